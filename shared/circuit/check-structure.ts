import type * as z from 'zod/mini';
import { plainNumber } from './in-words.ts';
import type { Issue } from './issue.ts';

/** What the schema found, in our words: every issue names its path, the value there and what is allowed. */
export function structureIssues(error: z.core.$ZodError, input: unknown): Issue[] {
  const issues: Issue[] = [];
  for (const issue of error.issues) {
    const path = issue.path.map((part) => (typeof part === 'symbol' ? String(part) : part));
    if (issue.code === 'unrecognized_keys') {
      for (const key of issue.keys) {
        const at = [...path, key];
        issues.push({ path: pathInWords(at), message: 'is not a field of a circuit document', value: shortValue(valueAtPath(input, at)) });
      }
      continue;
    }
    const value = valueAtPath(input, path);
    issues.push({ path: pathInWords(path), message: messageOf(issue, value), value: shortValue(value) });
  }
  return issues;
}

function messageOf(issue: z.core.$ZodIssue, value: unknown): string {
  if (value === undefined) return 'is missing';
  if (issue.code === 'invalid_type') return issue.expected === 'int' ? 'must be a whole number' : `must be ${kindOfValue(issue.expected)}`;
  if (issue.code === 'too_small') return sizeMessage('at least', issue.origin, Number(issue.minimum));
  if (issue.code === 'too_big') return sizeMessage('at most', issue.origin, Number(issue.maximum));
  if (issue.code === 'invalid_value') return `must be ${issue.values.length > 1 ? 'one of ' : ''}${issue.values.map(String).join(', ')}`;
  if (issue.code === 'invalid_union') return unionMessage(issue);
  return issue.message;
}

function unionMessage(issue: z.core.$ZodIssueInvalidUnion): string {
  const values = issue.errors.flatMap((branch) =>
    branch.flatMap((entry) => (entry.code === 'invalid_value' ? entry.values.map(String) : [])),
  );
  return values.length > 0 ? `must be one of ${values.join(', ')}` : 'must be a finite number or a text of at most 40 characters';
}

function sizeMessage(bound: string, origin: string, limit: number): string {
  if (origin === 'string') return `must have ${bound} ${limit} characters`;
  if (origin === 'array') return `must have ${bound} ${limit} entries`;
  return `must be ${bound} ${plainNumber(limit)}`;
}

function kindOfValue(expected: string): string {
  const words: Readonly<Record<string, string>> = {
    number: 'a finite number',
    string: 'a text',
    boolean: 'true or false',
    array: 'a list',
    object: 'an object',
    record: 'an object',
  };
  return words[expected] ?? expected;
}

/** components[2].at.x */
export function pathInWords(path: readonly (string | number)[]): string {
  let words = '';
  for (const part of path) words += typeof part === 'number' ? `[${part}]` : words === '' ? part : `.${part}`;
  return words || 'document';
}

function valueAtPath(input: unknown, path: readonly (string | number)[]): unknown {
  let current = input;
  for (const part of path) {
    if (typeof current !== 'object' || current === null || !Object.hasOwn(current, part)) return undefined;
    current = (current as Readonly<Record<string | number, unknown>>)[part];
  }
  return current;
}

/** The offending value, short enough to print: objects and lists are named, long texts are cut. */
export function shortValue(value: unknown): unknown {
  if (typeof value === 'string') return value.length > 60 ? `${value.slice(0, 57)}…` : value;
  if (typeof value === 'number' && !Number.isFinite(value)) return String(value);
  if (Array.isArray(value)) return `list of ${value.length}`;
  if (typeof value === 'object' && value !== null) return 'object';
  return value;
}
