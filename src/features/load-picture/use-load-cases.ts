import { useMemo } from 'react';
import { effectiveNumber } from '#shared/circuit/effective.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { caseLetter, tracePen } from '#shared/pictures/case-pens.ts';
import type { LoadCase } from '#shared/pictures/load-chart.ts';
import { loadPath } from '#shared/pictures/load-path.ts';
import { tapeStall } from '#shared/pictures/tape-references.ts';
import { channelOf, type RunResult, valueAt } from '#shared/simulation/result.ts';
import type { UnitPreferences } from '#shared/units/convert.ts';
import { formatQuantity } from '#shared/units/format.ts';
import { useFormat } from '#src/components/use-format.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { type CaseRun, useRuns } from '#src/stores/run-store.ts';
import { useShownDocument } from '#src/stores/shown-document.ts';

/** Cases of the load picture from the stores; the case on the drawing comes last, on top. */
export function useLoadCases(): LoadCase[] {
  const document = useShownDocument();
  const activeCase = useDocument((state) => state.activeCase);
  const overlays = useDocument((state) => state.overlays);
  const byCase = useRuns((state) => state.byCase);
  const { preferences } = useFormat();
  return useMemo(() => {
    const shown = document.cases.filter((entry) => entry.id === activeCase || overlays.includes(entry.id));
    const cases = shown.flatMap((entry): LoadCase[] => {
      const state = byCase[entry.id];
      const made = state && fromRun(state);
      if (!made) return [];
      const active = entry.id === activeCase;
      return [
        {
          ...made,
          id: entry.id,
          letter: caseLetter(entry.ink),
          pen: tracePen(entry.ink, active, shown.length),
          active,
          stale: state.stale,
          words: stopWords(document, entry.id, made.curves.pump, preferences),
          reliefFlow: made.curves.relief ? effectiveNumber(document, entry.id, made.curves.relief.component, 'setFlow') : null,
        },
      ];
    });
    return cases.sort((a, b) => Number(a.active) - Number(b.active));
  }, [document, activeCase, overlays, byCase, preferences]);
}

type FromRun = Pick<LoadCase, 'curves' | 'path' | 'stall'>;
const known = new WeakMap<RunResult, FromRun | null>();

/** Path and stall of a run, worked out once per run. */
function fromRun(state: CaseRun): FromRun | null {
  const { run, curves, assessment } = state;
  if (!run) return null;
  const before = known.get(run);
  if (before !== undefined) return before;
  let made: FromRun | null = null;
  if (curves) {
    const stall = tapeStall(run, assessment?.yardsticks ?? []);
    const pressure = channelOf(run, curves.pressureAddress)?.values;
    const flow = channelOf(run, curves.flowAddress)?.values;
    made = {
      curves,
      path: loadPath(run, curves),
      stall:
        stall && pressure && flow
          ? { pressure: valueAt(run.times, pressure, stall.time), flow: valueAt(run.times, flow, stall.time) }
          : null,
    };
  }
  known.set(run, made);
  return made;
}

/** 'stop fully out, 28.0 cm³/rev' or 'stop 16.0 cm³/rev'. */
function stopWords(document: CircuitDocument, caseId: string, pump: string, preferences: UnitPreferences): string {
  const stop = effectiveNumber(document, caseId, pump, 'maxVolumeStop');
  const most = effectiveNumber(document, caseId, pump, 'displacement');
  if (stop === null || most === null) return '';
  const text = formatQuantity(Math.min(stop, most), 'displacement', preferences).text;
  return stop >= most * (1 - 1e-6) ? `stop fully out, ${text}` : `stop ${text}`;
}
