import type { QuantityId } from '../units/quantities.ts';

/** The contract between one component kind and everything around it.
 *
 *  State vector y. Index 0 … nodes−1 oil-node pressures [Pa gauge]; then shaft speeds [rad/s]; then each component's own
 *  states. y has one entry more than the solver integrates: y[n] is 0 for ever and stands for the tank (and for anything
 *  that has no equation); writes to index n are thrown away.
 *
 *  Balances. A kernel adds to `balance[index]` what it pushes INTO the node: volume flow [m³/s] for oil, torque [N·m] for a
 *  shaft. The simulation divides by V/K(p) or by the shaft's inertia afterwards; a kind knows only its own ports.
 *
 *  Kernels are pure, allocate nothing, keep nothing between calls and use only + − × ÷ and Math.sqrt, Math.abs, Math.min,
 *  Math.max (bit-identical in every host). They may be called at trial points that are later rejected. */

export type Medium = 'oil' | 'shaft';

/** Where a parameter belongs on the nameplate. `raw` replaces what the plate values would give. */
export type ParameterGroup = 'plate' | 'setting' | 'load' | 'detail' | 'raw';

export interface NumberParameter {
  readonly type: 'number';
  readonly id: string;
  readonly label: string;
  readonly quantity: QuantityId;
  readonly group: ParameterGroup;
  /** Bounds of what may be entered [SI]; outside is refused with the nearest value offered. */
  readonly min: number;
  readonly max: number;
  /** Typical value [SI]; `null` = not given (raw coefficients, ratings that nobody has entered). */
  readonly initial: number | null;
  readonly typicalRange?: readonly [number, number];
  /** What it is and what it does, one or two sentences. */
  readonly help: string;
  /** Where the typical value comes from, for example 'REFERENCES section 15' never a maker; 'common practice, no source' where it is so. */
  readonly source: string;
  /** Equation in which it is used, as text with its symbols named. */
  readonly equation?: string;
  /** True where the value is a limit of the part: a run above it is a trial. `of` names the reading or port channel it limits. */
  readonly rating?: { readonly of: string };
}

export interface ChoiceParameter {
  readonly type: 'choice';
  readonly id: string;
  readonly label: string;
  readonly group: ParameterGroup;
  readonly choices: readonly { readonly value: string; readonly label: string }[];
  readonly initial: string;
  readonly help: string;
  readonly source: string;
}

export type ParameterSpec = NumberParameter | ChoiceParameter;

export interface FaultSpec {
  readonly id: string;
  readonly label: string;
  /** What severity 0 and 1 mean. */
  readonly help: string;
}

export interface PortSpec {
  readonly id: string;
  /** Letter on the drawing ('P', 'T', 'A' …) or '' where the trade uses none. */
  readonly letter: string;
  readonly label: string;
  readonly medium: Medium;
  /** Usual direction of flow, for the order in which parts are offered. */
  readonly role: 'inlet' | 'outlet' | 'drain' | 'either';
  /** What an open port means: a problem that stops the run, or an assumption that is said. */
  readonly whenOpen: 'problem' | 'tank' | 'plugged';
  /** The net behind this port may be fed from here (pump outlet): it needs a relief. */
  readonly source?: boolean;
  /** Ports of one component that share one node (a junction). Same string = same node. */
  readonly node?: string;
  /** Fixed oil volume behind the port [m³], beside lines and chambers. */
  readonly deadVolume?: (plate: Plate) => number;
}

export interface StateSpec {
  readonly id: string;
  readonly label: string;
  readonly quantity: QuantityId;
  /** Nominal size: absolute tolerance = rtol × nominal. */
  readonly nominal: number;
  /** Start value. */
  readonly start: (coefficients: Readonly<Record<string, number>>) => number;
}

