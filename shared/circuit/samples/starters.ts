import type { CircuitDocument, ParameterValue } from '../schema.ts';
import {
  amps,
  bar,
  barPerTurn,
  choice,
  cubic,
  cubicPerTurn,
  degrees,
  flag,
  hertz,
  kilograms,
  kilonewtons,
  kilowatts,
  litres,
  millimetres,
  milliseconds,
  motorRequirements,
  part,
  percent,
  pipe,
  ratio,
  rpm,
  sample,
  shaftOf,
  volts,
} from './sample-builder.ts';

/** Three circuits to start from. All values are our own, of ordinary size. */
export interface Starter {
  readonly id: string;
  readonly title: string;
  /** One sentence under the title: what it shows. */
  readonly about: string;
  readonly document: CircuitDocument;
}

function motor(power: number, current: number): Record<string, ParameterValue> {
  return {
    ratedPower: kilowatts(power),
    ratedVoltage: volts(400),
    ratedFrequency: hertz(50),
    poles: choice('4'),
    ratedSpeed: rpm(1450),
    ratedCurrent: amps(current),
    lockedRotorCurrent: ratio(6),
    designLetter: choice('N minima'),
    serviceFactor: ratio(1),
    relayFitted: choice('yes'),
    relayDial: amps(current),
    relayClass: choice('10'),
    relayStandard: choice('IEC'),
  };
}

function pump(displacement: number, stop: number, compensator: number): Record<string, ParameterValue> {
  return {
    displacement: cubic(displacement),
    compensatorPressure: bar(compensator),
    maxVolumeStop: cubic(stop),
    minVolumeStop: cubic(0),
    leastCompensator: bar(20),
    mostCompensator: bar(280),
    leastStop: cubic(displacement / 4),
    mostStop: cubic(displacement),
    leastMinStop: cubic(0),
    mostMinStop: cubic(displacement / 4),
    compensatorPerTurn: barPerTurn(20),
    stopPerTurn: cubicPerTurn(4),
    minStopPerTurn: cubicPerTurn(4),
    band: bar(8),
    destrokeLag: milliseconds(12),
    onstrokeLag: milliseconds(30),
    ratedPressure: bar(280),
  };
}

function relief(type: 'direct' | 'pilot', set: number, flow: number): Record<string, ParameterValue> {
  return {
    type: choice(type),
    setPressure: bar(set),
    leastSet: bar(20),
    mostSet: bar(315),
    setPerTurn: barPerTurn(40),
    setFlow: litres(flow),
    override: percent(type === 'pilot' ? 6 : 20),
    ratedPressure: bar(315),
  };
}

function valve(centre: 'closed' | 'open' | 'tandem' | 'float'): Record<string, ParameterValue> {
  return {
    centre: choice(centre),
    ratedFlow: litres(60),
    ratedDrop: bar(5),
    ratedPressure: bar(315),
  };
}

const PUMP_SCREWS = {
  screws: ['compensatorPressure', 'maxVolumeStop', 'minVolumeStop'],
  locked: ['minVolumeStop'],
} as const;
const RELIEF_SCREW = {
  screws: ['setPressure'],
  locked: ['setPressure'],
} as const;

