import { z } from 'zod';

/** The circuit document, version 1: everything a circuit is, in SI, and nothing a run produces.
 *  Structure only; what depends on the kinds (parameter names, ranges, ports) is checked by `checkDocument` in check-document.ts.
 *  Positions are in modules on the drawing (one module = the grid step). All keys strict, all numbers finite. */

export const DOCUMENT_FORMAT = 'swashbench-circuit';
export const DOCUMENT_VERSION = 1;
export const MAX_COMPONENTS = 200;
export const MAX_DOCUMENT_BYTES = 1_000_000;

const finite = z.number().refine(Number.isFinite, 'must be a finite number');
const id = z.string().regex(/^[A-Za-z][A-Za-z0-9_-]{0,39}$/, 'must start with a letter and hold at most 40 letters, digits, _ or -');
const text = (most: number) => z.string().max(most);
const point = z.strictObject({ x: finite.min(-10_000).max(10_000), y: finite.min(-10_000).max(10_000) });

export const valueSource = z.enum(['typed', 'part', 'fit', 'typical']);
export const parameterValue = z.strictObject({
  value: z.union([finite, text(40)]),
  /** What the person typed, with its unit, at most 6 digits: printed back as typed. */
  typed: text(40).optional(),
  source: valueSource,
  /** Relative spread of a fitted value. */
  spread: finite.min(0).max(10).optional(),
});
export const screwState = z.strictObject({
  /** As-found value [SI], once taken. */
  asFound: finite.optional(),
  locked: z.boolean(),
});
export const component = z.strictObject({
  id,
  kind: text(40),
  kindVersion: z.int().min(1).max(1000),
  name: text(60),
  at: point,
  turn: z.union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)]),
  mirror: z.boolean(),
  parameters: z.record(text(60), parameterValue),
  screws: z.record(text(60), screwState).optional(),
  part: text(60).optional(),
});
export const portRef = z.strictObject({ component: id, port: text(20) });
export const line = z.strictObject({
  id,
  from: portRef,
  to: portRef,
  /** Bends the person set, in modules; empty = routed by the drawing. */
  route: z.array(point).max(40),
  length: finite.min(0).max(1000),
  bore: finite.min(1e-4).max(1),
  wall: finite.min(1e-5).max(0.1).optional(),
  /** Oil volume [m³] instead of bore and length. */
  volume: finite.min(0).max(10).optional(),
  loss: z.boolean(),
  /** Raw loss coefficients [Pa·s/m³], [Pa·s²/m⁶] instead of those from bore, length and viscosity. */
  laminar: finite.min(0).max(1e15).optional(),
  quadratic: finite.min(0).max(1e20).optional(),
});
export const shaft = z.strictObject({ id, members: z.array(portRef).min(2).max(20) });
export const command = z.strictObject({
  id,
  time: finite.min(0).max(3600),
  ramp: finite.min(0).max(3600),
  /** Component id, or 'supply'. */
  target: text(40),
  input: text(60),
  value: finite,
  label: text(60),
});
export const duty = z.strictObject({
  duration: finite.min(0.05).max(3600),
  repeat: z.boolean(),
  commands: z.array(command).max(400),
});
export const requirement = z.strictObject({
  id,
  /** Address 'component.reading', 'component.port.pressure', or 'stall margin', 'rms current'. */
  quantity: text(120),
  measure: z.enum(['peak', 'end', 'time to reach']),
  /** For 'time to reach': the value to be reached [SI]. */
  at: finite.optional(),
  min: finite.optional(),
  max: finite.optional(),
  phase: text(60).optional(),
});
export const caseChange = z.strictObject({
  /** Component id, line id, or 'supply' | 'fluid' | 'reservoir' | 'site' | 'duty'. */
  target: text(40),
  /** Parameter id, 'fault.<id>', or for the duty 'duration', 'command.<id>.value|time|ramp'. */
  field: text(80),
  value: z.union([finite, text(40)]),
  typed: text(40).optional(),
});
export const caseSchema = z.strictObject({
  id,
  name: text(60),
  /** Index of the case ink: 0 A, 1 B, … */
  ink: z.int().min(0).max(9),
  changes: z.array(caseChange).max(400),
});
export const fluid = z.strictObject({
  grade: z.enum(['VG 22', 'VG 32', 'VG 46', 'VG 68']),
  temperature: finite.min(233.15).max(393.15),
  /** Undissolved air at atmospheric pressure, by volume. */
  airFraction: finite.min(0).max(0.2),
  /** Bulk modulus of clean oil [Pa]. */
  bulkModulus: finite.min(1e8).max(5e9),
  density: finite.min(700).max(1200),
});
export const reservoir = z.strictObject({
  volume: finite.min(0).max(100),
  temperature: finite.min(233.15).max(393.15),
  coolingArea: finite.min(0).max(1000),
});
export const supply = z.strictObject({
  /** No-load line voltage [V], frequency [Hz], series impedance per phase [Ω]. */
  voltage: finite.min(0).max(1000),
  frequency: finite.min(10).max(100),
  impedance: finite.min(0).max(20),
});
export const note = z.strictObject({ id, at: point, text: text(400), author: text(60).optional(), date: text(40) });
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
  site: z.strictObject({ altitude: finite.min(-500).max(6000) }),
  components: z.array(component).max(MAX_COMPONENTS),
  lines: z.array(line).max(400),
  shafts: z.array(shaft).max(50),
  duty,
  requirements: z.array(requirement).max(40),
  cases: z.array(caseSchema).min(1).max(10),
  tagPlaces: z.record(text(120), tagPlace),
  labels: z.array(partLabel).max(100),
  notes: z.array(note).max(100),
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
