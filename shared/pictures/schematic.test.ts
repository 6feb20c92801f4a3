import { describe, expect, it } from 'vitest';
import { emptyCircuit } from '../circuit/edit/empty-circuit.ts';
import { crowdedCircuit } from '../circuit/samples/crowded.ts';
import { demoCircuit } from '../circuit/samples/demo.ts';
import { schematicPicture } from './schematic.ts';
import type { Shape } from './shape.ts';
import { combine, groupMatrix, uprightMatrix } from './shape-transform.ts';
import { pictureToSvg, shapesMarkup } from './svg.ts';
import { inkColour, themeTokens } from './theme.ts';

function flat(shapes: readonly Shape[]): Shape[] {
  return shapes.flatMap((shape) => (shape.type === 'group' ? [shape, ...flat(shape.shapes)] : [shape]));
}
const role = (shapes: readonly Shape[], name: string) => flat(shapes).filter((shape) => shape.role === name);

describe('the schematic as a picture', () => {
  it('prints at rest: valve centred, rod in, no pressure, no barbs, no load ring', () => {
    const { shapes, width, height, title } = schematicPicture(demoCircuit, 'A', null);
    expect(title).toBe(demoCircuit.title);
    expect(width).toBeGreaterThan(80);
    expect(height).toBeGreaterThan(35);
    expect(role(shapes, 'spool')[0]).toMatchObject({ dx: 0 });
    expect(role(shapes, 'barbs')).toEqual([]);
    expect(role(shapes, 'strands')).toEqual([]);
    expect(role(shapes, 'load-ring')).toEqual([]);
    for (const tint of role(shapes, 'tint')) expect(tint).toMatchObject({ stroke: 'oil-0' });
    expect(role(shapes, 'casing')).toHaveLength(demoCircuit.lines.length - 1);
    expect(role(shapes, 'drain')).toHaveLength(1);
  });
  it('shows a moment: tint and strands by pressure, barbs by flow, the solenoid that is on', () => {
    const readings = (address: string) => {
      if (address === 'V3.spool') return 1;
      if (address.startsWith('line.')) return -20 / 60_000;
      return address.endsWith('.pressure') ? 150e5 : undefined;
    };
    const { shapes } = schematicPicture(demoCircuit, 'B', readings, { inkScale: 250e5 });
    expect(role(shapes, 'spool')[0]).toMatchObject({ dx: 4 });
    expect(role(shapes, 'tint')[0]).toMatchObject({ stroke: 'oil-600' });
    expect(role(shapes, 'barbs').length).toBeGreaterThan(5);
    expect(role(shapes, 'solenoid-a-on')).toHaveLength(1);
  });
  it('draws thumbnails without words', () => {
    const { shapes } = schematicPicture(crowdedCircuit, 'A', null, { plain: true });
    expect(flat(shapes).filter((shape) => shape.type === 'text' && shape.size < 2)).toEqual([]);
  });
  it('prints numerals instead of tags', () => {
    const numerals = new Map([
      ['P1.maxVolumeStop', '1'],
      ['nowhere.screw', '2'],
    ]);
    const { shapes } = schematicPicture(demoCircuit, 'A', null, { numerals });
    expect(flat(shapes).filter((shape) => shape.type === 'text' && shape.text === '1')).toHaveLength(1);
    expect(flat(shapes).filter((shape) => shape.type === 'text' && shape.text === '2')).toHaveLength(0);
  });
  it('gives an empty sheet a size', () => {
    const picture = schematicPicture(emptyCircuit('Nothing yet'), 'a', null);
    expect(picture.width).toBeGreaterThan(0);
    expect(flat(picture.shapes).filter((shape) => shape.type !== 'group')).toEqual([]);
  });
});

describe('SVG', () => {
  it('is well formed, finite and has its colours inline', () => {
    for (const theme of ['light', 'dark'] as const) {
      const svg = pictureToSvg(schematicPicture(crowdedCircuit, 'A', null), theme, { scale: 10, ground: 'sheet' });
      expect(svg).not.toMatch(/NaN|undefined|Infinity|var\(/);
      expect(svg).toContain(themeTokens[theme].ink);
      expect(svg.match(/<g /g)?.length).toBe(svg.match(/<\/g>/g)?.length);
    }
  });
  it('escapes what people typed', () => {
    const nasty = {
      ...demoCircuit,
      title: '</title><script>alert(1)</script>',
      components: demoCircuit.components.map((entry) => ({ ...entry, name: '<b onload="x">' })),
    };
    const svg = pictureToSvg(schematicPicture(nasty, 'A', null), 'light');
    expect(svg).not.toContain('<script');
    expect(svg).not.toContain('<b ');
    expect(svg).toContain('&lt;b onload=&quot;x&quot;&gt;');
  });
  it('scales small words and leaves them out at 0', () => {
    const shapes: Shape[] = [{ type: 'text', x: 1, y: 2, text: 'P', size: 1.2 }];
    const colour = () => '#000000';
    expect(shapesMarkup(shapes, { colour, textScale: 2 })).toContain('font-size="2.4"');
    expect(shapesMarkup(shapes, { colour, textScale: 0 })).toBe('');
  });
});

describe('groups', () => {
  const apply = ([a, b, c, d, e, f]: readonly number[], x: number, y: number) => [a! * x + c! * y + e!, b! * x + d! * y + f!];
  it('mirror first, turn clockwise, then shift', () => {
    expect(apply(groupMatrix({ dx: 10, dy: 20, turn: 1, mirror: true }), 3, 1)).toEqual([9, 17]);
    expect(apply(groupMatrix({ dx: 0, dy: 0, turn: 2 }), 3, 1)).toEqual([-3, -1]);
    expect(apply(groupMatrix({ dx: 0, dy: 0, turn: 3 }), 3, 1)).toEqual([1, -3]);
  });
  it('keep words upright in every turned and mirrored symbol', () => {
    for (const turn of [0, 1, 2, 3]) {
      for (const mirror of [false, true]) {
        const outer = groupMatrix({ dx: 0, dy: 0, turn, mirror });
        const text = uprightMatrix(turn, mirror, 4, 5);
        if (text === null) continue;
        const inner = text.slice(7, -1).split(' ').map(Number);
        const [x0, y0] = apply(outer, ...(apply(inner, 4, 5) as [number, number]));
        const [x1, y1] = apply(outer, ...(apply(inner, 5, 5) as [number, number]));
        const [ax, ay] = apply(outer, 4, 5);
        expect([x0, y0]).toEqual([ax, ay]);
        expect([x1! - x0!, y1! - y0!]).toEqual([1, 0]);
      }
    }
  });
  it('combine with the groups around them', () => {
    for (const outer of [
      { turn: 1, mirror: true },
      { turn: 3, mirror: false },
      { turn: 2, mirror: true },
    ]) {
      for (const inner of [
        { dx: 0, dy: 0, turn: 1, mirror: true },
        { dx: 0, dy: 0, turn: 3, mirror: false },
      ]) {
        const both = combine(outer, inner);
        const expected = apply(groupMatrix({ dx: 0, dy: 0, ...outer }), ...(apply(groupMatrix(inner), 2, 7) as [number, number]));
        expect(apply(groupMatrix({ dx: 0, dy: 0, ...both }), 2, 7)).toEqual(expected);
      }
    }
  });
});

describe('colours', () => {
  it('start the row of case inks again after the fifth', () => {
    expect(inkColour('case-5', 'light')).toBe(inkColour('case-0', 'light'));
    expect(inkColour('none', 'light')).toBe('none');
    expect(inkColour('oil-0', 'dark')).toBe('#55585a');
  });
});
