import { type RefObject, useEffect, useState } from 'react';

interface Tie {
  readonly from: { readonly x: number; readonly y: number };
  readonly to: { readonly x: number; readonly y: number };
}

/** The string from the plate's edge to its symbol on the drawing. It follows pan and zoom by looking once per frame. */
export function PlateString({ target, card }: { readonly target: string; readonly card: RefObject<HTMLElement | null> }) {
  const [tie, setTie] = useState<Tie | null>(null);
  useEffect(() => {
    let frame = 0;
    let last = '';
    function look() {
      frame = requestAnimationFrame(look);
      const plate = card.current?.getBoundingClientRect();
      const ground = card.current?.parentElement?.getBoundingClientRect();
      const symbol = document.querySelector(`[data-component="${CSS.escape(target)}"]`)?.getBoundingClientRect();
      if (!plate || !ground || !symbol || symbol.width === 0) return update(null);
      const x = symbol.left + symbol.width / 2;
      const y = symbol.top + symbol.height / 2;
      if (x > plate.left && x < plate.right && y > plate.top && y < plate.bottom) return update(null);
      const from = {
        x: Math.min(Math.max(x, plate.left), plate.right) - ground.left,
        y: Math.min(Math.max(y, plate.top + 24), plate.bottom - 24) - ground.top,
      };
      update({ from, to: { x: x - ground.left, y: y - ground.top } });
    }
    function update(next: Tie | null) {
      const key = JSON.stringify(next);
      if (key === last) return;
      last = key;
      setTie(next);
    }
    look();
    return () => cancelAnimationFrame(frame);
  }, [target, card]);
  if (!tie) return null;
  const { from, to } = tie;
  return (
    <svg className="plate-string" aria-hidden="true">
      <path
        d={`M${from.x} ${from.y}Q${(from.x + to.x) / 2} ${Math.max(from.y, to.y) + 18} ${to.x} ${to.y}`}
        fill="none"
        stroke="var(--ink)"
        strokeWidth="1.3"
      />
      <circle cx={from.x} cy={from.y} r="5" fill="var(--sheet)" stroke="var(--ink)" strokeWidth="1.6" />
      <circle cx={to.x} cy={to.y} r="4" fill="var(--sheet)" stroke="var(--ink)" strokeWidth="1.4" />
    </svg>
  );
}
