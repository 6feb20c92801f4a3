import { describe, expect, it } from 'vitest';
import { fromSi, preferredUnit, toSi, unitById } from './convert.ts';
import { formatPhrase, formatQuantity, formatTurns, THIN_SPACE } from './format.ts';
import { parseQuantity } from './parse.ts';
import { type Quantity, type QuantityId, quantities } from './quantities.ts';

/** One unit of a quantity in SI, through the same functions as every field and reading. */
const one = (quantity: QuantityId, unit: string) => toSi(1, unitById(quantity, unit));
const relative = (found: number, wanted: number) => Math.abs(found - wanted) / Math.abs(wanted);

describe('unit conversions against published values (REFERENCES.md section 1)', () => {
  it('U1: 1 psi = 6894.757293 Pa (NIST SI guide, appendix B.8; open conversion list T1)', () => {
    expect(relative(one('pressure', 'psi'), 6894.757293)).toBeLessThan(1e-8);
  });
  it('U2: 1 US gal = 3.785411784 L and 1 gpm = 3.785411784 L/min (231 in³, open conversion list T1)', () => {
    expect(relative(one('volume', 'gal') / one('volume', 'L'), 3.785411784)).toBeLessThan(1e-12);
    expect(relative(one('flow', 'gpm') / one('flow', 'L/min'), 3.785411784)).toBeLessThan(1e-12);
    expect(relative(one('flow', 'gpm'), 6.30902e-5)).toBeLessThan(1e-6);
  });
  it('U3: 1 hp = 745.700 W (550 ft·lbf/s, open conversion list T1)', () => {
    expect(relative(one('power', 'hp'), 745.7)).toBeLessThan(1e-5);
  });
  it('U4: 1 bar = 14.5038 psi (W1)', () => {
    expect(relative(fromSi(one('pressure', 'bar'), unitById('pressure', 'psi')), 14.5038)).toBeLessThan(1e-4);
  });
  it('U5: 1 lbf, 1 lb and 1 in are 4.448221615 N, 0.45359237 kg and 25.4 mm (exact definitions, T1)', () => {
    expect(relative(one('force', 'lbf'), 4.448221615)).toBeLessThan(1e-9);
    expect(one('mass', 'lb')).toBe(0.45359237);
    expect(one('length', 'in')).toBe(0.0254);
  });
  it('U6: hydraulic horsepower = gpm × psi / 1714 (E1, W2, W3)', () => {
    const constant = one('power', 'hp') / (one('flow', 'gpm') * one('pressure', 'psi'));
    expect(relative(constant, 1714.2857)).toBeLessThan(1e-7);
    expect(relative(constant, 1714)).toBeLessThan(2e-4);
  });
  it('U7: kW = L/min × bar / 600 exactly (W4)', () => {
    expect(relative(one('power', 'kW') / (one('flow', 'L/min') * one('pressure', 'bar')), 600)).toBeLessThan(1e-12);
  });
  it('U8: torque = power ÷ speed: 63025 in·lbf, 5252 ft·lbf and 9549.3 N·m (W2, E2, B1)', () => {
    const perRpm = one('power', 'hp') / one('speed', 'rpm');
    expect(relative(perRpm / one('torque', 'lbf.in'), 63025.4)).toBeLessThan(1e-6);
    expect(relative(perRpm / one('torque', 'lbf.ft'), 5252.11)).toBeLessThan(1e-6);
    expect(relative(one('power', 'kW') / one('speed', 'rpm') / one('torque', 'N.m'), 9549.3)).toBeLessThan(1e-6);
  });
  it('U10: v [ft/s] = 0.3208 gpm / in² and v [m/s] = 21.22 L/min / mm² of bore squared (W3, W6, W7)', () => {
    expect(relative(one('flow', 'gpm') / one('area', 'in2') / one('velocity', 'ft/s'), 0.320833)).toBeLessThan(1e-5);
    expect(relative(((4 / Math.PI) * one('flow', 'L/min')) / one('length', 'mm') ** 2, 21.2207)).toBeLessThan(1e-5);
  });
  it('U12: 1 lb·ft² = 0.0421401 kg·m², and the run-up constant is 307.24 (W8 rounds it to 308)', () => {
    expect(relative(one('inertia', 'lb.ft2'), 0.0421401)).toBeLessThan(1e-5);
    const constant = one('torque', 'lbf.ft') / (one('inertia', 'lb.ft2') * one('speed', 'rpm'));
    expect(relative(constant, 307.24)).toBeLessThan(1e-5);
  });
  it('O4: a pair of published catalogue figures agrees: 25 gpm = 94.8 L/min (0.2 %) and 100 psi = 687 kPa (0.4 %) (ex. 8.5, B1)', () => {
    expect(relative(fromSi(25 * one('flow', 'gpm'), unitById('flow', 'L/min')), 94.8)).toBeLessThan(2e-3);
    expect(relative(fromSi(100 * one('pressure', 'psi'), unitById('pressure', 'kPa')), 687)).toBeLessThan(4e-3);
  });
  it('V5: 38, 60 and 82 °C are 100, 140 and 180 °F (W44, W45)', () => {
    for (const [celsius, fahrenheit] of [
      [38, 100],
      [60, 140],
      [82, 180],
    ] as const) {
      const shown = fromSi(toSi(celsius, unitById('temperature', 'degC')), unitById('temperature', 'degF'));
      expect(Math.abs(shown - fahrenheit)).toBeLessThan(0.5);
    }
  });
});

