import type { OnLine } from '#shared/circuit/edit/grow.ts';
import { lineAt } from '#shared/circuit/edit/joins.ts';
import type { CircuitDocument, PortRef } from '#shared/circuit/schema.ts';
import { routeLines } from '#shared/pictures/route.ts';
import { nearestOnLine } from './line-point.ts';
import { drawnRoutes } from './sheet-routes.ts';

/** Where a branch leaves the line of a port: the middle of its longest straight run, where there is most room for a junction;
 *  undefined where the port has no line. */
export function branchPoint(document: CircuitDocument, ref: PortRef): OnLine | undefined {
  const line = lineAt(document, ref);
  const points = line && (drawnRoutes().get(line.id) ?? routeLines(document).get(line.id))?.points;
  if (!line || !points) return undefined;
  let best = { length: 0, x: 0, y: 0 };
  for (let k = 0; k + 1 < points.length; k++) {
    const a = points[k];
    const b = points[k + 1];
    if (!a || !b) continue;
    const length = Math.abs(b.x - a.x) + Math.abs(b.y - a.y);
    if (length > best.length) best = { length, x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 };
  }
  return nearestOnLine(line, points, best) ?? undefined;
}
