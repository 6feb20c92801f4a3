import type { ComponentKind, Plate } from '../kinds/kind.ts';
import type { Component } from './schema.ts';

/** Read access to a component's values: what the document (or the case written over it) gives, typical values filled in.
 *  `number` of a fault that is not given is 0. Values of the wrong type count as not given. An unknown id, or a parameter
 *  with neither a value nor a typical one, reads NaN ('' for a choice): compiling refuses coefficients that come out so. */
export function plateOf(component: Component, kind: ComponentKind): Plate {
  const { parameters } = component;
  const given = (id: string): number | null => {
    const value = parameters[id]?.value;
    return typeof value === 'number' ? value : null;
  };
  return {
    given,
    number(id) {
      const value = given(id);
      if (value !== null) return value;
      const spec = kind.parameters.find((entry) => entry.id === id);
      if (spec?.type === 'number') return spec.initial ?? Number.NaN;
      return id.startsWith('fault.') ? 0 : Number.NaN;
    },
    choice(id) {
      const spec = kind.parameters.find((entry) => entry.id === id);
      if (spec?.type !== 'choice') return '';
      const value = parameters[id]?.value;
      return typeof value === 'string' && spec.choices.some((choice) => choice.value === value) ? value : spec.initial;
    },
  };
}
