import type { FindingContext } from '../context.ts';
import type { Finding } from '../finding.ts';
import { INLET_WARNING } from '../house-rules.ts';
import { figure, pressure, say, share } from '../phrase.ts';
import { lowest, type Window } from '../series.ts';

/** Inlet starving, hunting. */
export function pumpRules(context: FindingContext): Finding[] {
  return context.ofKind('compensated-pump').flatMap((pump) => [...starving(context, pump.id), ...hunting(context, pump.id)]);
}

function runningWindow(context: FindingContext, pump: string): Window {
  return context.drives.find((drive) => drive.pumps.some((entry) => entry.id === pump))?.running ?? { from: 0, to: context.end };
}

/** Faster than this a shaft draws oil [rad/s]. */
const DRAWS = 1;

function speedOf(context: FindingContext, pump: string): Float64Array | null {
  const drive = context.drives.find((entry) => entry.pumps.some((part) => part.id === pump));
  return drive ? context.column(`${drive.component.id}.speed`) : null;
}

function starving(context: FindingContext, pump: string): Finding[] {
  const values = context.column(`${pump}.suctionPressure`);
  const filling = context.column(`${pump}.filling`);
  if (!values) return [];
  const window = runningWindow(context, pump);
  // A shaft that stands or turns back draws nothing from the inlet.
  const speed = speedOf(context, pump);
  const draws = (column: Float64Array) => (speed ? column.map((value, i) => (speed[i]! > DRAWS ? value : Number.NaN)) : column);
  const least = lowest(context.times, draws(values), window);
  const fill = filling ? Math.min(1, lowest(context.times, draws(filling), window).value) : 1;
  if (!(least.value < INLET_WARNING) && !(fill < 0.98)) return [];
  const name = context.name(pump);
  const air = context.constants.atmosphere;
  return [
    {
      id: `inlet-starving:${pump}`,
      rule: 'inlet-starving',
      severity: fill < 0.98 ? 1 : 2,
      caseId: context.caseId,
      component: pump,
      time: least.time,
      headline: fill < 0.98 ? say(`${name} starves at the inlet`) : say(`Inlet of ${name} under the warning`),
      cause: say(
        'The inlet falls to ',
        figure(least.value, 'pressure', { address: `${pump}.suctionPressure`, digits: 2 }),
        ' absolute; the warning stands at ',
        figure(INLET_WARNING, 'pressure', { digits: 2 }),
        fill < 0.98 ? say('. Filling falls to ', share(fill), '.') : '. It still fills.',
        air < INLET_WARNING / 0.95
          ? say(' The air itself has ', figure(air, 'pressure', { digits: 2 }), ' at this altitude: nothing is left for the suction line.')
          : '',
      ),
      remedy: {
        words: say(
          air < INLET_WARNING / 0.95
            ? 'Put the tank above the pump or press it with air as the maker allows; ask the maker for the speed at this altitude.'
            : 'Shorten or widen the suction line, clean the strainer, warm the oil, look at the breather.',
        ),
      },
    },
  ];
}

const SWINGS = 6;
const SWING = 0.05;
const WITHIN = 1.5;

/** The stroke swings back and forth at least three times within 1.5 s by 5 % of the stop or more while nothing is commanded. */
function hunting(context: FindingContext, pump: string): Finding[] {
  const stroke = context.column(`${pump}.stroke`);
  if (!stroke) return [];
  const window = runningWindow(context, pump);
  const turns: number[] = [];
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  let rising: boolean | null = null;
  for (let i = 0; i < stroke.length; i++) {
    const t = context.times[i]!;
    if (t < window.from) continue;
    const value = stroke[i]!;
    low = Math.min(low, value);
    high = Math.max(high, value);
    if (rising !== true && value > low + SWING) {
      turns.push(t);
      rising = true;
      high = value;
    } else if (rising !== false && value < high - SWING) {
      turns.push(t);
      rising = false;
      low = value;
    }
    if (rising === true) low = Math.min(value, high);
    if (rising === false) high = Math.max(value, low);
    if (rising === true) high = Math.max(high, value);
    if (rising === false) low = Math.min(low, value);
  }
  const start = turns.find((time, i) => {
    const last = turns[i + SWINGS - 1];
    return (
      last !== undefined &&
      last - time <= WITHIN &&
      !context.seen.duty.commands.some((command) => command.time > time - 0.1 && command.time < last)
    );
  });
  if (start === undefined) return [];
  const plate = context.plate(pump);
  return [
    {
      id: `hunting:${pump}`,
      rule: 'hunting',
      severity: 2,
      caseId: context.caseId,
      component: pump,
      time: start,
      headline: say(`${context.name(pump)} hunts`),
      cause: say(
        'With no command the stroke swings back and forth ',
        String(turns.length),
        ' times by more than ',
        share(SWING),
        ' of full stroke; the band is ',
        pressure(plate.number('band')),
        ', the lags ',
        figure(plate.number('destrokeLag'), 'time', { digits: 3 }),
        ' and ',
        figure(plate.number('onstrokeLag'), 'time', { digits: 3 }),
        '.',
      ),
      remedy: {
        words: say(
          'More oil volume between pump and valve, a wider band or air out of the oil; look for a relief that works against the compensator.',
        ),
      },
    },
  ];
}