describe('every unit', () => {
  const all = Object.entries<Quantity>(quantities).flatMap(([id, quantity]) =>
    quantity.units.map((unit) => ({ id: id as QuantityId, unit })),
  );
  it.each(all)('$id in $unit.id: its id and its symbol are read back to the same value', ({ id, unit }) => {
    for (const suffix of [unit.id, unit.symbol]) {
      const parsed = parseQuantity(`2.5 ${suffix === '1' ? '' : suffix}`, id, unit.id);
      expect(parsed.ok && fromSi(parsed.value, unit)).toBeCloseTo(2.5, 9);
    }
  });
});

const bar = (text: string) => parseQuantity(text, 'pressure', 'bar');
const inch3 = (text: string) => parseQuantity(text, 'displacement', 'in3/rev');

describe('parseQuantity', () => {
  it('lets the suffix decide the unit, in any letter case and without a space', () => {
    for (const text of ['2000 psi', '2000psi', '2000 PSI', '2000 psig']) {
      const parsed = bar(text);
      expect(parsed.ok && parsed.value).toBeCloseTo(13_789_514.586, 2);
      expect(parsed.ok && parsed.typed).toBe('2000 psi');
    }
  });
  it('takes comma and point as decimal signs', () => {
    expect(inch3('1.71')).toMatchObject({ ok: true, typed: '1.71 in³/rev' });
    expect(inch3('1,71')).toMatchObject({ ok: true, typed: '1,71 in³/rev', value: (inch3('1.71') as { value: number }).value });
    expect(inch3(',710')).toMatchObject({ ok: true });
    expect(inch3('0,710')).toMatchObject({ ok: true });
  });
  it.each(['1,710', '1.710', '-1,710', '1450.125'])('refuses %s and offers both readings', (text) => {
    const parsed = bar(text);
    expect(parsed).toMatchObject({ ok: false, reason: 'ambiguous' });
    if (parsed.ok || !parsed.readings) throw new Error('two readings expected');
    expect(parsed.readings).toHaveLength(2);
    const [large, small] = parsed.readings;
    if (!large || !small) throw new Error('two readings expected');
    expect(large.value / small.value).toBeCloseTo(1000, 9);
    expect(large.label).toContain('bar');
  });
  it('reads two kinds of separators, groups of three and grouping spaces', () => {
    expect(bar('1.234,5')).toMatchObject({ ok: true, value: 1234.5e5 });
    expect(bar('1,234.5')).toMatchObject({ ok: true, value: 1234.5e5 });
    expect(bar('1,234,567')).toMatchObject({ ok: true, value: 1234567e5 });
    expect(bar('1 710 bar')).toMatchObject({ ok: true, value: 1710e5 });
  });
  it('reads fractions of a turn and of an inch', () => {
    for (const [text, turns] of [
      ['2½', 2.5],
      ['2 1/2', 2.5],
      ['-¼', -0.25],
      ['3/4 turn', 0.75],
      ['½', 0.5],
    ] as const) {
      expect(parseQuantity(text, 'turns', 'turns')).toMatchObject({ ok: true, value: turns });
    }
    const bore = parseQuantity('2 1/2 in', 'length', 'mm');
    expect(bore.ok && bore.value).toBeCloseTo(0.0635, 12);
    expect(bore.ok && bore.typed).toBe('2 1/2 in');
  });
  it('prints back at most six digits as typed', () => {
    expect(bar('123.456')).toMatchObject({ ok: false, reason: 'ambiguous' });
    expect(bar('123.4567')).toMatchObject({ ok: true, typed: '123.457 bar' });
    expect(bar('190.50')).toMatchObject({ ok: true, typed: '190.50 bar' });
  });
  it.each(['abc', 'NaN', 'Infinity', '1e999', '--5', '10 - 20', '1.2.3', '1/0', '<b>5</b>', '5,'.repeat(2)])(
    'refuses %s as no number, naming the field',
    (text) => {
      const parsed = parseQuantity(text, 'pressure', 'bar', { min: 0, max: 1e7, label: 'Relief' });
      expect(parsed).toMatchObject({ ok: false, reason: 'not-a-number' });
      expect(!parsed.ok && parsed.message).toContain('Relief');
    },
  );
  it('names the quantity of a unit that does not belong here, and the units that do', () => {
    expect(bar('12 kW')).toMatchObject({
      ok: false,
      reason: 'unknown-unit',
      message: '"kW" is a unit of power; pressure takes bar, psi, MPa, kPa or Pa.',
    });
  });
  it('says what is empty', () => {
    expect(bar('  ')).toMatchObject({ ok: false, reason: 'empty' });
  });
  it('refuses a value outside the range with the nearest one', () => {
    const limits = { min: 6e-6 / (2 * Math.PI), max: 28e-6 / (2 * Math.PI), label: 'Max. volume stop' };
    const low = parseQuantity('4', 'displacement', 'cm3/rev', limits);
    expect(low).toMatchObject({ ok: false, reason: 'out-of-range', nearest: { value: limits.min } });
    expect(!low.ok && low.message).toContain('6');
    expect(parseQuantity('28', 'displacement', 'cm3/rev', limits)).toMatchObject({ ok: true, value: limits.max });
  });
});

