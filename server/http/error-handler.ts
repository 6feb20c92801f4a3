import type { ErrorRequestHandler, RequestHandler } from 'express';
import type { Logger } from 'pino';
import { AppError } from '#server/errors.ts';
import type { ErrorBody, ErrorCode } from '#shared/api/errors.ts';

const statusOf: Readonly<Record<ErrorCode, number>> = {
  'bad-input': 400,
  'bad-json': 400,
  'bad-address': 400,
  'too-large': 413,
  'wrong-type': 415,
  'not-found': 404,
  'wrong-method': 405,
  'not-allowed': 403,
  'too-many': 429,
  busy: 503,
  'too-slow': 503,
  'no-database': 503,
  internal: 500,
};

/** The last handler: turns whatever was thrown into the one error shape. Nothing of a bug but its request id leaves the server. */
export function errorHandler(logger: Logger): ErrorRequestHandler {
  return (error: unknown, _request, response, _next) => {
    const requestId = response.locals.requestId as string;
    const refusal = error instanceof AppError ? error : (fromBodyParser(error) ?? fromRouter(error));
    if (!refusal) logger.error({ err: error, requestId }, 'unforeseen failure');
    if (response.headersSent) {
      response.destroy();
      return;
    }
    const { code, message, details, retryAfter } = refusal ?? {
      code: 'internal' as const,
      message: 'Something went wrong on the server. Nothing you sent was kept; the request id helps us to find the cause.',
      details: undefined,
      retryAfter: undefined,
    };
    const body: ErrorBody = {
      error: {
        code,
        message,
        requestId,
        ...(details ? { details: [...details] } : {}),
      },
    };
    if (retryAfter !== undefined) response.setHeader('Retry-After', String(retryAfter));
    response.setHeader('Cache-Control', 'no-store');
    response.status(statusOf[code]).json(body);
  };
}

/** What express.json() throws, told by its `type`. */
function fromBodyParser(error: unknown): AppError | null {
  if (!(error instanceof Error) || !('type' in error)) return null;
  const limit = 'limit' in error ? Number(error.limit) : 0;
  switch (error.type) {
    case 'entity.parse.failed':
    case 'entity.verify.failed':
    case 'request.size.invalid':
    case 'request.aborted':
      return new AppError('bad-json', {
        message: 'The body is not valid JSON.',
      });
    case 'entity.too.large':
      return new AppError('too-large', {
        message: `The body is larger than the ${limit} bytes this address takes.`,
      });
    case 'encoding.unsupported':
    case 'charset.unsupported':
      return new AppError('wrong-type', {
        message: 'The body must be application/json in UTF-8, plain or compressed with gzip, deflate or br.',
      });
    default:
      return null;
  }
}

/** An address that cannot be decoded (%E0 and the like). */
function fromRouter(error: unknown): AppError | null {
  const status = error instanceof Error && 'status' in error ? error.status : undefined;
  if (error instanceof URIError || status === 400)
    return new AppError('bad-address', {
      message: 'The address cannot be decoded.',
    });
  return null;
}

export const notFound: RequestHandler = (request, _response, next) => {
  next(
    new AppError('not-found', {
      message: `There is nothing at ${(request.originalUrl.split('?')[0] as string).slice(0, 200)}.`,
    }),
  );
};

/** For addresses that exist under other methods. */
export function onlyMethods(...methods: readonly string[]): RequestHandler {
  return (request, response, next) => {
    response.setHeader('Allow', methods.join(', '));
    next(
      new AppError('wrong-method', {
        message: `${request.method} is not offered here: use ${methods.join(' or ')}.`,
      }),
    );
  };
}
