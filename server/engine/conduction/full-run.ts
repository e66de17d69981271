import { bandTimes, choleskyFactor, choleskySolve } from './band-matrix.ts'
import { hourStep } from './hour-step.ts'
import type { BandMatrix, ReducedElement, ThermalSystem } from './thermal-system.ts'

/**
 * A conducting element as a room sees it hour by hour, whatever steps it inside. Mean flow of the hour from
 * group g into it: what startHour gives, plus Σ_h response0[g G + h] u0_h + response1[g G + h] u1_h. A group
 * that is constant within the hour has u0 = u1.
 */
export interface SteppedElement {
  readonly groups: number
  readonly response0: Float64Array
  readonly response1: Float64Array
  /** Mean flow that the coming hour has from what is stored, with all inputs at 0 °C [W per unit of size]. */
  readonly startHour: (history_W: Float64Array) => void
  /** Ends the hour: inputs ran linearly from u0 to u1. */
  readonly finishHour: (u0: Float64Array, u1: Float64Array) => void
  /** Sets a uniform temperature. */
  readonly setUniform: (temperature_C: number) => void
  /** Sets the temperature of every node of the system [°C]. */
  readonly setField: (field_C: Float64Array) => void
  /** Heat held above 0 °C [J per unit of size]. */
  readonly stored_J: () => number
  /** Value of a probe at the present time, by its index. */
  readonly probe: (index: number) => number
}

/**
 * `crank-nicolson`: second order and the least work, but a cell that answers much faster than a substep
 * rings (its error changes sign each substep and dies slowly): surface nodes of a fine mesh do after a jump.
 * `tr-bdf2`: a trapezoid and a backward difference in each substep with one factor; second order too,
 * twice the work, and no ringing (L-stable).
 */
export type Scheme = 'crank-nicolson' | 'tr-bdf2'

export interface FullRunOptions {
  /** Equal steps in each hour. */
  readonly substeps?: number
  readonly scheme?: Scheme
  /** Temperatures to begin with [°C], one for each node; 0 when left out. */
  readonly start_C?: Float64Array
}

const STEP_S = 3600

/**
 * All nodes of a system, stepped in time: what the modes are measured against.
 *
 * Sources: J. Crank and P. Nicolson, Proc. Cambridge Philosophical Society 43, 1947; TR-BDF2 with
 * γ = 2 - √2, R. E. Bank et al., IEEE Trans. Electron Devices 32, 1985, as the one-step method of
 * M. E. Hosea and L. F. Shampine, Applied Numerical Mathematics 20, 1996 (from memory). Both take the flow
 * as their own weighted mean over a substep, so heat is conserved to rounding.
 */
export function fullStepper(system: ThermalSystem, options: FullRunOptions = {}): SteppedElement {
  const { substeps = 2, scheme = 'crank-nicolson', start_C } = options
  const { capacity_JK, boundaries, probes } = system
  const nodes = capacity_JK.length
  const groups = boundaries.length
  const substep = scheme === 'crank-nicolson' ? crankNicolson(system, substeps) : trBdf2(system, substeps)
  const state = new Float64Array(nodes)
  if (start_C) state.set(start_C)
  const none = new Float64Array(groups)
  const low = new Float64Array(groups)
  const high = new Float64Array(groups)

  /** One hour from `field` (in place) with inputs from u0 to u1; adds the mean flows to `flow`. */
  const hour = (field: Float64Array, u0: Float64Array, u1: Float64Array, flow: Float64Array) => {
    for (let n = 0; n < substeps; n++) {
      for (let g = 0; g < groups; g++) {
        low[g] = u0[g] + ((u1[g] - u0[g]) * n) / substeps
        high[g] = u0[g] + ((u1[g] - u0[g]) * (n + 1)) / substeps
      }
      substep(field, low, high, flow)
    }
  }

  // What 1 K at the start or at the end of an hour does from rest: flows, and the field that it leaves.
  const response0 = new Float64Array(groups * groups)
  const response1 = new Float64Array(groups * groups)
  const left0: Float64Array[] = []
  const left1: Float64Array[] = []
  for (let h = 0; h < groups; h++)
    for (const [response, left, isStart] of [
      [response0, left0, true],
      [response1, left1, false],
    ] as const) {
      const unit = new Float64Array(groups)
      unit[h] = 1
      const field = new Float64Array(nodes)
      const flow = new Float64Array(groups)
      hour(field, isStart ? unit : none, isStart ? none : unit, flow)
      left.push(field)
      for (let g = 0; g < groups; g++) response[g * groups + h] = flow[g]
    }

  return {
    groups,
    response0,
    response1,
    startHour: (history_W) => {
      history_W.fill(0)
      hour(state, none, none, history_W)
    },
    finishHour: (u0, u1) => {
      for (let h = 0; h < groups; h++) {
        const [a, b, from0, from1] = [u0[h], u1[h], left0[h], left1[h]]
        for (let i = 0; i < nodes; i++) state[i] += a * from0[i] + b * from1[i]
      }
    },
    setUniform: (temperature_C) => void state.fill(temperature_C),
    setField: (field_C) => state.set(field_C),
    stored_J: () => state.reduce((sum, value, i) => sum + value * capacity_JK[i], 0),
    probe: (index) =>
      probes[index].node.reduce((sum, node, i) => sum + probes[index].weight[i] * state[node], 0),
  }
}

type Substep = (field: Float64Array, u0: Float64Array, u1: Float64Array, flow: Float64Array) => void

