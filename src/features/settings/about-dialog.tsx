import { AFTER_A_TRIP, HELD_RELIEF, LOAD_HOLDING, RELIEF_IS_THE_SAFETY_DEVICE, STANDING_CAUTION } from '#shared/findings/cautions.ts';
import { SheetDialog } from '#src/components/dialog.tsx';
import { ServerData } from '#src/components/server-data.tsx';
import { ServerState } from './server-state.tsx';

/** What the product is, and its cautions word for word. */
export function AboutDialog({ onClose }: { readonly onClose: () => void }) {
  return (
    <SheetDialog title="About and cautions" onClose={onClose}>
      <p>
        Swashbench calculates what a hydraulic power unit with a pressure-compensated pump does with its adjusting screws where they are:
        pressure, flow and motor load over time. It is an aid to judgement. It never replaces the manufacturer’s data, local codes, or
        licensed practice.
      </p>
      <h3 className="region-heading">Standing caution</h3>
      <p>{STANDING_CAUTION}</p>
      <h3 className="region-heading">Where they apply</h3>
      <ul className="word-list">
        <li>{RELIEF_IS_THE_SAFETY_DEVICE}</li>
        <li>After a trip: {AFTER_A_TRIP}</li>
        <li>{HELD_RELIEF}</li>
        <li>Load holding: {LOAD_HOLDING}</li>
      </ul>
      <h3 className="region-heading">Order of setting on the machine</h3>
      <ol className="word-list word-list-numbered">
        <li>stop in, drive stopped</li>
        <li>prove the relief, seconds only (if the compensator cannot reach it, on a stand)</li>
        <li>compensator down to target, outlet blocked</li>
        <li>stop out to target</li>
        <li>read amps, dead-head pressure and stroke time</li>
      </ol>
      <h3 className="region-heading">On this device</h3>
      <p>The circuit in hand is kept in this browser and nowhere else. Save it as a file to keep it elsewhere.</p>
      <ServerData>
        <ServerState />
      </ServerData>
    </SheetDialog>
  );
}
