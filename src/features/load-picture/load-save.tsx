import { useEffect, useRef, useState } from 'react';
import type { LoadCase, LoadNumeral } from '#shared/pictures/load-chart.ts';
import { useFormat } from '#src/components/use-format.ts';
import { fileName, saveFile, svgToPng } from '#src/lib/save-file.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { EXPORT_HEIGHT, EXPORT_WIDTH, loadPictureSvg } from './load-export.ts';

export interface LoadSaveProps {
  readonly cases: readonly LoadCase[];
  readonly numerals: readonly LoadNumeral[];
  /** Times of commands [s]. */
  readonly starts: readonly number[];
}

/** Saves the load picture as SVG or PNG. */
export function LoadSave({ cases, numerals, starts }: LoadSaveProps) {
  const { preferences } = useFormat();
  const [open, setOpen] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (!open) return;
    const away = (event: PointerEvent) => !box.current?.contains(event.target as Node) && setOpen(false);
    window.addEventListener('pointerdown', away);
    return () => window.removeEventListener('pointerdown', away);
  }, [open]);
  const svg = () => loadPictureSvg(title(), cases, numerals, preferences, useCursor.getState().time, starts);
  const name = (ending: string) => fileName(`${useDocument.getState().document.title} load picture`, ending);
  async function savePng() {
    try {
      saveFile(name('png'), await svgToPng(svg(), EXPORT_WIDTH, EXPORT_HEIGHT, 2), 'image/png');
      setFault(null);
      setOpen(false);
    } catch (error) {
      setFault(error instanceof Error ? error.message : 'The picture could not be stored.');
    }
  }
  return (
    <div ref={box} className="load-save no-print">
      <button
        type="button"
        aria-expanded={open}
        disabled={cases.length === 0}
        onClick={() => setOpen(!open)}
        onKeyDown={(event) => event.key === 'Escape' && setOpen(false)}
      >
        Save
      </button>
      {open && (
        <section className="load-sheet" aria-label="Save the load picture">
          <button
            type="button"
            className="menu-item"
            onClick={() => {
              saveFile(name('svg'), svg(), 'image/svg+xml');
              setOpen(false);
            }}
          >
            As SVG
          </button>
          <button type="button" className="menu-item" onClick={() => void savePng()}>
            As PNG
          </button>
          {fault && <p role="alert">{fault}</p>}
        </section>
      )}
    </div>
  );
}

function title(): string {
  return `${useDocument.getState().document.title}: load picture`;
}
