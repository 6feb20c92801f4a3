import { useEffect } from 'react';
import { useReducedMotion } from '#src/lib/theme.ts';
import { useCursor } from '#src/stores/cursor-store.ts';

/** One loop moves the cursor, however many tapes are on the screen. */
let owner: symbol | null = null;

/** Pause between jumps where movement is kept still [ms], at speed 1. */
const JUMP = 1200;

export interface Playback {
  /** Length of the duty [s]. */
  readonly duration: number;
  /** The duty repeats: the cursor starts again at the end. */
  readonly repeat: boolean;
  /** Moments to which a still tape jumps [s], ascending. */
  readonly moments: readonly number[];
}

/** Next place of the cursor and whether it goes on. */
export function advance(
  time: number,
  elapsed: number,
  playback: Pick<Playback, 'duration' | 'repeat'>,
): { time: number; playing: boolean } {
  const next = time + elapsed;
  if (next < playback.duration) return { time: next, playing: true };
  if (!playback.repeat || playback.duration <= 0) return { time: playback.duration, playing: false };
  return { time: next % playback.duration, playing: true };
}

/** The moment after (or before) a time; the time itself where there is none. */
export function neighbour(moments: readonly number[], time: number, step: 1 | -1): number {
  const SAME = 1e-4;
  if (step > 0) return moments.find((moment) => moment > time + SAME) ?? time;
  let found = time;
  for (const moment of moments) if (moment < time - SAME) found = moment;
  return found;
}

export function usePlayback(playback: Playback): void {
  const playing = useCursor((state) => state.playing);
  const speed = useCursor((state) => state.speed);
  const still = useReducedMotion();
  const { duration, repeat, moments } = playback;
  useEffect(() => {
    if (!playing) return;
    const mine = Symbol('playback');
    if (owner) return;
    owner = mine;
    const cursor = useCursor.getState;
    if (cursor().time >= duration - 1e-6) cursor().setTime(0);
    let frame = 0;
    let timer: ReturnType<typeof setInterval> | undefined;
    if (still) {
      timer = setInterval(() => {
        const now = cursor().time;
        const next = neighbour(moments, now, 1);
        if (next > now) return cursor().setTime(next);
        cursor().setTime(repeat ? 0 : duration);
        if (!repeat) cursor().setPlaying(false);
      }, JUMP / speed);
    } else {
      let before = performance.now();
      const tick = (now: number) => {
        // A tab that slept must not leap.
        const elapsed = (Math.min(100, Math.max(0, now - before)) / 1000) * speed;
        before = now;
        const next = advance(cursor().time, elapsed, { duration, repeat });
        cursor().setTime(next.time);
        if (!next.playing) cursor().setPlaying(false);
        else frame = requestAnimationFrame(tick);
      };
      frame = requestAnimationFrame(tick);
    }
    return () => {
      cancelAnimationFrame(frame);
      clearInterval(timer);
      if (owner === mine) owner = null;
    };
  }, [playing, speed, still, duration, repeat, moments]);
}
