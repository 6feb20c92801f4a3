import type { Nets } from '../circuit/nets.ts';
import type { Profile } from '../circuit/profile.ts';
import type { CircuitDocument } from '../circuit/schema.ts';
import type { OilModel } from '../fluid/effective-modulus.ts';
import type { Block, ComponentKind, RunConstants } from '../kinds/kind.ts';
import type { SparsePattern } from '../numerics/sparse-pattern.ts';
import type { SymbolicLu } from '../numerics/symbolic-lu.ts';
import type { QuantityId } from '../units/quantities.ts';
import type { Problem } from './result.ts';

/** Least oil volume of a node [m³]. */
export const LEAST_VOLUME = 1e-6;

/** All instances of one kind, twice: adding to nodes (integrating) and to a slot per port (reading). */
export interface BlockPair {
  readonly kind: ComponentKind;
  readonly block: Block;
  readonly reading: Block;
}

/** What a state is, in words: for saying where a run stuck. */
export interface StateLabel {
  readonly component?: string;
  readonly words: string;
}

/** One column recorded at every row of a run. */
export interface Column {
  readonly kind: 'pressure' | 'flow' | 'reading' | 'line' | 'nothing';
  /** pressure: node index; flow: port slot; reading: index of the block pair; line: unused. */
  readonly at: number;
  /** Reading: instance and index of the reading. Line: terms. */
  readonly instance: number;
  readonly reading: number;
  readonly terms: readonly { readonly slot: number; readonly sign: number }[];
}

export interface ChannelPlan {
  readonly address: string;
  readonly label: string;
  readonly quantity: QuantityId;
  readonly column: number;
}

/** A circuit ready to run: states, blocks of coefficients, input profiles and sparsity. Nothing in it changes while a run
 *  goes, so it may be run many times. */
export interface CompiledCircuit {
  /** As the case sees it. */
  readonly document: CircuitDocument;
  readonly caseId: string;
  readonly duration: number;
  readonly run: RunConstants;
  readonly oil: OilModel;
  readonly nets: Nets;
  /** State index of each hydraulic net, in the order of `nets.oil`; `size` for a tank. */
  readonly nodeOfNet: Int32Array;
  /** Net index of each node. */
  readonly netOfNode: Int32Array;
  /** Number of integrated states, of oil nodes, of shafts. */
  readonly size: number;
  readonly nodes: number;
  readonly shafts: number;
  readonly blocks: readonly BlockPair[];
  /** Port slots used while reading, and the node of each. */
  readonly slots: number;
  readonly nodeOfSlot: Int32Array;
  /** Slots of ports that feed oil in (pump outlets). */
  readonly sourceSlots: Int32Array;
  /** Oil volume of each node that does not move [m³], and volume of wall given per pascal [m³/Pa]. */
  readonly volume: Float64Array;
  readonly compliance: Float64Array;
  /** Inertia of each shaft [kg·m²]. */
  readonly inertia: Float64Array;
  readonly profiles: readonly Profile[];
  /** Start state and scale of each state; length size + 1. */
  readonly start: Float64Array;
  readonly nominal: Float64Array;
  readonly labels: readonly StateLabel[];
  readonly pattern: SparsePattern;
  readonly symbolic: SymbolicLu;
  readonly columns: readonly Column[];
  readonly channels: readonly ChannelPlan[];
  readonly notes: readonly Problem[];
}
