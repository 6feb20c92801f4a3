import type { RunSummary } from '#shared/api/run-summary.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { defaultLanes } from '#shared/duty/lanes.ts';
import { STANDING_CAUTION } from '#shared/findings/cautions.ts';
import { formatQuantity } from '#shared/units/format.ts';
import type { QuantityId } from '#shared/units/quantities.ts';

/** The run in words for a terminal, in the SI system of units. */

const LANES = 12;
const units = { system: 'si' } as const;
const quantity = (value: number, id: QuantityId) => formatQuantity(value, id, units, { style: 'figure' }).text;
const seconds = (value: number) => `${value.toFixed(3)} s`;
const share = (value: number) => value.toExponential(1);

export function runReport(document: CircuitDocument, run: RunSummary): string {
  const nameOf = (id: string) => document.components.find((component) => component.id === id)?.name || id;
  return [
    ...heading(run),
    ...section('Findings', run.findings.flatMap(findingLines)),
    ...section(
      'Motor load',
      run.yardsticks.flatMap((yardsticks) => yardstickLines(yardsticks, nameOf)),
    ),
    ...section(
      'Requirements',
      run.requirements.map((entry) => `${entry.met ? 'met' : 'missed'}  ${entry.words}`),
    ),
    ...section('Events', eventLines(run, nameOf)),
    ...section('By phase', phaseLines(document, run)),
    ...section(
      'Pressure left',
      run.pressureLeft.map((left) => `${left.label}  ${quantity(left.pressure, 'pressure')}`),
    ),
    ...section(
      'Taken for granted',
      run.notes.map((note) => note.message),
    ),
    ...section('Calculation', calculationLines(run)),
    '',
    STANDING_CAUTION,
    '',
  ].join('\n');
}

function section(title: string, lines: readonly string[]): string[] {
  return lines.length === 0 ? [] : ['', title, ...lines.map((line) => `  ${line}`)];
}

function heading(run: RunSummary): string[] {
  const figure = run.verdict.figure;
  const words = figure ? `${run.verdict.word}, ${quantity(figure.value, figure.quantity as QuantityId)}` : run.verdict.word;
  const status = `Status: ${run.status} at ${seconds(run.time)} of ${seconds(run.duration)}${run.reason ? ` – ${run.reason}` : ''}`;
  return [`${run.circuit} · case ${run.case.name}`, `Verdict: ${words}`, status];
}

function findingLines(finding: RunSummary['findings'][number]): string[] {
  const at = finding.time === undefined ? '' : `${seconds(finding.time)}  `;
  return [
    `${at}${finding.headline}`,
    `  ${finding.cause}`,
    ...[finding.remedy, finding.caution].flatMap((words) => (words ? [`  ${words}`] : [])),
  ];
}

function yardstickLines(load: RunSummary['yardsticks'][number], nameOf: (id: string) => string): string[] {
  const margin = load.stallMargin === null ? 'none' : load.stallMargin > 100 ? 'over 100' : quantity(load.stallMargin, 'ratio');
  const stall = load.stalled && load.stallTime !== undefined ? `, stalls at ${seconds(load.stallTime)}` : '';
  const trip = load.tripTime === null ? 'does not trip' : `trips after ${quantity(load.tripTime, 'time')} of this duty, repeated`;
  const torque = `torque peak ${quantity(load.peakTorque, 'ratio')}, RMS ${quantity(load.rmsTorque, 'ratio')} rated`;
  const current = `current peak ${quantity(load.peakCurrent, 'current')}, RMS ${quantity(load.rmsCurrent, 'ratio')} nameplate`;
  return [`${nameOf(load.motor)}  stall margin ${margin}${stall}; ${torque}; ${current}; overload ${trip}`];
}

function eventLines(run: RunSummary, nameOf: (id: string) => string): string[] {
  return run.events
    .filter((event) => event.label !== '')
    .map((event) => `${seconds(event.time).padStart(10)}  ${nameOf(event.component)}  ${event.label}`);
}

function phaseLines(document: CircuitDocument, run: RunSummary): string[] {
  const lanes = defaultLanes(document, LANES);
  const width = Math.max(0, ...lanes.map((lane) => lane.title.length));
  return run.phases.flatMap((phase) => [
    `${seconds(phase.from)} to ${seconds(phase.to)}  ${phase.label}`,
    ...lanes.flatMap((lane) => {
      const range = phase.channels[lane.address];
      if (!range) return [];
      const text = (value: number) => formatQuantity(value, lane.quantity, units).text;
      return [
        `  ${lane.title.padEnd(width)}  least ${text(range.min)}, most ${text(range.max)}, mean ${text(range.mean)}, end ${text(range.end)}`,
      ];
    }),
  ]);
}

function calculationLines(run: RunSummary): string[] {
  const { statistics: s, audit } = run;
  const audited = audit
    ? `Energy: supplied ${quantity(audit.supplied, 'energy')}, delivered ${quantity(audit.delivered, 'energy')}, heat ${quantity(audit.heat, 'energy')}; residual ${share(audit.residual)}, volume residual ${share(audit.volumeResidual)}`
    : 'Energy: not audited, the run did not get far enough';
  return [
    audited,
    `Solver: ${s.steps} steps, ${s.rejected} rejected, ${s.evaluations} evaluations, ${s.jacobians} Jacobians, ${s.factorisations} factorisations, ${s.states} states, ${s.nonzeros} nonzeros`,
    `Engine ${run.engineVersion}, relative tolerance ${run.tolerance}, hash ${run.hash}`,
  ];
}
