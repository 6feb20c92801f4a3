import { describe, expect, it } from 'vitest';
import { builtPress } from './edit/test-circuits.ts';
import { jsonFault } from './json-fault.ts';
import { documentText, parseDocumentText } from './parse-document-text.ts';
import { utf8Length } from './text-size.ts';

function firstMessage(text: string): string {
  const parsed = parseDocumentText(text);
  return parsed.ok ? '' : (parsed.issues[0]?.message ?? '');
}

describe('parseDocumentText', () => {
  it('reads back what documentText writes, with or without a byte-order mark', () => {
    const press = builtPress();
    for (const text of [documentText(press), `\uFEFF${documentText(press)}`]) {
      const parsed = parseDocumentText(text);
      expect(parsed.ok && parsed.document).toEqual(press);
    }
  });

  it('refuses 20 MB by its size, before parsing', () => {
    expect(firstMessage('['.repeat(20_000_000))).toBe('the file is 20 MB; a circuit file holds at most 4 MB');
  });

  it('says that a file is empty', () => {
    expect(firstMessage(' \n')).toBe('the file is empty');
  });

  it.each([
    ['{\n  "format": swash\n}', 2, 13],
    ['{\n  "format": "swashbench-circuit",\n}', 3, 1],
    ['{"a": 1', 1, 8],
    ['{"a" 1}', 1, 6],
    ['[1, 2,, 3]', 1, 7],
    ['{"a": "no end', 1, 14],
    ['{"a": 1} x', 1, 10],
    ['{"a": "\\q"}', 1, 8],
    ['{"a": 01}', 1, 8],
  ])('finds the fault in %j at line %d, column %d', (text, line, column) => {
    expect(() => JSON.parse(text)).toThrow();
    expect(jsonFault(text)).toMatchObject({ line, column });
    expect(firstMessage(text)).toContain(`line ${line}, column ${column}`);
  });

  it('survives a file of nothing but opening brackets', () => {
    expect(firstMessage('['.repeat(100_000))).toContain('nested deeper than 500 levels');
  });

  it('does not call sound JSON faulty before its end', () => {
    const text = JSON.stringify({ a: [1, -2.5e-3, true, false, null, 'x\n"\u2028'], b: {} });
    expect(jsonFault(`${text}!`)).toMatchObject({ column: text.length + 1 });
  });
});

describe('utf8Length', () => {
  it.each(['plain', 'cm³/rev', '€ 5', '🙂', 'a🙂b³'])('counts the bytes of %s', (text) => {
    expect(utf8Length(text)).toBe(encodeURIComponent(text).replace(/%[0-9A-F]{2}/g, 'x').length);
  });
});
