import { symmetricModes } from './symmetric-modes.ts'
import { dotAt } from './band-matrix.ts'
import { leadingDirections, shortened, type ModalSystem } from './leading-modes.ts'
import { rationalBasis } from './rational-basis.ts'
import type { ReducedElement, ThermalSystem } from './thermal-system.ts'

/** Up to this many nodes all modes are kept, and nothing is lost. */
const WHOLE_NODES = 40

export interface ReduceOptions {
  /** Shifts besides 0, evenly spaced in the logarithm from 1/(20 years) to 1/(15 minutes); 10, or 20 for one or two groups. */
  readonly shifts?: number
  /** Nodal fields that must lie in the span of the modes as well, for example start states. */
  readonly extraFields?: readonly Float64Array[]
  /**
   * What leaving out the weaker modes may cost: error of a flow as a share of what 1 K at its own group brings,
   * for every period of 6 h and more, and of a probe in K for 1 K; 0 leaves none out.
   */
  readonly tolerance?: number
}

/**
 * Projects a system on a few modes.
 *
 * First a basis of answers to slow and fast inputs (rationalBasis), on which K and C are projected: both
 * stay symmetric and positive, so no mode can grow. Then the weaker half of the modes is left out as far as
 * the tolerance allows (leadingDirections). The constant field, the steady states and the extra fields lie
 * in the span to rounding. Systems of up to 40 nodes keep all their modes and lose nothing.
 *
 * What it costs against all nodes is measured by reductionError.
 *
 * @throws RangeError for a node without heat capacity or a system that is not positive definite
 */
export function reduce(system: ThermalSystem, options: ReduceOptions = {}): ReducedElement {
  const { shifts = system.boundaries.length > 2 ? 10 : 20, extraFields = [], tolerance = 3e-3 } = options
  const { capacity_JK, boundaries } = system
  const nodes = capacity_JK.length
  capacity_JK.forEach((capacity, node) => {
    if (!(capacity > 0)) throw new RangeError(`Node ${node} has no heat capacity.`)
  })
  const inputs = boundaries.map((boundary) => {
    const column = new Float64Array(nodes)
    boundary.node.forEach((node, i) => (column[node] += boundary.conductance_WK[i]))
    return column
  })
  const isSmall = nodes <= WHOLE_NODES
  const { fields, kept } = isSmall
    ? { fields: unitFields(nodes), kept: nodes }
    : rationalBasis(system, inputs, shifts, extraFields)
  const all = modesOn(system, inputs, fields)
  if (isSmall || tolerance === 0) return element(system, fields, all.modal, all.turn)
  const keptFields = fields.slice(0, kept).map((_, j) => row(all.turn, j, fields.length))
  const directions = leadingDirections(all.modal, keptFields, tolerance)
  const { system: modal, turn } = shortened(all.modal, directions)
  return element(system, fields, modal, product(all.turn, turn, fields.length, modal.modes))
}

function unitFields(nodes: number): Float64Array[] {
  return Array.from({ length: nodes }, (_, node) => {
    const field = new Float64Array(nodes)
    field[node] = 1
    return field
  })
}

function row(matrix: Float64Array, i: number, length: number): Float64Array {
  return matrix.slice(i * length, (i + 1) * length)
}

/** (inner × inner) · (inner × columns), row by row. */
function product(a: Float64Array, b: Float64Array, inner: number, columns: number): Float64Array {
  const out = new Float64Array(inner * columns)
  for (let i = 0; i < inner; i++)
    for (let j = 0; j < inner; j++) {
      const value = a[i * inner + j]
      for (let k = 0; k < columns; k++) out[i * columns + k] += value * b[j * columns + k]
    }
  return out
}

