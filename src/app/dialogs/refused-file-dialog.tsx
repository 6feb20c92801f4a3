import type { Issue } from '#shared/circuit/issue.ts';
import { SheetDialog } from '#src/components/dialog.tsx';

export interface RefusedFileDialogProps {
  readonly file: string;
  readonly issues: readonly Issue[];
  readonly onClose: () => void;
}

const MOST = 100;

function shown(value: unknown): string {
  if (value === undefined || value === null || value === '') return '\u2013';
  const text = typeof value === 'string' ? value : JSON.stringify(value);
  return text.length > 80 ? `${text.slice(0, 80)}\u2026` : text;
}

/** Why a file was not opened: every issue with its field, the value found and what is allowed. */
export function RefusedFileDialog({ file, issues, onClose }: RefusedFileDialogProps) {
  return (
    <SheetDialog
      title="This file was not opened"
      onClose={onClose}
      foot={
        <button type="button" className="button-primary" onClick={onClose}>
          Back to the circuit in hand
        </button>
      }
    >
      <p>
        <strong>{file}</strong>: {issues.length === 1 ? 'one thing is wrong' : `${issues.length} things are wrong`}. The circuit in hand is
        untouched.
      </p>
      <div className="scroll-x">
        <table className="table">
          <thead>
            <tr>
              <th scope="col">Field</th>
              <th scope="col">Found</th>
              <th scope="col">What is allowed</th>
            </tr>
          </thead>
          <tbody>
            {issues.slice(0, MOST).map((issue) => (
              <tr key={`${issue.path}:${issue.message}`}>
                <td className="break">{issue.path}</td>
                <td className="break">{shown(issue.value)}</td>
                <td>{issue.message}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {issues.length > MOST && <p>and {issues.length - MOST} more.</p>}
    </SheetDialog>
  );
}
