import { useDeferredValue, useMemo } from 'react';
import { growFrom } from '#shared/circuit/edit/grow.ts';
import { isOpen } from '#shared/circuit/edit/joins.ts';
import { removeItems } from '#shared/circuit/edit/removal.ts';
import { portInWords } from '#shared/circuit/kind-lookup.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { unprotectedSources } from '#shared/circuit/unprotected.ts';
import { compileCircuit } from '#shared/simulation/compile.ts';
import type { Problem } from '#shared/simulation/result.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { openNameplate } from '#src/stores/nameplate-store.ts';
import { growAt } from './actions.ts';
import { branchPoint } from './branch-point.ts';
import { openStrip, partFocus, say, useDrawing } from './drawing-store.ts';

/** What is missing or taken for granted, as compiling the circuit says it. */

let last: { document: CircuitDocument; caseId: string; problems: readonly Problem[] } | null = null;

export function drawingProblems(document: CircuitDocument, caseId: string): readonly Problem[] {
  if (last?.document === document && last.caseId === caseId) return last.problems;
  const compiled = compileCircuit(document, caseId);
  const found = compiled.ok ? compiled.notes : compiled.problems;
  const problems = document.components.length === 0 ? [] : [...found, ...unprotected(document)];
  last = { document, caseId, problems };
  return problems;
}

/** A pump line without a relief runs, and its verdict says so; on the drawing it is said before. */
function unprotected(document: CircuitDocument): Problem[] {
  return unprotectedSources(document).map((ref) => ({
    severity: 'caution',
    code: 'no-relief',
    message: `No relief protects the line of ${portInWords(document, ref)}.`,
    ...ref,
    cure: { label: 'Add a relief', action: 'add-relief', ...ref },
  }));
}

/** What a person has to do something about: what stops the run, and a pump line that nothing protects. */
export function isMissing(problem: Problem): boolean {
  return problem.severity === 'problem' || problem.code === 'no-relief';
}

/** Problems of the case on the drawing; while a part is dragged they follow as time allows. */
export function useDrawingProblems(): readonly Problem[] {
  const document = useDeferredValue(useDocument((state) => state.document));
  const activeCase = useDocument((state) => state.activeCase);
  return useMemo(() => drawingProblems(document, activeCase), [document, activeCase]);
}

const grows: Partial<Record<NonNullable<Problem['cure']>['action'], string>> = {
  'add-tank': 'tank',
  'add-relief': 'relief-valve',
  'add-drive': 'electric-motor',
};

const MOST_GHOSTS = 4;

/** The circuit as each cure would leave it, for the first few cures that add something at an open port. */
export function cureGhosts(document: CircuitDocument, problems: readonly Problem[]): CircuitDocument[] {
  return problems
    .flatMap((problem) => {
      const cure = problem.cure;
      const kind = cure && isMissing(problem) ? grows[cure.action] : undefined;
      if (!kind || !cure?.component || !cure.port) return [];
      const ref = { component: cure.component, port: cure.port };
      if (cure.action !== 'add-relief' && !isOpen(document, ref)) return [];
      const grown = growFrom(document, ref, kind, branchPoint(document, ref));
      return grown.componentId ? [grown.document] : [];
    })
    .slice(0, MOST_GHOSTS);
}

/** Does what a cure's link says. */
export function applyCure(problem: Problem) {
  const cure = problem.cure;
  if (!cure) return;
  const kind = grows[cure.action];
  const ref = cure.component && cure.port ? { component: cure.component, port: cure.port } : null;
  if (kind && ref) return growAt(ref, kind);
  if (cure.action === 'join' && ref) return openStrip(ref, 'next');
  if (cure.action === 'open-nameplate' && cure.component) return openNameplate(cure.component);
  if (cure.action === 'delete-line' && cure.line) {
    const { line } = cure;
    useDocument.getState().edit((document) => removeItems(document, [line]));
    return say('The line is deleted');
  }
  const where = problem.component;
  if (where) useDrawing.getState().set({ focus: partFocus(where) });
}
