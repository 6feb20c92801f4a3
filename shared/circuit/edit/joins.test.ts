import { describe, expect, it } from 'vitest';
import { checkDocument } from '../check-document.ts';
import { addCase } from './cases.ts';
import { addComponent } from './components.ts';
import { emptyCircuit } from './empty-circuit.ts';
import { connect, connectToLine, joinProblem, leaveShaft, lineAt, splitLine } from './joins.ts';
import { builtPress } from './test-circuits.ts';
import { setValue } from './values.ts';

const ref = (component: string, port: string) => ({ component, port });

describe('connect', () => {
  it('joins shaft ends by one shaft and oil ports by a line with typical data', () => {
    const press = builtPress();
    expect(press.shafts).toEqual([{ id: 'shaft1', members: [ref('m1', 'shaft'), ref('p1', 'shaft')] }]);
    expect(lineAt(press, ref('v1', 'A'))).toMatchObject({ to: ref('a1', 'A'), length: 1, bore: 0.016, loss: false });
  });

  it('branches off a taken port with a junction, keeping the length of the line', () => {
    const press = builtPress();
    const junction = press.components.find((component) => component.kind === 'junction');
    expect(junction?.at).toEqual({ x: 20, y: 10 });
    const onJunction = press.lines.filter((line) => [line.from, line.to].some((end) => end.component === junction?.id));
    expect(onJunction).toHaveLength(3);
    const main = onJunction.filter((line) => [line.from, line.to].every((end) => end.component !== 'v2'));
    expect(main.reduce((sum, line) => sum + line.length, 0)).toBeCloseTo(1, 12);
    expect(checkDocument(press).ok).toBe(true);
  });

  it('takes the next arm of a junction instead of a second one', () => {
    const press = builtPress();
    const added = addComponent(press, 'pressure-gauge', { x: 24, y: 4 });
    const joined = connect(added.document, ref('j1', 'a'), ref(added.componentId as string, 'M'));
    expect(joined.problem).toBeNull();
    expect(joined.document.components.filter((component) => component.kind === 'junction')).toHaveLength(1);
  });

  it('says in words why ports cannot be joined', () => {
    const press = builtPress();
    expect(joinProblem(press, ref('p1', 'shaft'), ref('p1', 'drain'))).toMatch(/carries oil.*turns/);
    expect(joinProblem(press, ref('p1', 'drain'), ref('p1', 'drain'))).toContain('itself');
    expect(joinProblem(press, ref('v1', 'A'), ref('a1', 'A'))).toContain('joined already');
    expect(joinProblem(press, ref('m1', 'shaft'), ref('p1', 'shaft'))).toContain('one shaft already');
    expect(joinProblem(press, ref('j1', 'd'), ref('j1', 'a'))).toContain('same junction');
    const refused = connect(press, ref('p1', 'shaft'), ref('p1', 'drain'));
    expect(refused.document).toBe(press);
    expect(refused.problem).not.toBeNull();
  });

  it('merges two shafts and takes one end out again', () => {
    let document = builtPress();
    const second = addComponent(document, 'electric-motor', { x: 60, y: 0 });
    document = connect(second.document, ref(second.componentId as string, 'shaft'), ref('p1', 'shaft')).document;
    expect(document.shafts).toHaveLength(1);
    expect(document.shafts[0]?.members).toHaveLength(3);
    document = leaveShaft(leaveShaft(document, ref('m1', 'shaft')), ref('p1', 'shaft'));
    expect(document.shafts).toEqual([]);
  });
});

describe('splitLine', () => {
  it('shares length, loss and bends between the pieces, in every case', () => {
    let document = builtPress();
    const id = lineAt(document, ref('v1', 'A'))?.id as string;
    document = {
      ...document,
      lines: document.lines.map((line) =>
        line.id === id
          ? {
              ...line,
              length: 4,
              laminar: 8,
              route: [
                { x: 1, y: 1 },
                { x: 2, y: 2 },
              ],
            }
          : line,
      ),
    };
    const withCase = addCase(document, 'a', 'Longer');
    document = setValue(withCase.document, withCase.caseId as string, id, 'length', 10).document;
    const split = splitLine(document, id, { x: 5, y: 5 }, 0.25, 1);
    const pieces = split.document.lines.filter(
      (line) => line.from.component === split.junctionId || line.to.component === split.junctionId,
    );
    expect(pieces.map((line) => [line.length, line.laminar, line.route])).toEqual([
      [1, 2, [{ x: 1, y: 1 }]],
      [3, 6, [{ x: 2, y: 2 }]],
    ]);
    expect(split.document.cases[1]?.changes.map((change) => change.value)).toEqual([2.5, 7.5]);
    expect(checkDocument(split.document).ok).toBe(true);
  });

  it('joins an open port to a line, but not a shaft end', () => {
    const press = builtPress();
    const line = lineAt(press, ref('v1', 'A'))?.id as string;
    const joined = connectToLine(press, ref('p1', 'drain'), line, { x: 9, y: 9 });
    expect(joined.problem).toBeNull();
    expect(joined.document.lines).toHaveLength(press.lines.length + 2);
    const free = addComponent(press, 'electric-motor', { x: 0, y: 0 });
    const refused = connectToLine(free.document, ref(free.componentId as string, 'shaft'), line, { x: 0, y: 0 });
    expect(refused.problem).toContain('cannot be joined to an oil line');
    expect(refused.document).toBe(free.document);
  });

  it('changes nothing on an unknown line', () => {
    const document = emptyCircuit();
    expect(splitLine(document, 'nope', { x: 0, y: 0 })).toEqual({ document, junctionId: null });
  });
});
