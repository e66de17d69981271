import { EigenvalueDecomposition, Matrix } from 'ml-matrix'
import { modalAdmittance, type Admittance } from './admittance.ts'
import { dotAt } from './band-matrix.ts'
import { addDirection } from './rational-basis.ts'
import { symmetricModes } from './symmetric-modes.ts'
import type { ReducedElement } from './thermal-system.ts'

/** A system in modes, as far as its answers go. */
export interface ModalSystem extends Pick<ReducedElement, 'modes' | 'decay_s' | 'gain' | 'conductance_WK'> {
  /** Temperatures inside that matter too, `watched[p * modes + k]`: weights that sum to 1, turned to modes. */
  readonly watched: Float64Array
}

const HOUR_S = 3600
const SLOWEST_S = 20 * 365 * 86400
const SAMPLES = 48

/** Periods at which a shortened system must answer like the whole one [s]. */
const HELD_PERIODS_S = [20, 5, 1, 0.25]
  .map((years) => years * 365 * 86400)
  .concat([15 * 86400, 4 * 86400, 86400, 12 * HOUR_S, 6 * HOUR_S])

/**
 * Fewer directions that answer like all of them: what the states do under sines of all periods from 20 years
 * to one hour, ranked by how much of it each direction carries (proper orthogonal decomposition of the
 * frequency response; for this symmetric system close to balanced truncation, after K. Willcox and
 * J. Peraire, AIAA Journal 40, 2002, from memory). As many are taken as the tolerance asks for: the answers
 * of both systems are compared, not estimated.
 *
 * @param kept        directions (combinations of modes) that must stay whole
 * @param tolerance   largest difference of a flow, as a share of what 1 K at its own group brings at that period,
 *   for periods of 6 h and more; as much may a watched temperature be off for 1 K [K]
 * @returns orthonormal directions, each of length `system.modes`
 */
export function leadingDirections(
  system: ModalSystem,
  kept: readonly Float64Array[],
  tolerance: number,
): Float64Array[] {
  const first: Float64Array[] = []
  for (const direction of kept) addDirection(first, direction.slice(), 1e-9)
  const ranked = rankedDirections(system, first)
  const taken = (count: number) => {
    const directions = first.slice()
    for (let i = 0; i < ranked.length && directions.length < count; i++)
      addDirection(directions, ranked[i].slice(), 1e-6)
    return directions
  }
  const wanted = HELD_PERIODS_S.map((period_s) => answers(system, (2 * Math.PI) / period_s))
  let low = first.length
  let high = system.modes
  while (low < high) {
    const middle = (low + high) >> 1
    if (isAlike(shortened(system, taken(middle)).system, wanted, tolerance)) high = middle
    else low = middle + 1
  }
  return taken(low)
}

/** Directions of the frequency response that `first` leaves, the strongest first. */
function rankedDirections(system: ModalSystem, first: readonly Float64Array[]): Float64Array[] {
  const { modes: size, decay_s, gain } = system
  const groups = system.conductance_WK.length
  const slow = Math.log((2 * Math.PI) / SLOWEST_S)
  const fast = Math.log((2 * Math.PI) / HOUR_S)
  const seen = new Float64Array(size * size)
  for (let sample = 0; sample < SAMPLES; sample++) {
    const omega = Math.exp(slow + ((fast - slow) * (sample + 0.5)) / SAMPLES)
    const own = modalAdmittance(system, omega)
    for (let g = 0; g < groups; g++) {
      const re = new Float64Array(size)
      const im = new Float64Array(size)
      // The error of an answer goes with the square of the state's, times ω: hence a weight that rises with ω.
      const at = g * groups + g
      const scale = Math.pow(omega, 0.4) / Math.sqrt(Math.hypot(own.re[at], own.im[at]))
      for (let k = 0; k < size; k++) {
        const share = (scale * gain[k * groups + g]) / (decay_s[k] * decay_s[k] + omega * omega)
        re[k] = share * decay_s[k]
        im[k] = -share * omega
      }
      for (const part of [re, im]) {
        for (const direction of first) {
          const along = dotAt(direction, 0, part, 0, size)
          for (let k = 0; k < size; k++) part[k] -= along * direction[k]
        }
        for (let i = 0; i < size; i++) for (let j = 0; j <= i; j++) seen[i * size + j] += part[i] * part[j]
      }
    }
  }
  const whole = new Matrix(size, size)
  for (let i = 0; i < size; i++)
    for (let j = 0; j <= i; j++) whole.set(i, j, seen[i * size + j]).set(j, i, seen[i * size + j])
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(whole, { assumeSymmetric: true })
  return realEigenvalues
    .map((strength, column) => ({ strength, column }))
    .sort((a, b) => b.strength - a.strength)
    .map(({ column }) => Float64Array.from(eigenvectorMatrix.getColumn(column)))
}

