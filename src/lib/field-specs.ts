import { findComponent, findKind, findParameter, nameInWords } from '#shared/circuit/kind-lookup.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { ChoiceParameter, NumberParameter } from '#shared/kinds/kind.ts';

/** What every value that can be edited is called, measured in and allowed to be: parameters of parts, their faults, and the
 *  data that belong to the whole circuit. One table, so that plates, differences and explanations use the same words. */
export type FieldSpec = NumberParameter | ChoiceParameter;

function number(spec: Omit<NumberParameter, 'type' | 'group' | 'initial' | 'source'> & { source?: string }): NumberParameter {
  return { type: 'number', group: 'plate', initial: null, source: 'entered here', ...spec };
}

const circuitFields: Record<string, Record<string, FieldSpec>> = {
  fluid: {
    grade: {
      type: 'choice',
      id: 'grade',
      label: 'Oil grade',
      group: 'plate',
      choices: ['VG 22', 'VG 32', 'VG 46', 'VG 68'].map((value) => ({ value, label: `ISO ${value}` })),
      initial: 'VG 46',
      help: 'Viscosity class of the oil: its kinematic viscosity at 40 °C in mm²/s. Leakage falls and viscous drag rises with it.',
      source: 'ISO 3448 viscosity classes',
    },
    temperature: number({
      id: 'temperature',
      label: 'Oil temperature',
      quantity: 'temperature',
      min: 233.15,
      max: 393.15,
      help: 'Temperature the run is calculated at; it decides the viscosity.',
      equation: 'log10 log10(ν + 0.7) = A − B·log10 T, through the grade’s two points',
    }),
    airFraction: number({
      id: 'airFraction',
      label: 'Free air in the oil',
      quantity: 'fraction',
      min: 0,
      max: 0.2,
      typicalRange: [0.002, 0.02],
      help: 'Undissolved air by volume at atmospheric pressure. It softens the oil most at low pressure.',
      equation: '1/K = 1/K_oil + air share × compressibility of the air at this pressure',
    }),
    bulkModulus: number({
      id: 'bulkModulus',
      label: 'Bulk modulus of clean oil',
      quantity: 'modulus',
      min: 1e8,
      max: 5e9,
      typicalRange: [1.4e9, 2e9],
      help: 'Stiffness of the oil without air.',
      equation: 'dp/dt = K/V · (ΣQ − dV/dt)',
    }),
    density: number({
      id: 'density',
      label: 'Oil density',
      quantity: 'density',
      min: 700,
      max: 1200,
      typicalRange: [850, 900],
      help: 'Used by orifices, valves and pipe losses.',
    }),
  },
  reservoir: {
    volume: number({
      id: 'volume',
      label: 'Oil in the tank',
      quantity: 'volume',
      min: 0,
      max: 100,
      help: 'Oil volume of the tank. All tank symbols share it.',
    }),
    temperature: number({
      id: 'temperature',
      label: 'Tank temperature',
      quantity: 'temperature',
      min: 233.15,
      max: 393.15,
      help: 'Temperature of the oil in the tank at the start.',
    }),
    coolingArea: number({
      id: 'coolingArea',
      label: 'Cooling area of the tank',
      quantity: 'area',
      min: 0,
      max: 1000,
      help: 'Wetted wall area that gives heat to the air.',
    }),
  },
  supply: {
    voltage: number({
      id: 'voltage',
      label: 'Supply voltage',
      quantity: 'voltage',
      min: 0,
      max: 1000,
      help: 'Line voltage with no load on it.',
      equation: 'torque ∝ (V/V_nameplate)²',
    }),
    frequency: number({
      id: 'frequency',
      label: 'Supply frequency',
      quantity: 'frequency',
      min: 10,
      max: 100,
      help: 'Sets the synchronous speed: 120 × frequency ÷ poles.',
    }),
    impedance: number({
      id: 'impedance',
      label: 'Supply impedance per phase',
      quantity: 'resistance',
      min: 0,
      max: 20,
      help: 'Series impedance of transformer and cable; it lets the voltage sag under current. Two readings give it: 400 V idle and 346 V at 31 A make 1.0 Ω.',
      equation: 'V_terminal = V_no load − √3 · Z · I',
    }),
  },
  site: {
    altitude: number({
      id: 'altitude',
      label: 'Altitude of the site',
      quantity: 'length',
      min: -500,
      max: 6000,
      help: 'Sets the atmospheric pressure, and with it what is left at the pump’s inlet.',
    }),
  },
  duty: {
    duration: number({
      id: 'duration',
      label: 'Duration',
      quantity: 'time',
      min: 0.05,
      max: 3600,
      help: 'Length of one cycle of the duty.',
    }),
  },
};

