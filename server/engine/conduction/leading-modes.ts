import { EigenvalueDecomposition, Matrix } from 'ml-matrix'
import { modalAdmittance, type Admittance } from './admittance.ts'
import { dotAt } from './band-matrix.ts'
import { addDirection } from './rational-basis.ts'
import { symmetricModes } from './symmetric-modes.ts'
import type { ReducedElement } from './thermal-system.ts'

/** What the boundaries see of a system in modes. */
export type ModalSystem = Pick<ReducedElement, 'modes' | 'decay_s' | 'gain' | 'conductance_WK'>

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
 * @param tolerance_K largest difference of a surface temperature for inputs of 1 K, for periods of 6 h and more
 * @returns orthonormal directions, each of length `system.modes`
 */
export function leadingDirections(
  system: ModalSystem,
  kept: readonly Float64Array[],
  tolerance_K: number,
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
  const wanted = HELD_PERIODS_S.map((period_s) => modalAdmittance(system, (2 * Math.PI) / period_s))
  let low = first.length
  let high = system.modes
  while (low < high) {
    const middle = (low + high) >> 1
    if (isAlike(shortened(system, taken(middle)).system, wanted, tolerance_K)) high = middle
    else low = middle + 1
  }
  return taken(low)
}

/** Directions of the frequency response that `first` leaves, the strongest first. */
function rankedDirections(system: ModalSystem, first: readonly Float64Array[]): Float64Array[] {
  const { modes: size, decay_s, gain, conductance_WK } = system
  const groups = conductance_WK.length
  const slow = Math.log((2 * Math.PI) / SLOWEST_S)
  const fast = Math.log((2 * Math.PI) / HOUR_S)
  const seen = new Float64Array(size * size)
  for (let sample = 0; sample < SAMPLES; sample++) {
    const omega = Math.exp(slow + ((fast - slow) * (sample + 0.5)) / SAMPLES)
    for (let g = 0; g < groups; g++) {
      const re = new Float64Array(size)
      const im = new Float64Array(size)
      // The error of an answer goes with the square of the state's, times ω: hence a weight that rises with ω.
      const scale = Math.pow(omega, 0.35) / Math.sqrt(conductance_WK[g])
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

function isAlike(system: ModalSystem, wanted: readonly Admittance[], tolerance_K: number): boolean {
  const { conductance_WK } = system
  const groups = conductance_WK.length
  return HELD_PERIODS_S.every((period_s, n) => {
    const { re, im } = modalAdmittance(system, (2 * Math.PI) / period_s)
    for (let g = 0; g < groups; g++)
      for (let h = 0; h < groups; h++) {
        const at = g * groups + h
        const off_WK = Math.hypot(re[at] - wanted[n].re[at], im[at] - wanted[n].im[at])
        if (!(off_WK <= tolerance_K * conductance_WK[g])) return false
      }
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
  for (let i = 0; i < old; i++)
    for (let k = 0; k < size; k++)
      for (let g = 0; g < groups; g++)
        gain[k * groups + g] += turn[i * size + k] * system.gain[i * groups + g]
  return { system: { modes: size, decay_s, gain, conductance_WK: system.conductance_WK }, turn }
}
