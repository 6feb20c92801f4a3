/** Quantities and the units people read and type them in.
 *  Everything stored or computed is in the SI base unit of its quantity (temperatures in kelvin, pressures in Pa gauge,
 *  displacement in m³/rad). `factor` and `offset` give: SI value = shown value × factor + offset.
 *  Sources: exact definitions of the inch, pound, pound-force and US gallon (NIST SI guide, appendix B.8). */

/** One way of showing a quantity. */
export interface Unit {
  /** Permanent id, also the main suffix a person may type. */
  readonly id: string;
  /** How it is printed after a thin space. */
  readonly symbol: string;
  readonly factor: number;
  readonly offset: number;
  /** Further suffixes accepted when typed (lower case, without spaces). */
  readonly aliases: readonly string[];
  /** Digits after the decimal sign in a reading. */
  readonly decimals: number;
}

export interface Quantity {
  readonly id: string;
  readonly label: string;
  readonly units: readonly Unit[];
  /** Unit ids of the two systems. */
  readonly si: string;
  readonly us: string;
}

function unit(id: string, symbol: string, factor: number, decimals: number, aliases: readonly string[] = [], offset = 0): Unit {
  return { id, symbol, factor, offset, aliases, decimals };
}

const INCH = 0.0254;
const POUND_FORCE = 4.4482216152605;
const POUND = 0.45359237;
const PSI = POUND_FORCE / (INCH * INCH);
const GALLON = 231 * INCH ** 3;
const TURN = 2 * Math.PI;
const HORSEPOWER = 550 * 0.3048 * POUND_FORCE;

