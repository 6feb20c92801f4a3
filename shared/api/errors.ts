import { z } from 'zod';

/** Every refusal the API knows. Clients branch on the code, never on the words. */
export const errorCodes = [
  /** A field is missing, unknown or out of range: `details` lists every one. */
  'bad-input',
  /** The body is not JSON. */
  'bad-json',
  /** The address cannot be decoded. */
  'bad-address',
  /** The body is larger than this route takes. */
  'too-large',
  /** The body is not application/json, or in an encoding that is not understood. */
  'wrong-type',
  /** Nothing lives at this address. */
  'not-found',
  /** The address exists, but not for this method. */
  'wrong-method',
  /** The policy says no. */
  'not-allowed',
  /** Too many requests from one place; Retry-After says when to come back. */
  'too-many',
  /** All workers are busy and the queue is full; Retry-After says when to come back. */
  'busy',
  /** The answer took longer than this server allows. */
  'too-slow',
  /** The database does not answer. */
  'no-database',
  /** A fault of the product; the request id finds it in the server's log. */
  'internal',
] as const;
export type ErrorCode = (typeof errorCodes)[number];

export const errorDetail = z.object({
  /** Field, as in components[2].parameters.setPressure.value. */
  path: z.string(),
  /** The value found there and what is allowed. */
  message: z.string(),
});
export type ErrorDetail = z.infer<typeof errorDetail>;

/** The one shape of every refusal. */
export const errorBody = z.object({
  error: z.object({
    code: z.enum(errorCodes),
    message: z.string(),
    requestId: z.string(),
    details: z.array(errorDetail).optional(),
  }),
});
export type ErrorBody = z.infer<typeof errorBody>;
