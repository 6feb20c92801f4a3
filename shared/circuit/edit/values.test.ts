import { describe, expect, it } from 'vitest';
import { checkDocument } from '../check-document.ts';
import { effectiveValue } from '../effective.ts';
import { addCase, caseLetter, deleteCase, duplicateCase, renameCase, setCaseInk } from './cases.ts';
import { addCommand, changeCommand, moveCommand, removeCommand, setDuty } from './duty.ts';
import { setLineData, setRoute, setTagPlace, setTitle } from './sheet.ts';
import { builtPress } from './test-circuits.ts';
import {
  asFoundTaken,
  asFoundValue,
  clearValue,
  correctAsFound,
  isLocked,
  lockScrew,
  resetToAsFound,
  setValue,
  takeAsFound,
} from './values.ts';

const bar = 1e5;

describe('setValue', () => {
  it('writes into the document in case A, with what was typed', () => {
    const edit = setValue(builtPress(), 'a', 'p1', 'compensatorPressure', 180 * bar, '180 bar');
    expect(edit.caseId).toBe('a');
    expect(edit.document.components.find((entry) => entry.id === 'p1')?.parameters.compensatorPressure).toEqual({
      value: 180 * bar,
      typed: '180 bar',
      source: 'typed',
    });
  });

  it('writes a change in another case, and takes it away again at the document value', () => {
    const made = addCase(builtPress(), 'a');
    const own = effectiveValue(made.document, 'a', 'p1', 'compensatorPressure') as number;
    let edit = setValue(made.document, 'b', 'p1', 'compensatorPressure', own - 20 * bar);
    expect(edit.document.cases[1]?.changes).toEqual([{ target: 'p1', field: 'compensatorPressure', value: own - 20 * bar }]);
    expect(edit.document.components).toBe(made.document.components);
    edit = setValue(edit.document, 'b', 'p1', 'compensatorPressure', own);
    expect(edit.document.cases[1]?.changes).toEqual([]);
  });

  it('refuses outside the range with the nearest value, and changes nothing', () => {
    const press = setValue(builtPress(), 'a', 'p1', 'mostCompensator', 250 * bar).document;
    const edit = setValue(press, 'a', 'p1', 'compensatorPressure', 300 * bar);
    expect(edit.document).toBe(press);
    expect(edit.refused).toMatchObject({ target: 'p1', field: 'compensatorPressure', nearest: 250 * bar });
  });

  it('refuses a range that would leave a screw of some case outside', () => {
    const made = addCase(builtPress(), 'a', 'Higher');
    const high = setValue(made.document, 'b', 'p1', 'compensatorPressure', 240 * bar).document;
    const edit = setValue(high, 'a', 'p1', 'mostCompensator', 220 * bar);
    expect(edit.document).toBe(high);
    expect(edit.refused?.message).toContain('case Higher');
  });

  it('makes the next case once A is frozen and a screw is turned, but corrects plate data in place', () => {
    const frozen = takeAsFound(builtPress());
    expect(asFoundTaken(frozen)).toBe(true);
    const mark = asFoundValue(frozen, 'p1', 'maxVolumeStop') as number;
    const turned = setValue(frozen, 'a', 'p1', 'maxVolumeStop', mark * 0.6);
    expect(turned.caseId).toBe('b');
    expect(turned.document.cases[1]).toMatchObject({ ink: 1, changes: [{ target: 'p1', field: 'maxVolumeStop', value: mark * 0.6 }] });
    expect(turned.document.cases[1]?.name).toMatch(/turned in$/);
    expect(effectiveValue(turned.document, 'a', 'p1', 'maxVolumeStop')).toBe(mark);
    const plate = setValue(frozen, 'a', 'm1', 'ratedSpeed', 150);
    expect(plate.caseId).toBe('a');
    expect(setValue(frozen, 'a', 'supply', 'voltage', 360).document.cases[1]?.name).toBe('Supply voltage lowered');
    const back = resetToAsFound(turned.document, 'b', 'p1', 'maxVolumeStop');
    expect(back.document.cases[1]?.changes).toEqual([]);
  });

  it('corrects an as-found mark together with the value', () => {
    const frozen = takeAsFound(builtPress());
    const edit = correctAsFound(frozen, 'p1', 'compensatorPressure', 170 * bar);
    expect(edit.document.cases).toHaveLength(1);
    expect(asFoundValue(edit.document, 'p1', 'compensatorPressure')).toBe(170 * bar);
    expect(effectiveValue(edit.document, 'a', 'p1', 'compensatorPressure')).toBe(170 * bar);
  });

  it('sets line data, fluid, duty and faults, and clears a value back to typical', () => {
    const press = builtPress();
    const line = press.lines[0]?.id as string;
    expect(setValue(press, 'a', line, 'loss', 1).document.lines[0]?.loss).toBe(true);
    expect(setValue(press, 'a', 'fluid', 'grade', 'VG 68').document.fluid.grade).toBe('VG 68');
    expect(setValue(press, 'a', 'fluid', 'grade', 'VG 99').refused?.message).toContain('VG 46');
    expect(setValue(press, 'a', 'duty', 'command.c2.value', -1).document.duty.commands[1]?.value).toBe(-1);
    expect(setValue(press, 'a', 'duty', 'command.c2.value', 7).refused).toBeDefined();
    const worn = setValue(press, 'a', 'p1', 'fault.worn', 0.5).document;
    expect(effectiveValue(worn, 'a', 'p1', 'fault.worn')).toBe(0.5);
    expect(effectiveValue(clearValue(worn, 'p1', 'fault.worn'), 'a', 'p1', 'fault.worn')).toBe(0);
  });

  it('locks and loosens a nut, and knows no nut where there is no screw', () => {
    const press = builtPress();
    const tight = lockScrew(press, 'v2', 'setPressure', true);
    expect(isLocked(tight, 'v2', 'setPressure')).toBe(true);
    expect(isLocked(lockScrew(tight, 'v2', 'setPressure', false), 'v2', 'setPressure')).toBe(false);
    expect(lockScrew(press, 'v2', 'ratedPressure', true)).toBe(press);
  });
});

