import type { FindingRule } from '#shared/findings/finding.ts';

/** The rule behind each finding: what is compared, under which assumptions, and where the rule comes from. */
export interface RuleWords {
  readonly equation: string;
  readonly assumptions: readonly string[];
  readonly limits: string;
  readonly source: string;
}

const HOUSE = 'house rule; common practice, no source';

export const ruleWords: Record<FindingRule, RuleWords> = {
  'motor-stalls': {
    equation: 'speed falls below pull-out speed after having been above it, and is not back above it 0.5 s later',
    assumptions: [
      'Run-up is left out: until speed first passes pull-out speed, plus 0.2 s.',
      'The motor’s curve follows the supply: torque ∝ (V/V_nameplate)².',
    ],
    limits: 'Steady torque curve; the electrical transients of the first cycles are left out.',
    source: 'motor curve: no load, plate, pull-out, pull-up, locked rotor; design N minima of IEC 60034-12 where not entered',
  },
  'dips-and-recovers': {
    equation: 'speed falls below pull-out speed and is back above it within 0.5 s',
    assumptions: ['Inertia and load carry the shaft through.'],
    limits: 'A slightly larger load or lower supply makes it a stall.',
    source: HOUSE,
  },
  'not-up-to-speed': {
    equation: 'speed never passes pull-out speed while the contactor is in',
    assumptions: ['Starting torque from the design letter’s minima unless entered.'],
    limits: 'Direct on line; a starter is not modelled unless its fault is set.',
    source: 'motor curve; design N minima of IEC 60034-12',
  },
  'will-trip': {
    equation: 'dθ/dt = ((I/(k·I_dial))² − θ)/τ, trips at θ = 1; over the repeated duty in closed form',
    assumptions: [
      'I is the highest leg.',
      'k = 1.15 for IEC dials, 1.25 for NEMA; k is not the service factor.',
      'Cooling at standstill is three times slower.',
    ],
    limits: 'One time constant; a real relay of the class lies within its band.',
    source: 'IEC 60947-4-1 trip classes',
  },
  'over-nameplate': {
    equation: 'RMS current over the repeated duty ÷ nameplate current > service factor',
    assumptions: ['Standstill within the cycle counts.'],
    limits: 'Holds only within ± 10 % of nameplate voltage.',
    source: 'IEC 60034-1; service factor 1.0 unless entered',
  },
  'small-stall-margin': {
    equation: 'stall margin = pull-out torque at the lowest supply of the duty ÷ highest torque asked, after run-up; rounded down',
    assumptions: ['The house rule asks for 1.25.'],
    limits: 'A worn pump or a lower supply takes from it.',
    source: HOUSE,
  },
  'supply-out-of-band': {
    equation: '|V/V_nameplate · f_nameplate/f − 1| > 10 %',
    assumptions: ['The same volts per hertz give the same flux: 480 V at 60 Hz is as 400 V at 50 Hz.'],
    limits: 'Outside the band no nameplate rating applies; the supply is a licensed electrician’s job.',
    source: 'IEC 60034-1 voltage range',
  },
  'relief-before-compensator': {
    equation: 'relief cracks at or below the compensator’s dead-head pressure',
    assumptions: ['Compared with cracking, never with the set pressure.'],
    limits: 'Override and reseat are the valve’s own data.',
    source: 'reference sheet, C3, C10',
  },
  'relief-gap-small': {
    equation: 'cracking − dead-head, and reseat − dead-head, against the house rule and the gauge’s resolution',
    assumptions: ['10 to 20 bar, or 10 to 15 %, above the compensator.'],
    limits: 'Gauge tolerance is the entered one.',
    source: 'reference sheet, C3, C4; the figure in bar is common practice, no source',
  },
  'relief-passing': {
    equation: 'heat = flow through the relief × pressure across it, for as long as it passes',
    assumptions: ['All of it warms the oil.'],
    limits: 'Temperature is not followed within a run.',
    source: 'reference sheet, C10, R3',
  },
  'rod-stops-short': {
    equation: 'commanded, at rest, neither at an end nor at the required force',
    assumptions: ['Force out = cap pressure × cap area − rod pressure × rod area − friction.'],
    limits: 'Friction is the entered one.',
    source: 'force balance of the rod',
  },
  'slower-than-pump': {
    equation: 'rod speed × area against pump flow at the outlet; the rest is named by where it goes',
    assumptions: [],
    limits: 'Averages over the phase.',
    source: 'volume balance',
  },
  'above-rating': {
    equation: 'highest value in the run > rating entered on the nameplate',
    assumptions: ['A rating that nobody has entered is not assumed.'],
    limits: 'Peaks shorter than a line’s own waves are not modelled.',
    source: 'nameplate',
  },
  heat: {
    equation: 'mean heat = Σ heat of every part ÷ duration',
    assumptions: ['Each part’s heat by its own law.'],
    limits: 'Set against the tank’s cooling area at a rise of 30 K.',
    source: 'reference sheet, section on heat',
  },
  'inlet-starving': {
    equation: 'suction pressure, absolute, < 0.8 bar',
    assumptions: [
      'Atmospheric pressure from the altitude of the site.',
      'Filling falls from 1 to 0 between 0.5 and 0.2 bar abs at rated speed.',
    ],
    limits: 'Filter and line losses as entered.',
    source: HOUSE,
  },
  intensification: {
    equation: 'rod-side pressure = cap pressure × cap area ÷ rod-side area',
    assumptions: ['Rod side shut or throttled.'],
    limits: 'Friction lowers it.',
    source: 'reference sheet, Y4, Y5',
  },
  hunting: {
    equation: 'pump port pressure still swings at the end of a steady phase',
    assumptions: [],
    limits: 'Line waves are left out.',
    source: 'observed in the run',
  },
  'load-above-compensator': {
    equation: 'pressure from the load > compensator’s dead-head, pump at zero flow',
    assumptions: ['The compensator can only reduce the pump’s own flow.'],
    limits: 'Only the relief limits it, where there is one in reach.',
    source: 'force balance; common practice, no source',
  },
  'load-runs-away': {
    equation: 'the rod moves over 20 mm/s for 0.15 s and 10 mm against its command, at centre, or with its driven side under −0.5 bar',
    assumptions: ['Slower is leakage.'],
    limits: 'Load-holding valves are not among the kinds yet.',
    source: 'observed in the run; common practice, no source',
  },
  'does-not-destroke': {
    equation: 'pump port > setting + the larger of 3 % and 5 bar for 0.3 s while the pump gives flow',
    assumptions: ['Shorter is overshoot while the swash plate still moves.'],
    limits: 'Case-drain pressure adds to the setting bar for bar.',
    source: HOUSE,
  },
  'no-relief': {
    equation: 'no relief is reachable from the flow source through elements that cannot close in that direction',
    assumptions: ['A check valve counts as open forwards only.'],
    limits: 'A compensator is not a safety device.',
    source: 'contract of the product; ISO 4413 asks for a relief',
  },
  'load-drives-pump': {
    equation: 'shaft speed < 0 with the contactor out and pressure behind the pump',
    assumptions: ['No backstop unless entered.'],
    limits: '',
    source: 'torque balance of the shaft',
  },
  'pressure-left': {
    equation: 'shut nets above 5 bar at the end of the duty',
    assumptions: ['Leakage goes on after the end.'],
    limits: 'A gauge at the pump can read zero while a cylinder is loaded.',
    source: 'observed in the run',
  },
  requirement: {
    equation: 'measured value against the requirement’s least and most',
    assumptions: ['Times to reach count from the start of the phase.'],
    limits: '',
    source: 'entered here',
  },
  'run-failed': {
    equation: 'the integration could not take a further step',
    assumptions: ['What was reached is kept and shown.'],
    limits: '',
    source: 'Rodas4P, step control',
  },
  'within-limits': {
    equation: 'none of the earlier verdicts applies and no finding of their kind is open',
    assumptions: ['Failed, above rating, motor stalls, trips, rod stops short, relief passing, over are tried in this order.'],
    limits: 'A calculation, not a permission.',
    source: 'contract of the product',
  },
};

