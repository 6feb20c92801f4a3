import { caseLetter } from '#shared/circuit/edit/cases.ts';
import { CaseLetter } from '#src/components/case-letter.tsx';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';

/** Why there are no findings: not run yet, the drawing does not run, or the run broke. */
export function FindingsState() {
  const entry = useDocument((state) => state.document.cases.find((candidate) => candidate.id === state.activeCase));
  const run = useRuns((state) => (entry ? state.byCase[entry.id] : undefined));
  if (!entry) return null;
  const letter = caseLetter(entry);
  if (!run || run.state === 'waiting' || (run.state === 'running' && !run.assessment)) {
    return (
      <p className="findings-state" role="status">
        Case {letter} is being run.
      </p>
    );
  }
  if (run.state === 'broken') {
    return (
      <p className="findings-state" role="alert">
        Case {letter} could not be run: {run.message ?? 'the calculation ended without a result'}. The next edit runs it again.
      </p>
    );
  }
  if (run.state !== 'refused') return null;
  const problems = run.problems.filter((problem) => problem.severity === 'problem');
  return (
    <div className="findings-state" role="status">
      <h3 className="finding-head">
        <CaseLetter letter={letter} ink={entry.ink} />
        <span>Not run: {problems.length === 1 ? 'one thing is missing' : `${problems.length} things are missing`}</span>
      </h3>
      <ul className="word-list">
        {problems.map((problem) => (
          <li key={`${problem.code}:${problem.message}`}>{problem.message}</li>
        ))}
      </ul>
    </div>
  );
}
