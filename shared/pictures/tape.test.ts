import { describe, expect, it } from 'vitest';
import { casePen, tracePen } from './case-pens.ts';
import { envelope, extent } from './envelope.ts';
import { freePlace, overlaps, pushApart, stackFlags, textWidth } from './placement.ts';
import { syntheticRun } from './run-for-tests.ts';
import { laneDomain, linearScale, roundTicks, tickDigits } from './scale.ts';
import { tapeBand } from './tape-band.ts';
import { groupWords, joinNumerals, mergePins, type Pin, pinsOf, pinVerdict, placeMarks } from './tape-pins.ts';

describe('envelope', () => {
  const n = 20_001;
  const times = Float64Array.from({ length: n }, (_, i) => i / 2000);
  const values = times.map((t) => Math.sin(t * 40) + (Math.abs(t - 3.33325) < 1e-4 ? 7 : 0));

  it('loses no peak and keeps both ends', () => {
    const points = envelope(times, values, 0, 10, 400);
    const kept = points.filter((_, i) => i % 2 === 1);
    expect(Math.max(...kept)).toBe(Math.max(...values));
    expect(Math.min(...kept)).toBe(Math.min(...values));
    expect(points[0]).toBe(0);
    expect(points[points.length - 2]).toBe(10);
    expect(points.length / 2).toBeLessThanOrEqual(4 * 400 + 2);
  });
  it('keeps the extremes of every column', () => {
    const columns = 50;
    const points = envelope(times, values, 2, 6, columns);
    for (let c = 0; c < columns; c += 1) {
      const inside = (t: number) => t >= 2 && Math.min(columns - 1, Math.floor(((t - 2) * columns) / 4)) === c && t <= 6;
      let most = Number.NEGATIVE_INFINITY;
      for (let i = 0; i < n; i += 1) if (inside(times[i] as number)) most = Math.max(most, values[i] as number);
      let kept = Number.NEGATIVE_INFINITY;
      for (let i = 0; i < points.length; i += 2) if (inside(points[i] as number)) kept = Math.max(kept, points[i + 1] as number);
      expect(kept).toBe(most);
    }
  });
  it('goes forward in time and interpolates at the window', () => {
    const points = envelope(Float64Array.of(0, 1, 2), Float64Array.of(0, 10, 0), 0.5, 1.5, 10);
    expect([...points]).toEqual([0.5, 5, 1, 10, 1.5, 5]);
  });
  it('is empty outside the run and for an empty run', () => {
    expect(envelope(Float64Array.of(0, 1), Float64Array.of(1, 2), 3, 4, 10)).toHaveLength(0);
    expect(envelope(new Float64Array(0), new Float64Array(0), 0, 1, 10)).toHaveLength(0);
  });
  it('measures a window with its ends', () => {
    expect(extent(Float64Array.of(0, 1, 2), Float64Array.of(0, 10, 0), 1.25, 1.75)).toEqual([2.5, 7.5]);
    expect(extent(Float64Array.of(0, 1, 2), Float64Array.of(0, 10, 0), 0, 5)).toEqual([0, 10]);
    expect(extent(Float64Array.of(0, 1), Float64Array.of(0, 1), 2, 3)).toBeNull();
  });
});

describe('scales', () => {
  it('map ends onto ends', () => {
    const y = linearScale(0, 200, 50, 0);
    expect([y(0), y(200), y(100)]).toEqual([50, 0, 25]);
  });
  it('make round ticks', () => {
    expect(roundTicks(0, 7, 7)).toEqual([0, 1, 2, 3, 4, 5, 6, 7]);
    expect(roundTicks(0, 250, 5)).toEqual([0, 50, 100, 150, 200, 250]);
    expect(tickDigits(roundTicks(0, 1.2, 6))).toBe(1);
  });
  it('hold what is shown, with zero and round ends, and stay put for a small change', () => {
    expect(laneDomain(2, 187)).toEqual([0, 200]);
    expect(laneDomain(2, 191)).toEqual([0, 200]);
    expect(laneDomain(-3, 187)[0]).toBeLessThanOrEqual(-3);
    expect(laneDomain(0, 0)).toEqual([0, 1]);
    expect(laneDomain(5, 5)).toEqual([0, 6.25]);
    expect(laneDomain(Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY)).toEqual([0, 1]);
  });
});

