import { useEffect, useMemo, useRef, useState } from 'react';
import type { LoadNumeral } from '#shared/pictures/load-chart.ts';
import { loadPicture } from '#shared/pictures/load-picture.ts';
import { loadWords, nowShapes, phaseStart, travelledShapes } from '#shared/pictures/load-picture-now.ts';
import type { Shape } from '#shared/pictures/shape.ts';
import { shapesMarkup } from '#shared/pictures/svg.ts';
import { textureDefinition } from '#shared/pictures/textures.ts';
import { inkCss } from '#src/components/schematic/ink-css.ts';
import { ShapeView, setMarkup } from '#src/components/schematic/shape-view.tsx';
import { useFormat } from '#src/components/use-format.ts';
import { useSize } from '#src/lib/use-size.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';
import { LoadSave } from './load-save.tsx';
import { useLoadCases } from './use-load-cases.ts';
import './load-picture.css';

/** A numbered finding as the load picture shows it. */
export interface LoadFinding {
  readonly number: number;
  readonly caseId: string;
  /** Where it stands on the chart [Pa, m³/s]; without it the finding has no place here. */
  readonly at?: { readonly pressure: number; readonly flow: number };
}

export interface LoadPicturePanelProps {
  readonly findings?: readonly LoadFinding[];
}

const textures = [
  ['dots', 'verdict-over'],
  ['hatch', 'verdict-trips'],
  ['cross-hatch', 'verdict-motor-stalls'],
] as const;

/** The P–Q chart: where the pump runs, what the motor can carry, and the operating point at the cursor. */
export function LoadPicturePanel({ findings = [] }: LoadPicturePanelProps) {
  const cases = useLoadCases();
  const { preferences } = useFormat();
  const [ref, size] = useSize<HTMLDivElement>();
  const numerals = useMemo(
    () =>
      findings.flatMap((finding): LoadNumeral[] =>
        finding.at && cases.some((entry) => entry.id === finding.caseId)
          ? [{ number: finding.number, caseId: finding.caseId, pressure: finding.at.pressure, flow: finding.at.flow }]
          : [],
      ),
    [findings, cases],
  );
  const chart = useMemo(
    () => loadPicture({ title: 'Load picture', cases, numerals, preferences, width: size.width, height: size.height }),
    [cases, numerals, preferences, size],
  );
  const commands = useDocument((state) => state.document.duty.commands);
  const starts = useMemo(() => commands.map((command) => command.time), [commands]);
  const travelled = useRef<SVGGElement>(null);
  const now = useRef<SVGGElement>(null);
  useEffect(() => {
    const draw = () => {
      const { time } = useCursor.getState();
      const write = (group: SVGGElement | null, shapes: readonly Shape[]) => {
        if (group) setMarkup(group, shapesMarkup(shapes, { colour: inkCss }));
      };
      write(travelled.current, travelledShapes(chart, cases, time, phaseStart(starts, time)));
      write(now.current, nowShapes(chart, cases, time));
    };
    draw();
    return useCursor.subscribe((state, before) => state.time !== before.time && draw());
  }, [chart, cases, starts]);
  const settled = useRuns((state) => Object.values(state.byCase).some((entry) => entry.state === 'done' || entry.state === 'refused'));
  const words = useWords(cases, preferences);
  const ready = size.width > 0 && size.height > 0;
  const hasMotor = cases.some((entry) => entry.curves.motor !== null);
  return (
    <section className="load-picture" aria-label="Load picture">
      <div className="load-head">
        <h2 className="region-heading">Load picture</h2>
        <span className="load-sub">P–Q chart</span>
        {hasMotor && <span className="load-note">Over and Trips only if it lasts</span>}
        <LoadSave cases={cases} numerals={numerals} starts={starts} />
      </div>
      <div ref={ref} className="load-plot">
        {ready && cases.length > 0 && (
          <svg width={size.width} height={size.height} viewBox={`0 0 ${size.width} ${size.height}`} aria-hidden="true">
            <Textures />
            <ShapeView shapes={chart.below} />
            <g ref={travelled} />
            <ShapeView shapes={chart.above} />
            <g ref={now} />
          </svg>
        )}
        {cases.length === 0 && settled && <p className="load-empty">The load picture needs a run with a pump.</p>}
      </div>
      <p className="visually-hidden">{words}</p>
    </section>
  );
}

function Textures() {
  const ref = useRef<SVGDefsElement>(null);
  useEffect(() => {
    if (ref.current) setMarkup(ref.current, textures.map(([name, ink]) => textureDefinition(`${name}-${ink}`, name, inkCss(ink))).join(''));
  }, []);
  return <defs ref={ref} />;
}

const SLOW = 400;

/** The picture in words; while the tape plays they follow at rest only. */
function useWords(cases: Parameters<typeof loadWords>[0], preferences: Parameters<typeof loadWords>[2]): string {
  const [time, setTime] = useState(() => useCursor.getState().time);
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const stop = useCursor.subscribe((state) => {
      if (state.playing) return;
      clearTimeout(timer);
      timer = setTimeout(() => setTime(useCursor.getState().time), SLOW);
    });
    return () => {
      stop();
      clearTimeout(timer);
    };
  }, []);
  return useMemo(() => loadWords(cases, time, preferences), [cases, time, preferences]);
}
