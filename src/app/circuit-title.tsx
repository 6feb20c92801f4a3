import { useState } from 'react';
import { setTitle } from '#shared/circuit/edit/sheet.ts';
import { MiddleEllipsis } from '#src/components/middle-ellipsis.tsx';
import { useDocument } from '#src/stores/document-store.ts';

/** The circuit's title; pressing it lets it be written anew. */
export function CircuitTitle({ most }: { readonly most: number }) {
  const title = useDocument((state) => state.document.title);
  const [editing, setEditing] = useState(false);

  function finish(text: string) {
    setEditing(false);
    useDocument.getState().edit((document) => setTitle(document, text));
  }

  if (editing) {
    return (
      <input
        className="circuit-title"
        aria-label="Title of the circuit"
        defaultValue={title}
        maxLength={120}
        // biome-ignore lint/a11y/noAutofocus: the person has just asked to write here
        autoFocus
        onFocus={(event) => event.target.select()}
        onBlur={(event) => finish(event.target.value)}
        onKeyDown={(event) => {
          if (event.key === 'Enter') finish(event.currentTarget.value);
          if (event.key === 'Escape') setEditing(false);
        }}
      />
    );
  }
  return (
    <h1 className="circuit-heading">
      <button type="button" className="circuit-title" title="Change the title" onClick={() => setEditing(true)}>
        <MiddleEllipsis text={title} most={most} />
      </button>
    </h1>
  );
}