describe('placement', () => {
  it('pushes apart, keeps the order and stays inside', () => {
    const places = pushApart([10, 12, 11, 80], 16, 0, 100);
    const sorted = [...places].sort((a, b) => a - b);
    for (let i = 1; i < sorted.length; i += 1) expect((sorted[i] as number) - (sorted[i - 1] as number)).toBeGreaterThanOrEqual(16 - 1e-9);
    expect(Math.min(...places)).toBeGreaterThanOrEqual(0);
    expect(places[3]).toBe(80);
    expect(places[0]).toBeLessThan(places[2] as number);
    expect(places[2]).toBeLessThan(places[1] as number);
  });
  it('spreads evenly when there is no room', () => expect(pushApart([5, 5, 5], 16, 0, 20)).toEqual([0, 10, 20]));
  it('leaves alone what is already apart', () => expect(pushApart([5, 30, 60], 16, 0, 100)).toEqual([5, 30, 60]));
  it('finds the first free place inside the frame', () => {
    const frame = { x: 0, y: 0, w: 100, h: 20 };
    const taken = [{ x: 40, y: 0, w: 20, h: 20 }];
    const right = { x: 45, y: 0, w: 30, h: 10 };
    const left = { x: 5, y: 0, w: 30, h: 10 };
    expect(freePlace([right, left], taken, frame)).toBe(left);
    expect(freePlace([{ x: 90, y: 0, w: 30, h: 10 }], taken, frame)).toBeNull();
    expect(overlaps(right, taken[0] as typeof right)).toBe(true);
  });
  it('stacks flags in two rows, further ones are ticks', () => {
    const flags = [0, 10, 20, 200].map((x) => ({ x, width: 80 }));
    expect(stackFlags(flags, 2, 2)).toEqual([0, 1, -1, 0]);
  });
  it('widens with the words', () => expect(textWidth('Solenoid a on', 13)).toBeGreaterThan(textWidth('a on', 13)));
});

const x = (time: number) => time * 100;
function pin(part: Partial<Pin>): Pin {
  return { caseId: 'A', letter: 'A', ink: 0, time: 0, words: 'relief cracks', kind: 'V2.cracks.up', verdict: null, ...part };
}

describe('pins', () => {
  it('merge when of one kind and case and closer than 14 px', () => {
    const pins = [0, 0.1, 0.2, 0.5].map((time) => pin({ time }));
    const groups = mergePins([...pins, pin({ time: 0.1, caseId: 'B', letter: 'B' })], x);
    expect(groups.map((group) => [group.pins[0]?.caseId, group.pins.length])).toEqual([
      ['A', 3],
      ['B', 1],
      ['A', 1],
    ]);
    expect(groups[0]).toMatchObject({ from: 0, to: 20 });
    expect(groupWords(groups[0] as (typeof groups)[number])).toBe('3× relief cracks, A');
  });
  it('come from events with words, up to where the trace ends', () => {
    const run = syntheticRun({
      channels: [],
      events: [
        { signal: 'cracks', component: 'V2', time: 1, rising: true, label: 'relief cracks' },
        { signal: 'in', component: 'A1', time: 0, rising: true, label: 'rod fully in' },
        { signal: 'passing', component: 'V2', time: 1.1, rising: true, label: 'relief passing' },
        { signal: 'cracks', component: 'V2', time: 2, rising: false, label: 'relief shut' },
        { signal: 'cracks', component: 'V2', time: 5, rising: true, label: 'relief cracks' },
      ],
    });
    const pins = pinsOf([{ id: 'A', letter: 'A', ink: 0, run, stall: { motor: 'M1', time: 3, traceEnd: 4, resumes: null } }]);
    expect(pins).toHaveLength(1);
    expect(pins[0]).toMatchObject({ time: 1, verdict: 'relief-passing' });
  });
  it('wear the shape of what they say', () => {
    expect(pinVerdict({ signal: 'overload-trip', label: 'overload relay trips' }, false)).toBe('trips');
    expect(pinVerdict({ signal: 'compensating', label: 'starts to compensate' }, false)).toBeNull();
  });
  it('call a fall below pull-out speed a stall only where the assessment does', () => {
    const fall = (time: number) => ({ signal: 'up-to-speed', component: 'M1', time, rising: false, label: 'falls below pull-out speed' });
    const met = (time: number) => ({ signal: 'work-met', component: 'A1', time, rising: true, label: 'meets the work' });
    const start = { signal: 'up-to-speed', component: 'M1', time: 0.2, rising: true, label: 'passes pull-out speed' };
    const run = syntheticRun({ channels: [], events: [start, fall(2), { ...start, time: 5 }, fall(6), met(4), met(6.5)] });
    const pins = pinsOf([{ id: 'A', letter: 'A', ink: 0, run, stall: { motor: 'M1', time: 2.01, traceEnd: 3, resumes: 5 } }]);
    expect(pins.map((entry) => [entry.words, entry.verdict])).toEqual([
      ['stalls', 'motor-stalls'],
      ['meets the work', null],
    ]);
  });
  it('carry the numeral of a finding of their case and moment', () => {
    const groups = mergePins([pin({ time: 2 }), pin({ time: 2.02, caseId: 'B', letter: 'B' })], x);
    const marks = joinNumerals(
      groups,
      [
        { number: 1, caseId: 'B', time: 2.01 },
        { number: 2, caseId: 'A', time: 4 },
      ],
      x,
    );
    expect(marks.map((mark) => [mark.group?.pins[0]?.caseId ?? null, mark.numerals.map((entry) => entry.number)])).toEqual([
      ['A', []],
      ['B', [1]],
      [null, [2]],
    ]);
  });
  it('never cover each other nor a flag while there is room', () => {
    const groups = mergePins(
      [0.5, 0.55, 0.6].map((time, i) => pin({ time, caseId: 'ABC'[i] as string })),
      x,
    );
    const placed = placeMarks(joinNumerals(groups, [], x), { from: 0, to: 700, rows: [1, 2, 0], rowHeight: 23 }, [], [], 13);
    expect(new Set(placed.map((mark) => mark.row)).size).toBe(3);
    expect(placed.every((mark) => mark.free)).toBe(true);
  });
});

