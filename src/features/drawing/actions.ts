import { addComponent, mirrorParts, moveParts, turnParts } from '#shared/circuit/edit/components.ts';
import { copyParts, duplicateParts, pasteParts } from '#shared/circuit/edit/copy.ts';
import { addCommand } from '#shared/circuit/edit/duty.ts';
import { growFrom, putDown } from '#shared/circuit/edit/grow.ts';
import { connect, connectToLine, isOpen, joinProblem, leaveShaft, lineAt, openArm } from '#shared/circuit/edit/joins.ts';
import { freePlace } from '#shared/circuit/edit/place-parts.ts';
import { chosenInWords, planRemoval, removalList, removeItems } from '#shared/circuit/edit/removal.ts';
import { seatJunction } from '#shared/circuit/edit/seat-junction.ts';
import { addNote } from '#shared/circuit/edit/sheet.ts';
import { listInWords } from '#shared/circuit/in-words.ts';
import { findComponent, findKind, kindOfComponent, nameInWords, portInWords } from '#shared/circuit/kind-lookup.ts';
import { openPorts } from '#shared/circuit/open-ports.ts';
import type { CircuitDocument, PortRef } from '#shared/circuit/schema.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { branchPoint } from './branch-point.ts';
import { partFocus, portFocus, say, useDrawing } from './drawing-store.ts';
import type { LinePoint } from './line-point.ts';

/** Everything a hand may do on the Draw stage: one pure edit, one step to undo, one sentence of what was done. */

const present = () => useDocument.getState().document;
const put = (document: CircuitDocument) => useDocument.getState().edit(() => document);
const draw = (patch: Parameters<ReturnType<typeof useDrawing.getState>['set']>[0]) => useDrawing.getState().set(patch);

/** How a part is called when it is announced: 'relief V2', 'tee'. */
function called(document: CircuitDocument, id: string): string {
  return chosenInWords(document, [id]);
}

/** Puts a part behind a port and moves the focus to the next open port, so that one can go on. */
export function growAt(ref: PortRef, kind: string) {
  const grown = growFrom(present(), ref, kind, branchPoint(present(), ref));
  if (!grown.componentId) return say(grown.problem ?? 'That cannot be joined there.');
  const where = portInWords(present(), ref);
  const flagged = withFirstFlags(grown.document, grown.componentId);
  put(flagged.document);
  const open = openPorts(grown.document).filter((port) => !port.optional);
  const next = open.find((port) => port.component === grown.componentId) ?? open[0];
  draw({
    strip: null,
    preview: null,
    focus: next ? portFocus(next) : partFocus(grown.componentId),
    said: `${called(grown.document, grown.componentId)} joined to ${where}${flagged.words}`,
  });
  useDocument.getState().select([]);
}

/** A part from the drawer. With `exact` its top-left stands there, else at the nearest free place. */
export function placePart(kind: string, at: { x: number; y: number }, exact: boolean) {
  const { document, componentId, problem } = putDown(present(), kind, at, exact);
  if (!componentId) return say(problem ?? 'There is no room on the sheet.');
  const flagged = withFirstFlags(document, componentId);
  put(flagged.document);
  useDocument.getState().select([componentId]);
  draw({ placing: null, focus: partFocus(componentId), said: `${called(document, componentId)} placed${flagged.words}` });
}

/** A valve that nothing shifts would leave a new circuit standing still: the first one gets its flags, there and back, and it is
 *  said so. They are ordinary flags on the tape from then on. */
function withFirstFlags(document: CircuitDocument, id: string): { document: CircuitDocument; words: string } {
  const spool = kindOfComponent(document, id)?.inputs.find((input) => input.id === 'spool');
  if (!spool || document.duty.commands.some((command) => command.input === 'spool')) return { document, words: '' };
  const { duration } = document.duty;
  const times = [0.1 * duration, 0.6 * duration];
  const values = [spool.max, spool.min];
  let flagged = document;
  for (const [index, time] of times.entries()) {
    flagged = addCommand(flagged, { time, target: id, input: 'spool', value: values[index] ?? 0 }).document;
  }
  return {
    document: flagged,
    words: `; two flags on the tape shift it, at ${times.map((time) => Number(time.toFixed(2))).join(' and ')} s`,
  };
}

