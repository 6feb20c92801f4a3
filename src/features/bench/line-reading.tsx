import { useRef } from 'react';
import { findKind } from '#shared/circuit/kind-lookup.ts';
import { useMoment } from '#src/components/schematic/moment.ts';
import { useFormat } from '#src/components/use-format.ts';
import { useDocument } from '#src/stores/document-store.ts';

/** Pressure of the pump line, above the small drawing of a phone. */
export function LineReading() {
  const format = useFormat();
  const components = useDocument((state) => state.document.components);
  const value = useRef<HTMLElement>(null);
  const unit = useRef<HTMLSpanElement>(null);
  const pump = components.find((component) => findKind(component.kind)?.ports.some((port) => port.source));
  const port = pump && findKind(pump.kind)?.ports.find((entry) => entry.source);
  const address = pump && port ? `${pump.id}.${port.id}.pressure` : null;
  useMoment(({ at }) => {
    const pressure = address ? at(address) : undefined;
    const shown = pressure === undefined ? null : format.quantity(pressure, 'pressure');
    if (value.current) value.current.textContent = shown?.value ?? '';
    if (unit.current) unit.current.textContent = shown ? `${shown.unit}, pump line` : '';
  });
  return (
    <p className="line-reading">
      <strong ref={value} className="reading" /> <span ref={unit} className="unit" />
    </p>
  );
}
