/** Limits of the shop that turn figures into findings. Each with its source; a shop will be able to keep its own. */

/** Least stall margin: pull-out torque at the lowest supply ÷ highest torque asked. House rule, common practice, no source. */
export const LEAST_STALL_MARGIN = 1.25;
/** Least gap between dead-head and the relief's cracking pressure [Pa]: 10 bar, the lower end of C4 (10–20 bar). */
export const LEAST_RELIEF_GAP = 10e5;
/** Gauge error as a share of its range: grade B, 2 % of span mid-scale (needs sheet, source 62). */
export const GAUGE_ERROR = 0.02;
/** What is taken where no gauge is drawn [Pa]. Common practice, no source. */
export const GAUGE_ERROR_UNKNOWN = 5e5;
/** Supply outside this share of nameplate volts: no nameplate rating applies (MODEL: within ±10 %). */
export const VOLTAGE_BAND = 0.1;
/** A relief that passes oil at least this long is a heater, not a guard [s]. Choice of the model. */
export const PASSING_TIME = 1;
/** …at this share of the pump's highest flow, and never under 0.5 L/min. Choice of the model. */
export const PASSING_SHARE = 0.05;
export const PASSING_LEAST = 0.5e-3 / 60;
/** Recovery time that separates a dip from a stall [s] (CONTRACTS). */
export const STALL_TIME = 0.5;
/** Run-up is over this long after pull-out speed is first passed [s] (CONTRACTS). */
export const RUN_UP_EXTRA = 0.2;
/** A rod slower than this is at rest [m/s]. Choice of the model. */
export const AT_REST = 2e-3;
/** Oil temperature at which the tank warns [K]: 60 °C, V5; air around the tank 20 °C (section 15). */
export const OIL_WARNING = 333.15;
export const AMBIENT = 293.15;
/** Tank coefficient [W/(m²·K)]: section 15 (F18). */
export const TANK_COEFFICIENT = 10;
/** Inlet pressure under which a pump may starve [Pa abs]: section 15 (K1, K2). */
export const INLET_WARNING = 0.8e5;
