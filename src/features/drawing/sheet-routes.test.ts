import { describe, expect, it } from 'vitest';
import { moveParts } from '#shared/circuit/edit/components.ts';
import { builtPress } from '#shared/circuit/edit/test-circuits.ts';
import { routeLines } from '#shared/pictures/route.ts';
import { routeAnew } from './sheet-routes.ts';

function keptOf(document: ReturnType<typeof builtPress>) {
  const blank = { routes: new Map(), ends: new Map(), boxes: new Map() };
  const routes = routeAnew(document, blank);
  return { first: routes, blank };
}

describe('routeAnew', () => {
  it('lays every line like a full routing when nothing is known', () => {
    const press = builtPress();
    expect([...keptOf(press).first.entries()]).toEqual(
      [...routeLines(press).entries()].sort((a, b) => order(press, a[0]) - order(press, b[0])),
    );
  });

  it('gives moved lines a new way that ends at their ports', () => {
    const press = moveParts(builtPress(), ['a1'], { x: 6, y: -4 });
    const fresh = routeAnew(press, { routes: keptOf(builtPress()).first, ends: new Map(), boxes: new Map() });
    const whole = routeLines(press);
    for (const [id, route] of fresh) {
      expect(route.points[0]).toEqual(whole.get(id)?.points[0]);
      expect(route.points.at(-1)).toEqual(whole.get(id)?.points.at(-1));
    }
    expect(fresh.size).toBe(press.lines.length);
  });
});

function order(document: ReturnType<typeof builtPress>, id: string): number {
  return document.lines.findIndex((line) => line.id === id);
}
