import type { InputSpec } from '../kinds/kind.ts';
import type { DutyComponent, DutyDocument, KindOf } from './duty.ts';

/** A new flag that may be put on the tape: everything a command needs but its time. */
export interface CommandOffer {
  readonly id: string;
  readonly words: string;
  readonly target: string;
  readonly input: string;
  readonly value: number;
  readonly ramp: number;
}
export interface OfferGroup {
  readonly title: string;
  readonly offers: readonly CommandOffer[];
}

/** Share of nominal voltage offered for a supply dip: the lower edge at which a plate rating still applies is 90 %;
 *  85 % is a dip that a person will want to see (common practice, no source). */
const DIP = 0.85;

/** What may be added, in the order in which it is usually wanted: commands, load, supply, settings, faults. */
export function offeredCommands(document: DutyDocument, kindOf: KindOf): OfferGroup[] {
  const commands: CommandOffer[] = [];
  const loads: CommandOffer[] = [];
  const settings: CommandOffer[] = [];
  const faults: CommandOffer[] = [];
  let motors = 0;
  for (const component of document.components) {
    const kind = kindOf(component.kind);
    if (!kind) continue;
    for (const input of kind.inputs) {
      if (input.id === 'contactor') motors += 1;
      if (input.id === 'supplyVoltage' || input.id === 'supplyFrequency') continue;
      const list = input.role === 'command' ? commands : input.role === 'load' ? loads : input.role === 'fault' ? faults : settings;
      list.push(...inputOffers(component, input));
    }
    for (const fault of kind.faults) {
      faults.push(offer(component.id, `fault.${fault.id}`, 1, 0, `${component.name}: ${lower(fault.label)}`));
    }
  }
  const supply =
    motors > 0
      ? [
          offer('supply', 'voltage', Math.round(document.supply.voltage * DIP), 0.02, 'Supply dips'),
          offer('supply', 'voltage', document.supply.voltage, 0.02, 'Supply back to nominal'),
          offer('supply', 'voltage', 0, 0, 'Supply lost'),
        ]
      : [];
  return [
    { title: 'Commands', offers: commands },
    { title: 'Load', offers: loads },
    { title: 'Supply', offers: supply },
    { title: 'Settings', offers: settings },
    { title: 'Fault onset', offers: faults },
  ].filter((group) => group.offers.length > 0);
}

function inputOffers(component: DutyComponent, input: InputSpec): CommandOffer[] {
  if (input.words && input.words.length > 0) {
    return input.words.map((word) => offer(component.id, input.id, word.value, input.ramp, `${component.name}: ${word.label}`));
  }
  if (input.id === 'contactor') {
    return [
      offer(component.id, input.id, 1, input.ramp, `${component.name}: start`),
      offer(component.id, input.id, 0, input.ramp, `${component.name}: stop`),
    ];
  }
  const value = Number.isFinite(input.min) && input.min > 0 ? input.min : 0;
  return [offer(component.id, input.id, value, input.ramp, `${component.name}: ${lower(input.label)}`)];
}

function offer(target: string, input: string, value: number, ramp: number, words: string): CommandOffer {
  return {
    id: `${target}.${input}.${value}`,
    words,
    target,
    input,
    value,
    ramp,
  };
}

function lower(words: string): string {
  return /^[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words;
}
