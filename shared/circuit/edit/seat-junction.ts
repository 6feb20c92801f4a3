import { findComponent } from '../kind-lookup.ts';
import type { CircuitDocument, Line, PortRef } from '../schema.ts';
import { portPlace, sideSteps } from './place-parts.ts';

/** Which arm of a junction each of its lines takes. All arms are one node, so this changes only how the lines are drawn. */

const arms = ['a', 'b', 'c', 'd'] as const;
type Arm = (typeof arms)[number];

function farEnd(line: Line, junctionId: string): PortRef {
  return line.from.component === junctionId ? line.to : line.from;
}

/** Gives every line of a junction the arm that points most nearly to where it goes; few lines, so all ways are tried. A junction
 *  whose ports are named by a requirement, and one with a line to itself, stay as they are. */
export function seatJunction(document: CircuitDocument, junctionId: string): CircuitDocument {
  const junction = findComponent(document, junctionId);
  if (junction?.kind !== 'junction') return document;
  if (document.requirements.some((entry) => entry.quantity.startsWith(`${junctionId}.`))) return document;
  const lines = document.lines.filter((line) => line.from.component === junctionId || line.to.component === junctionId);
  if (lines.length === 0 || lines.length > 4 || lines.some((line) => line.from.component === line.to.component)) return document;
  const costs = lines.map((line) => arms.map((arm) => armCost(document, junctionId, arm, line)));
  let best: readonly number[] = [];
  let least = Number.POSITIVE_INFINITY;
  const tryFrom = (index: number, taken: readonly number[], cost: number): void => {
    if (cost >= least) return;
    if (index === lines.length) {
      best = taken;
      least = cost;
      return;
    }
    for (let arm = 0; arm < 4; arm++) {
      if (!taken.includes(arm)) tryFrom(index + 1, [...taken, arm], cost + (costs[index]?.[arm] ?? 2));
    }
  };
  tryFrom(0, [], 0);
  const seat = new Map(lines.map((line, index) => [line.id, arms[best[index] ?? 0] as Arm]));
  const end = (ref: PortRef, arm: Arm): PortRef =>
    ref.component === junctionId && ref.port !== arm ? { component: junctionId, port: arm } : ref;
  return {
    ...document,
    lines: document.lines.map((line) => {
      const arm = seat.get(line.id);
      if (!arm) return line;
      const from = end(line.from, arm);
      const to = end(line.to, arm);
      return from === line.from && to === line.to ? line : { ...line, from, to };
    }),
  };
}

/** 0 when the arm looks straight at the line's next point, 2 when it looks away; a port that looks back along the arm helps. */
function armCost(document: CircuitDocument, junctionId: string, arm: Arm, line: Line): number {
  const place = portPlace(document, { component: junctionId, port: arm });
  if (!place) return 2;
  const far = portPlace(document, farEnd(line, junctionId));
  const bend = line.from.component === junctionId ? line.route[0] : line.route[line.route.length - 1];
  const target = bend ?? (far && { x: far.x + 2 * sideSteps[far.side].x, y: far.y + 2 * sideSteps[far.side].y });
  if (!target) return 1;
  const step = sideSteps[place.side];
  const dx = target.x - (place.x - step.x);
  const dy = target.y - (place.y - step.y);
  const length = Math.hypot(dx, dy) || 1;
  return 1 - (dx * step.x + dy * step.y) / length;
}
