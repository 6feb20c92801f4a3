import { describe, expect, it } from 'vitest';
import { valueProblem } from '#shared/circuit/allowed-values.ts';
import { crowdedCircuit } from '#shared/circuit/samples/crowded.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { fluid, line, reservoir, supply } from '#shared/circuit/schema.ts';
import { quantities } from '#shared/units/quantities.ts';
import { fieldSpec, targetWord } from './field-specs.ts';

const groups = { fluid, reservoir, supply } as const;

describe('words and limits of fields', () => {
  it.each(Object.entries(groups))('cover every field of %s', (target, schema) => {
    for (const field of Object.keys(schema.shape)) expect(fieldSpec(demoCircuit, target, field)?.label).toBeTruthy();
  });
  it('cover everything a line may hold', () => {
    const id = demoCircuit.lines[0]?.id ?? '';
    for (const field of Object.keys(line.shape).filter((key) => !['id', 'from', 'to', 'route'].includes(key))) {
      expect(fieldSpec(demoCircuit, id, field)?.label, field).toBeTruthy();
    }
  });
  it.each(['fluid', 'reservoir', 'supply', 'site', 'duty'])('allow in %s exactly what the document allows', (target) => {
    const fields = [
      'temperature',
      'airFraction',
      'bulkModulus',
      'density',
      'volume',
      'coolingArea',
      'voltage',
      'frequency',
      'impedance',
      'altitude',
      'duration',
    ];
    for (const field of fields) {
      const spec = fieldSpec(demoCircuit, target, field);
      if (spec?.type !== 'number') continue;
      const span = spec.max - spec.min;
      expect(valueProblem(demoCircuit, 'a', target, field, spec.min), `${target}.${field} min`).toBeNull();
      expect(valueProblem(demoCircuit, 'a', target, field, spec.max), `${target}.${field} max`).toBeNull();
      expect(valueProblem(demoCircuit, 'a', target, field, spec.min - span * 1e-6), `${target}.${field} below`).not.toBeNull();
      expect(valueProblem(demoCircuit, 'a', target, field, spec.max + span * 1e-6), `${target}.${field} above`).not.toBeNull();
    }
  });
  it('name every change of every case in known words', () => {
    for (const document of [demoCircuit, crowdedCircuit]) {
      for (const change of document.cases.flatMap((entry) => entry.changes)) {
        const spec = fieldSpec(document, change.target, change.field);
        expect(spec, `${change.target}.${change.field}`).not.toBeNull();
        if (spec?.type === 'number') expect(quantities[spec.quantity]).toBeDefined();
        expect(targetWord(document, change.target)).not.toBe('');
      }
    }
  });
  it('know no field that does not exist', () => {
    expect(fieldSpec(demoCircuit, 'fluid', 'colour')).toBeNull();
    expect(fieldSpec(demoCircuit, 'P1', 'fault.nothing')).toBeNull();
    expect(fieldSpec(demoCircuit, 'nobody', 'length')).toBeNull();
  });
});