export const quantities = {
  pressure: {
    id: 'pressure',
    label: 'Pressure',
    si: 'bar',
    us: 'psi',
    units: [
      unit('bar', 'bar', 1e5, 0),
      unit('psi', 'psi', PSI, 0, ['lbf/in2', 'psig']),
      unit('MPa', 'MPa', 1e6, 1, ['mpa']),
      unit('kPa', 'kPa', 1e3, 0, ['kpa']),
      unit('Pa', 'Pa', 1, 0, ['pa']),
    ],
  },
  flow: {
    id: 'flow',
    label: 'Flow',
    si: 'L/min',
    us: 'gpm',
    units: [
      unit('L/min', 'L/min', 1e-3 / 60, 1, ['l/min', 'lpm', 'lmin']),
      unit('gpm', 'gpm', GALLON / 60, 1, ['usgpm', 'gal/min']),
      unit('cm3/s', 'cm³/s', 1e-6, 0, ['cc/s', 'cm³/s']),
      unit('m3/s', 'm³/s', 1, 6, ['m³/s']),
    ],
  },
  displacement: {
    id: 'displacement',
    label: 'Displacement',
    si: 'cm3/rev',
    us: 'in3/rev',
    units: [
      unit('cm3/rev', 'cm³/rev', 1e-6 / TURN, 1, ['cm³/rev', 'cc/rev', 'cm3', 'cc', 'cm³', 'ccm']),
      unit('in3/rev', 'in³/rev', INCH ** 3 / TURN, 2, ['in³/rev', 'cir', 'in3', 'in³', 'cu in/rev']),
    ],
  },
  speed: {
    id: 'speed',
    label: 'Shaft speed',
    si: 'rpm',
    us: 'rpm',
    units: [unit('rpm', 'rpm', TURN / 60, 0, ['1/min', 'r/min', 'rev/min', 'min-1']), unit('rad/s', 'rad/s', 1, 1)],
  },
  torque: {
    id: 'torque',
    label: 'Torque',
    si: 'N.m',
    us: 'lbf.ft',
    units: [
      unit('N.m', 'N·m', 1, 1, ['nm', 'n·m', 'n.m', 'n m']),
      unit('lbf.ft', 'lbf·ft', POUND_FORCE * 0.3048, 1, ['lbft', 'lb-ft', 'lb·ft', 'ft·lbf', 'ftlb', 'lbf·ft', 'ft-lb']),
      unit('lbf.in', 'lbf·in', POUND_FORCE * INCH, 0, ['inlb', 'in-lb', 'lbf·in']),
    ],
  },
  power: {
    id: 'power',
    label: 'Power',
    si: 'kW',
    us: 'hp',
    units: [unit('kW', 'kW', 1e3, 2, ['kw']), unit('hp', 'hp', HORSEPOWER, 1, []), unit('W', 'W', 1, 0, ['w'])],
  },
  energy: { id: 'energy', label: 'Energy', si: 'kJ', us: 'kJ', units: [unit('kJ', 'kJ', 1e3, 1, ['kj']), unit('J', 'J', 1, 0, ['j'])] },
  force: {
    id: 'force',
    label: 'Force',
    si: 'kN',
    us: 'lbf',
    units: [
      unit('kN', 'kN', 1e3, 1, ['kn']),
      unit('N', 'N', 1, 0, ['n']),
      unit('lbf', 'lbf', POUND_FORCE, 0, ['lb', 'lbs']),
      unit('kip', 'kip', 1e3 * POUND_FORCE, 2, ['klbf']),
    ],
  },
  length: {
    id: 'length',
    label: 'Length',
    si: 'mm',
    us: 'in',
    units: [
      unit('mm', 'mm', 1e-3, 0),
      unit('in', 'in', INCH, 2, ['"', 'inch', 'inches']),
      unit('m', 'm', 1, 2),
      unit('ft', 'ft', 0.3048, 2, ["'", 'feet']),
      unit('cm', 'cm', 1e-2, 1),
    ],
  },
  velocity: {
    id: 'velocity',
    label: 'Rod speed',
    si: 'mm/s',
    us: 'in/s',
    units: [
      unit('mm/s', 'mm/s', 1e-3, 0),
      unit('in/s', 'in/s', INCH, 1, ['ips']),
      unit('m/s', 'm/s', 1, 2),
      unit('ft/s', 'ft/s', 0.3048, 2),
    ],
  },
  volume: {
    id: 'volume',
    label: 'Volume',
    si: 'L',
    us: 'gal',
    units: [
      unit('L', 'L', 1e-3, 2, ['l', 'litre', 'liter']),
      unit('gal', 'gal', GALLON, 2, ['usgal']),
      unit('cm3', 'cm³', 1e-6, 1, ['cc', 'cm³', 'ml']),
      unit('in3', 'in³', INCH ** 3, 1, ['in³', 'cu in']),
    ],
  },
  area: {
    id: 'area',
    label: 'Area',
    si: 'm2',
    us: 'ft2',
    units: [
      unit('m2', 'm²', 1, 2, ['m²']),
      unit('cm2', 'cm²', 1e-4, 2, ['cm²']),
      unit('in2', 'in²', INCH ** 2, 2, ['in²']),
      unit('ft2', 'ft²', 0.3048 ** 2, 1, ['ft²']),
    ],
  },
  mass: {
    id: 'mass',
    label: 'Mass',
    si: 'kg',
    us: 'lb',
    units: [unit('kg', 'kg', 1, 0), unit('lb', 'lb', POUND, 0, ['lbs']), unit('t', 't', 1e3, 2)],
  },
  inertia: {
    id: 'inertia',
    label: 'Inertia',
    si: 'kg.m2',
    us: 'lb.ft2',
    units: [
      unit('kg.m2', 'kg·m²', 1, 4, ['kgm2', 'kg·m²', 'kgm²']),
      unit('lb.ft2', 'lb·ft²', POUND * 0.3048 ** 2, 3, ['lbft2', 'lb·ft²', 'wk2']),
    ],
  },
  time: {
    id: 'time',
    label: 'Time',
    si: 's',
    us: 's',
    units: [unit('s', 's', 1, 2, ['sec']), unit('ms', 'ms', 1e-3, 0), unit('min', 'min', 60, 1), unit('h', 'h', 3600, 2)],
  },
  temperature: {
    id: 'temperature',
    label: 'Temperature',
    si: 'degC',
    us: 'degF',
    units: [
      unit('degC', '°C', 1, 0, ['c', '°c'], 273.15),
      unit('degF', '°F', 5 / 9, 0, ['f', '°f'], 273.15 - (32 * 5) / 9),
      unit('K', 'K', 1, 1, ['k']),
    ],
  },
  voltage: { id: 'voltage', label: 'Voltage', si: 'V', us: 'V', units: [unit('V', 'V', 1, 0, ['v', 'volt', 'volts'])] },
  current: { id: 'current', label: 'Current', si: 'A', us: 'A', units: [unit('A', 'A', 1, 1, ['a', 'amp', 'amps'])] },
  frequency: { id: 'frequency', label: 'Frequency', si: 'Hz', us: 'Hz', units: [unit('Hz', 'Hz', 1, 0, ['hz'])] },
  resistance: { id: 'resistance', label: 'Impedance', si: 'ohm', us: 'ohm', units: [unit('ohm', 'Ω', 1, 2, ['ω', 'ohms'])] },
  fraction: { id: 'fraction', label: 'Share', si: '%', us: '%', units: [unit('%', '%', 0.01, 0, ['percent', 'pct'])] },
  ratio: { id: 'ratio', label: 'Ratio', si: 'x', us: 'x', units: [unit('x', '×', 1, 2, ['×'])] },
  turns: { id: 'turns', label: 'Turns', si: 'turns', us: 'turns', units: [unit('turns', 'turns', 1, 2, ['turn'])] },
  angle: {
    id: 'angle',
    label: 'Angle',
    si: 'deg',
    us: 'deg',
    units: [unit('deg', '°', Math.PI / 180, 0, ['°', 'degrees']), unit('rad', 'rad', 1, 3)],
  },
  viscosity: {
    id: 'viscosity',
    label: 'Kinematic viscosity',
    si: 'cSt',
    us: 'cSt',
    units: [unit('cSt', 'cSt', 1e-6, 1, ['cst', 'mm2/s', 'mm²/s']), unit('m2/s', 'm²/s', 1, 8)],
  },
  dynamicViscosity: {
    id: 'dynamicViscosity',
    label: 'Dynamic viscosity',
    si: 'mPa.s',
    us: 'mPa.s',
    units: [unit('mPa.s', 'mPa·s', 1e-3, 1, ['mpas', 'cp', 'mpa·s']), unit('Pa.s', 'Pa·s', 1, 4, ['pas'])],
  },
  density: {
    id: 'density',
    label: 'Density',
    si: 'kg/m3',
    us: 'lb/ft3',
    units: [unit('kg/m3', 'kg/m³', 1, 0, ['kg/m³']), unit('lb/ft3', 'lb/ft³', POUND / 0.3048 ** 3, 1, ['lb/ft³'])],
  },
  modulus: {
    id: 'modulus',
    label: 'Bulk modulus',
    si: 'GPa',
    us: 'kpsi',
    units: [unit('GPa', 'GPa', 1e9, 2, ['gpa']), unit('kpsi', 'kpsi', 1e3 * PSI, 0, ['ksi']), unit('MPa', 'MPa', 1e6, 0, ['mpa'])],
  },
  pressurePerTurn: {
    id: 'pressurePerTurn',
    label: 'Pressure per turn',
    si: 'bar/turn',
    us: 'psi/turn',
    units: [unit('bar/turn', 'bar/turn', 1e5, 1), unit('psi/turn', 'psi/turn', PSI, 0)],
  },
  displacementPerTurn: {
    id: 'displacementPerTurn',
    label: 'Displacement per turn',
    si: 'cm3/rev/turn',
    us: 'in3/rev/turn',
    units: [unit('cm3/rev/turn', 'cm³/rev per turn', 1e-6 / TURN, 1), unit('in3/rev/turn', 'in³/rev per turn', INCH ** 3 / TURN, 2)],
  },
  leakage: {
    id: 'leakage',
    label: 'Leakage',
    si: 'L/min/bar',
    us: 'gpm/kpsi',
    units: [unit('L/min/bar', 'L/min per bar', 1e-3 / 60 / 1e5, 4), unit('gpm/kpsi', 'gpm per 1000 psi', GALLON / 60 / (1e3 * PSI), 3)],
  },
  viscousDrag: { id: 'viscousDrag', label: 'Viscous drag', si: 'N.m.s', us: 'N.m.s', units: [unit('N.m.s', 'N·m·s', 1, 4)] },
  damping: {
    id: 'damping',
    label: 'Viscous friction',
    si: 'N.s/m',
    us: 'lbf.s/in',
    units: [unit('N.s/m', 'N·s/m', 1, 0), unit('lbf.s/in', 'lbf·s/in', POUND_FORCE / INCH, 2)],
  },
  stiffness: {
    id: 'stiffness',
    label: 'Stiffness',
    si: 'N/mm',
    us: 'lbf/in',
    units: [unit('N/mm', 'N/mm', 1e3, 0), unit('lbf/in', 'lbf/in', POUND_FORCE / INCH, 0), unit('N/m', 'N/m', 1, 0)],
  },
  laminarLoss: { id: 'laminarLoss', label: 'Laminar loss', si: 'Pa.s/m3', us: 'Pa.s/m3', units: [unit('Pa.s/m3', 'Pa·s/m³', 1, 0)] },
  quadraticLoss: {
    id: 'quadraticLoss',
    label: 'Quadratic loss',
    si: 'Pa.s2/m6',
    us: 'Pa.s2/m6',
    units: [unit('Pa.s2/m6', 'Pa·s²/m⁶', 1, 0)],
  },
  flowCoefficient: {
    id: 'flowCoefficient',
    label: 'Flow coefficient',
    si: 'm3/s/Pa0.5',
    us: 'm3/s/Pa0.5',
    units: [unit('m3/s/Pa0.5', 'm³/s/√Pa', 1, 10)],
  },
  number: { id: 'number', label: 'Number', si: '1', us: '1', units: [unit('1', '', 1, 3)] },
} as const satisfies Record<string, Quantity>;

export type QuantityId = keyof typeof quantities;
