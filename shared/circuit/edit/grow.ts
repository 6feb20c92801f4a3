import { symbolOf } from '../../symbols/registry.ts';
import type { Side } from '../../symbols/symbol.ts';
import { findComponent, findKind, findPort, portInWords } from '../kind-lookup.ts';
import { entryPort } from '../next-parts.ts';
import type { CircuitDocument, PortRef } from '../schema.ts';
import { addComponent, type Point, snapPoint } from './components.ts';
import { connect, isOpen, lineAt, splitLine } from './joins.ts';
import { freePlace, portPlace, sideSteps, spotAt } from './place-parts.ts';
import { seatJunction } from './seat-junction.ts';

/** Growing a circuit from its open ports: a new part is put at a sensible free place and joined in one edit. */
export interface Grown {
  readonly document: CircuitDocument;
  /** The new part; null, and the document unchanged, when it cannot be joined there. */
  readonly componentId: string | null;
  readonly problem: string | null;
}

/** Parts that hang on a line instead of continuing it. */
const hanging: readonly string[] = ['relief-valve', 'pressure-gauge'];
/** How far a junction stands off the port it grows from: first out of the port, then to the right. */
const OUT = 4;
const OVER = 12;

/** A place on a line that is drawn already: where a junction shall sit on it (its middle), and what lies before it. */
export interface OnLine extends Point {
  readonly share: number;
  readonly bendsBefore: number;
}

const refused = (document: CircuitDocument, problem: string): Grown => ({ document, componentId: null, problem });

/** Puts a part behind an open port, or on the line of a taken one, there at `onLine` where the caller knows how the line runs.
 *  A relief or gauge hangs on a junction, so that the line stays open for what comes next. */
export function growFrom(document: CircuitDocument, ref: PortRef, kindId: string, onLine?: OnLine): Grown {
  const port = findPort(document, ref);
  const kind = findKind(kindId);
  const place = portPlace(document, ref);
  if (!port || !kind || !place) return refused(document, 'That port is not on the drawing.');
  const component = findComponent(document, ref.component);
  const entry = entryPort(port, kind, component && findKind(component.kind));
  if (!entry) return refused(document, `${portInWords(document, ref)} and ${kind.title.toLowerCase()} have nothing to join.`);
  if (port.medium === 'oil') {
    if (!isOpen(document, ref) && component?.kind !== 'junction') return hangOnLine(document, ref, kindId, entry.id, onLine);
    if (component?.kind === 'junction') return growFromJunction(document, ref.component, kindId, entry.id);
    if (hanging.includes(kindId) && port.role !== 'inlet' && port.role !== 'drain' && port.letter !== 'T') {
      return hangBehind(document, ref, place, place.side, kindId, entry.id);
    }
  }
  return addAt(document, ref, place, place.side, kindId, entry.id);
}

function addAt(document: CircuitDocument, ref: PortRef, from: Point, side: Side, kindId: string, entry: string): Grown {
  const spot = spotAt(document, from, side, kindId, entry);
  const added = spot && addComponent(document, kindId, spot.at, spot.turn, spot.mirror);
  if (!added?.componentId) return refused(document, 'The sheet is full.');
  const joined = connect(added.document, ref, { component: added.componentId, port: entry });
  if (joined.problem) return refused(document, joined.problem);
  return { document: seatJunction(joined.document, ref.component), componentId: added.componentId, problem: null };
}

/** Port, junction, part below or above it; the junction's far arm stays open. */
function hangBehind(document: CircuitDocument, ref: PortRef, from: Point, side: Side, kindId: string, entry: string): Grown {
  const out = sideSteps[side];
  const upright = side === 'top' || side === 'bottom';
  const centre = { x: from.x + (upright ? OVER : out.x * OVER), y: from.y + (upright ? out.y * OUT : 0) };
  const at = freePlace(document, { x: centre.x - 1, y: centre.y - 1 }, { width: 2, height: 2 }, upright ? { x: 1, y: 0 } : out);
  const added = addComponent(document, 'junction', at);
  if (!added.componentId) return refused(document, 'The sheet is full.');
  const near = at.x + 1 >= from.x ? 'a' : 'b';
  const joined = connect(added.document, ref, { component: added.componentId, port: near });
  if (joined.problem) return refused(document, joined.problem);
  const grown = growFromJunction(joined.document, added.componentId, kindId, entry);
  return grown.componentId ? grown : refused(document, grown.problem ?? 'The sheet is full.');
}

