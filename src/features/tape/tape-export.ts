import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { commandWords } from '#shared/duty/command-words.ts';
import { kindOf } from '#shared/kinds/registry.ts';
import { pictureToSvg } from '#shared/pictures/svg.ts';
import { tapePicture } from '#shared/pictures/tape.ts';
import type { UnitPreferences } from '#shared/units/convert.ts';
import { formatQuantity } from '#shared/units/format.ts';
import { showIn, type TapeCase, type TapeModel } from './tape-model.ts';

/** The tape on white ground in the light colours, as one SVG file. */
export function tapeSvg(document: CircuitDocument, model: TapeModel, preferences: UnitPreferences): string {
  const show = showIn(preferences);
  const picture = tapePicture({
    title: document.title,
    duration: model.duration,
    commands: document.duty.commands.map((command) => ({ time: command.time, words: commandWords(document, kindOf, command, show) })),
    cases: model.cases.map((entry) => ({ letter: entry.pen.letter, name: entry.name, pen: entry.pen })),
    lanes: model.lanes.map((lane) => ({
      title: lane.lane.title,
      unit: lane.lane.role === 'load' ? { ...lane.unit, symbol: '× rated' } : lane.unit,
      low: lane.low,
      high: lane.high,
      references: lane.references,
      traces: lane.traces.map((trace) => {
        const entry = model.cases[trace.caseIndex] as TapeCase;
        const stopped = trace.stalled && lane.lane.role === 'load';
        return {
          pen: entry.pen,
          times: trace.times,
          values: trace.values,
          stretches: trace.stretches,
          ...(stopped ? { words: stallWords(entry, preferences) } : {}),
        };
      }),
    })),
    preferences,
  });
  return pictureToSvg(picture, 'light', { ground: 'white' });
}

/** 'stalled, 60 A', or 'stalled' where the current is not known. */
export function stallWords(entry: TapeCase, preferences: UnitPreferences): string {
  const current = entry.stall?.current ?? null;
  return current === null ? 'stalled' : `stalled, ${formatQuantity(current, 'current', preferences, { digits: 0 }).text}`;
}
