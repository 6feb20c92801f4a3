import { portInWords } from '#shared/circuit/kind-lookup.ts';
import type { Line } from '#shared/circuit/schema.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { PlateCard } from './plate-card.tsx';
import { PlateTable } from './plate-table.tsx';

/** Data of a line; the loss coefficients only where the loss is calculated. */
export function LineRows({ line, heads = false }: { readonly line: Line; readonly heads?: boolean }) {
  const fields = ['length', 'bore', 'wall', 'volume', 'loss', ...(line.loss ? ['laminar', 'quadratic'] : [])];
  return <PlateTable caption={`Line ${line.id}`} target={line.id} fields={fields} heads={heads} />;
}

export function LinePlate({ lineId }: { readonly lineId: string }) {
  const document = useDocument((state) => state.document);
  const line = document.lines.find((entry) => entry.id === lineId);
  if (!line) return null;
  return (
    <PlateCard target={lineId} title={`Line ${lineId}`} note={`${portInWords(document, line.from)} to ${portInWords(document, line.to)}`}>
      <LineRows line={line} heads />
      <p className="plate-about">
        A line is a connection with data: its bore and length give the oil volume behind the ports it joins. The loss, laminar plus
        quadratic at the oil’s viscosity, is left out until it is switched on.
      </p>
    </PlateCard>
  );
}