describe('formatQuantity', () => {
  const si = { system: 'si' as const };
  it('shows SI or US, with an override per quantity', () => {
    expect(formatQuantity(190e5, 'pressure', si).text).toBe(`190${THIN_SPACE}bar`);
    expect(formatQuantity(190e5, 'pressure', { system: 'us' }).text).toBe(`2756${THIN_SPACE}psi`);
    expect(preferredUnit('displacement', { system: 'us', overrides: { displacement: 'cm3/rev' } }).symbol).toBe('cm³/rev');
  });
  it('uses the decimal sign of the person, a true minus and no minus zero', () => {
    expect(formatQuantity(1.5, 'ratio', { system: 'si', decimal: ',' }).value).toBe('1,50');
    expect(formatQuantity(-5e5, 'pressure', si).value).toBe('\u22125');
    expect(formatQuantity(-0.001, 'force', si).value).toBe('0.0');
  });
  it('groups five digits and more, never four', () => {
    expect(formatQuantity(2760, 'number', si, { digits: 0 }).value).toBe('2760');
    expect(formatQuantity(27600, 'number', si, { digits: 0 }).value).toBe(`27${THIN_SPACE}600`);
  });
  it('rounds margins down and forgives the last bits', () => {
    expect(formatQuantity(1.4999, 'ratio', si, { digits: 1, rounding: 'down' }).value).toBe('1.4');
    expect(formatQuantity(0.1 + 0.2 + 1.1, 'ratio', si, { digits: 1, rounding: 'down' }).value).toBe('1.4');
    expect(formatQuantity(1.3999999999999, 'ratio', si, { digits: 1, rounding: 'down' }).value).toBe('1.4');
  });
  it('shows plate values without loss and without trailing zeros', () => {
    expect(formatQuantity(3.5e5, 'pressure', si, { style: 'plate' }).value).toBe('3.5');
    expect(formatQuantity(0.935, 'fraction', si, { style: 'plate' }).text).toBe(`93.5${THIN_SPACE}%`);
    expect(formatQuantity(1e-12, 'flowCoefficient', si, { style: 'plate' }).value).toBe('1e-12');
  });
  it('never prints NaN or infinity', () => {
    for (const value of [Number.NaN, Number.POSITIVE_INFINITY]) expect(formatQuantity(value, 'pressure', si).text).toBe('\u2013');
  });
  it('writes phrases with their figures', () => {
    const phrase = [
      'At ',
      { value: 149e5, quantity: 'pressure' as const },
      ' the pump asks for ',
      { value: 72.5, quantity: 'torque' as const },
      '.',
    ];
    expect(formatPhrase(phrase, si)).toBe(`At 149${THIN_SPACE}bar the pump asks for 72.5${THIN_SPACE}N·m.`);
  });
  it('says turns in quarters', () => {
    expect(formatTurns(2.5)).toBe('2½ turns in');
    expect(formatTurns(-0.75)).toBe('¾ turn out');
    expect(formatTurns(0)).toBe('as found');
  });
});
