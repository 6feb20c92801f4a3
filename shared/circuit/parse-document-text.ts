import { type CheckedDocument, checkDocument } from './check-document.ts';
import { jsonFault } from './json-fault.ts';
import { MAX_DOCUMENT_BYTES } from './schema.ts';
import { megabytes, utf8Length } from './text-size.ts';

/** A file may be indented, so it may be larger than the document itself, which is measured without spaces. */
export const MAX_FILE_BYTES = 4 * MAX_DOCUMENT_BYTES;

/** Reads a circuit file. A file that is too large is refused before it is parsed; broken JSON is refused with the line and
 *  column of the first fault and what was expected there. A byte-order mark at the start is allowed. */
export function parseDocumentText(text: string): CheckedDocument {
  const body = text.startsWith('\uFEFF') ? text.slice(1) : text;
  const size = utf8Length(body);
  if (size > MAX_FILE_BYTES) {
    const message = `the file is ${megabytes(size)}; a circuit file holds at most ${megabytes(MAX_FILE_BYTES)}`;
    return { ok: false, issues: [{ path: 'file', message, value: `${size} bytes` }] };
  }
  if (body.trim() === '') return { ok: false, issues: [{ path: 'file', message: 'the file is empty', value: '' }] };
  let input: unknown;
  try {
    input = JSON.parse(body);
  } catch {
    const fault = jsonFault(body);
    const message = `is not JSON: line ${fault.line}, column ${fault.column}: ${fault.message}`;
    return { ok: false, issues: [{ path: 'file', message, value: fault.near }] };
  }
  return checkDocument(input);
}

/** The file that parseDocumentText reads back: indented, one trailing line break, keys in schema order. */
export function documentText(document: object): string {
  return `${JSON.stringify(document, null, 2)}\n`;
}
