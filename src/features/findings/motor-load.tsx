import { caseLetter } from '#shared/circuit/edit/cases.ts';
import { findComponent, nameInWords } from '#shared/circuit/kind-lookup.ts';
import type { CircuitCase } from '#shared/circuit/schema.ts';
import type { Yardsticks } from '#shared/findings/finding.ts';
import { CaseLetter } from '#src/components/case-letter.tsx';
import { type Format, useFormat } from '#src/components/use-format.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { explain } from '#src/stores/explain-store.ts';
import { useRuns } from '#src/stores/run-store.ts';

/** The three yardsticks, always in this order and never mixed into one per cent. Margins round down, loads to nearest. */
const rows = [
  ['stall-margin', 'Stall margin'],
  ['rms-current', 'RMS current, of nameplate'],
  ['peak-torque', 'Peak, × rated torque'],
] as const;

/** A motor that drives nothing has a margin without meaning: only that it is large is said. */
const UNLOADED = 100;

function cell(row: (typeof rows)[number][0], yardsticks: Yardsticks, format: Format): string {
  if (row === 'stall-margin') {
    if (yardsticks.stalled) return 'stalled';
    if (yardsticks.stallMargin === null) return '\u2013';
    return yardsticks.stallMargin > UNLOADED ? `over ${UNLOADED}` : format.number(yardsticks.stallMargin, 1, 'down');
  }
  if (row === 'rms-current') {
    if (yardsticks.stalled && yardsticks.stallCurrent !== undefined)
      return format.quantity(yardsticks.stallCurrent, 'current', { digits: 0 }).text;
    return format.quantity(yardsticks.rmsCurrent, 'fraction', { digits: 0 }).text;
  }
  return yardsticks.stalled ? format.words('pull-out') : format.number(yardsticks.peakTorque, 2);
}

/** Motor load of every case on the screen, one table per motor. */
export function MotorLoad() {
  const document = useDocument((state) => state.document);
  const activeCase = useDocument((state) => state.activeCase);
  const overlays = useDocument((state) => state.overlays);
  const byCase = useRuns((state) => state.byCase);
  const format = useFormat();
  const shown = document.cases.filter((entry) => (entry.id === activeCase || overlays.includes(entry.id)) && byCase[entry.id]?.assessment);
  const motors = [...new Set(shown.flatMap((entry) => yardsticksOf(entry).map((one) => one.motor)))];

  function yardsticksOf(entry: CircuitCase): readonly Yardsticks[] {
    return byCase[entry.id]?.assessment?.yardsticks ?? [];
  }
  return motors.map((motor) => {
    const component = findComponent(document, motor);
    const name = motors.length > 1 && component ? `Motor load, ${nameInWords(component)}` : 'Motor load';
    return (
      <table key={motor} className="table motor-load">
        <thead>
          <tr>
            <th scope="col">{name}</th>
            {shown.map((entry) => (
              <th key={entry.id} scope="col" className="number">
                <CaseLetter letter={caseLetter(entry)} ink={entry.ink} size={20} label="Case" />
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(([row, word]) => (
            <tr key={row}>
              <th scope="row">{word}</th>
              {shown.map((entry) => {
                const yardsticks = yardsticksOf(entry).find((one) => one.motor === motor);
                return (
                  <td key={entry.id} className="number">
                    {yardsticks && (
                      <button
                        type="button"
                        className="figure figure-open"
                        title="How is this computed?"
                        onClick={() => explain(`yardstick.${motor}.${row}`, entry.id)}
                      >
                        {cell(row, yardsticks, format)}
                      </button>
                    )}
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    );
  });
}
