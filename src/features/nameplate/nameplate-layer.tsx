import { useEffect } from 'react';
import { useDocument } from '#src/stores/document-store.ts';
import { useNameplate } from '#src/stores/nameplate-store.ts';
import { FluidPlate, SupplyPlate } from './circuit-plates.tsx';
import { ComponentPlate } from './component-plate.tsx';
import { DutyPlate } from './duty-plate.tsx';
import { LinePlate } from './line-plate.tsx';
import { RequirementsPlate } from './requirements-plate.tsx';

/** The one open nameplate, over the drawing. It closes itself when its component is deleted. */
export function NameplateLayer() {
  const target = useNameplate((state) => state.target);
  const component = useDocument((state) => state.document.components.some((entry) => entry.id === target));
  const line = useDocument((state) => state.document.lines.some((entry) => entry.id === target));
  const known = component || line || ['fluid', 'reservoir', 'supply', 'site', 'duty', 'requirements'].includes(target ?? '');
  useEffect(() => {
    if (target !== null && !known) useNameplate.getState().close();
  }, [target, known]);
  if (target === null) return null;
  if (component) return <ComponentPlate key={target} componentId={target} />;
  if (line) return <LinePlate key={target} lineId={target} />;
  if (target === 'fluid' || target === 'reservoir') return <FluidPlate />;
  if (target === 'supply' || target === 'site') return <SupplyPlate />;
  if (target === 'duty') return <DutyPlate />;
  if (target === 'requirements') return <RequirementsPlate />;
  return null;
}
