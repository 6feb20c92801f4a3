import { useMemo } from 'react';
import type { CircuitCase, CircuitDocument } from '#shared/circuit/schema.ts';
import type { Finding } from '#shared/findings/finding.ts';
import { useDocument } from './document-store.ts';
import { type CaseRun, useRuns } from './run-store.ts';

/** A finding with the numeral that stands beside it in the margin, on the tape and on the load picture. */
export interface NumberedFinding {
  readonly number: number;
  readonly finding: Finding;
  readonly caseName: string;
  /** Index of the case's ink; its letter is A for 0. */
  readonly ink: number;
}

/** Numbers the findings of the cases on the screen, once: worst first, then in the order of the cases, then by time. */
export function numberFindings(
  document: Pick<CircuitDocument, 'cases'>,
  shown: readonly string[],
  byCase: Readonly<Record<string, Pick<CaseRun, 'assessment'>>>,
): readonly NumberedFinding[] {
  const rows: { finding: Finding; entry: CircuitCase; place: number }[] = [];
  document.cases.forEach((entry, place) => {
    if (!shown.includes(entry.id)) return;
    for (const finding of byCase[entry.id]?.assessment?.findings ?? []) rows.push({ finding, entry, place });
  });
  rows.sort(
    (a, b) =>
      a.finding.severity - b.finding.severity ||
      a.place - b.place ||
      (a.finding.time ?? Number.MAX_VALUE) - (b.finding.time ?? Number.MAX_VALUE) ||
      (a.finding.id < b.finding.id ? -1 : 1),
  );
  return rows.map(({ finding, entry }, index) => ({ number: index + 1, finding, caseName: entry.name, ink: entry.ink }));
}

/** The numbered findings of the case on the drawing and those overlaid. */
export function useNumberedFindings(): readonly NumberedFinding[] {
  const cases = useDocument((state) => state.document.cases);
  const activeCase = useDocument((state) => state.activeCase);
  const overlays = useDocument((state) => state.overlays);
  const byCase = useRuns((state) => state.byCase);
  return useMemo(() => numberFindings({ cases }, [activeCase, ...overlays], byCase), [cases, activeCase, overlays, byCase]);
}
