import { memo, useEffect, useMemo } from 'react';
import { type NodeProps, useUpdateNodeInternals } from 'reactflow';
import { joinProblem } from '#shared/circuit/edit/joins.ts';
import { findKind, findPort } from '#shared/circuit/kind-lookup.ts';
import type { PortSpec } from '#shared/kinds/kind.ts';
import { symbolValues } from '#shared/pictures/symbol-values.ts';
import { placedSize, placePoint, placePort } from '#shared/symbols/place.ts';
import { symbolOf } from '#shared/symbols/registry.ts';
import { SymbolView } from '#src/components/schematic/symbol-view.tsx';
import { useDocument } from '#src/stores/document-store.ts';
import { openNameplate } from '#src/stores/nameplate-store.ts';
import { useDrawing } from './drawing-store.ts';
import { MODULE, type PartData, partInWords } from './flow-model.ts';
import { PortRing, type RingState } from './port-ring.tsx';

/** One part on the sheet: its symbol, the thing one takes hold of, and a ring at every port. */
export const PartNode = memo(function PartNode({ id, data, selected }: NodeProps<PartData>) {
  const { component, open, optional, joined } = data;
  const symbol = symbolOf(component.kind);
  const kind = findKind(component.kind);
  const cases = useDocument((state) => state.document.cases);
  const activeCase = useDocument((state) => state.activeCase);
  const joinFrom = useDrawing((state) => state.joinFrom);
  // biome-ignore lint/correctness/useExhaustiveDependencies: a part's values come from itself and the case alone
  const values = useMemo(() => symbolValues(useDocument.getState().document, activeCase, component), [cases, activeCase, component]);
  const refresh = useUpdateNodeInternals();
  // biome-ignore lint/correctness/useExhaustiveDependencies: the ports move when the part is turned or mirrored
  useEffect(() => refresh(id), [refresh, id, component.turn, component.mirror]);
  if (!symbol || !kind) return null;
  const { width, height } = placedSize(symbol, component.turn);
  const code = placePoint(symbol, { ...component, at: { x: 0, y: 0 } }, symbol.code);

  function ringState(port: PortSpec): RingState {
    if (joinFrom) {
      if (joinFrom.component === id && joinFrom.port === port.id) return 'from';
      const { document } = useDocument.getState();
      if (!joinProblem(document, joinFrom, { component: id, port: port.id })) return 'alike';
      return port.medium === findPort(document, joinFrom)?.medium ? 'joined' : 'unlike';
    }
    if (open.includes(port.id)) return 'open';
    return optional.includes(port.id) ? 'optional' : 'joined';
  }

  return (
    <div
      className="part"
      data-selected={selected || undefined}
      data-junction={component.kind === 'junction' || undefined}
      style={{ width: width * MODULE, height: height * MODULE }}
    >
      <svg
        className="part-symbol"
        width={width * MODULE}
        height={height * MODULE}
        viewBox={`0 0 ${width} ${height}`}
        overflow="visible"
        aria-hidden="true"
      >
        <SymbolView component={component} values={values} joined={joined} live={false} />
        {component.name && component.kind !== 'tank' && component.kind !== 'junction' && (
          <text x={code.x} y={code.y} className="part-code">
            {component.name}
          </text>
        )}
      </svg>
      {/* biome-ignore lint/a11y/useSemanticElements: a button element would swallow the drag in one browser */}
      <div
        role="button"
        tabIndex={0}
        className="part-body"
        data-part={id}
        aria-pressed={selected}
        aria-label={partInWords(component, open.length)}
        onDoubleClick={() => openNameplate(id)}
      />
      {kind.ports.map((port) => {
        const place = placePort(symbol, { ...component, at: { x: 0, y: 0 } }, port.id);
        return place ? (
          <PortRing
            key={port.id}
            componentId={id}
            port={port}
            place={component.kind === 'junction' ? { ...place, x: 1, y: 1 } : place}
            state={ringState(port)}
            reachable={selected}
          />
        ) : null;
      })}
    </div>
  );
});
