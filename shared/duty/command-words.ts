import { type DutyCommand, type DutyDocument, inOrder, type KindOf, type Show, targetInput } from './duty.ts';

/** Words of one command for a flag: the person's own label where there is one, otherwise words made from what it does. */
export function commandWords(document: DutyDocument, kindOf: KindOf, command: DutyCommand, show: Show): string {
  return command.label.trim() === '' ? madeWords(document, kindOf, command, show) : command.label.trim();
}

/** Words made from target, input and value alone: 'Start', 'Solenoid a on', 'Supply dips to 340 V', 'Load 20 kN'. */
export function madeWords(document: DutyDocument, kindOf: KindOf, command: DutyCommand, show: Show): string {
  const input = targetInput(document, kindOf, command.target, command.input);
  if (command.target === 'supply') return supplyWords(document, command, show);
  const component = document.components.find((entry) => entry.id === command.target);
  const name = component?.name ?? command.target;
  if (!input) return `${name} ${command.input} ${command.value}`;
  const alike = component ? document.components.filter((entry) => entry.kind === component.kind).length > 1 : false;
  const named = (words: string) => (alike ? `${name}: ${words}` : capital(words));
  const word = input.words.find((entry) => Math.abs(entry.value - command.value) < 1e-9);
  if (word) return named(word.label);
  if (command.input === 'contactor') return named(command.value >= 0.5 ? 'start' : 'stop');
  if (input.role === 'fault') return faultWords(name, input.label, command.value, show);
  return named(`${lower(input.label)} ${show(command.value, input.quantity)}`);
}

function faultWords(name: string, label: string, severity: number, show: Show): string {
  if (severity <= 0) return `${name} ${lower(label)} ends`;
  return severity < 1 ? `${name} ${lower(label)} ${show(severity, 'fraction')}` : `${name} ${lower(label)}`;
}

function supplyWords(document: DutyDocument, command: DutyCommand, show: Show): string {
  const quantity = command.input === 'frequency' ? 'frequency' : 'voltage';
  const nominal = quantity === 'frequency' ? document.supply.frequency : document.supply.voltage;
  let before = nominal;
  for (const other of inOrder(document.duty.commands)) {
    if (other.id === command.id) break;
    if (other.target === 'supply' && other.input === command.input) before = other.value;
  }
  const value = show(command.value, quantity);
  if (quantity === 'voltage' && command.value <= 0) return 'Supply lost';
  if (command.value < before) return `Supply dips to ${value}`;
  if (command.value > before) return command.value === nominal ? `Supply back to ${value}` : `Supply rises to ${value}`;
  return `Supply ${value}`;
}

/** The same words cut down for narrow tapes: 'Solenoid a on' → 'a on'. */
export function shortWords(words: string): string {
  return words.replace(/^Solenoid /, '').replace(/^Supply (dips|rises|back) to /, '');
}

function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** Lower-cases the first letter unless the word is an abbreviation ('RMS'). */
function lower(words: string): string {
  return /^[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words;
}
