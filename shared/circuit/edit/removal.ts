import { countInWords, listInWords } from '../in-words.ts';
import { findComponent, findKind, nameInWords, portInWords } from '../kind-lookup.ts';
import type { CircuitDocument, Line } from '../schema.ts';

/** Deleting. What goes along with a part is worked out once, so that the list that is shown is what happens. */
export interface Removal {
  readonly components: ReadonlySet<string>;
  readonly lines: ReadonlySet<string>;
  readonly notes: ReadonlySet<string>;
  readonly labels: ReadonlySet<string>;
  readonly shafts: ReadonlySet<string>;
  readonly commands: ReadonlySet<string>;
  readonly requirements: ReadonlySet<string>;
  /** Number of case changes, by case id. */
  readonly changes: Readonly<Record<string, number>>;
}

export function planRemoval(document: CircuitDocument, ids: readonly string[]): Removal {
  const chosen = new Set(ids);
  const pick = (list: readonly { readonly id: string }[]) => new Set(list.filter((entry) => chosen.has(entry.id)).map((entry) => entry.id));
  const components = pick(document.components);
  const lines = new Set(
    document.lines
      .filter((line) => chosen.has(line.id) || components.has(line.from.component) || components.has(line.to.component))
      .map((line) => line.id),
  );
  const shafts = new Set(
    document.shafts
      .filter((shaft) => chosen.has(shaft.id) || shaft.members.filter((member) => !components.has(member.component)).length < 2)
      .map((shaft) => shaft.id),
  );
  const commands = new Set(document.duty.commands.filter((entry) => components.has(entry.target)).map((entry) => entry.id));
  const gone = (address: string) => {
    const [head = '', id = ''] = address.split('.');
    return head === 'line' ? lines.has(id) : components.has(head);
  };
  const requirements = new Set(document.requirements.filter((entry) => gone(entry.quantity)).map((entry) => entry.id));
  const changes: Record<string, number> = {};
  for (const entry of document.cases) {
    const count = entry.changes.filter((change) => changeGoes(change, components, lines, commands)).length;
    if (count > 0) changes[entry.id] = count;
  }
  const labels = new Set(
    document.labels.filter((entry) => chosen.has(entry.id) || components.has(entry.component)).map((entry) => entry.id),
  );
  return { components, lines, shafts, commands, requirements, changes, labels, notes: pick(document.notes) };
}

function changeGoes(
  change: { readonly target: string; readonly field: string },
  components: ReadonlySet<string>,
  lines: ReadonlySet<string>,
  commands: ReadonlySet<string>,
): boolean {
  if (components.has(change.target) || lines.has(change.target)) return true;
  return change.target === 'duty' && commands.has(change.field.split('.')[1] ?? '');
}

/** What goes along when these are deleted, in words, one entry per kind of thing; empty when nothing else goes. */
export function removalList(document: CircuitDocument, ids: readonly string[]): string[] {
  const plan = planRemoval(document, ids);
  const chosen = new Set(ids);
  const words: string[] = [];
  const lines = document.lines.filter((line) => plan.lines.has(line.id) && !chosen.has(line.id));
  if (lines.length > 0 && lines.length <= 3) {
    words.push(`${lines.length === 1 ? 'the line' : 'the lines'} ${listInWords(lines.map((line) => lineInWords(document, line)))}`);
  } else if (lines.length > 3) words.push(countInWords(lines.length, 'line'));
  const shafts = [...plan.shafts].filter((id) => !chosen.has(id)).length;
  if (shafts > 0) words.push(countInWords(shafts, 'shaft'));
  for (const entry of document.cases) {
    const count = plan.changes[entry.id];
    if (count) words.push(`${countInWords(count, 'change')} in case ${entry.name || entry.id}`);
  }
  const commands = document.duty.commands.filter((entry) => plan.commands.has(entry.id)).map((entry) => `'${entry.label || entry.input}'`);
  if (commands.length > 0) words.push(`${commands.length === 1 ? 'the command' : 'the commands'} ${listInWords(commands)}`);
  if (plan.requirements.size > 0) words.push(countInWords(plan.requirements.size, 'requirement'));
  const labels = [...plan.labels].filter((id) => !chosen.has(id)).length;
  if (labels > 0) words.push(countInWords(labels, 'part label'));
  return words;
}

function lineInWords(document: CircuitDocument, line: Line): string {
  return `from ${portInWords(document, line.from)} to ${portInWords(document, line.to)}`;
}