interface Answers {
  readonly flow: Admittance
  readonly inside: Admittance
}

/** Flows at the boundaries, and watched temperatures p for 1 K at group h, `[p * groups + h]`. */
function answers(system: ModalSystem, omega: number): Answers {
  const { modes, decay_s, gain, watched } = system
  const groups = system.conductance_WK.length
  const re = new Float64Array((watched.length / modes) * groups)
  const im = new Float64Array(re.length)
  for (let k = 0; k < modes; k++) {
    const square = decay_s[k] * decay_s[k] + omega * omega
    for (let h = 0; h < groups; h++) {
      const share = gain[k * groups + h] / square
      for (let at = h, from = k; from < watched.length; at += groups, from += modes) {
        re[at] += watched[from] * share * decay_s[k]
        im[at] -= watched[from] * share * omega
      }
    }
  }
  return { flow: modalAdmittance(system, omega), inside: { re, im } }
}

function isAlike(system: ModalSystem, wanted: readonly Answers[], tolerance: number): boolean {
  const groups = system.conductance_WK.length
  const distance = (a: Admittance, b: Admittance, at: number) =>
    Math.hypot(a.re[at] - b.re[at], a.im[at] - b.im[at])
  return HELD_PERIODS_S.every((period_s, n) => {
    const { flow, inside } = answers(system, (2 * Math.PI) / period_s)
    for (let at = 0; at < flow.re.length; at++) {
      const own = Math.floor(at / groups) * (groups + 1)
      const allowed_WK = tolerance * Math.hypot(wanted[n].flow.re[own], wanted[n].flow.im[own])
      if (!(distance(flow, wanted[n].flow, at) <= allowed_WK)) return false
    }
    for (let at = 0; at < inside.re.length; at++)
      if (!(distance(inside, wanted[n].inside, at) <= tolerance)) return false
    return true
  })
}

/**
 * The system on some directions, in modes again.
 *
 * @returns `turn[i * size + k]`: mode i of the old system in mode k of the new one
 */
export function shortened(
  system: ModalSystem,
  directions: readonly Float64Array[],
): { system: ModalSystem; turn: Float64Array } {
  const size = directions.length
  const old = system.modes
  let fields = directions
  let turn: Float64Array = new Float64Array(0)
  let decay_s: Float64Array = new Float64Array(0)
  // The second time the matrix is nearly diagonal, and slow modes come out to full accuracy.
  for (let pass = 0; pass < 2; pass++) {
    const matrix = new Float64Array(size * size)
    for (let i = 0; i < size; i++) {
      const scaled = fields[i].map((value, k) => value * system.decay_s[k])
      for (let j = 0; j <= i; j++)
        matrix[i * size + j] = matrix[j * size + i] = dotAt(scaled, 0, fields[j], 0, old)
    }
    const found = symmetricModes(matrix, size)
    decay_s = found.values
    turn = new Float64Array(old * size)
    for (let j = 0; j < size; j++)
      for (let i = 0; i < old; i++) {
        const value = fields[j][i]
        for (let k = 0; k < size; k++) turn[i * size + k] += value * found.vectors[j * size + k]
      }
    fields = Array.from({ length: size }, (_, k) => {
      const field = new Float64Array(old)
      for (let i = 0; i < old; i++) field[i] = turn[i * size + k]
      return field
    })
  }
  const groups = system.conductance_WK.length
  const gain = new Float64Array(size * groups)
  const watched = new Float64Array((system.watched.length / old) * size)
  for (let i = 0; i < old; i++)
    for (let k = 0; k < size; k++) {
      const share = turn[i * size + k]
      for (let g = 0; g < groups; g++) gain[k * groups + g] += share * system.gain[i * groups + g]
      for (let at = k, from = i; at < watched.length; at += size, from += old)
        watched[at] += share * system.watched[from]
    }
  return { system: { modes: size, decay_s, gain, conductance_WK: system.conductance_WK, watched }, turn }
}