describe('cases', () => {
  it('are added from another with its changes, renamed, inked and deleted; A stays', () => {
    let made = addCase(builtPress(), 'a');
    made = duplicateCase(setValue(made.document, 'b', 'supply', 'voltage', 380).document, 'b');
    expect(made.document.cases[2]).toMatchObject({ id: 'c', ink: 2, changes: [{ target: 'supply', field: 'voltage', value: 380 }] });
    expect(caseLetter(made.document.cases[2] as { ink: number })).toBe('C');
    const inked = setCaseInk(made.document, 'c', 1);
    expect(inked.cases.map((entry) => entry.ink)).toEqual([0, 2, 1]);
    expect(renameCase(inked, 'c', ' Lower ').cases[2]?.name).toBe('Lower');
    expect(deleteCase(inked, 'b').cases.map((entry) => entry.id)).toEqual(['a', 'c']);
    expect(deleteCase(inked, 'a')).toBe(inked);
  });

  it('are at most ten', () => {
    let document = builtPress();
    for (let i = 0; i < 9; i++) document = addCase(document, 'a').document;
    expect(addCase(document, 'a')).toEqual({ document, caseId: null });
    expect(checkDocument(document).ok).toBe(true);
  });
});

describe('the duty', () => {
  it('takes a command with the ramp and word of its input, keeps the order of time, and refuses what the input does not take', () => {
    const press = builtPress();
    const added = addCommand(press, { time: 0.5, target: 'v1', input: 'spool', value: -1 });
    expect(added.document.duty.commands.map((command) => command.id)).toEqual(['c1', 'c3', 'c2']);
    expect(added.document.duty.commands[1]?.ramp).toBeGreaterThan(0);
    expect(addCommand(press, { time: 0, target: 'v1', input: 'spool', value: 2 }).problem?.message).toMatch(/must be/);
    expect(addCommand(press, { time: 0, target: 'supply', input: 'voltage', value: 360 }).problem).toBeNull();
    expect(addCommand(press, { time: 0, target: 'supply', input: 'colour', value: 1 }).problem).not.toBeNull();
  });

  it('moves within the duty, changes and removes with what cases say about it', () => {
    const press = builtPress();
    const moved = moveCommand(press, 'c1', 99);
    expect(moved.duty.commands.map((command) => [command.id, command.time])).toEqual([
      ['c2', 0.8],
      ['c1', press.duty.duration],
    ]);
    const withCase = setValue(addCase(press, 'a').document, 'b', 'duty', 'command.c2.time', 2).document;
    expect(removeCommand(withCase, 'c2').cases[1]?.changes).toEqual([]);
    expect(changeCommand(press, 'c2', { value: 5 }).problem).not.toBeNull();
    expect(changeCommand(press, 'c2', { label: 'Shift' }).document.duty.commands[1]?.label).toBe('Shift');
    expect(setDuty(press, { duration: 8, repeat: false }).duty).toMatchObject({ duration: 8, repeat: false });
    expect(setDuty(press, {})).toBe(press);
  });
});

describe('the sheet', () => {
  it('keeps title, tag places, bends and line data, and refuses nonsense', () => {
    const press = builtPress();
    expect(setTitle(press, '  ')).toBe(press);
    const tagged = setTagPlace(press, 'p1.maxVolumeStop', { dx: 1, dy: 2, pinned: true });
    expect(setTagPlace(tagged, 'p1.maxVolumeStop', null).tagPlaces).toEqual({});
    const line = press.lines[0]?.id as string;
    expect(setLineData(press, line, { bore: 5 }).problem).toContain('bore must be at most 1');
    expect(setLineData(press, line, { wall: 0.002, loss: true }).document.lines[0]).toMatchObject({ wall: 0.002, loss: true });
    expect(setRoute(press, line, [{ x: 1.26, y: 2 }]).lines[0]?.route).toEqual([{ x: 1.5, y: 2 }]);
  });
});
