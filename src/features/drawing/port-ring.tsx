import { Handle, Position } from 'reactflow';
import { portInWords } from '#shared/circuit/kind-lookup.ts';
import type { PortSpec } from '#shared/kinds/kind.ts';
import type { Side } from '#shared/symbols/symbol.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { openStrip } from './drawing-store.ts';
import { MODULE } from './flow-model.ts';

/** open: nothing is joined. optional: a tee's next arm. joined: has its line. While a line is drawn: from, alike, unlike. */
export type RingState = 'open' | 'optional' | 'joined' | 'from' | 'alike' | 'unlike';

const positions: Record<Side, Position> = { left: Position.Left, right: Position.Right, top: Position.Top, bottom: Position.Bottom };
const mediumWords = { oil: 'oil', shaft: 'shaft, not oil' } as const;

export interface PortRingProps {
  readonly componentId: string;
  readonly port: PortSpec;
  /** In modules from the top-left of the part's box. */
  readonly place: { readonly x: number; readonly y: number; readonly side: Side };
  readonly state: RingState;
  /** True where Tab shall also reach ports that have their line. */
  readonly reachable: boolean;
}

/** A port: a ring that opens the strip when pressed and draws a line when dragged. */
export function PortRing({ componentId, port, place, state, reachable }: PortRingProps) {
  const ref = { component: componentId, port: port.id };
  const words = useDocument((store) => portInWords(store.document, ref));
  const shown = state !== 'joined' || reachable;
  const status = state === 'joined' ? 'joined' : state === 'optional' ? 'one more branch' : 'open';
  return (
    <Handle
      id={port.id}
      type="source"
      position={positions[place.side]}
      className={`port-ring ring-${state}`}
      style={{ left: place.x * MODULE, top: place.y * MODULE }}
      role="button"
      tabIndex={shown ? 0 : -1}
      aria-hidden={shown ? undefined : true}
      data-ring={`${componentId}.${port.id}`}
      aria-label={`${words}, ${status}`}
      onClick={(event) => {
        event.stopPropagation();
        openStrip(ref);
      }}
      onKeyDown={(event) => {
        if (event.key !== 'Enter' && event.key !== ' ') return;
        event.preventDefault();
        event.stopPropagation();
        openStrip(ref);
      }}
    >
      {state === 'unlike' && <span className="ring-word">{port.medium === 'oil' ? mediumWords.oil : mediumWords.shaft}</span>}
    </Handle>
  );
}