/** Anything the duty may move while the run goes: commands, settings, loads, faults. */
export interface InputSpec {
  readonly id: string;
  readonly label: string;
  readonly quantity: QuantityId;
  readonly min: number;
  readonly max: number;
  /** Value without any command [SI], after case changes: usually a parameter's value. */
  readonly rest: (plate: Plate, run: RunConstants) => number;
  /** Ramp offered for a new command [s]. */
  readonly ramp: number;
  /** Words for named values on flags, e.g. 1 → 'solenoid a on'. */
  readonly words?: readonly { readonly value: number; readonly label: string }[];
  /** 'command' inputs are offered first when a flag is made. */
  readonly role: 'command' | 'setting' | 'load' | 'fault';
}

/** An adjusting screw: it turns the parameter of the same id. */
export interface ScrewSpec {
  readonly id: string;
  readonly label: string;
  readonly short: string;
  /** Parameter ids of change per turn, and of the adjustable range. */
  readonly perTurn: string;
  readonly least: string;
  readonly most: string;
  /** Turning in raises or lowers the value. */
  readonly inward: 'raises' | 'lowers';
  /** Where the tag's string is tied: a named anchor of the symbol. */
  readonly anchor: string;
}

/** Read access to a component's effective values (document, then case), typical values filled in. */
export interface Plate {
  number(id: string): number;
  /** Value if the document or the case gives one, else null: for raw coefficients and unknown ratings. */
  given(id: string): number | null;
  choice(id: string): string;
}

/** What is evaluated once per run and the same for all components. */
export interface RunConstants {
  /** Oil density [kg/m³], dynamic viscosity at run temperature [Pa·s], reference viscosity [Pa·s] of plate leakages. */
  readonly density: number;
  readonly viscosity: number;
  readonly referenceViscosity: number;
  /** Atmospheric pressure [Pa abs]. */
  readonly atmosphere: number;
  readonly supplyVoltage: number;
  readonly supplyFrequency: number;
  /** Series impedance per phase [Ω]. */
  readonly supplyImpedance: number;
}

/** All instances of one kind in one compiled circuit, as flat arrays. Instance i uses c[i*coefficientCount + k] and so on. */
export interface Block {
  readonly kind: string;
  readonly count: number;
  readonly componentIds: readonly string[];
  /** Coefficients, in the order of `coefficients`. */
  readonly c: Float64Array;
  readonly coefficientCount: number;
  /** State index of each port's shared value (pressure or speed), in the order of `ports`. */
  readonly port: Int32Array;
  /** Where each port's flow or torque is added. Equal to `port` while integrating; a slot per port while reading. */
  readonly balance: Int32Array;
  readonly portCount: number;
  /** State index of each own state, in the order of `states`. */
  readonly state: Int32Array;
  readonly stateCount: number;
  /** Index into u of each input, in the order of `inputs` followed by one per fault in the order of `faults`. */
  readonly input: Int32Array;
  readonly inputCount: number;
  /** Index into jac of each declared entry, in the order of `entries`. */
  readonly slot: Int32Array;
  readonly entryCount: number;
}

export interface Workspace {
  readonly y: Float64Array;
  /** Derivatives of component states: kernels write (=) their own. */
  readonly dy: Float64Array;
  /** Net flow or torque pushed into each node or shaft: kernels add (+=). */
  readonly balance: Float64Array;
  /** Volume of each oil node [m³]: starts at its fixed volume; kernels with moving chambers add (+=). */
  readonly volume: Float64Array;
  /** Present value of every input. */
  readonly u: Float64Array;
  /** Sparse Jacobian values: kernels add (+=) partial derivatives of what `flow` wrote. The last slot is a dump.
   *  For node and shaft rows the entry is the derivative of the balance; the simulation scales the row. A kernel that adds
   *  to `volume` also adds −balance/volume · dV/dx in the entry of that node and state: `balance` and `volume` are complete
   *  at this y when `jacobian` is called. */
  readonly jac: Float64Array;
  /** Number of the flow pass: changes whenever y or u have changed. A kind may keep the working of one instance for the rest of
   *  a pass (see memo.ts); without a number it keeps nothing. */
  readonly pass?: number;
}