/** From a junction's open arm that suits the part: below for what is entered from the top, above for what is entered from
 *  below, else onward. A part that hangs on a tee that already has two lines gets a further tee, so that the line stays open;
 *  on a `branch` off a line that is drawn already there is nothing to keep open. */
function growFromJunction(document: CircuitDocument, junctionId: string, kindId: string, entry: string, branch = false): Grown {
  const symbol = symbolOf(kindId);
  const entrySide = symbol?.ports[entry]?.side ?? 'left';
  const hangs = hanging.includes(kindId);
  const wanted: readonly string[] =
    hangs || kindId === 'tank' ? (entrySide === 'top' ? ['c', 'd', 'b', 'a'] : ['d', 'c', 'b', 'a']) : ['b', 'a', 'd', 'c'];
  const arm = wanted.find((port) => isOpen(document, { component: junctionId, port }));
  if (!arm) return refused(document, 'This junction has no open arm: branch off one of its lines.');
  const ref = { component: junctionId, port: arm };
  const place = portPlace(document, ref);
  if (!place) return refused(document, 'That port is not on the drawing.');
  const lines = document.lines.filter((line) => line.from.component === junctionId || line.to.component === junctionId).length;
  if (hangs && !branch && (lines >= 2 || arm === 'a' || arm === 'b')) {
    const onward = ['b', 'a', 'd', 'c'].map((port) => ({ component: junctionId, port })).find((end) => isOpen(document, end)) ?? ref;
    const from = portPlace(document, onward) ?? place;
    return hangBehind(document, onward, from, from.side, kindId, entry);
  }
  return addAt(document, ref, place, place.side, kindId, entry);
}

/** A junction on the line of a port that is taken, and the part on it. */
function hangOnLine(document: CircuitDocument, ref: PortRef, kindId: string, entry: string, onLine?: OnLine): Grown {
  const line = lineAt(document, ref);
  const place = portPlace(document, ref);
  if (!line || !place) return refused(document, 'That port is not on the drawing.');
  const first = line.from.component === ref.component && line.from.port === ref.port;
  const at = onLine ? { x: onLine.x - 1, y: onLine.y - 1 } : besidePort(document, place);
  const share = onLine?.share ?? (first ? 0.2 : 0.8);
  const split = splitLine(document, line.id, snapPoint(at), share, onLine?.bendsBefore ?? (first ? 0 : line.route.length));
  if (!split.junctionId) return refused(document, 'The sheet is full: no room for a junction.');
  const grown = growFromJunction(seatJunction(split.document, split.junctionId), split.junctionId, kindId, entry, true);
  return grown.componentId ? grown : refused(document, grown.problem ?? 'The sheet is full.');
}

function besidePort(document: CircuitDocument, place: Point & { readonly side: Side }): Point {
  const out = sideSteps[place.side];
  const upright = place.side === 'top' || place.side === 'bottom';
  const wish = { x: place.x + (upright ? OVER : out.x * OVER) - 1, y: place.y + out.y * OUT - 1 };
  return freePlace(document, wish, { width: 2, height: 2 }, upright ? { x: 1, y: 0 } : out);
}

/** A part from the drawer, not joined to anything, near the wished place. */
export function putDown(document: CircuitDocument, kindId: string, wish: Point, exact = false): Grown {
  const symbol = symbolOf(kindId);
  if (!symbol) return refused(document, 'There is no such part.');
  const added = addComponent(document, kindId, exact ? snapPoint(wish) : freePlace(document, wish, symbol));
  return added.componentId
    ? { document: added.document, componentId: added.componentId, problem: null }
    : refused(document, 'The sheet is full.');
}
