export interface IndoorClimate {
  readonly air_C: number
  readonly radiant_C: number
  /** Relative to the body [m/s]. */
  readonly airSpeed_ms: number
  readonly vapour_Pa: number
  /** Metabolic rate [met], 58.15 W/m² each. */
  readonly activity_met: number
  /** External work [met]. */
  readonly work_met: number
  /** Clothing [clo], 0.155 m² K/W each. */
  readonly clothing_clo: number
}

/**
 * Predicted mean vote and predicted percentage dissatisfied. The clothing surface temperature is
 * found by the fixed-point iteration of the published code.
 *
 * Source: ISO 7730:2005, 4.1 and annex D (after P. O. Fanger 1970), from memory. Valid for votes from
 * -2 to +2, air 10 to 30 °C, radiant 10 to 40 °C, air speed up to 1 m/s, 0.8 to 4 met, up to 2 clo.
 *
 * @returns vote (-3 cold to +3 hot) and dissatisfied [%]
 * @throws RangeError when the iteration does not settle
 */
export function predictedVote(climate: IndoorClimate): {
  readonly vote: number
  readonly dissatisfied_pct: number
} {
  const { air_C, radiant_C, vapour_Pa } = climate
  const icl = 0.155 * climate.clothing_clo
  const m = 58.15 * climate.activity_met
  const mw = m - 58.15 * climate.work_met
  const fcl = icl <= 0.078 ? 1 + 1.29 * icl : 1.05 + 0.645 * icl
  const hcf = 12.1 * Math.sqrt(climate.airSpeed_ms)
  const taa = air_C + 273
  const tra = radiant_C + 273
  const p1 = icl * fcl
  const p2 = p1 * 3.96
  const p3 = p1 * 100
  const p4 = p1 * taa
  const p5 = 308.7 - 0.028 * mw + p2 * (tra / 100) ** 4
  let xn = (taa + (35.5 - air_C) / (3.5 * (6.45 * icl + 0.1))) / 100
  let xf = xn / 2
  let hc = hcf
  for (let n = 0; Math.abs(xn - xf) > 0.00015; n++) {
    if (n > 150) throw new RangeError('predicted vote: the clothing temperature does not settle')
    xf = (xf + xn) / 2
    hc = Math.max(hcf, 2.38 * Math.abs(100 * xf - taa) ** 0.25)
    xn = (p5 + p4 * hc - p2 * xf ** 4) / (100 + p3 * hc)
  }
  const tcl = 100 * xn - 273
  const skin = 3.05e-3 * (5733 - 6.99 * mw - vapour_Pa)
  const sweat = mw > 58.15 ? 0.42 * (mw - 58.15) : 0
  const breath = 1.7e-5 * m * (5867 - vapour_Pa) + 0.0014 * m * (34 - air_C)
  const radiation = 3.96 * fcl * (xn ** 4 - (tra / 100) ** 4)
  const convection = fcl * hc * (tcl - air_C)
  const vote = (0.303 * Math.exp(-0.036 * m) + 0.028) * (mw - skin - sweat - breath - radiation - convection)
  return { vote, dissatisfied_pct: 100 - 95 * Math.exp(-0.03353 * vote ** 4 - 0.2179 * vote ** 2) }
}
