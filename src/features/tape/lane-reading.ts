import { isStalledAt } from '#shared/pictures/tape-references.ts';
import { channelOf, valueAt } from '#shared/simulation/result.ts';
import type { UnitPreferences } from '#shared/units/convert.ts';
import { formatQuantity } from '#shared/units/format.ts';
import type { TapeCase, TapeLane } from './tape-model.ts';

export interface LaneReading {
  readonly value: string;
  readonly unit: string;
}

/** Reading of one case in one lane at a time. Below pull-out speed no load figure is shown, only "stalled" and the current. */
export function laneReading(entry: TapeCase, lane: TapeLane, time: number, preferences: UnitPreferences): LaneReading {
  const { run, stall } = entry;
  const channel = run && channelOf(run, lane.lane.address);
  if (!run || !channel || run.times.length === 0) return { value: '–', unit: '' };
  if (lane.lane.role === 'load' && stall && isStalledAt(stall, time)) {
    const current = channelOf(run, `${stall.motor}.current`);
    const amps = current ? valueAt(run.times, current.values, time) : stall.current;
    return { value: 'stalled', unit: amps === null ? '' : formatQuantity(amps, 'current', preferences, { digits: 0 }).text };
  }
  const formatted = formatQuantity(valueAt(run.times, channel.values, time), lane.lane.quantity, preferences);
  return { value: formatted.value, unit: lane.lane.role === 'load' ? '× rated' : formatted.unit };
}