/** Joins two ports; an end that is taken is branched off its line. */
export function joinPorts(from: PortRef, to: PortRef) {
  const document = present();
  const joined = joinedTo(document, from, to) ?? joinedTo(document, to, from) ?? connect(document, from, to);
  if (joined.problem) return draw({ said: joined.problem, strip: null, preview: null, focus: portFocus(from) });
  const words = `${portInWords(document, from)} joined to ${portInWords(document, to)}`;
  put(seated(document, joined.document));
  const next = openPorts(joined.document).find((port) => !port.optional);
  draw({ strip: null, preview: null, said: words, focus: next ? portFocus(next) : partFocus(from.component) });
}

/** An open port joined to the line of a taken one, where that line has room; null where that is not the case. */
function joinedTo(document: CircuitDocument, open: PortRef, taken: PortRef) {
  if (joinProblem(document, open, taken) || !isOpen(document, open)) return null;
  const line = lineAt(document, openArm(document, taken));
  const point = branchPoint(document, taken);
  if (!line || !point) return null;
  return connectToLine(document, open, line.id, { x: point.x - 1, y: point.y - 1 }, point.share, point.bendsBefore);
}

/** Drops a line's end on another line. */
export function joinToLine(from: PortRef, lineId: string, point: LinePoint) {
  const document = present();
  const joined = connectToLine(document, from, lineId, { x: point.x - 1, y: point.y - 1 }, point.share, point.bendsBefore);
  if (joined.problem) return say(joined.problem);
  put(seated(document, joined.document));
  draw({ strip: null, preview: null, said: `${portInWords(document, from)} joined to the line` });
}

/** Gives the junctions that an edit made, and those it added lines to, the arms that suit. */
function seated(before: CircuitDocument, after: CircuitDocument): CircuitDocument {
  const lines = new Set(before.lines);
  const touched = new Set(after.lines.filter((line) => !lines.has(line)).flatMap((line) => [line.from.component, line.to.component]));
  return [...touched].reduce(seatJunction, after);
}

/** Cuts what hangs on a port: its line, or its end of a shaft. */
export function takeApart(ref: PortRef) {
  const document = present();
  const line = lineAt(document, ref);
  put(line ? removeItems(document, [line.id]) : leaveShaft(document, ref));
  draw({ strip: null, preview: null, said: `${portInWords(document, ref)} taken apart`, focus: portFocus(ref) });
}

/** The selected things, or the one that has the focus. */
export function chosen(focused?: string | null): readonly string[] {
  const { selection } = useDocument.getState();
  return selection.length > 0 && (!focused || selection.includes(focused)) ? selection : focused ? [focused] : [];
}

export function turnChosen(ids: readonly string[]) {
  const turned = turnParts(present(), ids);
  if (turned === present()) return;
  put(turned);
  const first = ids.length === 1 ? findComponent(turned, ids[0] as string) : undefined;
  say(first ? `${nameInWords(first)} turned to ${first.turn * 90} degrees` : `${chosenInWords(turned, ids)} turned`);
}

export function mirrorChosen(ids: readonly string[]) {
  const mirrored = mirrorParts(present(), ids);
  if (mirrored === present()) return;
  put(mirrored);
  say(`${chosenInWords(mirrored, ids)} mirrored`);
}

export function duplicateChosen(ids: readonly string[]) {
  const copy = duplicateParts(present(), ids);
  takeCopy(copy.document, copy.ids);
}

export function copyChosen(ids: readonly string[]) {
  const clip = copyParts(present(), ids);
  if (clip.components.length + clip.notes.length === 0) return;
  draw({ clip, pasted: 0, said: `${chosenInWords(present(), ids)} copied` });
}

export function pasteClip() {
  const { clip, pasted } = useDrawing.getState();
  if (!clip) return;
  const step = 2 * (pasted + 1);
  const copy = pasteParts(present(), clip, { x: step, y: step });
  draw({ pasted: pasted + 1 });
  takeCopy(copy.document, copy.ids);
}

