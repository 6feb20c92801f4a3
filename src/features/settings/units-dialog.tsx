import { fromSi, preferredUnit, unitById } from '#shared/units/convert.ts';
import { type Quantity, type QuantityId, quantities } from '#shared/units/quantities.ts';
import { SheetDialog } from '#src/components/dialog.tsx';
import { useFormat } from '#src/components/use-format.ts';
import { usePreferences } from '#src/stores/preferences-store.ts';
import { tradePairs } from './trade-words.ts';

/** An everyday amount of each quantity [SI], so that a choice shows what it does. */
const examples: Partial<Record<QuantityId, number>> = {
  pressure: 190e5,
  flow: 40e-3 / 60,
  displacement: 28e-6 / (2 * Math.PI),
  speed: (1450 * Math.PI) / 30,
  torque: 36.2,
  power: 5500,
  energy: 4000,
  force: 52e3,
  length: 0.063,
  velocity: 0.13,
  volume: 0.12,
  area: 1.2,
  mass: 400,
  inertia: 0.02,
  temperature: 313.15,
  density: 870,
  modulus: 1.7e9,
  pressurePerTurn: 38e5,
  displacementPerTurn: 4e-6 / (2 * Math.PI),
  leakage: 0.014e-3 / 60 / 1e5,
  damping: 2000,
  stiffness: 50e3,
  time: 3.34,
};

/** SI or US, and each quantity on its own: many shops mix psi with cm³/rev. Numbers are kept in SI whatever is shown. */
export function UnitsDialog({ onClose }: { readonly onClose: () => void }) {
  const { system, overrides, decimal, set } = usePreferences();
  const { preferences, quantity: show } = useFormat();
  const rows = (Object.entries(quantities) as [QuantityId, Quantity][]).filter(([, quantity]) => quantity.units.length > 1);

  function choose(id: QuantityId, unit: string) {
    const { [id]: _gone, ...rest } = overrides;
    set({ overrides: unit === quantities[id][system] ? rest : { ...rest, [id]: unit } });
  }

  return (
    <SheetDialog
      title="Units"
      onClose={onClose}
      foot={
        <>
          <button type="button" className="button" disabled={Object.keys(overrides).length === 0} onClick={() => set({ overrides: {} })}>
            All as the system
          </button>
          <button type="button" className="button-primary" onClick={onClose}>
            Done
          </button>
        </>
      }
    >
      <div className="setting-rows">
        <label className="setting-row">
          <span>System</span>
          <select className="select" value={system} onChange={(event) => set({ system: event.target.value === 'us' ? 'us' : 'si' })}>
            <option value="si">SI: bar, L/min, kW, cm³/rev, N·m, °C</option>
            <option value="us">US: psi, gpm, hp, in³/rev, lbf·ft, °F</option>
          </select>
        </label>
        <label className="setting-row">
          <span>Decimal sign</span>
          <select className="select" value={decimal} onChange={(event) => set({ decimal: event.target.value === ',' ? ',' : '.' })}>
            <option value=".">Point: 16.0</option>
            <option value=",">Comma: 16,0</option>
          </select>
        </label>
      </div>
      <h3 className="region-heading">Each quantity</h3>
      <p className="text-14 text-ink2">Any unit may be typed in any field; the suffix decides. These are the units shown.</p>
      <table className="table">
        <thead>
          <tr>
            <th scope="col">Quantity</th>
            <th scope="col">Shown in</th>
            <th scope="col" className="number">
              For example
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map(([id, quantity]) => {
            const unit = preferredUnit(id, preferences);
            const example = examples[id];
            return (
              <tr key={id}>
                <th scope="row" id={`unit-${id}`}>
                  {quantity.label}
                </th>
                <td>
                  <select
                    className="select"
                    aria-labelledby={`unit-${id}`}
                    value={unit.id}
                    onChange={(event) => choose(id, event.target.value)}
                  >
                    {quantity.units.map((entry) => (
                      <option key={entry.id} value={entry.id}>
                        {entry.symbol || 'number'}
                        {entry.id === quantities[id][system] ? ' (as the system)' : ''}
                      </option>
                    ))}
                  </select>
                </td>
                <td className="number">
                  <span className="figure">
                    {example === undefined ? show(1, id, { style: 'plate' }).text : show(example, id, { style: 'plate' }).text}
                  </span>
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
      <h3 className="region-heading">Words of the trade</h3>
      <p className="text-14 text-ink2">
        The other word of each pair, for reading other people’s sheets. The screens keep to the first column.
      </p>
      <table className="table">
        <thead>
          <tr>
            <th scope="col">Here</th>
            <th scope="col">Elsewhere</th>
          </tr>
        </thead>
        <tbody>
          {tradePairs.map(([here, elsewhere]) => (
            <tr key={here}>
              <th scope="row">{here}</th>
              <td>{elsewhere}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="text-14 text-ink2">
        One psi is {fromSi(unitById('pressure', 'psi').factor, unitById('pressure', 'bar')).toPrecision(6)} bar; one gpm (US) is{' '}
        {fromSi(unitById('flow', 'gpm').factor, unitById('flow', 'L/min')).toPrecision(6)} L/min.
      </p>
    </SheetDialog>
  );
}
