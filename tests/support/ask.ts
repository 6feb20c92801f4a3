import { expect } from 'vitest';
import { type ErrorBody, errorBody } from '#shared/api/errors.ts';

/** POST of a value as JSON, or of a text as it is. */
export function post(url: string, body: unknown, headers: Readonly<Record<string, string>> = {}): Promise<Response> {
  return fetch(url, {
    method: 'POST',
    headers: { 'content-type': 'application/json', ...headers },
    body: typeof body === 'string' ? body : JSON.stringify(body),
  });
}

/** Reads a refusal and holds it to the one error shape: nothing beside it, the id also in the header, no trace of the code. */
export async function refusal(response: Response, status: number, code: ErrorBody['error']['code']): Promise<ErrorBody['error']> {
  const text = await response.text();
  expect({ status: response.status, body: text }).toMatchObject({ status });
  expect(response.headers.get('content-type')).toContain('application/json');
  const body: unknown = JSON.parse(text);
  const { error } = errorBody.parse(body);
  expect(Object.keys(body as object)).toEqual(['error']);
  expect(Object.keys((body as ErrorBody).error).filter((key) => !['code', 'message', 'requestId', 'details'].includes(key))).toEqual([]);
  expect(error.code).toBe(code);
  expect(error.requestId).toBe(response.headers.get('x-request-id'));
  expect(text).not.toMatch(/\n\s+at |node_modules|\.ts:\d|Error:/);
  return error;
}