function takeCopy(document: CircuitDocument, ids: readonly string[]) {
  if (ids.length === 0) return say('There is no room on the sheet for the copy.');
  put(document);
  useDocument.getState().select(ids);
  draw({ said: `${chosenInWords(document, ids)} added`, focus: partFocus(ids[0] as string) });
}

export function moveChosen(ids: readonly string[], by: { x: number; y: number }) {
  useDocument.getState().edit((document) => moveParts(document, ids, by));
}

export function selectAll() {
  const document = present();
  const ids = [...document.components, ...document.lines, ...document.notes, ...document.labels].map((entry) => entry.id);
  useDocument.getState().select(ids);
  say(ids.length > 0 ? `${chosenInWords(document, ids)} selected` : 'The sheet is empty');
}

/** Deletes at once what takes nothing but lines along; asks first where case changes, commands, requirements or labels go too. */
export function deleteChosen(ids: readonly string[]) {
  const document = present();
  const plan = planRemoval(document, ids);
  const asks = plan.commands.size + plan.requirements.size + Object.keys(plan.changes).length > 0;
  const along = removalList(document, ids);
  if (!asks) return deleteNow(ids);
  draw({ deletion: { ids, what: chosenInWords(document, ids), along }, strip: null, preview: null });
}

export function deleteNow(ids: readonly string[]) {
  const document = present();
  const what = chosenInWords(document, ids);
  if (what === '') return;
  const along = removalList(document, ids);
  put(removeItems(document, ids));
  useDocument.getState().select([]);
  const open = openPorts(present())[0];
  draw({
    deletion: null,
    said: `${what} deleted${along.length > 0 ? `, with ${listInWords(along)}` : ''}`,
    focus: open ? portFocus(open) : null,
  });
}

export function writeNote(at: { x: number; y: number }) {
  const free = freePlace(present(), at, { width: 25, height: 8 });
  const added = addNote(present(), { at: free, text: '', date: new Date().toISOString().slice(0, 10) });
  if (!added.noteId) return say('A sheet holds at most 100 notes.');
  put(added.document);
  useDocument.getState().select([added.noteId]);
  draw({ writing: added.noteId });
}

/** What an empty sheet offers first: a motor and a pump on one shaft, and the strip at the pump's outlet. */
export function startWithPump(at: { x: number; y: number }) {
  const pump = addComponent(present(), 'compensated-pump', at);
  if (!pump.componentId) return;
  const motor = growFrom(pump.document, { component: pump.componentId, port: 'shaft' }, 'electric-motor');
  const outlet = { component: pump.componentId, port: 'outlet' };
  put(motor.document);
  draw({ strip: { ref: outlet, list: 'next' }, preview: null, said: 'Pump and motor placed on one shaft' });
}

export function wordOf(kind: string): string {
  return findKind(kind)?.word ?? kind;
}

/** Ports that a port could be joined to, in flow order: first those that are open. */
export function joinTargets(document: CircuitDocument, ref: PortRef): { ref: PortRef; words: string; open: boolean }[] {
  const medium = findKind(findComponent(document, ref.component)?.kind ?? '')?.ports.find((port) => port.id === ref.port)?.medium;
  const open = openPorts(document).filter((port) => port.spec.medium === medium && port.component !== ref.component);
  const openKeys = new Set(open.map((port) => `${port.component}.${port.port}`));
  const taken = document.components.flatMap((component) => {
    if (component.id === ref.component || component.kind === 'junction') return [];
    return (findKind(component.kind)?.ports ?? []).flatMap((port) => {
      const other = { component: component.id, port: port.id };
      if (port.medium !== medium || openKeys.has(`${other.component}.${other.port}`) || isOpen(document, other)) return [];
      return [{ ref: other, words: `${portInWords(document, other)}, on its line`, open: false }];
    });
  });
  return [
    ...open.map((port) => ({ ref: { component: port.component, port: port.port }, words: armless(document, port), open: true })),
    ...taken,
  ];
}

function armless(document: CircuitDocument, ref: PortRef): string {
  return findComponent(document, ref.component)?.kind === 'junction' ? `tee ${ref.component}` : portInWords(document, ref);
}
