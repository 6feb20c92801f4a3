import { coefficient, portValue, stateValue } from './access.ts';
import { BAR, indices, number } from './build.ts';
import { defineKind } from './kind.ts';
import * as S from './sources.ts';

const names = ['lag', 'range'] as const;
const C = indices(names);

export const pressureGauge = defineKind({
  id: 'pressure-gauge',
  version: 1,
  title: 'Pressure gauge',
  word: 'gauge',
  letter: 'S',
  stage: 'protect',
  about:
    'Shows the pressure of its net with the lag of its snubber, so a short peak passes unseen. It takes no oil. A gauge at the pump can read zero while a cylinder is loaded.',
  parameters: [
    number(
      'plate',
      'range',
      'End of scale',
      'pressure',
      250 * BAR,
      [1 * BAR, 1600 * BAR],
      'Highest pressure on the dial; more may damage the gauge.',
      S.PRACTICE,
      { ratingOf: 'truePressure' },
    ),
    number('plate', 'lag', 'Snubber lag', 'time', 0.05, [1e-3, 10], 'Time constant with which the needle follows.', S.PRACTICE, {
      equation: 'd(shown)/dt = (p − shown)/lag',
      typical: [0.02, 0.5],
    }),
  ],
  faults: [],
  ports: [{ id: 'M', letter: 'M', label: 'Measuring port', medium: 'oil', role: 'either', whenOpen: 'plugged' }],
  states: [{ id: 'shown', label: 'Pressure shown', quantity: 'pressure', nominal: 2e5, start: () => 0 }],
  inputs: [],
  screws: [],
  coefficients: names,
  prepare: (plate) => ({ lag: plate.number('lag'), range: plate.number('range') }),
  entries: [
    ['state:shown', 'M'],
    ['state:shown', 'state:shown'],
  ],
  flow: (block, w) => {
    for (let i = 0; i < block.count; i += 1) {
      const s = block.state[i]!;
      w.dy[s] = (w.y[block.port[i]!]! - w.y[s]!) / coefficient(block, i, C.lag);
    }
  },
  jacobian: (block, w) => {
    for (let i = 0; i < block.count; i += 1) {
      const rate = 1 / coefficient(block, i, C.lag);
      const onPort = block.slot[2 * i]!;
      const onShown = block.slot[2 * i + 1]!;
      w.jac[onPort] = w.jac[onPort]! + rate;
      w.jac[onShown] = w.jac[onShown]! - rate;
    }
  },
  powers: () => {},
  signals: [
    {
      id: 'off-scale',
      rises: 'gauge beyond its scale',
      falls: '',
      value: (block, i, w) => portValue(block, i, 0, w) - coefficient(block, i, C.range),
    },
  ],
  trips: [],
  readings: [
    {
      id: 'pressure',
      label: 'Pressure shown',
      quantity: 'pressure',
      value: (block, i, w) => stateValue(block, i, 0, w),
      explain: {
        equation: 'd(shown)/dt = (p − shown)/lag',
        where: 'p pressure of the net, lag of the snubber',
        inputs: ['lag', 'truePressure'],
        assumptions: ['The needle has no friction and no error.'],
        limits: 'Peaks shorter than the lag are not seen.',
        source: S.PRACTICE,
      },
    },
    {
      id: 'truePressure',
      label: 'Pressure at the gauge',
      quantity: 'pressure',
      value: (block, i, w) => portValue(block, i, 0, w),
      explain: {
        equation: 'dp/dt = K/V·(sum of flows into the net − dV/dt)',
        where: 'K effective modulus of oil, air and line walls, V volume of the net',
        inputs: ['M.pressure'],
        assumptions: ['One pressure in the whole net.'],
        limits: 'Waves inside a line are not resolved.',
        source: S.CONTINUITY,
      },
    },
  ],
  passes: [],
});
