export interface ZoomButtonsProps {
  readonly fitted: boolean;
  readonly touch: boolean;
  readonly onZoom: (factor: number) => void;
  readonly onFit: () => void;
}

/** Every two-finger gesture has its button. */
export function ZoomButtons({ fitted, touch, onZoom, onFit }: ZoomButtonsProps) {
  return (
    <div className={`zoom-buttons${touch ? ' zoom-buttons-touch' : ''}`} role="toolbar" aria-label="View">
      <button type="button" className="button" aria-label="Smaller" onClick={() => onZoom(0.8)}>
        −
      </button>
      <button type="button" className="button" aria-pressed={fitted} onClick={onFit}>
        Fit
      </button>
      <button type="button" className="button" aria-label="Larger" onClick={() => onZoom(1.25)}>
        +
      </button>
    </div>
  );
}
