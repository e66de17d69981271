import { HOUR_S, HOURS, type ClimateYear } from '../climate/climate-year.ts'
import {
  humidityRatio,
  moistAirVolume,
  saturationPressureIso13788,
  vapourPressureOfDewPoint,
  vapourPressureOfRatio,
} from './moist-air.ts'

export interface VapourSources {
  /** Vapour set free in the room by hour of the day, 24 values [kg/h]. */
  readonly vapour_kgh: readonly number[]
  /** Room air [m³]. */
  readonly volume_m3: number
  /**
   * Vapour that air, furniture and wall faces take up together, as a multiple of the air alone, >= 1.
   * 1 leaves all buffering out, which overstates the peaks; monthly means hardly depend on it.
   */
  readonly buffer: number
}

/**
 * Vapour pressure of the room air, hour by hour, from sources and outdoor air:
 *
 *   ρ V b dW/dt = ρ Q (W_out - W) + G
 *
 * solved exactly for inputs that are constant within the hour, with the humidity ratio W, and limited
 * at saturation at the air temperature (what is beyond is taken to condense). Vapour that condenses on
 * colder faces is not taken out, which is on the safe side.
 *
 * @param air_C          room air, 8,760 values
 * @param outdoorAir_m3s outdoor air entering, 8,760 values
 * @param firstHour      the hour lived first; two days before it are run up to it
 * @returns vapour pressure at the end of each hour [Pa]
 */
export function indoorVapour(
  air_C: Float64Array,
  outdoorAir_m3s: Float64Array,
  climate: ClimateYear,
  sources: VapourSources,
  firstHour: number,
): Float64Array {
  const { vapour_kgh, volume_m3, buffer } = sources
  const vapour_Pa = new Float64Array(HOURS)
  const warmUp_h = 48
  let ratio = -1
  for (let step = -warmUp_h; step < HOURS; step++) {
    const hour = (firstHour + step + HOURS) % HOURS
    const pressure = climate.pressure_Pa[hour]
    const outdoor = humidityRatio(vapourPressureOfDewPoint(climate.dewPoint_C[hour]), pressure)
    if (ratio < 0) ratio = outdoor
    const density = 1 / moistAirVolume(air_C[hour], outdoor, pressure)
    const changes = (outdoorAir_m3s[hour] * HOUR_S) / (volume_m3 * buffer)
    const gain = vapour_kgh[hour % 24] / (density * volume_m3 * buffer)
    // (1 - e^-x)/x tends to 1 for a room without any air change.
    const kept = changes > 1e-9 ? -Math.expm1(-changes) / changes : 1
    ratio = outdoor + (ratio - outdoor) * Math.exp(-changes) + gain * kept
    ratio = Math.min(ratio, humidityRatio(saturationPressureIso13788(air_C[hour]), pressure))
    if (step >= 0) vapour_Pa[hour] = vapourPressureOfRatio(ratio, pressure)
  }
  return vapour_Pa
}