describe('top edge', () => {
  const view = { x, width: 700, size: 13, rowHeight: 23, short: false, bare: false, mostRows: 3 as const };
  it('keeps marks clear of flags and their poles', () => {
    const flags = [{ id: 'a', time: 0.6, words: 'Solenoid a on', short: 'a on' }];
    const band = tapeBand(flags, [pin({ time: 0.62 })], [], view);
    expect(band.flags[0]).toMatchObject({ row: 0, x: 60 });
    expect(band.marks[0]).toMatchObject({ row: 1, words: 'A relief cracks', side: 'right' });
  });
  it('hangs a flag to the left where the right edge is near', () => {
    const flags = [{ id: 'a', time: 6.8, words: 'Solenoid a on', short: 'a on' }];
    expect(tapeBand(flags, [], [], view).flags[0]).toMatchObject({ x: 680, row: 0, mirrored: true });
  });
  it('has a third row only where it is allowed', () => {
    const pins = [0.5, 0.52, 0.54].map((time, i) => pin({ time, caseId: 'ABC'[i] as string, verdict: 'relief-passing' }));
    const flags = [{ id: 'a', time: 0.3, words: 'Solenoid a on', short: 'a on' }];
    expect(tapeBand(flags, pins, [], view).rows).toBe(3);
    expect(tapeBand(flags, pins, [], { ...view, mostRows: 2 }).rows).toBe(2);
  });
  it('unfolds crowded flags as ticks', () => {
    const flags = [0.1, 0.15, 0.2, 0.25].map((time, i) => ({ id: `c${i}`, time, words: 'Solenoid a on', short: 'a on' }));
    expect(tapeBand(flags, [], [], view).flags.map((flag) => flag.row)).toEqual([0, 1, -1, -1]);
  });
});

describe('pens', () => {
  it('join letter, ink and dash', () => {
    expect(casePen(2)).toMatchObject({ letter: 'C', ink: 'case-2', dash: [8, 3] });
    expect(casePen(5)).toMatchObject({ letter: 'F', ink: 'case-0', dash: [10, 3, 2, 3] });
  });
  it('make the case on the drawing the thicker', () => {
    for (const ink of [0, 1, 2, 3, 4]) {
      for (const other of [0, 1, 2, 3, 4]) expect(tracePen(ink, true, 4).width).toBeGreaterThan(tracePen(other, false, 4).width);
    }
    expect(tracePen(2, false, 2).dash).toEqual([]);
  });
});
