import { HOURS, type ClimateYear } from '../climate/climate-year.ts'
import type { Exposure } from './house-model.ts'

const RAD = Math.PI / 180

/**
 * The equivalent outdoor temperature of a plane, hour by hour. Within hour i it runs linearly from
 * `linear_C[i - 1] + step_K[i]` to `linear_C[i] + step_K[i]`: air and sky change steadily, the sun is
 * known as the mean of the hour only.
 */
export interface Driven {
  readonly linear_C: Float64Array
  readonly step_K: Float64Array
}

/** Sun on a plane by hour [W/m²]: beam, sky and ground together. */
export interface PlaneSun {
  readonly beam_Wm2: Float64Array
  readonly sky_Wm2: Float64Array
  readonly ground_Wm2: Float64Array
}

/**
 * Air, sky and sun as one temperature behind the outer film h:
 *
 *   T_eq = T_air + ε h_r F (T_sky - T_air) / h + α (1 - v) I / h
 *
 * with F = cos(tilt/2) (1 + cos tilt)/2, the part of the view that is sky rather than ground and low
 * air, both taken at air temperature (Walton 1983, thermal analysis research program reference
 * manual, from memory), and v the share of the absorbed sun that evaporates water.
 *
 * @param sun null for a plane without sun (windows, whose sun is accounted for by their glass)
 * @returns linear_C and step_K, 8,760 values each
 */
export function drivenTemperature(climate: ClimateYear, exposure: Exposure, sun: PlaneSun | null): Driven {
  const cosTilt = Math.cos(exposure.tilt_deg * RAD)
  const sky = Math.cos((exposure.tilt_deg * RAD) / 2) * (1 + cosTilt) * 0.5
  const skyShare = (exposure.emittance * exposure.radiative_Wm2K * sky) / exposure.film_Wm2K
  const sunShare = (exposure.solarAbsorptance * (1 - exposure.evaporativeShare)) / exposure.film_Wm2K
  const linear_C = new Float64Array(HOURS)
  const step_K = new Float64Array(HOURS)
  for (let i = 0; i < HOURS; i++) {
    const air = climate.outdoor_C[i]
    linear_C[i] = air + skyShare * (climate.sky_C[i] - air)
    if (sun) step_K[i] = sunShare * (sun.beam_Wm2[i] + sun.sky_Wm2[i] + sun.ground_Wm2[i])
  }
  return { linear_C, step_K }
}
