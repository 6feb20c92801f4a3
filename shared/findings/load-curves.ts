/** What the load picture needs beside the run, computed by the engine once per case (findings/load-curves.ts fills it). */
export interface Curve {
  /** Pressure [Pa] and flow [m³/s] pairs, equal lengths. */
  readonly pressure: Float64Array;
  readonly flow: Float64Array;
}
export interface LoadCurves {
  readonly pump: string;
  readonly motor: string | null;
  /** Limits Q = w(T) · etav · T · etam / p at the run's lowest supply voltage; empty without a motor. */
  readonly rated: Curve;
  /** Torque whose current is k × relay dial: Trips begins there. */
  readonly trips: Curve;
  readonly pullOut: Curve;
  /** Steady P–Q line of the pump on its motor, in pieces; not drawn where no steady state exists. */
  readonly pumpLine: readonly Curve[];
  /** Compensator dead-head and knee [Pa]. */
  readonly deadHead: number;
  readonly knee: number;
  /** Relief on the pump's net: cracking and set pressure [Pa], or null. */
  readonly relief: { readonly component: string; readonly cracks: number; readonly set: number } | null;
  /** Channel addresses of the operating point. */
  readonly pressureAddress: string;
  readonly flowAddress: string;
}
