import { renameComponent } from '#shared/circuit/edit/components.ts';
import { findComponent, findKind, nameInWords, portInWords } from '#shared/circuit/kind-lookup.ts';
import type { Component, Line } from '#shared/circuit/schema.ts';
import type { ComponentKind, ParameterGroup } from '#shared/kinds/kind.ts';
import { useDocument } from '#src/stores/document-store.ts';
import { LineRows } from './line-plate.tsx';
import { PlateCard } from './plate-card.tsx';
import { PlateTable } from './plate-table.tsx';

function idsOf(kind: ComponentKind, ...groups: readonly ParameterGroup[]): readonly string[] {
  return kind.parameters.filter((spec) => groups.includes(spec.group)).map((spec) => spec.id);
}

/** A component's full data card. */
export function ComponentPlate({ componentId }: { readonly componentId: string }) {
  const document = useDocument((state) => state.document);
  const component = findComponent(document, componentId);
  const kind = component && findKind(component.kind);
  if (!component || !kind) return null;
  const lines = document.lines.filter((line) => line.from.component === componentId || line.to.component === componentId);
  return (
    <PlateCard
      target={componentId}
      title={`${kind.word.charAt(0).toUpperCase()}${kind.word.slice(1)} ${component.name}`.trim()}
      note={`${kind.title.toLowerCase()}${component.part ? `, ${component.part}` : ''}`}
    >
      <NameField component={component} />
      <PlateTable caption={`Nameplate of ${nameInWords(component)}`} target={componentId} fields={idsOf(kind, 'plate', 'setting')} heads />
      <PlateTable caption="Load" target={componentId} fields={idsOf(kind, 'load')} />
      <PlateTable caption="Details" target={componentId} fields={idsOf(kind, 'detail')} folded />
      <PlateTable
        caption="Faults, 0 % none to 100 % whole"
        target={componentId}
        fields={kind.faults.map((fault) => `fault.${fault.id}`)}
        folded
      />
      <PlateTable caption="Raw coefficients instead of the plate" target={componentId} fields={idsOf(kind, 'raw')} folded />
      <Ports kind={kind} component={component} lines={lines} />
      <p className="plate-about">{kind.about}</p>
    </PlateCard>
  );
}

/** The item code on the drawing. */
function NameField({ component }: { readonly component: Component }) {
  return (
    <label className="plate-code">
      <span>Name on the drawing</span>
      <input
        key={component.name}
        className="field"
        defaultValue={component.name}
        maxLength={60}
        onBlur={(event) => {
          const { value } = event.target;
          useDocument.getState().edit((document) => renameComponent(document, component.id, value));
        }}
        onKeyDown={(event) => {
          if (event.key === 'Enter') event.currentTarget.blur();
        }}
      />
    </label>
  );
}

interface PortsProps {
  readonly kind: ComponentKind;
  readonly component: Component;
  readonly lines: readonly Line[];
}

/** Where each oil port leads, with the data of its line. */
function Ports({ kind, component, lines }: PortsProps) {
  const document = useDocument((state) => state.document);
  const oil = kind.ports.filter((port) => port.medium === 'oil');
  if (oil.length === 0) return null;
  const open = { problem: 'open: it must be joined', tank: 'open: assumed to tank', plugged: 'open: assumed plugged' } as const;
  return (
    <section className="plate-section">
      <h3 className="plate-caption">Ports and lines</h3>
      {oil.map((port) => {
        const line = lines.find(({ from, to }) => [from, to].some((end) => end.component === component.id && end.port === port.id));
        if (!line) {
          return (
            <p key={port.id} className="plate-port">
              <strong>{port.letter || port.label}</strong> {port.letter && `${port.label.toLowerCase()}, `}
              {open[port.whenOpen]}
            </p>
          );
        }
        const end = line.from.component === component.id && line.from.port === port.id ? line.to : line.from;
        return (
          <div key={port.id}>
            <p className="plate-port">
              <strong>{port.letter || port.label}</strong> {port.letter && `${port.label.toLowerCase()}, `}joined to{' '}
              {portInWords(document, end)}
            </p>
            <LineRows line={line} />
          </div>
        );
      })}
    </section>
  );
}
