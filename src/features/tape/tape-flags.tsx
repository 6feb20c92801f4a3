import { useRef, useState } from 'react';
import type { PlacedFlag } from '#shared/pictures/tape-band.ts';

export interface TapeFlagsProps {
  readonly flags: readonly PlacedFlag[];
  readonly rowHeight: number;
  readonly height: number;
  /** Seconds per pixel. */
  readonly perPixel: number;
  readonly canEdit: boolean;
  /** What a reader hears: 'Start at 0.00 s'. */
  readonly spoken: (flag: PlacedFlag) => string;
  readonly onGrab: () => void;
  readonly onMove: (id: string, time: number) => void;
  readonly onLetGo: () => void;
  readonly onDelete: (id: string) => void;
  readonly onOpen: (id: string) => void;
}

/** Steps of the arrow keys and of dragging [s]. */
const FINE = 0.01;
const COARSE = 0.1;

/** Command flags on the top edge: drag, arrow keys (Shift: ten times), Delete, Enter or double click to edit. */
export function TapeFlags(props: TapeFlagsProps) {
  const { flags } = props;
  const [held, setHeld] = useState(false);
  const order = useRef<string[]>([]);
  const drag = useRef<{ id: string; x: number; time: number; moved: boolean } | null>(null);
  // While a flag has the focus the order of the elements stays, so that moving one past another does not lose it.
  if (!held) order.current = flags.map((flag) => flag.id);
  const known = order.current.filter((id) => flags.some((flag) => flag.id === id));
  const fresh = flags.map((flag) => flag.id).filter((id) => !known.includes(id));
  const snap = (time: number) => Math.round(time / FINE) * FINE;

  function move(event: React.PointerEvent) {
    const start = drag.current;
    if (!start) return;
    const by = event.clientX - start.x;
    if (!start.moved && Math.abs(by) < 3) return;
    start.moved = true;
    props.onMove(start.id, Math.max(0, snap(start.time + by * props.perPixel)));
  }
  function letGo() {
    if (!drag.current) return;
    drag.current = null;
    props.onLetGo();
  }
  function key(event: React.KeyboardEvent, flag: PlacedFlag) {
    const step = event.shiftKey ? COARSE : FINE;
    if (event.key === 'Enter') props.onOpen(flag.id);
    else if (!props.canEdit) return;
    else if (event.key === 'ArrowLeft') props.onMove(flag.id, Math.max(0, snap(flag.time - step)));
    else if (event.key === 'ArrowRight') props.onMove(flag.id, snap(flag.time + step));
    else if (event.key === 'Delete' || event.key === 'Backspace') props.onDelete(flag.id);
    else return;
    event.preventDefault();
    event.stopPropagation();
  }
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: only watches where the focus is
    <div
      className="tape-flags"
      style={{ '--tape-cloth': `${props.rowHeight - 3}px` } as React.CSSProperties}
      onFocus={() => setHeld(true)}
      onBlur={() => setHeld(false)}
    >
      {[...known, ...fresh].map((id) => {
        const flag = flags.find((entry) => entry.id === id);
        if (!flag) return null;
        const row = Math.max(0, flag.row);
        return (
          <button
            key={id}
            type="button"
            className="tape-flag"
            data-command={id}
            data-mirrored={flag.mirrored || undefined}
            data-tick={flag.row < 0 || undefined}
            data-fixed={!props.canEdit || undefined}
            style={{
              transform: `translateX(${flag.mirrored ? flag.x - flag.width : flag.x}px)`,
              top: row * props.rowHeight,
              height: props.height - row * props.rowHeight,
              width: flag.row < 0 ? undefined : flag.width,
            }}
            aria-label={props.spoken(flag)}
            onPointerDown={(event) => {
              if (!props.canEdit || event.button !== 0) return;
              event.currentTarget.setPointerCapture(event.pointerId);
              drag.current = { id, x: event.clientX, time: flag.time, moved: false };
              props.onGrab();
            }}
            onPointerMove={move}
            onPointerUp={letGo}
            onPointerCancel={letGo}
            onDoubleClick={() => props.onOpen(id)}
            onKeyDown={(event) => key(event, flag)}
          >
            <span className="tape-flag-cloth">{flag.words}</span>
          </button>
        );
      })}
    </div>
  );
}
