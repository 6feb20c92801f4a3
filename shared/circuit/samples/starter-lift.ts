import {
  bar,
  choice,
  degrees,
  flag,
  kilograms,
  litres,
  millimetres,
  milliseconds,
  motorRequirements,
  part,
  percent,
  pipe,
  sample,
  shaftOf,
} from './sample-builder.ts';
import { motor, PUMP_SCREWS, pump, RELIEF_SCREW, relief, valve } from './sample-plates.ts';

/** A hanging load, raised and lowered through a throttle; the closed-centre spool does not hold it. Values are our own. */
export const liftStarter = sample({
  title: 'Lift against gravity',
  components: [
    part('M1', 'electric-motor', [9, 29], motor(4, 8.5)),
    part('P1', 'compensated-pump', [24, 26], pump(18, 14, 130), PUMP_SCREWS),
    part('V1', 'check-valve', [37, 24]),
    part('J1', 'junction', [43, 24], {
      shape: choice('tee'),
    }),
    part('V2', 'relief-valve', [41, 28], relief('pilot', 155, 25), RELIEF_SCREW),
    part('J2', 'junction', [57, 24], {
      shape: choice('tee'),
    }),
    part('S1', 'pressure-gauge', [55, 17], {
      range: bar(250),
      lag: milliseconds(50),
    }),
    part('V3', 'directional-valve-4-3', [69, 18], valve('closed')),
    part('V4', 'throttle', [82, 8], {
      opening: percent(15),
      ratedFlow: litres(60),
      ratedDrop: bar(6),
    }),
    part(
      'A1',
      'cylinder',
      [98, 23],
      {
        bore: millimetres(50),
        rod: millimetres(28),
        stroke: millimetres(600),
        mass: kilograms(1400),
        angle: degrees(90),
        ratedPressure: bar(250),
      },
      { turn: 1, mirror: true },
    ),
    part('T1', 'tank', [30, 40]),
    part('T2', 'tank', [34, 40]),
    part('T3', 'tank', [42, 40]),
    part('T4', 'tank', [77, 40]),
  ],
  lines: [
    pipe('L1', 'T1.T', 'P1.suction', 0.6, 32),
    pipe('L2', 'P1.drain', 'T2.T', 1, 10),
    pipe('L3', 'P1.outlet', 'V1.A', 0.4, 16),
    pipe('L4', 'V1.B', 'J1.a', 0.3, 16),
    pipe('L5', 'J1.c', 'V2.P', 0.2, 16),
    pipe('L6', 'V2.T', 'T3.T', 1, 20),
    pipe('L7', 'J1.b', 'J2.a', 0.5, 16),
    pipe('L8', 'J2.d', 'S1.M', 0.5, 4),
    pipe('L9', 'J2.b', 'V3.P', 2.5, 16),
    pipe('L10', 'V3.A', 'V4.A', 0.5, 16, [{ x: 77, y: 10 }]),
    pipe('L11', 'V4.B', 'A1.A', 1, 16, [
      { x: 93, y: 10 },
      { x: 93, y: 41 },
    ]),
    pipe('L12', 'A1.B', 'V3.B', 2, 16, [
      { x: 95, y: 25 },
      { x: 95, y: 14 },
      { x: 79, y: 14 },
    ]),
    pipe('L13', 'V3.T', 'T4.T', 1.5, 20),
  ],
  shafts: [shaftOf('shaft1', 'M1.shaft', 'P1.shaft')],
  duty: {
    duration: 14,
    repeat: true,
    commands: [
      flag('start', 0, 'Start', 'M1.contactor', 1),
      flag('lift', 0.6, 'Solenoid a on', 'V3.spool', 1, 0.05),
      flag('wait', 5.2, 'Centre', 'V3.spool', 0, 0.05),
      flag('lower', 6, 'Solenoid b on', 'V3.spool', -1, 0.05),
      flag('rest', 8.8, 'Centre', 'V3.spool', 0, 0.05),
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
