/** Cautions, word for word as the product brief gives them. Shown with a finding where they apply; the standing one always. */

export const STANDING_CAUTION =
  'A calculation, not a permission. Stop and lock out. Lower or block the load, let pressure down and prove zero at the cylinder as well as the pump; a gauge at the pump can read zero while a cylinder is loaded. Turn a quarter, tighten the nut, stand clear, start, read. Repeat.';

export const AFTER_A_TRIP =
  'Find the cause before resetting. Let the motor cool. One restart, unloaded; a second trip ends the trial. Never automatic reset on a machine that can move.';

export const HELD_RELIEF = 'Held relief: seconds with case or internal drain, never over one minute; feel nothing by hand.';

export const LOAD_HOLDING =
  'A spool, a pump check, a compensator or a motor does not hold a load. Block it. Never adjust a load-holding valve under a hung load; some makes turn the other way.';

export const RELIEF_IS_THE_SAFETY_DEVICE =
  "Stored energy and injection injury; the relief valve is the safety device, the compensator is not; never above the lowest rating in the circuit; local codes and manufacturer's data prevail; motor protection is a licensed electrician's job.";
