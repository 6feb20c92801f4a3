import * as z from 'zod/mini';

/** The circuit document, version 1: everything a circuit is, in SI, and nothing a run produces.
 *  Structure only; what depends on the kinds (parameter names, ranges, ports) is checked by `checkDocument` in check-document.ts.
 *  Positions are in modules on the drawing (one module = the grid step). All keys strict, all numbers finite. */

export const DOCUMENT_FORMAT = 'swashbench-circuit';
export const DOCUMENT_VERSION = 1;
export const MAX_COMPONENTS = 200;
export const MAX_DOCUMENT_BYTES = 1_000_000;

const finite = z.number().check(z.refine(Number.isFinite, 'must be a finite number'));
/** A finite number within closed bounds. */
const within = (least: number, most: number) => finite.check(z.minimum(least), z.maximum(most));
const whole = (least: number, most: number) => z.int().check(z.minimum(least), z.maximum(most));
const listOf = <T extends z.core.SomeType>(entry: T, most: number, least = 0) =>
  z.array(entry).check(z.minLength(least), z.maxLength(most));
const id = z
  .string()
  .check(z.regex(/^[A-Za-z][A-Za-z0-9_-]{0,39}$/, 'must start with a letter and hold at most 40 letters, digits, _ or -'));
const text = (most: number) => z.string().check(z.maxLength(most));
const point = z.strictObject({ x: within(-10_000, 10_000), y: within(-10_000, 10_000) });

export const valueSource = z.enum(['typed', 'part', 'fit', 'typical']);
export const parameterValue = z.strictObject({
  value: z.union([finite, text(40)]),
  /** What the person typed, with its unit, at most 6 digits: printed back as typed. */
  typed: z.optional(text(40)),
  source: valueSource,
  /** Relative spread of a fitted value. */
  spread: z.optional(within(0, 10)),
});
export const screwState = z.strictObject({
  /** As-found value [SI], once taken. */
  asFound: z.optional(finite),
  locked: z.boolean(),
});
export const component = z.strictObject({
  id,
  kind: text(40),
  kindVersion: whole(1, 1000),
  name: text(60),
  at: point,
  turn: z.union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)]),
  mirror: z.boolean(),
  parameters: z.record(text(60), parameterValue),
  screws: z.optional(z.record(text(60), screwState)),
  part: z.optional(text(60)),
});
export const portRef = z.strictObject({ component: id, port: text(20) });
export const line = z.strictObject({
  id,
  from: portRef,
  to: portRef,
  /** Bends the person set, in modules; empty = routed by the drawing. */
  route: listOf(point, 40),
  length: within(0, 1000),
  bore: within(1e-4, 1),
  wall: z.optional(within(1e-5, 0.1)),
  /** Oil volume [m³] instead of bore and length. */
  volume: z.optional(within(0, 10)),
  loss: z.boolean(),
  /** Raw loss coefficients [Pa·s/m³], [Pa·s²/m⁶] instead of those from bore, length and viscosity. */
  laminar: z.optional(within(0, 1e15)),
  quadratic: z.optional(within(0, 1e20)),
});
export const shaft = z.strictObject({ id, members: listOf(portRef, 20, 2) });
export const command = z.strictObject({
  id,
  time: within(0, 3600),
  ramp: within(0, 3600),
  /** Component id, or 'supply'. */
  target: text(40),
  input: text(60),
  value: finite,
  label: text(60),
});
export const duty = z.strictObject({
  duration: within(0.05, 3600),
  repeat: z.boolean(),
  commands: listOf(command, 400),
});
export const requirement = z.strictObject({
  id,
  /** Address 'component.reading', 'component.port.pressure', or 'stall margin', 'rms current'. */
  quantity: text(120),
  measure: z.enum(['peak', 'end', 'time to reach']),
  /** For 'time to reach': the value to be reached [SI]. */
  at: z.optional(finite),
  min: z.optional(finite),
  max: z.optional(finite),
  phase: z.optional(text(60)),
});
export const caseChange = z.strictObject({
  /** Component id, line id, or 'supply' | 'fluid' | 'reservoir' | 'site' | 'duty'. */
  target: text(40),
  /** Parameter id, 'fault.<id>', or for the duty 'duration', 'command.<id>.value|time|ramp'. */
  field: text(80),
  value: z.union([finite, text(40)]),
  typed: z.optional(text(40)),
});
export const caseSchema = z.strictObject({
  id,
  name: text(60),
  /** Index of the case ink: 0 A, 1 B, … */
  ink: whole(0, 9),
  changes: listOf(caseChange, 400),
});
export const fluid = z.strictObject({
  grade: z.enum(['VG 22', 'VG 32', 'VG 46', 'VG 68']),
  temperature: within(233.15, 393.15),
  /** Undissolved air at atmospheric pressure, by volume. */
  airFraction: within(0, 0.2),
  /** Bulk modulus of clean oil [Pa]. */
  bulkModulus: within(1e8, 5e9),
  density: within(700, 1200),
});
export const reservoir = z.strictObject({
  volume: within(0, 100),
  temperature: within(233.15, 393.15),
  coolingArea: within(0, 1000),
});
export const supply = z.strictObject({
  /** No-load line voltage [V], frequency [Hz], series impedance per phase [Ω]. */
  voltage: within(0, 1000),
  frequency: within(10, 100),
  impedance: within(0, 20),
});
export const note = z.strictObject({ id, at: point, text: text(400), author: z.optional(text(60)), date: text(40) });
export const tagPlace = z.strictObject({ dx: finite, dy: finite, pinned: z.boolean() });
/** A part label: a small plate with a shelf name, tied to a component. */
export const partLabel = z.strictObject({ id, component: id, at: point, text: text(60) });

export const circuitDocument = z.strictObject({
  format: z.literal(DOCUMENT_FORMAT),
  version: z.literal(DOCUMENT_VERSION),
  title: text(120),
  fluid,
  reservoir,
  supply,
  site: z.strictObject({ altitude: within(-500, 6000) }),
  components: listOf(component, MAX_COMPONENTS),
  lines: listOf(line, 400),
  shafts: listOf(shaft, 50),
  duty,
  requirements: listOf(requirement, 40),
  cases: listOf(caseSchema, 10, 1),
  tagPlaces: z.record(text(120), tagPlace),
  labels: listOf(partLabel, 100),
  notes: listOf(note, 100),
});

export type CircuitDocument = z.infer<typeof circuitDocument>;
export type Component = z.infer<typeof component>;
export type ParameterValue = z.infer<typeof parameterValue>;
export type ValueSource = z.infer<typeof valueSource>;
export type PortRef = z.infer<typeof portRef>;
export type Line = z.infer<typeof line>;
export type Shaft = z.infer<typeof shaft>;
export type Command = z.infer<typeof command>;
export type Requirement = z.infer<typeof requirement>;
export type CircuitCase = z.infer<typeof caseSchema>;
export type CaseChange = z.infer<typeof caseChange>;
export type Note = z.infer<typeof note>;
export type PartLabel = z.infer<typeof partLabel>;
