import { type DutyCommand, inOrder } from './duty.ts';

/** One stretch of the duty between two commands [s]. */
export interface DutyPhase {
  readonly label: string;
  readonly from: number;
  readonly to: number;
}

/** Commands closer than this count as given together [s]. */
const TOGETHER = 1e-6;

/** Stretches between commands, in order, without gaps from 0 to the duration. Commands given together share one phase
 *  and their words are joined by a comma; commands at or after the end make no phase. */
export function dutyPhases(
  duty: {
    readonly duration: number;
    readonly commands: readonly DutyCommand[];
  },
  words: (command: DutyCommand) => string,
): DutyPhase[] {
  const starts: { time: number; label: string }[] = [];
  for (const command of inOrder(duty.commands)) {
    if (command.time >= duty.duration) break;
    const last = starts[starts.length - 1];
    if (last && command.time - last.time <= TOGETHER) last.label = `${last.label}, ${words(command)}`;
    else starts.push({ time: command.time, label: words(command) });
  }
  if (starts.length === 0 || (starts[0] as { time: number }).time > TOGETHER) starts.unshift({ time: 0, label: 'At rest' });
  return starts.map((start, index) => ({
    label: start.label,
    from: start.time,
    to: starts[index + 1]?.time ?? duty.duration,
  }));
}
