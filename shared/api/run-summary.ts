import { z } from 'zod';
import { verdictIds } from '../findings/finding.ts';

/** A run without its columns: what POST /api/simulate and the command line's --json answer. All numbers SI, pressures gauge,
 *  times in seconds from the start of the duty. Objects stay open: a later server may say more. */

const phraseText = z.string().describe('Sentence with its figures, in the SI system of units');

export const runFigure = z.object({ value: z.number(), quantity: z.string() });
export const runProblem = z.object({
  severity: z.enum(['problem', 'assumption', 'caution']),
  code: z.string(),
  message: z.string(),
  component: z.string().optional(),
  port: z.string().optional(),
  line: z.string().optional(),
  path: z.string().optional(),
});
export const runFinding = z.object({
  id: z.string(),
  rule: z.string(),
  severity: z.int().min(0).max(3).describe('0 stops the job … 3 a note'),
  component: z.string().optional(),
  time: z.number().optional(),
  headline: phraseText,
  cause: phraseText,
  remedy: phraseText.optional(),
  caution: z.string().optional(),
});
export const runEvent = z.object({
  time: z.number(),
  component: z.string(),
  signal: z.string(),
  rising: z.boolean(),
  label: z.string(),
});
const channelRange = z.object({
  min: z.number(),
  max: z.number(),
  mean: z.number(),
  end: z.number(),
});
export const runPhase = z.object({
  label: z.string(),
  from: z.number(),
  to: z.number(),
  channels: z.record(z.string(), channelRange).describe('By channel address'),
});
export const runYardsticks = z.object({
  motor: z.string(),
  stalled: z.boolean(),
  stallTime: z.number().optional(),
  stallCurrent: z.number().optional(),
  stallMargin: z.number().nullable(),
  rmsCurrent: z.number().describe('RMS current over the repeated duty ÷ nameplate current'),
  rmsTorque: z.number(),
  peakTorque: z.number(),
  peakCurrent: z.number(),
  tripTime: z.number().nullable().describe('Time to trip on the repeated duty; null = never'),
});
export const runAudit = z.object({
  supplied: z.number(),
  delivered: z.number(),
  heat: z.number(),
  storedChange: z.number(),
  residual: z.number(),
  volumeResidual: z.number(),
  heatBy: z.record(z.string(), z.number()),
});
export const runStatistics = z.object({
  steps: z.int(),
  rejected: z.int(),
  evaluations: z.int(),
  jacobians: z.int(),
  factorisations: z.int(),
  states: z.int(),
  nonzeros: z.int(),
});
export const runChannel = z.object({
  address: z.string(),
  label: z.string(),
  quantity: z.string(),
  values: z.array(z.number()),
});

export const runSummary = z.object({
  format: z.literal('swashbench-run'),
  engineVersion: z.int(),
  circuit: z.string().describe('Title of the circuit'),
  case: z.object({ id: z.string(), name: z.string() }),
  status: z.enum(['finished', 'stopped', 'failed']),
  reason: z.string().optional(),
  stuck: z.object({ component: z.string().optional(), state: z.string().optional() }).optional(),
  time: z.number(),
  duration: z.number(),
  tolerance: z.number(),
  verdict: z.object({
    id: z.enum(verdictIds),
    word: z.string(),
    figure: runFigure.optional(),
  }),
  findings: z.array(runFinding),
  yardsticks: z.array(runYardsticks),
  requirements: z.array(
    z.object({
      id: z.string(),
      met: z.boolean(),
      value: z.number().nullable(),
      words: phraseText,
    }),
  ),
  heat: z.number().describe('Mean heat over the run [W]'),
  events: z.array(runEvent),
  phases: z.array(runPhase),
  audit: runAudit.nullable(),
  pressureLeft: z.array(z.object({ net: z.string(), label: z.string(), pressure: z.number() })),
  notes: z.array(runProblem),
  statistics: runStatistics,
  hash: z.string().describe('Equal bits of the accepted steps give equal hashes in every host'),
  /** Only when asked for. */
  times: z.array(z.number()).optional(),
  channels: z.array(runChannel).optional(),
});
export type RunSummary = z.infer<typeof runSummary>;
