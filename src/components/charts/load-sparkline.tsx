import { useMemo } from 'react';
import type { Yardsticks } from '#shared/findings/finding.ts';
import { tapeStall, traceStretches } from '#shared/pictures/tape-references.ts';
import type { RunResult } from '#shared/simulation/result.ts';
import { Sparkline } from './sparkline.tsx';

export interface LoadSparklineProps {
  readonly run: RunResult;
  readonly yardsticks: readonly Yardsticks[];
  readonly ink: number;
  readonly dash?: readonly number[];
  readonly width?: number;
  readonly height?: number;
  readonly stale?: boolean;
}

/** Motor load over the duty, × rated, with the rated line and the stall; pressure at the first pump where there is no motor.
 *  Draws nothing when the run has neither. */
export function LoadSparkline({ run, yardsticks, ink, dash, width, height, stale }: LoadSparklineProps) {
  const found = useMemo(() => {
    const motor = yardsticks[0]?.motor;
    const load = run.channels.find((channel) =>
      motor ? channel.address === `${motor}.torqueRatio` : channel.address.endsWith('.torqueRatio'),
    );
    const channel = load ?? run.channels.find((entry) => entry.address.endsWith('.outlet.pressure'));
    const stall = tapeStall(run, yardsticks);
    return { channel, isLoad: load !== undefined, stretches: traceStretches(run, stall, true), stalled: stall !== null };
  }, [run, yardsticks]);
  if (!found.channel) return null;
  return (
    <Sparkline
      times={run.times}
      values={found.channel.values}
      stretches={found.stretches}
      duration={run.duration}
      ink={ink}
      dash={dash}
      width={width}
      height={height}
      reference={found.isLoad ? 1 : undefined}
      stalled={found.stalled}
      stale={stale}
    />
  );
}