const lineFields: Record<string, FieldSpec> = {
  length: number({
    id: 'length',
    label: 'Length',
    quantity: 'length',
    min: 0,
    max: 1000,
    help: 'Length of the line; with the bore it gives the oil volume and the loss.',
  }),
  bore: number({ id: 'bore', label: 'Bore', quantity: 'length', min: 1e-4, max: 1, help: 'Inside diameter.' }),
  wall: number({
    id: 'wall',
    label: 'Wall thickness',
    quantity: 'length',
    min: 1e-5,
    max: 0.1,
    help: 'With it the pipe’s own give is added to the oil’s.',
  }),
  volume: number({ id: 'volume', label: 'Oil volume', quantity: 'volume', min: 0, max: 10, help: 'Instead of length × bore area.' }),
  laminar: number({
    id: 'laminar',
    label: 'Laminar loss',
    quantity: 'laminarLoss',
    min: 0,
    max: 1e15,
    help: 'Raw coefficient instead of the one from length, bore and viscosity.',
    equation: 'Δp = R·Q + k·Q·|Q|',
  }),
  quadratic: number({
    id: 'quadratic',
    label: 'Quadratic loss',
    quantity: 'quadraticLoss',
    min: 0,
    max: 1e20,
    help: 'Raw coefficient instead of the one from length and bore.',
    equation: 'Δp = R·Q + k·Q·|Q|',
  }),
  loss: {
    type: 'choice',
    id: 'loss',
    label: 'Pressure loss',
    group: 'plate',
    choices: [
      { value: '0', label: 'left out' },
      { value: '1', label: 'calculated' },
    ],
    initial: '0',
    help: 'Calculated: the line separates two nets with a laminar and a quadratic loss between them.',
    source: 'entered here',
  },
};

/** Words and limits of one field, or null when there is no such field. */
export function fieldSpec(document: CircuitDocument, target: string, field: string): FieldSpec | null {
  const component = findComponent(document, target);
  if (component) {
    const kind = findKind(component.kind);
    if (!kind) return null;
    if (!field.startsWith('fault.')) return findParameter(kind, field) ?? null;
    const fault = kind.faults.find((entry) => `fault.${entry.id}` === field);
    return fault
      ? {
          type: 'number',
          id: field,
          label: fault.label,
          quantity: 'fraction',
          group: 'detail',
          min: 0,
          max: 1,
          initial: 0,
          help: fault.help,
          source: 'entered here',
        }
      : null;
  }
  if (target === 'duty' && field.startsWith('command.')) return commandField(document, field);
  if (circuitFields[target]) return circuitFields[target][field] ?? null;
  return document.lines.some((line) => line.id === target) ? (lineFields[field] ?? null) : null;
}

function commandField(document: CircuitDocument, field: string): FieldSpec | null {
  const [, id, part] = field.split('.');
  const command = document.duty.commands.find((entry) => entry.id === id);
  if (!command) return null;
  const name = command.label || id;
  if (part === 'time' || part === 'ramp')
    return number({
      id: field,
      label: `${part === 'time' ? 'Time' : 'Ramp'} of "${name}"`,
      quantity: 'time',
      min: 0,
      max: 3600,
      help: 'A command of the duty.',
    });
  const input = findKind(findComponent(document, command.target)?.kind ?? '')?.inputs.find((entry) => entry.id === command.input);
  return number({
    id: field,
    label: `Value of "${name}"`,
    quantity: input?.quantity ?? (command.input === 'frequency' ? 'frequency' : command.input === 'voltage' ? 'voltage' : 'number'),
    min: input?.min ?? -1e12,
    max: input?.max ?? 1e12,
    help: 'A command of the duty.',
  });
}

const targetWords: Record<string, string> = { fluid: 'Fluid', reservoir: 'Tank', supply: 'Supply', site: 'Site', duty: 'Duty' };

/** "Pump P1", "Supply", "Line L3". */
export function targetWord(document: CircuitDocument, target: string): string {
  const component = findComponent(document, target);
  if (component) return nameInWords(component);
  return targetWords[target] ?? `Line ${target}`;
}
