import { memo, useMemo } from 'react';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { endOf } from '#shared/pictures/line-ends.ts';
import { shaftPath, shaftShapes } from '#shared/pictures/shaft-shapes.ts';
import { ShapeView } from './shape-view.tsx';

export interface ShaftsViewProps {
  readonly components: CircuitDocument['components'];
  readonly shafts: CircuitDocument['shafts'];
}

/** All shafts of the sheet, in modules. Goes inside an SVG. */
export const ShaftsView = memo(function ShaftsView({ components, shafts }: ShaftsViewProps) {
  const shapes = useMemo(() => {
    const byId = new Map(components.map((component) => [component.id, component]));
    return shafts.flatMap((shaft) =>
      shaft.members.slice(1).flatMap((member, k) => {
        const before = shaft.members[k];
        const from = before && endOf(byId.get(before.component), before.port);
        const to = endOf(byId.get(member.component), member.port);
        return from && to ? shaftShapes(shaftPath(from, to)) : [];
      }),
    );
  }, [components, shafts]);
  return <ShapeView shapes={shapes} />;
});
