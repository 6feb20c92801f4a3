import type { QuantityId } from '../units/quantities.ts';
import type { Figure, Phrase } from './finding.ts';

/** Figures and sentences of findings. Values SI. */

export function figure(value: number, quantity: QuantityId, extra: Partial<Omit<Figure, 'value' | 'quantity'>> = {}): Figure {
  return { value, quantity, ...extra };
}

export const pressure = (value: number, address?: string): Figure => figure(value, 'pressure', address ? { address } : {});
export const flow = (value: number, address?: string): Figure => figure(value, 'flow', address ? { address } : {});
export const force = (value: number, address?: string): Figure => figure(value, 'force', { digits: 0, ...(address ? { address } : {}) });
export const current = (value: number, address?: string): Figure => figure(value, 'current', address ? { address } : {});
export const torque = (value: number, address?: string): Figure => figure(value, 'torque', address ? { address } : {});
export const displacement = (value: number, address?: string): Figure => figure(value, 'displacement', address ? { address } : {});
export const heat = (value: number): Figure => figure(value, 'power', { digits: 1 });
export const share = (value: number): Figure => figure(value, 'fraction', { digits: 0 });
/** A margin: never rounded up. */
export const margin = (value: number): Figure => figure(value, 'number', { digits: 2, rounding: 'down' });
/** A multiple, such as torque × rated. */
export const multiple = (value: number): Figure => figure(value, 'ratio', { digits: 2 });
export const moment = (value: number): Figure => figure(value, 'time', { digits: 1 });

/** A length of time in words: '2.9 s', 'about 4 min', 'about 2 h'. */
export function span(seconds: number): Phrase {
  if (seconds < 90) return [figure(seconds, 'time', { digits: seconds < 20 ? 1 : 0 })];
  if (seconds < 5400) return [`about ${Math.max(2, Math.round(seconds / 60))} min`];
  return [`about ${Math.round(seconds / 360) / 10} h`];
}

/** Joins parts into one phrase, neighbouring strings merged. */
export function say(...parts: readonly (string | Figure | Phrase)[]): Phrase {
  const out: (string | Figure)[] = [];
  const add = (part: string | Figure) => {
    const last = out[out.length - 1];
    if (typeof part === 'string' && typeof last === 'string') out[out.length - 1] = last + part;
    else out.push(part);
  };
  for (const part of parts) {
    if (typeof part === 'string' || 'quantity' in part) add(part as string | Figure);
    else for (const inner of part as Phrase) add(inner);
  }
  return out;
}
