import { EigenvalueDecomposition, Matrix } from 'ml-matrix'
import { bandTimes, choleskyFactor, choleskySolve } from './band-matrix.ts'
import type { ReducedElement, ThermalSystem } from './thermal-system.ts'

const SLOWEST_S = 20 * 365 * 86400
const FASTEST_S = 15 * 60

/** Up to this many nodes all modes are kept, and nothing is lost. */
const WHOLE_NODES = 40

export interface ReduceOptions {
  /** Number of shifts besides 0, evenly spaced in the logarithm from 1/(20 years) to 1/(15 minutes). */
  readonly shifts?: number
  /** Nodal fields that must lie in the basis as well, for example start states. */
  readonly extraFields?: readonly Float64Array[]
  /** A new direction counts when at least this share of it is new. */
  readonly tolerance?: number
}

/**
 * Projects a system on a few modes.
 *
 * The basis holds, for each shift s, the solutions of (K + s C) v = B_g for every boundary group: the
 * responses to inputs that grow at rate s (a block rational Krylov basis with one vector a shift).
 * Shift 0 is always among them, so the steady states and with them the constant field are exact. The
 * projection keeps the structure: C and K stay symmetric and positive, so no mode can grow.
 * Source: A. C. Antoulas, Approximation of Large-Scale Dynamical Systems, 2005, chapter 11 (from memory).
 *
 * @throws RangeError for a node without heat capacity or a system that is not positive definite
 */
export function reduce(system: ThermalSystem, options: ReduceOptions = {}): ReducedElement {
  const { shifts = 10, extraFields = [], tolerance = 1e-7 } = options
  const { capacity_JK, conductance_WK, boundaries } = system
  const nodes = capacity_JK.length
  capacity_JK.forEach((capacity, node) => {
    if (!(capacity > 0)) throw new RangeError(`Node ${node} has no heat capacity.`)
  })
  const inputs = boundaries.map((boundary) => {
    const column = new Float64Array(nodes)
    boundary.node.forEach((node, i) => (column[node] += boundary.conductance_WK[i]))
    return column
  })
  const basis: Float64Array[] = []
  if (nodes <= WHOLE_NODES) {
    for (let node = 0; node < nodes; node++) {
      const unit = new Float64Array(nodes)
      unit[node] = 1 / Math.sqrt(capacity_JK[node])
      basis.push(unit)
    }
  } else {
    addDirection(basis, new Float64Array(nodes).fill(1), capacity_JK, 0)
    for (const shift of [0, ...shiftRates(shifts)]) {
      const factor = choleskyFactor(conductance_WK, capacity_JK, shift)
      for (const input of inputs)
        addDirection(basis, choleskySolve(factor, input.slice()), capacity_JK, tolerance)
    }
    for (const field of extraFields) addDirection(basis, field.slice(), capacity_JK, 1e-9)
  }
  return project(system, basis, inputs)
}

function shiftRates(count: number): number[] {
  const slow = Math.log(1 / SLOWEST_S)
  const fast = Math.log(1 / FASTEST_S)
  return Array.from({ length: count }, (_, i) =>
    Math.exp(slow + ((fast - slow) * i) / Math.max(1, count - 1)),
  )
}

/** Gram-Schmidt in the inner product of C, twice; what is nearly dependent is dropped. */
function addDirection(
  basis: Float64Array[],
  field: Float64Array,
  capacity: Float64Array,
  tolerance: number,
): void {
  const length = norm(field, capacity)
  if (length === 0) return
  for (let pass = 0; pass < 2; pass++)
    for (const known of basis) {
      let part = 0
      for (let i = 0; i < field.length; i++) part += known[i] * capacity[i] * field[i]
      for (let i = 0; i < field.length; i++) field[i] -= part * known[i]
    }
  const rest = norm(field, capacity)
  if (!(rest > tolerance * length)) return
  basis.push(field.map((value) => value / rest))
}

function norm(field: Float64Array, capacity: Float64Array): number {
  let sum = 0
  for (let i = 0; i < field.length; i++) sum += capacity[i] * field[i] * field[i]
  return Math.sqrt(sum)
}

function project(
  system: ThermalSystem,
  directions: readonly Float64Array[],
  inputs: readonly Float64Array[],
): ReducedElement {
  const { capacity_JK, conductance_WK, boundaries, probes } = system
  const modes = directions.length
  const nodes = capacity_JK.length
  const projected = new Matrix(modes, modes)
  const image = new Float64Array(nodes)
  for (let j = 0; j < modes; j++) {
    bandTimes(conductance_WK, directions[j], image)
    for (let i = 0; i <= j; i++) {
      const value = dot(directions[i], image)
      projected.set(i, j, value)
      projected.set(j, i, value)
    }
  }
  const decomposition = new EigenvalueDecomposition(projected, { assumeSymmetric: true })
  const order = decomposition.realEigenvalues
    .map((decay, index) => ({ decay, index }))
    .sort((a, b) => a.decay - b.decay)
  const turn = decomposition.eigenvectorMatrix
  const basis = new Float64Array(nodes * modes)
  order.forEach(({ index }, k) => {
    for (let j = 0; j < modes; j++) {
      const weight = turn.get(j, index)
      const direction = directions[j]
      for (let node = 0; node < nodes; node++) basis[node * modes + k] += weight * direction[node]
    }
  })
  const decay_s = Float64Array.from(order, ({ decay }) => decay)
  if (!(decay_s[0] > 0))
    throw new RangeError('The system has a mode that does not decay; a boundary is missing.')

  const against = (weight: (node: number) => number, out: Float64Array, at: number, stride: number) => {
    for (let node = 0; node < nodes; node++) {
      const w = weight(node)
      if (w !== 0) for (let k = 0; k < modes; k++) out[at + k * stride] += w * basis[node * modes + k]
    }
  }
  const groups = boundaries.length
  const gain = new Float64Array(modes * groups)
  inputs.forEach((input, g) => against((node) => input[node], gain, g, groups))
  const content = new Float64Array(modes)
  against((node) => capacity_JK[node], content, 0, 1)
  const probeGain = new Float64Array(probes.length * modes)
  probes.forEach((probe, p) =>
    probe.node.forEach((node, i) => {
      for (let k = 0; k < modes; k++) probeGain[p * modes + k] += probe.weight[i] * basis[node * modes + k]
    }),
  )
  return {
    modes,
    decay_s,
    boundaries: boundaries.map((boundary) => boundary.name),
    conductance_WK: Float64Array.from(boundaries, (boundary) =>
      boundary.conductance_WK.reduce((sum, g) => sum + g, 0),
    ),
    gain,
    content,
    probes: probes.map((probe) => probe.name),
    probeGain,
    basis,
    capacity_JK,
  }
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i]
  return sum
}
