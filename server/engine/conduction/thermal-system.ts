/**
 * A symmetric band matrix, lower triangle by rows.
 *
 * Entry (i, j) with i - halfWidth <= j <= i stands at `data[i * (halfWidth + 1) + (j - i + halfWidth)]`;
 * the diagonal is the last entry of each row. Entries left of column 0 are zero and unused.
 */
export interface BandMatrix {
  readonly size: number
  readonly halfWidth: number
  readonly data: Float64Array
}

/** A group of nodes that share one input temperature through a surface film. */
export interface Boundary {
  readonly name: string
  /** The nodes of the group. */
  readonly node: Int32Array
  /** Film conductance between the input and each of these nodes [W/K per unit of size]. */
  readonly conductance_WK: Float64Array
}

/** A linear functional of the nodal temperatures: Σ weight · T. A temperature has weights that sum to 1; a heat content has weights in J/K. */
export interface Probe {
  readonly name: string
  readonly node: Int32Array
  readonly weight: Float64Array
}

/**
 * Anything that conducts, however many nodes:  C dT/dt = -K T + Σ_g B_g u_g
 *
 * C is diagonal (lumped) and positive, K symmetric positive definite and already contains the film
 * conductances of all boundaries on its diagonal, so K · 1 = Σ_g B_g · 1 (a uniform temperature
 * equal to all inputs is at rest). u_g is the equivalent temperature of boundary group g [°C].
 * Heat flow from group g into the system: q_g = Σ_n B_gn (u_g - T_n), positive inwards.
 *
 * Unit of size: a layered system is for 1 m² of area, a ground section for 1 m of length, a lumped
 * system is whole. All conductances and capacities are per that unit.
 */
export interface ThermalSystem {
  readonly capacity_JK: Float64Array
  readonly conductance_WK: BandMatrix
  readonly boundaries: readonly Boundary[]
  readonly probes: readonly Probe[]
}

/**
 * The same system projected on a few modes: T ≈ V m with Vᵀ C V = I and Vᵀ K V = diag(decay), so
 *
 *   dm_k/dt = -decay_k m_k + Σ_g gain[k * groups + g] u_g
 *   q_g     = conductance_g u_g - Σ_k gain[k * groups + g] m_k
 *
 * The constant field lies in the span of V, so the projected system conserves heat exactly:
 * stored heat is Σ_k content_k m_k [J, above 0 °C].
 */
export interface ReducedElement {
  readonly modes: number
  /** Decay rates, ascending, all positive [1/s], length modes. */
  readonly decay_s: Float64Array
  /** Names of the boundary groups, in the order of the system. */
  readonly boundaries: readonly string[]
  /** Total film conductance of each group [W/K per unit of size]. */
  readonly conductance_WK: Float64Array
  /** Vᵀ B, `gain[k * groups + g]`, mode k, group g. */
  readonly gain: Float64Array
  /** Vᵀ C 1, length modes. */
  readonly content: Float64Array
  readonly probes: readonly string[]
  /** Vᵀ w of each probe, `probeGain[p * modes + k]`. */
  readonly probeGain: Float64Array
  /** V, `basis[node * modes + k]`. */
  readonly basis: Float64Array
  /** C, kept to project a field on the modes: m = Vᵀ C T. */
  readonly capacity_JK: Float64Array
}