/** Row and column of one Jacobian entry: a port id (its node's balance or shared value) or 'state:<id>'. */
export type EntryRef = string;

export interface Explanation {
  readonly equation: string;
  /** What the letters mean. */
  readonly where: string;
  /** Parameter or reading ids that go in. */
  readonly inputs: readonly string[];
  readonly assumptions: readonly string[];
  readonly limits: string;
  readonly source: string;
}

export interface ReadingSpec {
  readonly id: string;
  readonly label: string;
  readonly quantity: QuantityId;
  /** Evaluated after a full flow pass at the same y; port flows are in w.balance[block.balance[…]] with sign INTO THE NODE. */
  readonly value: (block: Block, i: number, w: Workspace) => number;
  readonly explain: Explanation;
}

/** A sign change that is located on the dense output and logged; it never changes the run unless it is in `trips`. */
export interface SignalSpec {
  readonly id: string;
  /** Words for the rising and the falling crossing, e.g. 'relief cracks' / 'relief closes'; '' = not pinned on the tape. */
  readonly rises: string;
  readonly falls: string;
  readonly value: (block: Block, i: number, w: Workspace) => number;
}

/** An event that acts: when `signal` rises, `input` is overridden with `value` for the rest of the run. */
export interface TripSpec {
  readonly signal: string;
  readonly input: string;
  readonly value: number;
  readonly label: string;
}

/** Powers of one component at one instant [W], each by its own law, for the energy audit. Shaft kinetic energy and oil
 *  compression are added by the simulation. The audit checks: supplied = delivered + heat + change of stored energy. */
export interface Powers {
  /** Work put in by a prime mover, or by a load that pushes (>= 0). */
  supplied: number;
  /** Work given out to a load (>= 0). */
  delivered: number;
  /** Turned to heat here (>= 0). */
  heat: number;
  /** Rate of change of energy kept in own states (rod kinetic energy, end-stop springs). */
  stored: number;
}

export type Stage = 'drive' | 'pump' | 'protect' | 'direct' | 'act' | 'store' | 'return';

export interface ComponentKind {
  readonly id: string;
  readonly version: number;
  readonly title: string;
  /** Word under the symbol in the parts drawer. */
  readonly word: string;
  /** Letter of the item code: M, P, V, Z, S, A, T … */
  readonly letter: string;
  readonly stage: Stage;
  /** One paragraph: what it models, what it leaves out, source. Shown at the foot of the nameplate. */
  readonly about: string;
  readonly parameters: readonly ParameterSpec[];
  readonly faults: readonly FaultSpec[];
  readonly ports: readonly PortSpec[];
  readonly states: readonly StateSpec[];
  readonly inputs: readonly InputSpec[];
  readonly screws: readonly ScrewSpec[];
  readonly coefficients: readonly string[];
  /** Nameplate → coefficients, once per run. */
  readonly prepare: (plate: Plate, run: RunConstants) => Record<string, number>;
  /** Inertia this component adds to its shaft [kg·m²]. */
  readonly inertia?: (plate: Plate) => number;
  /** Jacobian pattern: every (row, column) the kernels may touch. */
  readonly entries: readonly (readonly [row: EntryRef, column: EntryRef])[];
  readonly flow: (block: Block, w: Workspace) => void;
  readonly jacobian: (block: Block, w: Workspace) => void;
  /** Adds (+=) to `out` for instance i, after a flow pass at the same y. */
  readonly powers: (block: Block, i: number, w: Workspace, out: Powers) => void;
  readonly signals: readonly SignalSpec[];
  readonly trips: readonly TripSpec[];
  readonly readings: readonly ReadingSpec[];
  /** Words for what is missing or doubtful about this component's own values. */
  readonly checks?: (plate: Plate) => readonly string[];
  /** Paths through which oil can always pass from one port to another (for 'no relief protects this net'). */
  readonly passes: readonly (readonly [from: string, to: string])[];
}

/** Identity function that keeps literal types narrow and checks the shape. */
export function defineKind<const K extends ComponentKind>(kind: K): K {
  return kind;
}
