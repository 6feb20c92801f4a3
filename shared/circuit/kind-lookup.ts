import type { ComponentKind, ParameterSpec, PortSpec, ScrewSpec } from '../kinds/kind.ts';
import { kindOf } from '../kinds/registry.ts';
import { symbolOf } from '../symbols/registry.ts';
import type { CircuitDocument, Component, PortRef } from './schema.ts';

/** Questions about a component that its kind answers. All give undefined for a kind, port or parameter that does not exist. */

export function findKind(id: string): ComponentKind | undefined {
  return kindOf(id);
}

export function findComponent(document: CircuitDocument, id: string): Component | undefined {
  return document.components.find((entry) => entry.id === id);
}

export function kindOfComponent(document: CircuitDocument, id: string): ComponentKind | undefined {
  const component = findComponent(document, id);
  return component && findKind(component.kind);
}

export function findPort(document: CircuitDocument, ref: PortRef): PortSpec | undefined {
  return kindOfComponent(document, ref.component)?.ports.find((port) => port.id === ref.port);
}

export function findParameter(kind: ComponentKind, id: string): ParameterSpec | undefined {
  return kind.parameters.find((spec) => spec.id === id);
}

export function findScrew(kind: ComponentKind, id: string): ScrewSpec | undefined {
  return kind.screws.find((screw) => screw.id === id);
}

/** Size of a kind's symbol in modules; 4 × 4 where it has none. */
export function symbolSize(kind: string): { width: number; height: number } {
  const symbol = symbolOf(kind);
  return symbol ? { width: symbol.width, height: symbol.height } : { width: 4, height: 4 };
}

/** How a component is called in a sentence: its item code, else the word of its kind. */
export function nameInWords(component: Component): string {
  return component.name || findKind(component.kind)?.word || component.kind;
}

/** How a port is called in a sentence: 'P1 outlet', 'V2 port T'. */
export function portInWords(document: CircuitDocument, ref: PortRef): string {
  const component = findComponent(document, ref.component);
  const port = findPort(document, ref);
  const name = component ? nameInWords(component) : ref.component;
  if (!port) return `${name} ${ref.port}`;
  return `${name} ${port.label.charAt(0).toLowerCase()}${port.label.slice(1)}`;
}

export function samePort(a: PortRef, b: PortRef): boolean {
  return a.component === b.component && a.port === b.port;
}
