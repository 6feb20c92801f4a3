import { describe, expect, it } from 'vitest';
import { quantities } from '../units/quantities.ts';
import type { ComponentKind, NumberParameter } from './kind.ts';
import { kindOf, kinds } from './registry.ts';
import { plateOf, rigOf, testRun } from './testing.ts';

function numbers(kind: ComponentKind): readonly NumberParameter[] {
  return kind.parameters.filter((spec): spec is NumberParameter => spec.type === 'number');
}

describe('registry', () => {
  it('knows every kind of this step by its id', () => {
    expect(kinds.map((kind) => kind.id)).toEqual([
      'electric-motor',
      'compensated-pump',
      'relief-valve',
      'check-valve',
      'directional-valve-4-3',
      'directional-valve-4-2',
      'throttle',
      'cylinder',
      'junction',
      'filter',
      'tank',
      'pressure-gauge',
      'flow-meter',
    ]);
    for (const kind of kinds) expect(kindOf(kind.id)).toBe(kind);
    expect(kindOf('windmill')).toBeUndefined();
  });

  for (const kind of kinds) {
    describe(kind.id, () => {
      it('has unique ids, and typical values inside what may be entered', () => {
        for (const list of [kind.parameters, kind.ports, kind.states, kind.inputs, kind.readings, kind.signals, kind.faults]) {
          const ids = list.map((entry) => entry.id);
          expect(new Set(ids).size, ids.join(' ')).toBe(ids.length);
        }
        for (const spec of numbers(kind)) {
          expect(quantities[spec.quantity], spec.id).toBeDefined();
          expect(spec.min, spec.id).toBeLessThan(spec.max);
          if (spec.initial !== null) {
            expect(spec.initial, spec.id).toBeGreaterThanOrEqual(spec.min);
            expect(spec.initial, spec.id).toBeLessThanOrEqual(spec.max);
          }
          if (spec.typicalRange && spec.initial !== null) {
            expect(spec.initial, spec.id).toBeGreaterThanOrEqual(spec.typicalRange[0]);
            expect(spec.initial, spec.id).toBeLessThanOrEqual(spec.typicalRange[1]);
          }
          expect(spec.initial === null, spec.id).toBe(
            spec.group === 'raw' || spec.rating !== undefined ? spec.initial === null : spec.id === 'requiredForce',
          );
          expect(spec.help.length, spec.id).toBeGreaterThan(4);
          expect(spec.source.length, spec.id).toBeGreaterThan(4);
        }
        for (const spec of kind.parameters) {
          if (spec.type === 'choice') expect(spec.choices.map((choice) => choice.value)).toContain(spec.initial);
        }
      });

      it('refers only to what it has', () => {
        const parameters = kind.parameters.map((spec) => spec.id);
        const readings = kind.readings.map((reading) => reading.id);
        const ports = kind.ports.map((port) => port.id);
        const refs = [...ports, ...kind.states.map((state) => `state:${state.id}`)];
        for (const [row, column] of kind.entries) {
          expect(refs).toContain(row);
          expect(refs).toContain(column);
        }
        for (const screw of kind.screws) {
          for (const id of [screw.id, screw.perTurn, screw.least, screw.most]) expect(parameters).toContain(id);
          expect(kind.inputs.map((input) => input.id)).toContain(screw.id);
        }
        for (const spec of numbers(kind)) {
          if (spec.rating) expect([...readings, ...ports.map((id) => `${id}.pressure`)]).toContain(spec.rating.of);
        }
        const known = [...parameters, ...readings, ...kind.inputs.map((input) => input.id), ...ports.map((id) => `${id}.pressure`)];
        for (const reading of kind.readings) {
          for (const id of reading.explain.inputs) expect(known, `${reading.id} ← ${id}`).toContain(id);
          expect(reading.explain.equation.length).toBeGreaterThan(2);
          expect(reading.explain.source.length).toBeGreaterThan(4);
        }
        for (const trip of kind.trips) {
          expect(kind.signals.map((signal) => signal.id)).toContain(trip.signal);
          expect(kind.inputs.map((input) => input.id)).toContain(trip.input);
        }
        for (const [from, to] of kind.passes) {
          expect(ports).toContain(from);
          expect(ports).toContain(to);
        }
        const inputs = [...kind.inputs.map((input) => input.id), ...kind.faults.map((fault) => fault.id)];
        expect(new Set(inputs).size).toBe(inputs.length);
      });

      it('prepares every coefficient from typical values and is finite at rest', () => {
        const coefficients = kind.prepare(plateOf(kind), testRun);
        expect(Object.keys(coefficients).sort()).toEqual([...kind.coefficients].sort());
        for (const [name, value] of Object.entries(coefficients)) expect(Number.isFinite(value), name).toBe(true);
        const rig = rigOf(kind);
        kind.jacobian(rig.block, rig.w);
        for (const list of [rig.w.balance, rig.w.dy, rig.w.volume, rig.w.jac]) expect([...list].every(Number.isFinite)).toBe(true);
        for (const reading of kind.readings) expect(Number.isFinite(rig.reading(reading.id)), reading.id).toBe(true);
        for (const signal of kind.signals) expect(Number.isFinite(rig.signal(signal.id)), signal.id).toBe(true);
        for (const input of kind.inputs) {
          const rest = input.rest(plateOf(kind), testRun);
          expect(rest).toBeGreaterThanOrEqual(input.min);
          expect(rest).toBeLessThanOrEqual(input.max);
        }
        expect(kind.checks?.(plateOf(kind)) ?? []).toEqual([]);
      });
    });
  }
});