/** Modes on fields given as √C times temperature, orthonormal, from slow to fast; `turn[field * size + mode]`. */
function modesOn(
  system: ThermalSystem,
  inputs: readonly Float64Array[],
  fields: readonly Float64Array[],
): { modal: ModalSystem; turn: Float64Array } {
  const size = fields.length
  const { capacity_JK } = system
  const nodes = capacity_JK.length
  const timesK = conduction(system, inputs)
  const byRoot = capacity_JK.map((capacity) => 1 / Math.sqrt(capacity))
  const matrix = new Float64Array(size * size)
  const image = new Float64Array(nodes)
  const temperature = new Float64Array(nodes)
  for (let i = 0; i < size; i++) {
    for (let node = 0; node < nodes; node++) temperature[node] = fields[i][node] * byRoot[node]
    timesK(temperature, image)
    for (let node = 0; node < nodes; node++) image[node] *= byRoot[node]
    // The image of the slower field is the smaller one and has the smaller rounding error.
    for (let j = i; j < size; j++)
      matrix[i * size + j] = matrix[j * size + i] = dotAt(image, 0, fields[j], 0, nodes)
  }
  const { values, vectors } = symmetricModes(matrix, size)
  if (!(values[0] > 0))
    throw new RangeError('The system has a mode that does not decay; a boundary is missing.')
  const groups = inputs.length
  const gain = new Float64Array(size * groups)
  inputs.forEach((input, g) => {
    const scaled = input.map((value, node) => value * byRoot[node])
    for (let j = 0; j < size; j++) {
      const along = dotAt(scaled, 0, fields[j], 0, nodes)
      for (let k = 0; k < size; k++) gain[k * groups + g] += along * vectors[j * size + k]
    }
  })
  const watched = new Float64Array(system.probes.length * size)
  system.probes.forEach(({ node, weight }, p) => {
    // A content is watched as the mean temperature it stands for.
    const whole = weight.reduce((sum, value) => sum + Math.abs(value), 0)
    for (let j = 0; j < size; j++) {
      let value = 0
      for (let i = 0; i < node.length; i++)
        value += (weight[i] * byRoot[node[i]] * fields[j][node[i]]) / whole
      for (let k = 0; k < size; k++) watched[p * size + k] += value * vectors[j * size + k]
    }
  })
  const conductance_WK = Float64Array.from(inputs, (input) => input.reduce((sum, film) => sum + film, 0))
  return { modal: { modes: size, decay_s: values, gain, conductance_WK, watched }, turn: vectors }
}

/**
 * K times a field by differences of temperature and the films, so that a uniform field gives exactly the
 * sum of the inputs however K was added up.
 */
function conduction(
  system: ThermalSystem,
  inputs: readonly Float64Array[],
): (field: Float64Array, out: Float64Array) => void {
  const { size, halfWidth, data } = system.conductance_WK
  const from: number[] = []
  const to: number[] = []
  const conductance: number[] = []
  for (let i = 0; i < size; i++)
    for (let j = Math.max(0, i - halfWidth); j < i; j++) {
      const value = data[i * (halfWidth + 1) + j - i + halfWidth]
      if (value === 0) continue
      from.push(i)
      to.push(j)
      conductance.push(-value)
    }
  const pairs = from.length
  const [a, b, g] = [Int32Array.from(from), Int32Array.from(to), Float64Array.from(conductance)]
  const films = new Float64Array(size)
  for (const input of inputs) for (let node = 0; node < size; node++) films[node] += input[node]
  return (field, out) => {
    for (let node = 0; node < size; node++) out[node] = films[node] * field[node]
    for (let n = 0; n < pairs; n++) {
      const flow = g[n] * (field[a[n]] - field[b[n]])
      out[a[n]] += flow
      out[b[n]] -= flow
    }
  }
}

function element(
  system: ThermalSystem,
  fields: readonly Float64Array[],
  modal: ModalSystem,
  turn: Float64Array,
): ReducedElement {
  const { capacity_JK, boundaries, probes } = system
  const nodes = capacity_JK.length
  const { modes } = modal
  const basis = new Float64Array(nodes * modes)
  const content = new Float64Array(modes)
  const root = capacity_JK.map(Math.sqrt)
  fields.forEach((field, j) => {
    const heat = dotAt(root, 0, field, 0, nodes)
    for (let k = 0; k < modes; k++) content[k] += heat * turn[j * modes + k]
  })
  const line = new Float64Array(modes)
  for (let node = 0; node < nodes; node++) {
    line.fill(0)
    for (let j = 0; j < fields.length; j++) {
      const value = fields[j][node]
      if (value !== 0) for (let k = 0; k < modes; k++) line[k] += value * turn[j * modes + k]
    }
    for (let k = 0; k < modes; k++) basis[node * modes + k] = line[k] / root[node]
  }
  const probeGain = new Float64Array(probes.length * modes)
  probes.forEach((probe, p) =>
    probe.node.forEach((node, i) => {
      for (let k = 0; k < modes; k++) probeGain[p * modes + k] += probe.weight[i] * basis[node * modes + k]
    }),
  )
  return {
    modes,
    decay_s: modal.decay_s,
    boundaries: boundaries.map((boundary) => boundary.name),
    conductance_WK: modal.conductance_WK,
    gain: modal.gain,
    content,
    probes: probes.map((probe) => probe.name),
    probeGain,
    basis,
    capacity_JK,
  }
}
