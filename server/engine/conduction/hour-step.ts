import type { ReducedElement } from './thermal-system.ts'

/**
 * One exact step of a reduced element. Inputs of group h run linearly from u0_h to u1_h within the step.
 *
 *   mean flow in from group g:  -Σ_k meanState[k G + g] m_k + Σ_h response0[g G + h] u0_h + response1[g G + h] u1_h
 *   modes at the end:           decay[k] m_k + Σ_h gain0[k G + h] u0_h + gain1[k G + h] u1_h
 */
export interface HourStep {
  readonly modes: number
  readonly groups: number
  readonly decay: Float64Array
  readonly gain0: Float64Array
  readonly gain1: Float64Array
  readonly meanState: Float64Array
  readonly response0: Float64Array
  readonly response1: Float64Array
}

/**
 * The exact solution of dm/dt = -λ m + b u with u linear in the step, z = λ dt:
 *
 *   m(dt) = e^{-z} m + (b/λ) [ (φ - e^{-z}) u0 + (1 - φ) u1 ],                φ = (1 - e^{-z}) / z
 *   mean m = φ m + (b/λ) [ (1/2 - φ + ψ) u0 + (1/2 - ψ) u1 ],                 ψ = (1 - φ) / z
 *
 * @param step_s length of the step [s]
 */
export function hourStep(element: ReducedElement, step_s = 3600): HourStep {
  const { modes, decay_s, gain, conductance_WK } = element
  const groups = conductance_WK.length
  const decay = new Float64Array(modes)
  const gain0 = new Float64Array(modes * groups)
  const gain1 = new Float64Array(modes * groups)
  const meanState = new Float64Array(modes * groups)
  const response0 = new Float64Array(groups * groups)
  const response1 = new Float64Array(groups * groups)
  for (let g = 0; g < groups; g++) {
    response0[g * groups + g] = 0.5 * conductance_WK[g]
    response1[g * groups + g] = 0.5 * conductance_WK[g]
  }
  for (let k = 0; k < modes; k++) {
    const z = decay_s[k] * step_s
    const { e, endStart, endEnd, mean, meanStart, meanEnd } = weights(z)
    decay[k] = e
    for (let h = 0; h < groups; h++) {
      const b = gain[k * groups + h]
      gain0[k * groups + h] = b * step_s * endStart
      gain1[k * groups + h] = b * step_s * endEnd
      meanState[k * groups + h] = b * mean
      for (let g = 0; g < groups; g++) {
        const pair = gain[k * groups + g] * b * step_s
        response0[g * groups + h] -= pair * meanStart
        response1[g * groups + h] -= pair * meanEnd
      }
    }
  }
  return { modes, groups, decay, gain0, gain1, meanState, response0, response1 }
}

/**
 * Weights of one mode in units of the step: of u0 and u1 in its end value and in its mean, all over
 * b dt. Below z = 0.02 the closed forms lose digits, so their series stand there (z⁶ left out).
 */
function weights(z: number) {
  const e = Math.exp(-z)
  if (z < 0.02) {
    const mean = 1 + z * (-1 / 2 + z * (1 / 6 + z * (-1 / 24 + z * (1 / 120 - z / 720))))
    const endStart = 1 / 2 + z * (-1 / 3 + z * (1 / 8 + z * (-1 / 30 + z * (1 / 144 - z / 840))))
    const endEnd = 1 / 2 + z * (-1 / 6 + z * (1 / 24 + z * (-1 / 120 + z * (1 / 720 - z / 5040))))
    const meanStart = 1 / 3 + z * (-1 / 8 + z * (1 / 30 + z * (-1 / 144 + z * (1 / 840 - z / 5760))))
    const meanEnd = 1 / 6 + z * (-1 / 24 + z * (1 / 120 + z * (-1 / 720 + z * (1 / 5040 - z / 40320))))
    return { e, endStart, endEnd, mean, meanStart, meanEnd }
  }
  const phi = -Math.expm1(-z) / z
  const psi = (1 - phi) / z
  return {
    e,
    endStart: (phi - e) / z,
    endEnd: (1 - phi) / z,
    mean: phi,
    meanStart: (0.5 - phi + psi) / z,
    meanEnd: (0.5 - psi) / z,
  }
}
