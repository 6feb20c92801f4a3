import { PlateCard } from './plate-card.tsx';
import { PlateTable } from './plate-table.tsx';

/** Fluid and tank: shared by the whole circuit. */
export function FluidPlate() {
  return (
    <PlateCard target="fluid" title="Fluid and tank" note="one for the whole circuit">
      <PlateTable caption="Fluid" target="fluid" fields={['grade', 'temperature', 'airFraction', 'bulkModulus', 'density']} heads />
      <PlateTable caption="Tank" target="reservoir" fields={['volume', 'temperature', 'coolingArea']} />
      <p className="plate-about">
        Grade and temperature give density and viscosity once per run. Leakages rise as the oil thins, viscous drags fall. All tank symbols
        share this one tank.
      </p>
    </PlateCard>
  );
}

/** Supply and site. */
export function SupplyPlate() {
  return (
    <PlateCard target="supply" title="Supply and site" note="drives every motor">
      <PlateTable caption="Supply" target="supply" fields={['voltage', 'frequency', 'impedance']} heads />
      <PlateTable caption="Site" target="site" fields={['altitude']} />
      <p className="plate-about">
        No-load voltage, frequency and a series impedance per phase: the voltage at the motor sags with its current. A supply outside ± 10 %
        of the nameplate is to be cured by a licensed electrician; no nameplate rating applies there.
      </p>
    </PlateCard>
  );
}
