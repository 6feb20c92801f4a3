import type { FindingContext } from '../context.ts';
import type { Finding } from '../finding.ts';
import { AMBIENT, OIL_WARNING, TANK_COEFFICIENT } from '../house-rules.ts';
import { figure, heat, say } from '../phrase.ts';

/** Mean heat into the oil [W]: that of every component but the motors, whose loss goes into the air. */
export function oilHeat(context: Pick<FindingContext, 'run' | 'seen'>): number {
  const { audit, time } = context.run;
  if (!audit || !(time > 0)) return 0;
  const motors = new Set(
    context.seen.components.filter((component) => component.kind === 'electric-motor').map((component) => component.id),
  );
  return Object.entries(audit.heatBy).reduce((sum, [id, joules]) => sum + (motors.has(id) ? 0 : joules), 0) / time;
}

/** No tank is run up to here, and the oil’s data end: a settling temperature above it means nothing [K]: 120 °C. */
const NO_OIL = 393.15;

/** Heat of the repeated duty against what the tank gives off at 60 °C with air at 20 °C. */
export function heatRules(context: FindingContext): Finding[] {
  const { audit, time } = context.run;
  const area = context.seen.reservoir.coolingArea;
  if (!audit || !context.seen.duty.repeat || context.run.status !== 'finished' || !(area > 0)) return [];
  const mean = oilHeat(context);
  const given = TANK_COEFFICIENT * area * (OIL_WARNING - AMBIENT);
  if (mean <= given) return [];
  const worst = Object.entries(audit.heatBy)
    .filter(([id]) => context.seen.components.find((component) => component.id === id)?.kind !== 'electric-motor')
    .sort((a, b) => b[1] - a[1])[0];
  const settles = AMBIENT + mean / (TANK_COEFFICIENT * area);
  return [
    {
      id: 'heat:tank',
      rule: 'heat',
      severity: 2,
      caseId: context.caseId,
      ...(worst ? { component: worst[0] } : {}),
      headline: say('More heat than the tank gives off'),
      cause: say(
        'Repeated, the duty puts ',
        heat(mean),
        ' into the oil; the tank gives off ',
        heat(given),
        ' at ',
        figure(OIL_WARNING, 'temperature'),
        ' in air of ',
        figure(AMBIENT, 'temperature'),
        settles < NO_OIL
          ? say('. Without a cooler it would settle at ', figure(settles, 'temperature'), '.')
          : say('. Without a cooler it would not settle under ', figure(NO_OIL, 'temperature'), '.'),
        worst ? say(` The largest part comes from ${context.name(worst[0])}: `, heat(worst[1] / time), '.') : '',
      ),
      remedy: { words: say('Take the heat away where it is made before adding a cooler.') },
    },
  ];
}
