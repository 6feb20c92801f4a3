import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { commandWords } from '#shared/duty/command-words.ts';
import { kindOf } from '#shared/kinds/registry.ts';
import type { UnitPreferences } from '#shared/units/convert.ts';
import { showIn, type TapeCase, type TapeModel } from './tape-model.ts';
import type { TapeFinding } from './tape-panel.tsx';

/** One line of the table that stands for the tape. */
export interface EventRow {
  readonly time: number;
  readonly letter: string;
  readonly words: string;
  readonly sort: 'command' | 'event' | 'finding';
}

/** Commands, events and findings of the shown cases, by time. */
export function eventRows(
  document: CircuitDocument,
  model: TapeModel,
  findings: readonly TapeFinding[],
  preferences: UnitPreferences,
): EventRow[] {
  const show = showIn(preferences);
  const rows: EventRow[] = document.duty.commands.map((command) => ({
    time: command.time,
    letter: '',
    words: commandWords(document, kindOf, command, show),
    sort: 'command',
  }));
  for (const entry of model.cases) rows.push(...caseRows(document, entry));
  for (const finding of findings) {
    const entry = model.cases.find((candidate) => candidate.id === finding.caseId);
    if (finding.time === undefined || !entry) continue;
    rows.push({ time: finding.time, letter: entry.pen.letter, words: `Finding ${finding.number}: ${finding.words}`, sort: 'finding' });
  }
  return rows.sort((a, b) => a.time - b.time);
}

function caseRows(document: CircuitDocument, entry: TapeCase): EventRow[] {
  return (entry.run?.events ?? [])
    .filter((event) => event.label !== '')
    .map((event) => {
      const name = document.components.find((component) => component.id === event.component)?.name;
      return { time: event.time, letter: entry.pen.letter, words: name ? `${name}: ${event.label}` : event.label, sort: 'event' as const };
    });
}
