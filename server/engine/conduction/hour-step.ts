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
 *   m(dt) = e^{-z} m + b dt [ (φ1 - φ2) u0 + φ2 u1 ]
 *   mean m = φ1 m + b dt [ (φ2 - φ3) u0 + φ3 u1 ]
 *   φ1 = (1 - e^{-z}) / z,  φ2 = (1 - φ1) / z,  φ3 = (1/2 - φ2) / z
 *
 * Source: the variation of constants formula; φ functions as in M. Hochbruck and A. Ostermann, Exponential
 * integrators, Acta Numerica 19, 2010 (from memory), with z for -z.
 *
 * @param step_s length of the step [s]
 * @throws RangeError for a step that is not more than 0
 */
export function hourStep(element: ReducedElement, step_s = 3600): HourStep {
  if (!(step_s > 0)) throw new RangeError(`step_s must be more than 0, got ${step_s}`)
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
    const [e, phi1, phi2, phi3] = phis(decay_s[k] * step_s)
    decay[k] = e
    for (let h = 0; h < groups; h++) {
      const b = gain[k * groups + h]
      gain0[k * groups + h] = b * step_s * (phi1 - phi2)
      gain1[k * groups + h] = b * step_s * phi2
      meanState[k * groups + h] = b * phi1
      for (let g = 0; g < groups; g++) {
        const pair = gain[k * groups + g] * b * step_s
        response0[g * groups + h] -= pair * (phi2 - phi3)
        response1[g * groups + h] -= pair * phi3
      }
    }
  }
  return { modes, groups, decay, gain0, gain1, meanState, response0, response1 }
}

/** e^{-z}, φ1, φ2 and φ3 at z. Below 1 the quotients lose digits: there φ3 is summed and the others follow from it. */
export function phis(z: number): [e: number, phi1: number, phi2: number, phi3: number] {
  if (z < 1) {
    // φ3 = Σ (-z)ⁿ / (n + 3)!, 18 terms, so that what is left out is below 1e-19.
    let phi3 = 0
    for (let n = 17; n >= 0; n--) phi3 = INVERSE_FACTORIAL[n + 3] - z * phi3
    const phi2 = 0.5 - z * phi3
    const phi1 = 1 - z * phi2
    return [1 - z * phi1, phi1, phi2, phi3]
  }
  const phi1 = -Math.expm1(-z) / z
  const phi2 = (1 - phi1) / z
  return [Math.exp(-z), phi1, phi2, (0.5 - phi2) / z]
}

const INVERSE_FACTORIAL = Float64Array.from({ length: 21 }, (_, n) => {
  let factorial = 1
  for (let i = 2; i <= n; i++) factorial *= i
  return 1 / factorial
})
