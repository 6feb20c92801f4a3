import { describe, expect, it } from 'vitest';
import { demoCircuit } from '../circuit/samples/demo.ts';
import { dateInWords, slipShapes, slipsOf, wrapWords } from './paper-slips.ts';
import { schematicPicture } from './schematic.ts';
import { pictureToSvg } from './svg.ts';

describe('paper slips', () => {
  it('break words into lines and cut what is longer than a line', () => {
    expect(wrapWords('one two three', 7)).toEqual(['one two', 'three']);
    expect(wrapWords('abcdefghij', 4)).toEqual(['abcd', 'efgh', 'ij']);
    expect(wrapWords('first\n\nsecond', 20)).toEqual(['first', '', 'second']);
  });
  it('say dates in words and leave others as written', () => {
    expect(dateInWords('2026-11-28')).toBe('28 Nov 2026');
    expect(dateInWords('last week')).toBe('last week');
    expect(dateInWords('2026-13-28')).toBe('2026-13-28');
  });
  it('hold their words and are left out when empty', () => {
    const [slip] = slipsOf(demoCircuit);
    if (!slip) throw new Error('the demo has no note');
    expect(slip.lines.join(' ')).toBe(demoCircuit.notes[0]?.text);
    for (const shape of slipShapes(slip)) {
      if (shape.type !== 'text') continue;
      expect(shape.y).toBeLessThan(slip.box.y + slip.box.h);
      expect(shape.x).toBeGreaterThan(slip.box.x);
    }
    expect(slipsOf({ notes: [{ id: 'n', at: { x: 0, y: 0 }, text: '  ', date: '' }], labels: [] })).toEqual([]);
  });
  it('stand on the exported and printed drawing, inside it', () => {
    const far = { ...demoCircuit, notes: [{ id: 'n', at: { x: -60, y: -20 }, text: 'Look here', date: '2026-11-28' }] };
    const plain = schematicPicture(far, 'A', null);
    const withNotes = schematicPicture(far, 'A', null, { notes: true });
    expect(pictureToSvg(plain, 'light')).not.toContain('Look here');
    expect(pictureToSvg(withNotes, 'light')).toContain('Look here');
    expect(withNotes.width).toBeGreaterThan(plain.width + 50);
    const labelled = { ...demoCircuit, labels: [{ id: 'l', component: 'P1', at: { x: 10, y: 42 }, text: 'Shelf 14' }] };
    expect(pictureToSvg(schematicPicture(labelled, 'A', null, { notes: true }), 'light')).toContain('Shelf 14');
  });
});