export const yardstickWords = {
  'stall-margin': {
    label: 'Stall margin',
    equation: 'pull-out torque at the lowest supply of the duty ÷ highest torque asked, after run-up',
    assumptions: ['Pull-out torque ∝ (V/V_nameplate)².', 'Rounded down.', 'House rule: at least 1.25.'],
    limits: 'Below pull-out speed there is no margin, only "stalled" and the current.',
    source: HOUSE,
  },
  'rms-current': {
    label: 'RMS current, of nameplate',
    equation: '√(mean of I² over the repeated duty) ÷ nameplate current',
    assumptions: [
      'Rotor part ∝ √(torque × slip), magnetising part in quadrature, scaled to nameplate and locked-rotor current.',
      'Standstill within the cycle counts.',
    ],
    limits: 'This is what "Over" is about and what trips the relay; it holds within ± 10 % of nameplate voltage.',
    source: 'IEC 60034-1, duty types',
  },
  'peak-torque': {
    label: 'Peak, × rated torque',
    equation: 'highest torque asked, after run-up ÷ rated torque',
    assumptions: ['Rated torque = rated power ÷ rated speed.'],
    limits: 'Information: a short peak is no overload.',
    source: 'nameplate',
  },
} as const;
export type YardstickId = keyof typeof yardstickWords;