const press = sample({
  title: 'Press with compensated pump',
  components: [
    part('M1', 'electric-motor', [8.5, 29], motor(7.5, 15)),
    part('P1', 'compensated-pump', [26.5, 29], pump(28, 24, 160), PUMP_SCREWS),
    part('V1', 'check-valve', [35.5, 23]),
    part('J1', 'junction', [44, 24.5], {
      shape: choice('tee'),
    }),
    part('V2', 'relief-valve', [42.5, 29], relief('pilot', 190, 35), RELIEF_SCREW),
    part('J2', 'junction', [58, 24.5], {
      shape: choice('tee'),
    }),
    part('S1', 'pressure-gauge', [56.3, 17], {
      range: bar(250),
      lag: milliseconds(50),
    }),
    part('V3', 'directional-valve-4-3', [66, 18], valve('tandem')),
    part('A1', 'cylinder', [56, 4.5], {
      bore: millimetres(80),
      rod: millimetres(45),
      stroke: millimetres(400),
      mass: kilograms(120),
      workContact: millimetres(150),
      workFull: millimetres(250),
      workForce: kilonewtons(60),
      ratedPressure: bar(250),
    }),
    part('Z1', 'filter', [74.5, 30], {
      ratedFlow: litres(60),
      ratedDrop: bar(0.5),
      bypassPressure: bar(2),
    }),
    part('T1', 'tank', [28.8, 40]),
    part('T2', 'tank', [33, 40]),
    part('T3', 'tank', [42.8, 40]),
    part('T4', 'tank', [74.8, 40]),
  ],
  lines: [
    pipe('L1', 'T1.T', 'P1.suction', 0.6, 32),
    pipe('L2', 'P1.drain', 'T2.T', 1, 10),
    pipe('L3', 'P1.outlet', 'V1.A', 0.4, 16),
    pipe('L4', 'V1.B', 'J1.a', 0.3, 16),
    pipe('L5', 'J1.c', 'V2.P', 0.2, 16),
    pipe('L6', 'V2.T', 'T3.T', 1, 20),
    pipe('L7', 'J1.b', 'J2.a', 0.5, 16),
    pipe('L8', 'J2.c', 'S1.M', 0.5, 4),
    pipe('L9', 'J2.b', 'V3.P', 2.5, 16),
    pipe('L10', 'V3.A', 'A1.A', 1.5, 16),
    pipe('L11', 'A1.B', 'V3.B', 1.5, 16),
    pipe('L12', 'V3.T', 'Z1.A', 1.5, 20),
    pipe('L13', 'Z1.B', 'T4.T', 0.5, 20),
  ],
  shafts: [shaftOf('shaft1', 'M1.shaft', 'P1.shaft')],
  duty: {
    duration: 7,
    repeat: true,
    commands: [
      flag('start', 0, 'Start', 'M1.contactor', 1),
      flag('press', 0.6, 'Solenoid a on', 'V3.spool', 1, 0.05),
      flag('open', 4, 'Solenoid b on', 'V3.spool', -1, 0.05),
      flag('rest', 6.5, 'Centre', 'V3.spool', 0, 0.05),
    ],
  },
  requirements: [
    {
      id: 'force',
      quantity: 'A1.loadForce',
      measure: 'peak',
      min: 60e3,
      phase: 'Solenoid a on',
    },
    {
      id: 'time',
      quantity: 'A1.loadForce',
      measure: 'time to reach',
      at: 60e3,
      max: 3.2,
      phase: 'Solenoid a on',
    },
    ...motorRequirements(),
  ],
});

const stand = sample({
  title: 'Test stand, pump on relief',
  components: [
    part('M1', 'electric-motor', [8.5, 29], motor(11, 21)),
    part('P1', 'compensated-pump', [26.5, 29], pump(28, 28, 200), PUMP_SCREWS),
    part('J1', 'junction', [36, 24.5], {
      shape: choice('tee'),
    }),
    part('S1', 'pressure-gauge', [34.3, 17], {
      range: bar(250),
      lag: milliseconds(50),
    }),
    part('J2', 'junction', [50, 24.5], {
      shape: choice('tee'),
    }),
    part('V1', 'relief-valve', [48.5, 29], relief('direct', 150, 40), RELIEF_SCREW),
    part('V2', 'throttle', [60, 23], {
      opening: percent(100),
      ratedFlow: litres(80),
      ratedDrop: bar(6),
    }),
    part('S2', 'flow-meter', [70, 23], {
      ratedFlow: litres(60),
      ratedDrop: bar(1),
    }),
    part('T1', 'tank', [28.8, 40]),
    part('T2', 'tank', [33, 40]),
    part('T3', 'tank', [48.8, 40]),
    part('T4', 'tank', [82, 40]),
  ],
  lines: [
    pipe('L1', 'T1.T', 'P1.suction', 0.6, 32),
    pipe('L2', 'P1.drain', 'T2.T', 1, 10),
    pipe('L3', 'P1.outlet', 'J1.a', 0.4, 16),
    pipe('L4', 'J1.c', 'S1.M', 0.5, 4),
    pipe('L5', 'J1.b', 'J2.a', 0.5, 16),
    pipe('L6', 'J2.c', 'V1.P', 0.2, 16),
    pipe('L7', 'V1.T', 'T3.T', 1, 20),
    pipe('L8', 'J2.b', 'V2.A', 0.5, 16),
    pipe('L9', 'V2.B', 'S2.A', 0.3, 20),
    pipe('L10', 'S2.B', 'T4.T', 1, 20),
  ],
  shafts: [shaftOf('shaft1', 'M1.shaft', 'P1.shaft')],
  duty: {
    duration: 6,
    repeat: false,
    commands: [
      flag('start', 0, 'Start', 'M1.contactor', 1),
      flag('load', 1, 'Throttle to 15 %', 'V2.opening', 0.15, 0.5),
      flag('shut', 2.5, 'Throttle shut', 'V2.opening', 0, 0.5),
      flag('release', 4.5, 'Throttle open', 'V2.opening', 1, 0.5),
    ],
  },
  requirements: motorRequirements(),
});

