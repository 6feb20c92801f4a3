import { describe, expect, it } from 'vitest';
import { addComponent, mirrorParts, moveParts, placeAt, turnParts } from './components.ts';
import { copyParts, duplicateParts, pasteParts } from './copy.ts';
import { emptyCircuit } from './empty-circuit.ts';
import { builtPress } from './test-circuits.ts';

const at = (document: ReturnType<typeof builtPress>, id: string) => document.components.find((component) => component.id === id);

describe('parts on the sheet', () => {
  it('gives the next item code per letter and leaves parameters typical', () => {
    const press = builtPress();
    expect(press.components.map((component) => component.name)).toEqual(['M1', 'P1', 'V1', 'V2', 'A1', 'T1', 'T2', '']);
    expect(press.components.every((component) => Object.keys(component.parameters).length === 0)).toBe(true);
  });

  it('refuses an unknown kind and a full sheet', () => {
    const document = emptyCircuit();
    expect(addComponent(document, 'warp-drive', { x: 0, y: 0 })).toEqual({ document, componentId: null });
    let full = document;
    for (let i = 0; i < 200; i++) full = addComponent(full, 'tank', { x: i, y: 0 }).document;
    expect(addComponent(full, 'tank', { x: 0, y: 0 }).componentId).toBeNull();
  });

  it('moves bends only of lines that lie between moved parts, and shares what stays', () => {
    let press = builtPress();
    press = { ...press, lines: press.lines.map((line) => ({ ...line, route: [{ x: 1, y: 1 }] })) };
    const moved = moveParts(press, ['v1', 'a1'], { x: 3, y: -2 });
    const bends = (id: string) =>
      moved.lines.filter((line) => [line.from.component, line.to.component].sort().join() === id).map((line) => line.route[0]);
    expect(bends('a1,v1')).toEqual([
      { x: 4, y: -1 },
      { x: 4, y: -1 },
    ]);
    expect(bends('t2,v1')).toEqual([{ x: 1, y: 1 }]);
    expect(at(moved, 'm1')).toBe(at(press, 'm1'));
    expect(moveParts(press, ['v1'], { x: 0, y: 0 })).toBe(press);
  });

  it('comes back to the start after four quarter turns and after two mirrors', () => {
    const press = builtPress();
    for (const ids of [['v1'], ['p1'], ['v1', 'a1', 'v2']]) {
      let turned = press;
      for (let i = 0; i < 4; i++) turned = turnParts(turned, ids);
      expect(turned.components).toEqual(press.components);
      expect(mirrorParts(mirrorParts(press, ids), ids).components).toEqual(press.components);
      expect(turnParts(press, ids).components).not.toEqual(press.components);
    }
  });

  it('mirrors a part on its side left for right, not top for bottom', () => {
    const side = turnParts(builtPress(), ['v1']);
    const mirrored = at(mirrorParts(side, ['v1']), 'v1');
    expect([mirrored?.turn, mirrored?.mirror]).toEqual([3, true]);
  });

  it('places a part and takes its label along', () => {
    let press = builtPress();
    press = { ...press, labels: [{ id: 'k1', component: 'v1', at: { x: 41, y: 25 }, text: 'Shelf 3' }] };
    const placed = placeAt(press, 'v1', { x: 50.2, y: 18 });
    expect(at(placed, 'v1')?.at).toEqual({ x: 50, y: 18 });
    expect(placed.labels[0]?.at).toEqual({ x: 51, y: 25 });
  });
});

describe('copies', () => {
  it('take the lines and shafts between the chosen parts, under new ids and codes', () => {
    const press = builtPress();
    const copy = duplicateParts(press, ['m1', 'p1', 'v1', 'a1']);
    expect(copy.ids).toEqual(['m2', 'p2', 'v3', 'a2']);
    expect(copy.document.shafts[1]?.members.map((member) => member.component)).toEqual(['m2', 'p2']);
    const lines = copy.document.lines.slice(press.lines.length);
    expect(lines.map((line) => `${line.from.component}-${line.to.component}`)).toEqual(['v3-a2', 'v3-a2']);
  });

  it('start without as-found marks', () => {
    let press = builtPress();
    press = {
      ...press,
      components: press.components.map((entry) =>
        entry.id === 'p1' ? { ...entry, screws: { maxVolumeStop: { asFound: 1e-6, locked: true } } } : entry,
      ),
    };
    const copy = duplicateParts(press, ['p1']);
    expect(at(copy.document, 'p2')?.screws).toEqual({ maxVolumeStop: { locked: true } });
  });

  it('may be pasted into another sheet', () => {
    const clip = copyParts(builtPress(), ['v1', 'a1']);
    const pasted = pasteParts(emptyCircuit(), clip, { x: 0, y: 0 });
    expect(pasted.ids).toEqual(['v1', 'a1']);
    expect(pasted.document.lines).toHaveLength(2);
    expect(pasteParts(emptyCircuit(), { components: [], lines: [], shafts: [], notes: [] }, { x: 0, y: 0 }).ids).toEqual([]);
  });
});
