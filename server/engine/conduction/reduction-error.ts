import { modalAdmittance, nodalAdmittance } from './admittance.ts'
import type { ReducedElement, ThermalSystem } from './thermal-system.ts'

const HOUR_S = 3600
const YEAR_S = 365 * 86400

/** From 20 years to 2 hours, evenly in the logarithm, with the year and the day among them. */
export const COMPARED_PERIODS_S: readonly number[] = [
  20 * YEAR_S,
  4 * YEAR_S,
  YEAR_S,
  YEAR_S / 4,
  YEAR_S / 12,
  10 * 86400,
  3 * 86400,
  86400,
  12 * HOUR_S,
  6 * HOUR_S,
  3 * HOUR_S,
  2 * HOUR_S,
]

/** What the reduction costs at one period of the inputs. */
export interface PeriodError {
  readonly period_s: number
  /** Largest error of a group's mean surface temperature for 1 K at any group [K per K]. */
  readonly surface: number
  /** Largest error of a flow, as a share of the flow that 1 K at its own group brings at that period. */
  readonly flow: number
}

/**
 * Compares the modes with all nodes for steady sines: an error that is computed, not estimated.
 *
 *   Y(ω) = G - Bᵀ (K + iωC)⁻¹ B,  for the modes  Y_gh = G_g δ_gh - Σ_k gain_kg gain_kh / (decay_k + iω)
 *
 * The mean surface temperature of group g (weighted by film) is u_g - q_g / G_g.
 *
 * @returns one entry for each period, in their order
 */
export function reductionError(
  system: ThermalSystem,
  reduced: ReducedElement,
  periods_s: readonly number[] = COMPARED_PERIODS_S,
): PeriodError[] {
  const { conductance_WK } = reduced
  const groups = conductance_WK.length
  return periods_s.map((period_s) => {
    const omega_s = (2 * Math.PI) / period_s
    const full = nodalAdmittance(system, omega_s)
    const few = modalAdmittance(reduced, omega_s)
    let surface = 0
    let flow = 0
    for (let g = 0; g < groups; g++) {
      const own = g * groups + g
      const brought = Math.hypot(full.re[own], full.im[own])
      for (let h = 0; h < groups; h++) {
        const at = g * groups + h
        const off = Math.hypot(few.re[at] - full.re[at], few.im[at] - full.im[at])
        surface = Math.max(surface, off / conductance_WK[g])
        flow = Math.max(flow, off / brought)
      }
    }
    return { period_s, surface, flow }
  })
}