const lift = sample({
  title: 'Lift against gravity',
  components: [
    part('M1', 'electric-motor', [8.5, 29], motor(4, 8.5)),
    part('P1', 'compensated-pump', [26.5, 29], pump(18, 14, 130), PUMP_SCREWS),
    part('V1', 'check-valve', [35.5, 23]),
    part('J1', 'junction', [44, 24.5], {
      shape: choice('tee'),
    }),
    part('V2', 'relief-valve', [42.5, 29], relief('pilot', 155, 25), RELIEF_SCREW),
    part('J2', 'junction', [58, 24.5], {
      shape: choice('tee'),
    }),
    part('S1', 'pressure-gauge', [56.3, 17], {
      range: bar(250),
      lag: milliseconds(50),
    }),
    part('V3', 'directional-valve-4-3', [66, 18], valve('closed')),
    part('V4', 'throttle', [72, 8], {
      opening: percent(30),
      ratedFlow: litres(60),
      ratedDrop: bar(6),
    }),
    part(
      'A1',
      'cylinder',
      [88, 2],
      {
        bore: millimetres(50),
        rod: millimetres(28),
        stroke: millimetres(600),
        mass: kilograms(1400),
        angle: degrees(90),
        ratedPressure: bar(250),
      },
      { turn: 3 },
    ),
    part('T1', 'tank', [28.8, 40]),
    part('T2', 'tank', [33, 40]),
    part('T3', 'tank', [42.8, 40]),
    part('T4', 'tank', [74.8, 40]),
  ],
  lines: [
    pipe('L1', 'T1.T', 'P1.suction', 0.6, 32),
    pipe('L2', 'P1.drain', 'T2.T', 1, 10),
    pipe('L3', 'P1.outlet', 'V1.A', 0.4, 16),
    pipe('L4', 'V1.B', 'J1.a', 0.3, 16),
    pipe('L5', 'J1.c', 'V2.P', 0.2, 16),
    pipe('L6', 'V2.T', 'T3.T', 1, 20),
    pipe('L7', 'J1.b', 'J2.a', 0.5, 16),
    pipe('L8', 'J2.c', 'S1.M', 0.5, 4),
    pipe('L9', 'J2.b', 'V3.P', 2.5, 16),
    pipe('L10', 'V3.A', 'V4.A', 0.5, 16),
    pipe('L11', 'V4.B', 'A1.A', 1, 16),
    pipe('L12', 'A1.B', 'V3.B', 2, 16),
    pipe('L13', 'V3.T', 'T4.T', 1.5, 20),
  ],
  shafts: [shaftOf('shaft1', 'M1.shaft', 'P1.shaft')],
  duty: {
    duration: 10,
    repeat: true,
    commands: [
      flag('start', 0, 'Start', 'M1.contactor', 1),
      flag('lift', 0.6, 'Solenoid a on', 'V3.spool', 1, 0.05),
      flag('wait', 5.2, 'Centre', 'V3.spool', 0, 0.05),
      flag('lower', 6, 'Solenoid b on', 'V3.spool', -1, 0.05),
      flag('rest', 9.6, 'Centre', 'V3.spool', 0, 0.05),
    ],
  },
  requirements: [
    {
      id: 'height',
      quantity: 'A1.position',
      measure: 'peak',
      min: 0.59,
      phase: 'Solenoid a on',
    },
    ...motorRequirements(),
  ],
});

export const starters: readonly Starter[] = [
  {
    id: 'press',
    title: 'Press with compensated pump',
    about: 'A cylinder closes on a work-piece; compensator, relief and stop in their usual order.',
    document: press,
  },
  {
    id: 'test-stand',
    title: 'Test stand, pump on relief',
    about: 'A throttle loads the pump; shut, the whole flow crosses the relief, because it is set under the compensator.',
    document: stand,
  },
  {
    id: 'lift',
    title: 'Lift against gravity',
    about: 'A hanging load is raised and lowered through a throttle; a spool does not hold it.',
    document: lift,
  },
];
