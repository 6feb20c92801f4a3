import { describe, expect, it } from 'vitest';
import { checkDocument } from '../check-document.ts';
import { addCase } from './cases.ts';
import { addRequirement } from './duty.ts';
import { lineAt } from './joins.ts';
import { chosenInWords, disconnect, removalList, removeItems } from './removal.ts';
import { addLabel, addNote } from './sheet.ts';
import { builtPress } from './test-circuits.ts';
import { setValue } from './values.ts';

function pressWithEverything() {
  let document = builtPress();
  const added = addCase(document, 'a', 'Float centre');
  document = setValue(added.document, added.caseId as string, 'v1', 'centre', 'float').document;
  document = setValue(document, added.caseId as string, 'duty', 'command.c2.time', 1.2).document;
  document = addRequirement(document, { quantity: 'v1.P.pressure', measure: 'peak', max: 200e5 }).document;
  document = addLabel(document, 'v1', { x: 1, y: 1 }, 'Shelf 4').document;
  return addNote(document, { at: { x: 0, y: 0 }, text: 'New pump fitted', date: '2026-11-28' }).document;
}

describe('removing', () => {
  it('lists in words what goes along', () => {
    const words = removalList(pressWithEverything(), ['v1']);
    expect(words).toEqual(['4 lines', '2 changes in case Float centre', "the command 'Solenoid a on'", '1 requirement', '1 part label']);
    expect(chosenInWords(pressWithEverything(), ['v1'])).toMatch(/ V1$/);
  });

  it('names up to three lines by their ends', () => {
    const words = removalList(builtPress(), ['t1']);
    expect(words).toHaveLength(1);
    expect(words[0]).toMatch(/^the line from V2 .* to T1 /);
  });

  it('removes exactly what it listed and leaves a document that passes the check', () => {
    const document = removeItems(pressWithEverything(), ['v1']);
    expect(document.components.some((component) => component.id === 'v1')).toBe(false);
    expect(document.cases[1]?.changes).toEqual([]);
    expect(document.duty.commands.map((command) => command.id)).toEqual(['c1']);
    expect(document.requirements).toEqual([]);
    expect(document.labels).toEqual([]);
    expect(document.notes).toHaveLength(1);
    expect(checkDocument(document).ok).toBe(true);
  });

  it('turns a junction of two alike lines into plain line again', () => {
    const document = removeItems(builtPress(), ['v2']);
    expect(document.components.some((component) => component.kind === 'junction')).toBe(false);
    expect(lineAt(document, { component: 'p1', port: 'outlet' })).toMatchObject({ to: { component: 'v1', port: 'P' }, length: 1 });
  });

  it('keeps the dot where the two lines differ', () => {
    const press = builtPress();
    const lines = press.lines.map((line) => (line.to.component === 'v1' || line.from.component === 'v1' ? { ...line, bore: 0.02 } : line));
    const document = removeItems({ ...press, lines }, ['v2']);
    expect(document.components.some((component) => component.kind === 'junction')).toBe(true);
  });

  it('drops the shaft when one end goes and nothing when nothing is chosen', () => {
    const press = builtPress();
    expect(removeItems(press, ['m1']).shafts).toEqual([]);
    expect(removalList(press, ['m1'])).toContain('1 shaft');
    expect(removeItems(press, ['nobody'])).toBe(press);
    const line = lineAt(press, { component: 'v1', port: 'A' })?.id as string;
    expect(lineAt(disconnect(press, line), { component: 'a1', port: 'A' })).toBeUndefined();
  });
});
