import { memo } from 'react';
import type { EdgeProps } from 'reactflow';
import { FILLET } from '#shared/pictures/pressure-ink.ts';
import { filletPath } from '#shared/pictures/route-path.ts';
import { LineView } from '#src/components/schematic/line-view.tsx';
import { ShapeView } from '#src/components/schematic/shape-view.tsx';
import { type LineData, MODULE, type ShaftData } from './flow-model.ts';

/** A line without pressure, with a broad strip under it for the hand. */
export const LineEdge = memo(function LineEdge({ id, data, selected }: EdgeProps<LineData>) {
  if (!data) return null;
  const d = filletPath(data.route.points, FILLET);
  return (
    <g
      transform={`scale(${MODULE})`}
      className="flow-line"
      data-flow-line={id}
      data-points={data.route.points.map((point) => `${point.x},${point.y}`).join(' ')}
      data-selected={selected || undefined}
    >
      <title>{data.words}</title>
      <path d={d} className="line-hold" />
      {selected && <path d={d} className="line-chosen" />}
      <LineView line={data.line} route={data.route} live={false} />
    </g>
  );
});

export const ShaftEdge = memo(function ShaftEdge({ data }: EdgeProps<ShaftData>) {
  return data ? <ShapeView shapes={data.shapes} transform={`scale(${MODULE})`} /> : null;
});
