import { useReactFlow } from 'reactflow';

export interface ZoomButtonsProps {
  /** null = everything is fitted in. */
  readonly zoom: number | null;
  readonly touch: boolean;
  /** Of the drawing [px]. */
  readonly width: number;
  readonly height: number;
  readonly onZoom: (zoom: number | null) => void;
}

export const LEAST_ZOOM = 0.15;
export const MOST_ZOOM = 3;

/** Every two-finger gesture has its button. */
export function ZoomButtons({ zoom, touch, width, height, onZoom }: ZoomButtonsProps) {
  const flow = useReactFlow();
  function zoomBy(factor: number) {
    const { x, y, zoom: now } = flow.getViewport();
    const next = Math.min(MOST_ZOOM, Math.max(LEAST_ZOOM, now * factor));
    const cx = width / 2;
    const cy = height / 2;
    flow.setViewport({ zoom: next, x: cx - ((cx - x) * next) / now, y: cy - ((cy - y) * next) / now });
    onZoom(next);
  }
  return (
    <div className={`zoom-buttons${touch ? ' zoom-buttons-touch' : ''}`} role="toolbar" aria-label="View">
      <button type="button" className="button" aria-label="Smaller" onClick={() => zoomBy(0.8)}>
        −
      </button>
      <button type="button" className="button" aria-pressed={zoom === null} onClick={() => onZoom(null)}>
        Fit
      </button>
      <button type="button" className="button" aria-label="Larger" onClick={() => zoomBy(1.25)}>
        +
      </button>
    </div>
  );
}

/** Pixels kept free for the buttons. */
export const noRoom = { width: 0, height: 0 };

export function buttonRoom(touch: boolean): { width: number; height: number } {
  return touch ? { width: 196, height: 66 } : { width: 142, height: 48 };
}
