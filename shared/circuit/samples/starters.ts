import type { CircuitDocument } from '../schema.ts';
import { liftStarter } from './starter-lift.ts';
import { pressStarter } from './starter-press.ts';
import { standStarter } from './starter-stand.ts';

/** Three circuits to start from. All values are our own, of ordinary size. */
export interface Starter {
  readonly id: string;
  readonly title: string;
  /** One sentence under the title: what it shows. */
  readonly about: string;
  readonly document: CircuitDocument;
}

export const starters: readonly Starter[] = [
  {
    id: 'press',
    title: 'Press with compensated pump',
    about: 'A cylinder closes on a work-piece; compensator, relief and stop in their usual order.',
    document: pressStarter,
  },
  {
    id: 'test-stand',
    title: 'Test stand, pump on relief',
    about: 'A throttle loads the pump; shut, the whole flow crosses the relief, because it is set under the compensator.',
    document: standStarter,
  },
  {
    id: 'lift',
    title: 'Lift against gravity',
    about: 'A hanging load is raised and lowered through a throttle; a spool does not hold it.',
    document: liftStarter,
  },
];
