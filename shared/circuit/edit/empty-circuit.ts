import { type CircuitDocument, DOCUMENT_FORMAT, DOCUMENT_VERSION } from '../schema.ts';

/** A sheet with nothing on it: mineral oil VG 46 at 40 °C with half a per cent of free air, a 120 L tank, 400 V 50 Hz. */
export function emptyCircuit(title = 'Untitled circuit'): CircuitDocument {
  return {
    format: DOCUMENT_FORMAT,
    version: DOCUMENT_VERSION,
    title,
    fluid: { grade: 'VG 46', temperature: 313.15, airFraction: 0.005, bulkModulus: 1.7e9, density: 870 },
    reservoir: { volume: 0.12, temperature: 313.15, coolingArea: 1.2 },
    supply: { voltage: 400, frequency: 50, impedance: 0 },
    site: { altitude: 0 },
    components: [],
    lines: [],
    shafts: [],
    duty: { duration: 5, repeat: true, commands: [] },
    requirements: [],
    cases: [{ id: 'a', name: 'As found', ink: 0, changes: [] }],
    tagPlaces: {},
    labels: [],
    notes: [],
  };
}
