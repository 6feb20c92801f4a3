/** Where a text stops being JSON. Hosts word and place this differently, so we look ourselves; only called on a text that
 *  JSON.parse has refused. */
export interface JsonFault {
  readonly line: number;
  readonly column: number;
  readonly message: string;
  /** Up to 20 characters from the fault on. */
  readonly near: string;
}

const MOST_NESTING = 500;

class Fault {
  constructor(
    readonly at: number,
    readonly message: string,
  ) {}
}

export function jsonFault(text: string): JsonFault {
  let at = text.length;
  let message = 'the text ends too early';
  try {
    const end = skipSpace(text, readValue(text, skipSpace(text, 0), 0));
    if (end < text.length) throw new Fault(end, 'nothing may follow the closing brace');
  } catch (fault) {
    if (!(fault instanceof Fault)) throw fault;
    at = Math.min(fault.at, text.length);
    message = at >= text.length ? `the text ends too early: ${fault.message}` : fault.message;
  }
  const before = text.slice(0, at);
  const line = before.split('\n').length;
  return { line, column: at - before.lastIndexOf('\n'), message, near: text.slice(at, at + 20) };
}

function skipSpace(text: string, from: number): number {
  let at = from;
  while (at < text.length && ' \t\r\n'.includes(text.charAt(at))) at++;
  return at;
}

function readValue(text: string, at: number, depth: number): number {
  if (depth > MOST_NESTING) throw new Fault(at, `nested deeper than ${MOST_NESTING} levels`);
  const character = text.charAt(at);
  if (character === '{') return readList(text, at, depth, '}', true);
  if (character === '[') return readList(text, at, depth, ']', false);
  if (character === '"') return readText(text, at);
  const word = /(?:true|false|null)(?![A-Za-z0-9_])/y;
  word.lastIndex = at;
  if (word.test(text)) return word.lastIndex;
  const number = /-?(?:0|[1-9][0-9]*)(?:\.[0-9]+)?(?:[eE][+-]?[0-9]+)?/y;
  number.lastIndex = at;
  if (number.test(text)) return number.lastIndex;
  throw new Fault(at, 'a value was expected (text in double quotes, number, true, false, null, { or [)');
}

function readList(text: string, start: number, depth: number, close: string, named: boolean): number {
  let at = skipSpace(text, start + 1);
  if (text.charAt(at) === close) return at + 1;
  for (;;) {
    if (named) {
      if (text.charAt(at) !== '"') throw new Fault(at, 'a field name in double quotes was expected');
      at = skipSpace(text, readText(text, at));
      if (text.charAt(at) !== ':') throw new Fault(at, "':' was expected after the field name");
      at = skipSpace(text, at + 1);
    }
    at = skipSpace(text, readValue(text, at, depth + 1));
    if (text.charAt(at) === close) return at + 1;
    if (text.charAt(at) !== ',') throw new Fault(at, `',' or '${close}' was expected`);
    at = skipSpace(text, at + 1);
  }
}

function readText(text: string, start: number): number {
  for (let at = start + 1; at < text.length; at++) {
    const character = text.charAt(at);
    if (character === '"') return at + 1;
    if (character < ' ') throw new Fault(at, 'a text may not run over the end of its line');
    if (character !== '\\') continue;
    const sequence = /\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4})/y;
    sequence.lastIndex = at;
    if (!sequence.test(text)) throw new Fault(at, 'unknown escape after a backslash');
    at = sequence.lastIndex - 1;
  }
  throw new Fault(text.length, 'a closing double quote was expected');
}