/** 'relief V2', 'check valve V1 and 1 line': what was chosen, in words. */
export function chosenInWords(document: CircuitDocument, ids: readonly string[]): string {
  const parts = ids.flatMap((id) => {
    const component = findComponent(document, id);
    if (!component) return [];
    const word = findKind(component.kind)?.word ?? component.kind;
    return [component.name ? `${word} ${nameInWords(component)}` : word];
  });
  const lines = document.lines.filter((line) => ids.includes(line.id)).length;
  const notes = document.notes.filter((note) => ids.includes(note.id)).length;
  const labels = document.labels.filter((label) => ids.includes(label.id)).length;
  const words = parts.length <= 3 ? parts : [countInWords(parts.length, 'part')];
  if (lines > 0) words.push(countInWords(lines, 'line'));
  if (notes > 0) words.push(countInWords(notes, 'note'));
  if (labels > 0) words.push(countInWords(labels, 'part label'));
  return listInWords(words);
}

/** Deletes parts, lines, shafts, notes and labels with everything that hangs on them. A junction left with two lines where it
 *  had more becomes plain line again; one left with none goes. */
export function removeItems(document: CircuitDocument, ids: readonly string[]): CircuitDocument {
  const plan = planRemoval(document, ids);
  const anything = plan.components.size + plan.lines.size + plan.shafts.size + plan.notes.size + plan.labels.size;
  if (anything === 0) return document;
  const touched = new Set(
    document.lines
      .filter((line) => plan.lines.has(line.id))
      .flatMap((line) => [line.from.component, line.to.component])
      .filter((id) => !plan.components.has(id) && findComponent(document, id)?.kind === 'junction'),
  );
  let next = withoutPlan(document, plan);
  for (const id of touched) next = tidyJunction(next, id);
  return next;
}

function withoutPlan(document: CircuitDocument, plan: Removal): CircuitDocument {
  const keep = <T extends { id: string }>(list: T[], gone: ReadonlySet<string>) =>
    list.some((entry) => gone.has(entry.id)) ? list.filter((entry) => !gone.has(entry.id)) : list;
  const shafts = document.shafts
    .filter((shaft) => !plan.shafts.has(shaft.id))
    .map((shaft) => {
      const members = shaft.members.filter((member) => !plan.components.has(member.component));
      return members.length === shaft.members.length ? shaft : { ...shaft, members };
    });
  const cases = document.cases.map((entry) =>
    plan.changes[entry.id]
      ? { ...entry, changes: entry.changes.filter((change) => !changeGoes(change, plan.components, plan.lines, plan.commands)) }
      : entry,
  );
  const tags = Object.entries(document.tagPlaces);
  const tagPlaces = tags.some(([address]) => plan.components.has(address.split('.')[0] ?? ''))
    ? Object.fromEntries(tags.filter(([address]) => !plan.components.has(address.split('.')[0] ?? '')))
    : document.tagPlaces;
  return {
    ...document,
    components: keep(document.components, plan.components),
    lines: keep(document.lines, plan.lines),
    shafts,
    duty: plan.commands.size > 0 ? { ...document.duty, commands: keep(document.duty.commands, plan.commands) } : document.duty,
    requirements: keep(document.requirements, plan.requirements),
    cases,
    tagPlaces,
    labels: keep(document.labels, plan.labels),
    notes: keep(document.notes, plan.notes),
  };
}

function tidyJunction(document: CircuitDocument, id: string): CircuitDocument {
  const lines = document.lines.filter((line) => line.from.component === id || line.to.component === id);
  if (lines.length === 0) return withoutPlan(document, planRemoval(document, [id]));
  const [first, second] = lines;
  if (lines.length !== 2 || !first || !second) return document;
  const changed = document.cases.some((entry) => entry.changes.some((change) => [first.id, second.id, id].includes(change.target)));
  const required = document.requirements.some(
    (entry) => entry.quantity.startsWith(`${id}.`) || entry.quantity === `line.${second.id}.flow`,
  );
  const alike = first.bore === second.bore && first.wall === second.wall && first.loss === second.loss;
  // Only lines of one make become one line again; where data differ the dot stays, and nothing that was entered is lost.
  if (changed || required || !alike || first.volume !== undefined || second.volume !== undefined) return document;
  if (first.laminar !== second.laminar || first.quadratic !== second.quadratic) return document;
  const start = first.to.component === id ? first.from : first.to;
  const before = first.to.component === id ? first.route : [...first.route].reverse();
  const end = second.from.component === id ? second.to : second.from;
  const after = second.from.component === id ? second.route : [...second.route].reverse();
  if (start.component === end.component && start.port === end.port) return document;
  const length = Math.min(1000, first.length + second.length);
  const joined: Line = { ...first, from: start, to: end, route: [...before, ...after].slice(0, 40), length };
  const lineList = document.lines.flatMap((line) => (line === first ? [joined] : line === second ? [] : [line]));
  return withoutPlan({ ...document, lines: lineList }, planRemoval({ ...document, lines: lineList }, [id]));
}

/** Cuts one line. */
export function disconnect(document: CircuitDocument, lineId: string): CircuitDocument {
  return removeItems(document, [lineId]);
}
