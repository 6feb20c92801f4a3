import { kindIssues } from './check-kinds.ts';
import { referenceIssues } from './check-references.ts';
import { shortValue, structureIssues } from './check-structure.ts';
import type { Issue } from './issue.ts';
import { migrateDocument } from './migrations.ts';
import { type CircuitDocument, circuitDocument, DOCUMENT_FORMAT, DOCUMENT_VERSION, MAX_DOCUMENT_BYTES } from './schema.ts';
import { megabytes, utf8Length } from './text-size.ts';

export type CheckedDocument =
  | { readonly ok: true; readonly document: CircuitDocument; readonly migrated: readonly string[] }
  | { readonly ok: false; readonly issues: readonly Issue[] };

const refused = (path: string, message: string, value: unknown): CheckedDocument => ({
  ok: false,
  issues: [{ path, message, value: shortValue(value) }],
});

/** The only way into the product for a document from outside (file, draft, request): format and version first, then size,
 *  structure, and everything that depends on the component kinds. All issues are listed, not the first. A circuit that is
 *  merely unfinished (open ports, no motor) is a good document: that is the compiler's matter.
 *  Names are text and never markup: whatever stands in them is kept as it is and shown as text. */
export function checkDocument(input: unknown): CheckedDocument {
  if (typeof input !== 'object' || input === null || Array.isArray(input)) return refused('document', 'must be an object', input);
  const record = input as Readonly<Record<string, unknown>>;
  if (record.format !== DOCUMENT_FORMAT) {
    const found = typeof record.format === 'string' ? `this file says '${shortValue(record.format)}'` : 'this file does not say what it is';
    return refused('format', `must be '${DOCUMENT_FORMAT}'; ${found}`, record.format);
  }
  const version = record.version;
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 1) {
    return refused('version', `must be a whole number from 1 to ${DOCUMENT_VERSION}`, version);
  }
  if (version > DOCUMENT_VERSION) {
    return refused(
      'version',
      `version ${version} is newer than this program, which reads up to version ${DOCUMENT_VERSION}; nothing was touched`,
      version,
    );
  }
  const size = sizeOf(input);
  if (size === null) return refused('document', 'cannot be written as JSON: it refers to itself or is nested too deeply', input);
  if (size > MAX_DOCUMENT_BYTES) {
    return refused('document', `is ${megabytes(size)}; a circuit holds at most ${megabytes(MAX_DOCUMENT_BYTES)}`, `${size} bytes`);
  }
  const migrated = migrateDocument(record, version);
  if (!migrated) return refused('version', `there is no step from version ${version} to ${DOCUMENT_VERSION}`, version);
  const parsed = circuitDocument.safeParse(migrated.document);
  if (!parsed.success) return { ok: false, issues: structureIssues(parsed.error, migrated.document) };
  const issues = [...kindIssues(parsed.data), ...referenceIssues(parsed.data)];
  if (issues.length > 0) return { ok: false, issues };
  return { ok: true, document: parsed.data, migrated: migrated.taken };
}

function sizeOf(input: object): number | null {
  try {
    return utf8Length(JSON.stringify(input));
  } catch {
    return null;
  }
}
