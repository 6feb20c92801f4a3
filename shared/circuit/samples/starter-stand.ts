import { bar, choice, flag, litres, milliseconds, motorRequirements, part, percent, pipe, sample, shaftOf } from './sample-builder.ts';
import { motor, PUMP_SCREWS, pump, RELIEF_SCREW, relief } from './sample-plates.ts';

/** Test stand on which the relief is proved: set under the compensator, so that the whole flow crosses it. Values are our own. */
export const standStarter = sample({
  title: 'Test stand, pump on relief',
  components: [
    part('M1', 'electric-motor', [9, 29], motor(11, 21)),
    part('P1', 'compensated-pump', [24, 26], pump(28, 28, 200), PUMP_SCREWS),
    part('J1', 'junction', [39, 24], {
      shape: choice('tee'),
    }),
    part('S1', 'pressure-gauge', [37, 16], {
      range: bar(250),
      lag: milliseconds(50),
    }),
    part('J2', 'junction', [51, 24], {
      shape: choice('tee'),
    }),
    part('V1', 'relief-valve', [49, 29], relief('direct', 150, 40), RELIEF_SCREW),
    part('V2', 'throttle', [62, 23], {
      opening: percent(100),
      ratedFlow: litres(80),
      ratedDrop: bar(6),
    }),
    part('S2', 'flow-meter', [74, 22.5], {
      ratedFlow: litres(60),
      ratedDrop: bar(1),
    }),
    part('T1', 'tank', [30, 40]),
    part('T2', 'tank', [34, 40]),
    part('T3', 'tank', [50, 40]),
    part('T4', 'tank', [86, 32]),
  ],
  lines: [
    pipe('L1', 'T1.T', 'P1.suction', 0.6, 32),
    pipe('L2', 'P1.drain', 'T2.T', 1, 10),
    pipe('L3', 'P1.outlet', 'J1.a', 0.4, 16),
    pipe('L4', 'J1.d', 'S1.M', 0.5, 4),
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
