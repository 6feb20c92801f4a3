import { useEffect, useLayoutEffect, useRef, useState } from 'react';
import { useTheme } from '#src/lib/theme.ts';
import { usePreferences } from '#src/stores/preferences-store.ts';
import { drawTraces } from './draw-traces.ts';
import type { TapeGeometry } from './tape-geometry.ts';
import type { TapeModel } from './tape-model.ts';
import { readTokens, type Tokens } from './tokens.ts';

export interface TapeCanvasProps {
  readonly model: TapeModel;
  readonly geometry: TapeGeometry;
  /** Dotted lines through the lanes at pinned moments, in the ink of their case. */
  readonly verticals: readonly { readonly time: number; readonly ink: number }[];
}

/** The traces. Redrawn when runs, lanes, size or theme change; never when the cursor moves. */
export function TapeCanvas({ model, geometry, verticals }: TapeCanvasProps) {
  const ref = useRef<HTMLCanvasElement>(null);
  const theme = useTheme();
  const projector = usePreferences((state) => state.projector);
  const fonts = useFontsReady();
  const density = useDensity();
  const kept = useRef<{ look: string; tokens: Tokens } | null>(null);
  // biome-ignore lint/correctness/useExhaustiveDependencies: theme, projector mode and fonts change what the tokens give
  useLayoutEffect(() => {
    const canvas = ref.current;
    if (!canvas || geometry.width <= 0 || geometry.height <= 0) return;
    const width = Math.round(geometry.width * density);
    const height = Math.round(geometry.height * density);
    if (canvas.width !== width) canvas.width = width;
    if (canvas.height !== height) canvas.height = height;
    const context = canvas.getContext('2d');
    if (!context) return;
    context.setTransform(density, 0, 0, density, 0, 0);
    const look = `${theme} ${document.documentElement.dataset.projector}`;
    if (kept.current?.look !== look) kept.current = { look, tokens: readTokens(canvas) };
    drawTraces(context, model, geometry, kept.current.tokens, verticals);
  }, [model, geometry, verticals, theme, projector, fonts, density]);
  return <canvas ref={ref} className="tape-canvas" style={{ width: geometry.width, height: geometry.height }} />;
}

function useFontsReady(): boolean {
  const [ready, setReady] = useState(false);
  useEffect(() => {
    let alive = true;
    document.fonts?.ready.then(() => alive && setReady(true));
    return () => {
      alive = false;
    };
  }, []);
  return ready;
}

/** Device pixels per CSS pixel, followed when the window moves to another screen or is zoomed. */
function useDensity(): number {
  const [density, setDensity] = useState(() => window.devicePixelRatio || 1);
  useEffect(() => {
    const query = window.matchMedia(`(resolution: ${density}dppx)`);
    const follow = () => setDensity(window.devicePixelRatio || 1);
    query.addEventListener('change', follow);
    return () => query.removeEventListener('change', follow);
  }, [density]);
  return density;
}
