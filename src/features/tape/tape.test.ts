import { describe, expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { defaultLanes } from '#shared/duty/lanes.ts';
import type { Yardsticks } from '#shared/findings/finding.ts';
import { syntheticRun } from '#shared/pictures/run-for-tests.ts';
import type { RunResult } from '#shared/simulation/result.ts';
import type { CaseRun } from '#src/stores/run-store.ts';
import { drawTraces } from './draw-traces.ts';
import { eventRows } from './event-rows.ts';
import { laneReading } from './lane-reading.ts';
import { tapeSvg } from './tape-export.ts';
import type { Context } from './tape-geometry.ts';
import { FOLDED_ROW, planTape } from './tape-layout.ts';
import { tapeCases, tapeModel } from './tape-model.ts';
import type { Tokens } from './tokens.ts';
import { advance, neighbour } from './use-playback.ts';

const preferences = { system: 'si' as const };
const STALL = 2;

/** A press that is within limits, or stalls at 2 s and comes back at 5.2 s. */
function press(caseId: string, stalls: boolean): RunResult {
  const stalled = (t: number) => stalls && t > STALL + 1e-6 && t < 5.2 - 1e-6;
  return syntheticRun({
    caseId,
    duration: 8,
    channels: [
      {
        address: 'P1.outlet.pressure',
        quantity: 'pressure',
        value: (t) => (Math.abs(t - 0.6) < 0.004 ? 210e5 : Math.min(190, 40 * t) * 1e5),
      },
      { address: 'P1.flow', quantity: 'flow', value: (t) => (stalled(t) ? 0 : 3.5e-4) },
      { address: 'M1.torqueRatio', quantity: 'ratio', value: (t) => (stalled(t) ? 9 : 0.4 + t / 10) },
      { address: 'M1.speed', quantity: 'speed', value: (t) => (stalled(t) ? 2 : 152) },
      { address: 'M1.current', quantity: 'current', value: (t) => (stalled(t) ? 61.4 : 9) },
      { address: 'A1.position', quantity: 'length', value: (t) => t * 0.04 },
    ],
    events: stalls
      ? [
          { signal: 'up-to-speed', component: 'M1', time: STALL, rising: false, label: 'falls below pull-out speed' },
          { signal: 'up-to-speed', component: 'M1', time: 5.2, rising: true, label: 'passes pull-out speed' },
        ]
      : [{ signal: 'work-met', component: 'A1', time: 1.5, rising: true, label: 'meets the work' }],
  });
}

function caseRun(run: RunResult, stalls: boolean, part: Partial<CaseRun> = {}): CaseRun {
  const yardsticks: Yardsticks[] = [
    {
      motor: 'M1',
      stalled: stalls,
      stallMargin: null,
      rmsCurrent: 1,
      rmsTorque: 1,
      peakTorque: 2,
      peakCurrent: 6,
      tripTime: null,
      ...(stalls ? { stallTime: STALL, stallCurrent: 61.4 } : {}),
    },
  ];
  const assessment = {
    caseId: run.caseId,
    verdict: { id: 'within-limits' as const, word: '' },
    findings: [],
    yardsticks,
    requirements: [],
    heat: 0,
  };
  return { state: 'done', stale: false, document: demoCircuit, run, assessment, curves: null, problems: [], reached: 8, ...part };
}

function model(overlays: readonly string[] = ['A'], part: Partial<CaseRun> = {}) {
  const byCase = { A: caseRun(press('A', true), true, part), B: caseRun(press('B', false), false), C: caseRun(press('C', false), false) };
  const cases = tapeCases(demoCircuit, 'B', overlays, byCase);
  return tapeModel(demoCircuit, cases, byCase, defaultLanes(demoCircuit), preferences);
}

describe('tape model', () => {
  it('holds a lane for every question, with a domain around all that is drawn', () => {
    const { lanes } = model();
    expect(lanes.map((lane) => lane.lane.title)).toEqual(['Pump port', 'Flow', 'Motor torque', 'Shaft speed', 'Rod extended']);
    expect(lanes[0]?.high).toBeGreaterThanOrEqual(210e5);
    expect(lanes[0]?.low).toBe(0);
  });
  it('ends a trace after the stall, the load at the stall, and takes both up where the motor is back', () => {
    const { lanes, cases } = model();
    const at = cases.findIndex((entry) => entry.id === 'A');
    const stretches = (title: string) =>
      lanes.find((lane) => lane.lane.title === title)?.traces.find((trace) => trace.caseIndex === at)?.stretches;
    expect(stretches('Motor torque')).toEqual([
      [0, 2],
      [5.2, 8],
    ]);
    expect(stretches('Pump port')?.[0]?.[1]).toBeCloseTo(2 + 0.12 * 8, 9);
  });
  it('leaves the load below pull-out speed out of the lane', () => {
    expect(model().lanes[2]?.high).toBeLessThan(3);
  });
  it('marks the rated torque of the motor', () => {
    expect(model().lanes[2]?.references[0]?.label.replaceAll('\u202f', ' ')).toBe('rated, 36.2 N·m');
  });
});

describe('reading in a lane', () => {
  const { cases, lanes } = model();
  const load = lanes[2] as (typeof lanes)[number];
  const a = cases[0] as (typeof cases)[number];
  it('is torque × rated while the motor runs', () => {
    expect(laneReading(a, load, 1, preferences)).toEqual({ value: '0.50', unit: '× rated' });
    expect(laneReading(a, load, 6, preferences).value).toBe('1.00');
  });
  it('is "stalled" with the current below pull-out speed, never a figure of load', () => {
    const reading = laneReading(a, load, 3, preferences);
    expect([reading.value, reading.unit.replace('\u202f', ' ')]).toEqual(['stalled', '61 A']);
  });
  it('is a dash without a run', () => {
    expect(laneReading({ ...a, run: null }, load, 1, preferences)).toEqual({ value: '–', unit: '' });
  });
});

describe('layout', () => {
  it('shares the height between up to two cases', () => {
    const plan = planTape(model(), { width: 826, height: 225 }, 26, null);
    expect(plan.folded).toEqual([]);
    expect(plan.geometry.lanes.map((lane) => lane.height)).toEqual([45, 45, 45, 45, 45]);
    expect(plan.geometry.plotWidth).toBe(800);
  });
  it('folds all but the lane in focus from three cases on', () => {
    const plan = planTape(model(['A', 'C']), { width: 826, height: 225 }, 26, 'A1.position');
    expect(plan.focus).toBe(4);
    expect(plan.folded).toEqual([0, 1, 2, 3]);
    expect(plan.geometry.lanes).toEqual([{ index: 4, top: 0, height: 225 - 4 * FOLDED_ROW }]);
    expect(plan.geometry.letters).toBe(true);
  });
});

/** A canvas that notes what is drawn on it. */
function recorder() {
  const lines: { alpha: number; stroke: unknown; points: [number, number][] }[] = [];
  const words: string[] = [];
  let path: [number, number][] = [];
  const stack: number[] = [];
  const nothing = () => undefined;
  const context = {
    globalAlpha: 1,
    strokeStyle: '',
    save: () => stack.push(context.globalAlpha),
    restore: () => {
      context.globalAlpha = stack.pop() ?? 1;
    },
    beginPath: () => {
      path = [];
    },
    moveTo: (x: number, y: number) => path.push([x, y]),
    lineTo: (x: number, y: number) => path.push([x, y]),
    stroke: () => lines.push({ alpha: context.globalAlpha, stroke: context.strokeStyle, points: path }),
    fillText: (text: string) => words.push(text),
    measureText: (text: string) => ({ width: text.length * 6 }),
    fillRect: nothing,
    clearRect: nothing,
    setLineDash: nothing,
    rect: nothing,
    clip: nothing,
    strokeRect: nothing,
  };
  return { context: context as unknown as Context, lines, words };
}
const tokens: Tokens = {
  ink: 'ink',
  ink2: 'ink2',
  ink3: 'ink3',
  rule: 'rule',
  sheet: 'sheet',
  paper: 'paper',
  stall: 'stall',
  cases: ['case-0', 'case-1', 'case-2'],
  body: 'sans-serif',
  reading: 'sans-serif',
  step: 1,
};

describe('drawing', () => {
  const drawn = (overlays?: readonly string[], part?: Partial<CaseRun>) => {
    const made = model(overlays, part);
    const { geometry } = planTape(made, { width: 826, height: 225 }, 26, null);
    const canvas = recorder();
    drawTraces(canvas.context, made, geometry, tokens);
    return canvas;
  };
  it('keeps a spike of one sample', () => {
    const top = drawn()
      .lines.filter((line) => line.stroke === 'case-1')
      .flatMap((line) => line.points.map((point) => point[1]));
    const lane = model().lanes[0] as ReturnType<typeof model>['lanes'][number];
    const y = 45 - 4 - ((210e5 - lane.low) / (lane.high - lane.low)) * (45 - 9);
    expect(Math.min(...top)).toBeCloseTo(y, 6);
  });
  it('says the stall and its current in the load lane', () => {
    expect(drawn().words).toContain('stalled, 61 A');
  });
  it('shows stale traces at 40 %', () => {
    const alphas = drawn(['A'], { stale: true })
      .lines.filter((line) => line.stroke === 'case-0')
      .map((line) => line.alpha);
    expect(new Set(alphas)).toEqual(new Set([0.4]));
  });
  it('letters the ends of traces when three share a lane', () => {
    expect(drawn(['A', 'C']).words).toEqual(expect.arrayContaining(['A', 'B', 'C']));
  });
});

describe('playback', () => {
  it('stops at the end, or begins again where the duty repeats', () => {
    expect(advance(6.99, 0.02, { duration: 7, repeat: false })).toEqual({ time: 7, playing: false });
    expect(advance(6.99, 0.02, { duration: 7, repeat: true }).time).toBeCloseTo(0.01, 9);
    expect(advance(1, 0.5, { duration: 7, repeat: false })).toEqual({ time: 1.5, playing: true });
    expect(advance(0, 1, { duration: 0, repeat: true })).toEqual({ time: 0, playing: false });
  });
  it('steps from event to event', () => {
    const moments = [0, 0.6, 2.1, 5.2];
    expect(neighbour(moments, 0.6, 1)).toBe(2.1);
    expect(neighbour(moments, 0.6, -1)).toBe(0);
    expect(neighbour(moments, 6, 1)).toBe(6);
    expect(neighbour(moments, 6, -1)).toBe(5.2);
  });
});

describe('the tape in words', () => {
  it('lists commands, events and findings by time', () => {
    const rows = eventRows(demoCircuit, model(), [{ number: 1, caseId: 'A', time: 2, words: 'Motor stalls' }], preferences);
    expect(rows.map((row) => row.time)).toEqual([...rows.map((row) => row.time)].sort((a, b) => a - b));
    expect(rows).toContainEqual({ time: 0.6, letter: '', words: 'Solenoid a on', sort: 'command' });
    expect(rows).toContainEqual({ time: 1.5, letter: 'B', words: 'A1: meets the work', sort: 'event' });
    expect(rows).toContainEqual({ time: 2, letter: 'A', words: 'Finding 1: Motor stalls', sort: 'finding' });
  });
  it('is one SVG file for export, with traces, references and the stall', () => {
    const svg = tapeSvg({ ...demoCircuit, title: 'Press <1>' }, model(), preferences);
    expect(svg).toContain('Press &lt;1&gt;');
    expect(svg).toContain('stalled, 61');
    expect(svg.match(/<polyline/g)?.length).toBe(5 * 3);
    expect(svg).not.toContain('NaN');
  });
});