/** (C + h/2 K) T1 = (C - h/2 K) T0 + h/2 B (u0 + u1). */
function crankNicolson(system: ThermalSystem, substeps: number): Substep {
  const step_s = STEP_S / substeps
  const { capacity_JK } = system
  const factor = stepFactor(system, 0.5 * step_s)
  const right = new Float64Array(capacity_JK.length)
  return (field, u0, u1, flow) => {
    const share = 0.5 / substeps
    addFlow(system, field, u0, flow, share)
    heatRate(system, field, u0, right)
    addInput(system, u1, right, 1)
    for (let i = 0; i < right.length; i++) right[i] = capacity_JK[i] * field[i] + 0.5 * step_s * right[i]
    choleskySolve(factor, right)
    field.set(right)
    addFlow(system, field, u1, flow, share)
  }
}

const GAMMA = 2 - Math.SQRT2
const OUTER = Math.SQRT2 / 4
const LAST = GAMMA / 2

/** T_γ = T0 + h γ/2 (f0 + f_γ),  T1 = T0 + h (√2/4 f0 + √2/4 f_γ + γ/2 f1) with C f = B u - K T. */
function trBdf2(system: ThermalSystem, substeps: number): Substep {
  const step_s = STEP_S / substeps
  const { capacity_JK } = system
  const nodes = capacity_JK.length
  const factor = stepFactor(system, LAST * step_s)
  const first = new Float64Array(nodes)
  const second = new Float64Array(nodes)
  const middle = new Float64Array(nodes)
  const between = new Float64Array(system.boundaries.length)
  return (field, u0, u1, flow) => {
    for (let g = 0; g < between.length; g++) between[g] = u0[g] + GAMMA * (u1[g] - u0[g])
    addFlow(system, field, u0, flow, OUTER / substeps)
    heatRate(system, field, u0, first)
    middle.set(first)
    addInput(system, between, middle, 1)
    for (let i = 0; i < nodes; i++) middle[i] = capacity_JK[i] * field[i] + LAST * step_s * middle[i]
    choleskySolve(factor, middle)
    addFlow(system, middle, between, flow, OUTER / substeps)
    heatRate(system, middle, between, second)
    for (let i = 0; i < nodes; i++)
      field[i] = capacity_JK[i] * field[i] + OUTER * step_s * (first[i] + second[i])
    addInput(system, u1, field, LAST * step_s)
    choleskySolve(factor, field)
    addFlow(system, field, u1, flow, LAST / substeps)
  }
}

/** C + weight K, factored. */
function stepFactor(system: ThermalSystem, weight_s: number): BandMatrix {
  const { size, halfWidth, data } = system.conductance_WK
  const scaled = { size, halfWidth, data: data.map((value) => weight_s * value) }
  return choleskyFactor(scaled, system.capacity_JK, 1)
}

/** B u - K T [W]. */
function heatRate(system: ThermalSystem, field: Float64Array, u: Float64Array, out: Float64Array): void {
  bandTimes(system.conductance_WK, field, out)
  for (let i = 0; i < out.length; i++) out[i] = -out[i]
  addInput(system, u, out, 1)
}

function addInput(system: ThermalSystem, u: Float64Array, out: Float64Array, weight: number): void {
  system.boundaries.forEach(({ node, conductance_WK }, g) => {
    for (let i = 0; i < node.length; i++) out[node[i]] += weight * conductance_WK[i] * u[g]
  })
}

function addFlow(
  system: ThermalSystem,
  field: Float64Array,
  u: Float64Array,
  flow: Float64Array,
  weight: number,
) {
  system.boundaries.forEach(({ node, conductance_WK }, g) => {
    let sum = 0
    for (let i = 0; i < node.length; i++) sum += conductance_WK[i] * (u[g] - field[node[i]])
    flow[g] += weight * sum
  })
}

/** The modes of an element behind the same interface, for comparisons; the room's hour loop uses hourStep's arrays. */
export function reducedStepper(element: ReducedElement, start_C?: Float64Array): SteppedElement {
  const { modes, groups, decay, gain0, gain1, meanState, response0, response1 } = hourStep(element, STEP_S)
  const state = new Float64Array(modes)
  if (start_C) projectField(element, start_C, state)
  return {
    groups,
    response0,
    response1,
    startHour: (history_W) => {
      history_W.fill(0)
      for (let k = 0; k < modes; k++)
        for (let g = 0; g < groups; g++) history_W[g] -= meanState[k * groups + g] * state[k]
    },
    finishHour: (u0, u1) => {
      for (let k = 0; k < modes; k++) {
        let value = decay[k] * state[k]
        for (let h = 0; h < groups; h++)
          value += gain0[k * groups + h] * u0[h] + gain1[k * groups + h] * u1[h]
        state[k] = value
      }
    },
    setUniform: (temperature_C) => {
      for (let k = 0; k < modes; k++) state[k] = element.content[k] * temperature_C
    },
    setField: (field_C) => void projectField(element, field_C, state),
    stored_J: () => state.reduce((sum, value, k) => sum + value * element.content[k], 0),
    probe: (index) => state.reduce((sum, value, k) => sum + value * element.probeGain[index * modes + k], 0),
  }
}

/** Modes of a nodal field, m = Vᵀ C T: the nearest state, and the same field where it lies in their span. */
export function projectField(
  element: ReducedElement,
  field_C: Float64Array,
  out: Float64Array = new Float64Array(element.modes),
): Float64Array {
  const { modes, basis, capacity_JK } = element
  out.fill(0)
  for (let node = 0; node < capacity_JK.length; node++) {
    const heat = capacity_JK[node] * field_C[node]
    for (let k = 0; k < modes; k++) out[k] += heat * basis[node * modes + k]
  }
  return out
}
