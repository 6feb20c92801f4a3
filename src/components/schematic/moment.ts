import { useEffect, useLayoutEffect, useRef } from 'react';
import type { ReadingAt } from '#shared/pictures/schematic-shapes.ts';
import type { RunResult } from '#shared/simulation/result.ts';
import { useCursor } from '#src/stores/cursor-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useRuns } from '#src/stores/run-store.ts';

/** The moment that the drawing shows: the run of the case on the drawing, at the cursor. One place looks the time up, all symbols,
 *  lines and readings share it, and a movement of the cursor renders nothing: who follows it sets its own attributes. */
export interface Moment {
  readonly time: number;
  readonly run: RunResult | null;
  /** True from an edit until the new run is in. */
  readonly stale: boolean;
  readonly inkScale: number;
  /** Value of an address [SI]; undefined where the run has no such channel. */
  readonly at: ReadingAt;
}

const columns = new WeakMap<RunResult, Map<string, Float64Array>>();

function columnsOf(run: RunResult): Map<string, Float64Array> {
  let map = columns.get(run);
  if (!map) {
    map = new Map(run.channels.map((channel) => [channel.address, channel.values]));
    columns.set(run, map);
  }
  return map;
}

/** All values of a run at one time: the place between two rows is found once.
 *  @param time [s], clamped to what was reached */
export function readingsAt(run: RunResult | null, time: number): ReadingAt {
  if (!run || run.times.length === 0) return () => undefined;
  const { times } = run;
  const map = columnsOf(run);
  let low = 0;
  let high = times.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((times[middle] as number) <= time) low = middle;
    else high = middle;
  }
  const t0 = times[low] as number;
  const t1 = times[high] as number;
  const part = t1 > t0 ? Math.min(1, Math.max(0, (time - t0) / (t1 - t0))) : 0;
  return (address) => {
    const values = map.get(address);
    if (!values) return undefined;
    const a = values[low] as number;
    return part === 0 ? a : a + ((values[high] as number) - a) * part;
  };
}

let current: Moment | null = null;
const followers = new Set<(moment: Moment) => void>();
let detach: (() => void) | null = null;

/** The moment now shown. */
export function presentMoment(): Moment {
  const { time } = useCursor.getState();
  const { activeCase } = useDocument.getState();
  const { byCase, inkScale } = useRuns.getState();
  const entry = byCase[activeCase];
  const run = entry?.run ?? null;
  const stale = entry?.stale ?? true;
  if (!current || current.time !== time || current.run !== run || current.inkScale !== inkScale || current.stale !== stale) {
    current = { time, run, stale, inkScale, at: readingsAt(run, time) };
  }
  return current;
}

function attach(): () => void {
  let last = presentMoment();
  const tell = () => {
    const moment = presentMoment();
    if (moment === last) return;
    last = moment;
    for (const follower of followers) follower(moment);
  };
  const off = [useCursor.subscribe(tell), useRuns.subscribe(tell), useDocument.subscribe(tell)];
  return () => {
    for (const stop of off) stop();
  };
}

/** Calls `follower` whenever the moment changes, until the returned function is called. */
export function followMoment(follower: (moment: Moment) => void): () => void {
  followers.add(follower);
  detach ??= attach();
  return () => {
    followers.delete(follower);
    if (followers.size === 0) {
      detach?.();
      detach = null;
    }
  };
}

/** Calls `update` after every render and whenever the moment changes, without rendering.
 *  @param live false = never (drawings at rest) */
export function useMoment(update: (moment: Moment) => void, live = true): void {
  const latest = useRef(update);
  useLayoutEffect(() => {
    latest.current = update;
    if (live) update(presentMoment());
  });
  useEffect(() => (live ? followMoment((moment) => latest.current(moment)) : undefined), [live]);
}
