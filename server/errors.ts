import type { ErrorCode, ErrorDetail } from '#shared/api/errors.ts';

/** A refusal with a code of shared/api/errors.ts. The message is for people; it never holds secrets or a stack. */
export class AppError extends Error {
  readonly code: ErrorCode;
  readonly details: readonly ErrorDetail[] | undefined;
  /** Seconds after which trying again makes sense. */
  readonly retryAfter: number | undefined;

  constructor(
    code: ErrorCode,
    options: {
      message: string;
      details?: readonly ErrorDetail[];
      retryAfter?: number;
      cause?: unknown;
    },
  ) {
    super(options.message, { cause: options.cause });
    this.name = 'AppError';
    this.code = code;
    this.details = options.details;
    this.retryAfter = options.retryAfter;
  }
}
