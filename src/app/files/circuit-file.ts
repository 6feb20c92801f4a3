import { documentText, MAX_FILE_BYTES, parseDocumentText } from '#shared/circuit/parse-document-text.ts';
import { megabytes } from '#shared/circuit/text-size.ts';
import { pickFile } from '#src/lib/pick-file.ts';
import { fileName, saveFile } from '#src/lib/save-file.ts';
import { showDialog } from '#src/stores/dialog-store.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { useKeeping } from '#src/stores/keeping-store.ts';

/** Reads a circuit file. A refused one is explained, field by field, and the circuit in hand stays; a good one replaces it
 *  as one step that can be undone. */
export async function readFile(file: File): Promise<boolean> {
  if (file.size > MAX_FILE_BYTES) {
    const message = `the file is ${megabytes(file.size)}; a circuit file holds at most ${megabytes(MAX_FILE_BYTES)}`;
    showDialog({ id: 'refused-file', file: file.name, issues: [{ path: 'file', message, value: `${file.size} bytes` }] });
    return false;
  }
  let text: string;
  try {
    text = await file.text();
  } catch {
    showDialog({
      id: 'refused-file',
      file: file.name,
      issues: [{ path: 'file', message: 'could not be read from the device', value: file.name }],
    });
    return false;
  }
  const checked = parseDocumentText(text);
  if (!checked.ok) {
    showDialog({ id: 'refused-file', file: file.name, issues: checked.issues });
    return false;
  }
  useDocument.getState().edit(() => checked.document);
  useKeeping.getState().setNotice(`Opened ${file.name}. Undo brings the former circuit back.`);
  return true;
}

export async function openFile(): Promise<void> {
  const file = await pickFile('.json,application/json');
  if (file) await readFile(file);
}

export function saveCircuit(): void {
  const { document } = useDocument.getState();
  saveFile(fileName(document.title, 'json'), documentText(document), 'application/json');
}
