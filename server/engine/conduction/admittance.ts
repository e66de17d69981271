import { complexFactor, complexSolve } from './band-complex.ts'
import type { ReducedElement, ThermalSystem } from './thermal-system.ts'

/** Complex flow into each group g for 1 K at group h, `[g * groups + h]` [W/K]. */
export interface Admittance {
  readonly re: Float64Array
  readonly im: Float64Array
}

/** By all nodes:  Y(ω) = G - Bᵀ (K + iωC)⁻¹ B. */
export function nodalAdmittance(system: ThermalSystem, omega_s: number): Admittance {
  const { capacity_JK, conductance_WK, boundaries } = system
  const groups = boundaries.length
  const re = new Float64Array(groups * groups)
  const im = new Float64Array(groups * groups)
  const factor = complexFactor(conductance_WK, capacity_JK, omega_s)
  boundaries.forEach((driven, h) => {
    const x = new Float64Array(capacity_JK.length)
    const y = new Float64Array(capacity_JK.length)
    driven.node.forEach((node, i) => (x[node] += driven.conductance_WK[i]))
    complexSolve(factor, x, y)
    boundaries.forEach((seen, g) =>
      seen.node.forEach((node, i) => {
        const film = seen.conductance_WK[i]
        re[g * groups + h] += film * ((g === h ? 1 : 0) - x[node])
        im[g * groups + h] -= film * y[node]
      }),
    )
  })
  return { re, im }
}

/** By modes:  Y_gh = G_g δ_gh - Σ_k gain_kg gain_kh / (decay_k + iω). */
export function modalAdmittance(
  reduced: Pick<ReducedElement, 'modes' | 'decay_s' | 'gain' | 'conductance_WK'>,
  omega_s: number,
): Admittance {
  const { modes, decay_s, gain, conductance_WK } = reduced
  const groups = conductance_WK.length
  const re = new Float64Array(groups * groups)
  const im = new Float64Array(groups * groups)
  for (let g = 0; g < groups; g++) re[g * groups + g] = conductance_WK[g]
  for (let k = 0; k < modes; k++) {
    const square = decay_s[k] * decay_s[k] + omega_s * omega_s
    for (let g = 0; g < groups; g++)
      for (let h = 0; h < groups; h++) {
        const pair = (gain[k * groups + g] * gain[k * groups + h]) / square
        re[g * groups + h] -= pair * decay_s[k]
        im[g * groups + h] += pair * omega_s
      }
  }
  return { re, im }
}
