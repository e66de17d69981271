import { complexFactor, complexSolve } from './band-complex.ts'
import { choleskyFactor, choleskySolveAll, dotAt } from './band-matrix.ts'
import type { ThermalSystem } from './thermal-system.ts'

const SLOWEST_S = 20 * 365 * 86400
const FASTEST_S = 15 * 60
const YEAR_S = 365 * 86400

/** A new direction counts when at least this share of it is new: below, it would be mostly rounding. */
const NEW_SHARE = 1e-7

/**
 * Orthonormal fields that hold the answers of a system to slow and fast inputs, from slow to fast.
 *
 * For each shift s the solutions of (K + s C) v = B_g for every boundary group are the answers to inputs
 * that grow at rate s (a block rational Krylov space with one vector a shift). The constant field comes
 * first and is exact; shift 0 adds the steady states. Both phases of the answer to a yearly sine,
 * (K + iωC) v = B_g, are there as well: the first harmonic of every node, which says how late and how much
 * damped summer arrives somewhere, is exact.
 * Source: A. C. Antoulas, Approximation of Large-Scale Dynamical Systems, 2005, chapter 11 (from memory).
 *
 * @param inputs      B, one column of nodes for each group
 * @param shifts      how many besides 0, evenly in the logarithm from 1/(20 years) to 1/(15 minutes)
 * @param extraFields nodal temperatures that must lie in the space as well
 * @returns √C times each field, orthonormal in the plain sense; the first ones, `kept` of them, hold the
 *   constant, the steady states, the yearly sine and the extra fields
 */
export function rationalBasis(
  system: ThermalSystem,
  inputs: readonly Float64Array[],
  shifts: number,
  extraFields: readonly Float64Array[],
): { fields: Float64Array[]; kept: number } {
  const { capacity_JK, conductance_WK } = system
  const root = capacity_JK.map(Math.sqrt)
  const fields: Float64Array[] = []
  const add = (temperature: Float64Array, newShare: number) =>
    addDirection(
      fields,
      temperature.map((value, node) => value * root[node]),
      newShare,
    )
  const answers = (shift: number) => {
    const factor = choleskyFactor(conductance_WK, capacity_JK, shift)
    const fieldsOf = inputs.map((input) => input.slice())
    choleskySolveAll(factor, fieldsOf)
    for (const field of fieldsOf) add(field, NEW_SHARE)
  }
  add(new Float64Array(root.length).fill(1), 0)
  answers(0)
  const yearly = complexFactor(conductance_WK, capacity_JK, (2 * Math.PI) / YEAR_S)
  for (const input of inputs) {
    const re = input.slice()
    const im = new Float64Array(re.length)
    complexSolve(yearly, re, im)
    add(re, NEW_SHARE)
    add(im, NEW_SHARE)
  }
  for (const field of extraFields) add(field, 1e-12)
  const kept = fields.length
  for (const shift of shiftRates(shifts)) answers(shift)
  return { fields, kept }
}

function shiftRates(count: number): number[] {
  const slow = Math.log(1 / SLOWEST_S)
  const fast = Math.log(1 / FASTEST_S)
  return Array.from({ length: count }, (_, i) =>
    Math.exp(slow + ((fast - slow) * i) / Math.max(1, count - 1)),
  )
}

/** Gram-Schmidt in place, a second time where the first took most of it; what is nearly dependent is dropped. */
export function addDirection(known: Float64Array[], field: Float64Array, newShare: number): boolean {
  const n = field.length
  const length = norm(field)
  let before = length
  let rest = length
  do {
    before = rest
    for (const direction of known) {
      const part = dotAt(direction, 0, field, 0, n)
      for (let i = 0; i < n; i++) field[i] -= part * direction[i]
    }
    rest = norm(field)
    if (!(rest > newShare * length)) return false
  } while (rest < 0.1 * before)
  for (let i = 0; i < n; i++) field[i] /= rest
  known.push(field)
  return true
}

function norm(field: Float64Array): number {
  return Math.sqrt(dotAt(field, 0, field, 0, field.length))
}
