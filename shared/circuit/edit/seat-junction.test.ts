import { describe, expect, it } from 'vitest';
import { addComponent } from './components.ts';
import { emptyCircuit } from './empty-circuit.ts';
import { connect } from './joins.ts';
import { seatJunction } from './seat-junction.ts';

describe('seatJunction', () => {
  it('turns each arm to where its line goes, and leaves the rest of the document alone', () => {
    let document = emptyCircuit();
    for (const [kind, x, y] of [
      ['junction', 20, 20],
      ['tank', 19, 30],
      ['pressure-gauge', 18, 4],
      ['tank', 40, 20],
    ] as const) {
      document = addComponent(document, kind, { x, y }).document;
    }
    const [junction, below, gauge, right] = document.components.map((component) => component.id);
    const join = (port: string, component: string, other: string) => {
      document = connect(document, { component: junction as string, port }, { component, port: other }).document;
    };
    join('a', below as string, 'T');
    join('b', gauge as string, 'M');
    join('c', right as string, 'T');
    const seated = seatJunction(document, junction as string);
    expect(seated.lines.map((line) => [line.from.port, line.to.component])).toEqual([
      ['c', below],
      ['d', gauge],
      ['b', right],
    ]);
    expect(seated.components).toBe(document.components);
    expect(seatJunction(seated, below as string)).toBe(seated);
  });
});
