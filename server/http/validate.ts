import type { z } from 'zod';
import { AppError } from '#server/errors.ts';
import type { ErrorDetail } from '#shared/api/errors.ts';
import { structureIssues } from '#shared/circuit/check-structure.ts';

/** Parses a request against its contract. All problems are told at once, each with its field, the value and what is allowed. */
export function validate<T>(schema: z.ZodType<T>, input: unknown): T {
  const parsed = schema.safeParse(input);
  if (parsed.success) return parsed.data;
  const details = structureIssues(parsed.error, input).map(
    (issue): ErrorDetail => ({
      path: issue.path,
      message: withValue(issue.value, issue.message),
    }),
  );
  throw new AppError('bad-input', {
    message: badInputMessage(details.length),
    details,
  });
}

export function badInputMessage(count: number): string {
  return count === 1 ? 'One field is not as it must be.' : `${count} fields are not as they must be.`;
}

/** 'is 12: must be at most 10'; a value that is absent is not repeated. */
export function withValue(value: unknown, message: string): string {
  if (value === undefined) return message;
  const text = JSON.stringify(value) ?? String(value);
  return `is ${text.length > 60 ? `${text.slice(0, 60)}…` : text}: ${message}`;
}
