import { describe, expect, it } from 'vitest';
import { checkDocument } from './check-document.ts';
import { addCase } from './edit/cases.ts';
import { emptyCircuit } from './edit/empty-circuit.ts';
import { builtPress } from './edit/test-circuits.ts';
import type { CircuitDocument } from './schema.ts';

type Loose = { [key: string]: unknown };

/** The built press, spoilt by a function that may write anywhere. */
function spoilt(spoil: (document: CircuitDocument & Loose) => void): unknown {
  const document = JSON.parse(JSON.stringify(builtPress())) as CircuitDocument & Loose;
  spoil(document);
  return document;
}

function issuesOf(input: unknown): { path: string; message: string; value: unknown }[] {
  const checked = checkDocument(input);
  return checked.ok ? [] : [...checked.issues];
}

function onlyIssue(input: unknown): { path: string; message: string; value: unknown } {
  const issues = issuesOf(input);
  expect(issues).toHaveLength(1);
  return issues[0] as { path: string; message: string; value: unknown };
}

describe('checkDocument', () => {
  it('accepts an empty sheet and a built press, and gives back an equal document', () => {
    expect(checkDocument(emptyCircuit())).toMatchObject({ ok: true });
    const press = builtPress();
    const checked = checkDocument(press);
    expect(checked).toMatchObject({ ok: true, migrated: [] });
    expect(checked.ok && checked.document).toEqual(press);
  });

  it.each([[null], ['text'], [[1, 2]], [7], [undefined]])('refuses %j, which is no object', (input) => {
    expect(onlyIssue(input)).toMatchObject({ path: 'document', message: 'must be an object' });
  });

  it('names another format and refuses it before looking further', () => {
    const issue = onlyIssue({ format: 'parts-list', nonsense: Number.NaN });
    expect(issue.path).toBe('format');
    expect(issue.message).toContain("this file says 'parts-list'");
  });

  it('refuses a newer version by its number', () => {
    const issue = onlyIssue(spoilt((document) => Object.assign(document, { version: 7 })));
    expect(issue).toMatchObject({ path: 'version', value: 7 });
    expect(issue.message).toContain('version 7 is newer');
  });

  it.each([0, 1.5, '1', null])('refuses version %j', (version) => {
    expect(onlyIssue(spoilt((document) => Object.assign(document, { version }))).path).toBe('version');
  });

  it('lists all issues of structure with path, value and what is allowed', () => {
    const issues = issuesOf(
      spoilt((document) => {
        document.colour = 'green';
        (document.components[0] as unknown as Loose).at = { x: Number.NaN, y: 2 };
        (document.components[1] as unknown as Loose).turn = 5;
        document.duty.duration = -1;
        (document.supply as Loose).voltage = 'four hundred';
        (document.site as Loose) = {};
      }),
    );
    const byPath = Object.fromEntries(issues.map((issue) => [issue.path, issue]));
    expect(byPath.colour).toMatchObject({ message: 'is not a field of a circuit document', value: 'green' });
    expect(byPath['components[0].at.x']).toMatchObject({ message: 'must be a finite number', value: 'NaN' });
    expect(byPath['components[1].turn']?.message).toBe('must be one of 0, 1, 2, 3');
    expect(byPath['duty.duration']).toMatchObject({ message: 'must be at least 0.05', value: -1 });
    expect(byPath['supply.voltage']).toMatchObject({ message: 'must be a finite number', value: 'four hundred' });
    expect(byPath['site.altitude']?.message).toBe('is missing');
    expect(issues).toHaveLength(6);
  });

  it('refuses infinities', () => {
    const issue = onlyIssue(spoilt((document) => Object.assign(document.supply, { voltage: Number.POSITIVE_INFINITY })));
    expect(issue).toMatchObject({ path: 'supply.voltage', value: 'Infinity' });
  });

  it('refuses more than 200 components and more than 1 MB', () => {
    const many = spoilt((document) => {
      const tank = document.components.find((component) => component.kind === 'tank');
      for (let i = 0; i < 200; i++) document.components.push({ ...(tank as CircuitDocument['components'][number]), id: `x${i}` });
    });
    expect(onlyIssue(many)).toMatchObject({ path: 'components', message: 'must have at most 200 entries', value: 'list of 208' });
    const large = spoilt((document) => Object.assign(document, { title: 'x'.repeat(1_100_000) }));
    expect(onlyIssue(large).message).toContain('a circuit holds at most 1 MB');
  });

  it('refuses a document that refers to itself', () => {
    expect(onlyIssue(spoilt((document) => Object.assign(document, { self: document }))).message).toContain('refers to itself');
  });

  it('names an unknown kind, parameter and screw', () => {
    const issues = issuesOf(
      spoilt((document) => {
        Object.assign(document.components.find((entry) => entry.id === 't2') as object, { kind: 'warp-drive' });
        const pump = document.components.find((entry) => entry.id === 'p1') as CircuitDocument['components'][number];
        pump.parameters.horses = { value: 1, source: 'typed' };
        pump.parameters['fault.tired'] = { value: 1, source: 'typed' };
        pump.screws = { horses: { locked: false } };
      }),
    );
    expect(issues).toContainEqual({
      path: 'components[6].kind',
      message: 'is not a component kind this version knows',
      value: 'warp-drive',
    });
    const paths = issues.map((issue) => issue.path);
    expect(paths).toContain('components[1].parameters.horses.value');
    expect(paths).toContain('components[1].parameters.fault.tired.value');
    expect(paths).toContain('components[1].screws.horses');
  });

  it('holds values to their type and range, and a screw to the part it sits in', () => {
    const issues = issuesOf(
      spoilt((document) => {
        const pump = document.components.find((entry) => entry.id === 'p1') as CircuitDocument['components'][number];
        pump.parameters.leastCompensator = { value: 50e5, source: 'typed' };
        pump.parameters.mostCompensator = { value: 210e5, source: 'typed' };
        pump.parameters.compensatorPressure = { value: 250e5, source: 'typed' };
        pump.parameters.displacement = { value: 'large', source: 'typed' };
        pump.parameters['fault.worn'] = { value: 2, source: 'typed' };
      }),
    );
    const byPath = Object.fromEntries(issues.map((issue) => [issue.path, issue.message]));
    expect(byPath['components[1].parameters.compensatorPressure.value']).toContain('the screw goes from 50 bar to 210 bar');
    expect(byPath['components[1].parameters.displacement.value']).toContain('must be a finite number');
    expect(byPath['components[1].parameters.fault.worn.value']).toContain('must be 0 to 1');
  });

  it('refuses two lines at one port, unlike media, a port or a shaft joined to itself, and dangling ends', () => {
    const line = (id: string, from: string, to: string) => {
      const [a = '', b = ''] = from.split('.');
      const [c = '', d = ''] = to.split('.');
      return { id, from: { component: a, port: b }, to: { component: c, port: d }, route: [], length: 1, bore: 0.01, loss: false };
    };
    const messages = (id: string, from: string, to: string) =>
      issuesOf(spoilt((document) => document.lines.push(line(id, from, to))))
        .map((issue) => issue.message)
        .join(' / ');
    expect(messages('x1', 'p1.outlet', 'p1.drain')).toContain('one line per port');
    expect(messages('x1', 'm1.shaft', 'p1.drain')).toContain('is a shaft end');
    expect(messages('x1', 'p1.drain', 'p1.drain')).toContain('joins a port to itself');
    expect(messages('x1', 'p1.drain', 'ghost.T')).toContain('there is no such component');
    expect(messages('x1', 'p1.drain', 'a1.C')).toContain('has the ports');
    expect(messages('supply', 'p1.drain', 'p1.suction')).toContain('reserved name');
    const shaft = issuesOf(spoilt((document) => document.shafts[0]?.members.push({ component: 'p1', port: 'shaft' })));
    expect(shaft.map((issue) => issue.message)).toEqual(['joins a shaft end to itself']);
  });

  it('checks what duty, cases, requirements and labels name', () => {
    const issues = issuesOf(
      spoilt((document) => {
        document.duty.commands.push({ id: 'x', time: 1, ramp: 0, target: 'v1', input: 'spool', value: 3, label: '' });
        document.duty.commands.push({ id: 'y', time: 1, ramp: 0, target: 'a1', input: 'jump', value: 0, label: '' });
        document.cases.push({
          id: 'b',
          name: 'B',
          ink: 1,
          changes: [
            { target: 'p1', field: 'compensatorPressure', value: 9e9 },
            { target: 'nobody', field: 'x', value: 1 },
            { target: 'duty', field: 'command.nope.value', value: 1 },
          ],
        });
        (document.cases[0] as Loose).changes = [{ target: 'supply', field: 'voltage', value: 380 }];
        document.requirements.push({ id: 'r1', quantity: 'a1.temper', measure: 'peak', min: 1 });
        document.requirements.push({ id: 'r2', quantity: 'stall margin', measure: 'peak' });
        document.labels.push({ id: 'k', component: 'gone', at: { x: 0, y: 0 }, text: 'x' });
      }),
    );
    const paths = issues.map((issue) => issue.path);
    expect(paths).toEqual(
      expect.arrayContaining([
        'duty.commands[2].value',
        'duty.commands[3].value',
        'cases[1].changes[0].value',
        'cases[1].changes[1].value',
        'cases[1].changes[2].value',
        'cases[0].changes',
        'requirements[0].quantity',
        'requirements[1]',
        'labels[0].component',
      ]),
    );
    expect(issues).toHaveLength(9);
  });

  it('refuses ids used twice', () => {
    const issue = onlyIssue(spoilt((document) => Object.assign(document.lines[2] as object, { id: 'a1' })));
    expect(issue.message).toContain('is used twice');
  });

  it('keeps HTML in names as text', () => {
    const name = '<img src=x onerror=alert(1)>';
    const input = spoilt((document) => Object.assign(document.components[0] as object, { name }));
    const checked = checkDocument(input);
    expect(checked.ok && checked.document.components[0]?.name).toBe(name);
  });

  it('refuses a screw that a case leaves outside the range it moves', () => {
    const document = JSON.parse(JSON.stringify(addCase(builtPress(), 'a', 'Other part').document)) as CircuitDocument;
    document.cases[1]?.changes.push({ target: 'p1', field: 'mostCompensator', value: 30e5 });
    expect(issuesOf(document).map((issue) => issue.path)).toEqual(['cases[1].changes']);
  });
});
