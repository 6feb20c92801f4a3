import type { Channel, RunResult } from '../simulation/result.ts';
import { fromSi, preferredUnit, type UnitPreferences, unitById } from '../units/convert.ts';

/** Traces as CSV (RFC 4180): one header row, CRLF line ends, fields quoted where they must be. The decimal sign is a point in
 *  every locale, so that any program reads the same numbers; units stand in the header, by the reader's choice of units. */

export interface CsvRun {
  readonly letter: string;
  readonly name: string;
  readonly run: RunResult;
}

const SIGNIFICANT = 8;

/** Rows of all given runs, one below the other, told apart by the first column. A channel that a run lacks is left empty. */
export function tracesToCsv(runs: readonly CsvRun[], preferences: UnitPreferences): string {
  const columns: Pick<Channel, 'address' | 'label' | 'quantity'>[] = [];
  const seen = new Set<string>();
  for (const { run } of runs) {
    for (const channel of run.channels) {
      if (seen.has(channel.address)) continue;
      seen.add(channel.address);
      columns.push(channel);
    }
  }
  const units = columns.map((column) => preferredUnit(column.quantity, preferences));
  const seconds = unitById('time', 's');
  const rows: string[] = [
    record(['Case', `Time [${seconds.symbol}]`, ...columns.map((column, k) => title(column.label, units[k]?.symbol ?? ''))]),
  ];
  for (const { letter, name, run } of runs) {
    const values = columns.map((column) => run.channels.find((channel) => channel.address === column.address)?.values ?? null);
    const head = name === '' ? letter : `${letter} ${name}`;
    for (let i = 0; i < run.times.length; i += 1) {
      rows.push(
        record([
          head,
          plain(run.times[i] as number),
          ...values.map((column, k) => (column ? plain(fromSi(column[i] as number, units[k] as (typeof units)[number])) : '')),
        ]),
      );
    }
  }
  return `${rows.join('\r\n')}\r\n`;
}

function title(label: string, unit: string): string {
  return unit === '' ? label : `${label} [${unit}]`;
}

function plain(value: number): string {
  return Number.isFinite(value) ? String(Number(value.toPrecision(SIGNIFICANT)) + 0) : '';
}

function record(fields: readonly string[]): string {
  return fields.map(field).join(',');
}

/** Words that a table program would take for a formula get an apostrophe in front. */
function field(text: string): string {
  const harmless = /^[=+\-@\t\r]/.test(text) && !/^-?\d/.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(harmless) ? `"${harmless.replaceAll('"', '""')}"` : harmless;
}
