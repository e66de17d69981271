import { STATION_DEPTHS_M, type SoilStation } from './soil-stations.ts'
import { average, daysLater, fitDiffusivity, waveBelow, waveOfDays } from './soil-wave.ts'

const MONTH_START_D = [0, 31, 59, 90, 120, 151, 181, 212, 243, 273, 304, 334, 365]
/** Depths that the diffusivity of a station is fitted on: 5 to 50 cm. */
const FITTED = [0, 1, 2, 3]
const DEEPEST = 4

/** How a station's deepest thermometer answers to the wave carried down from above. */
export interface StationError {
  readonly station: SoilStation
  /** Whether neither freezing nor lasting snow is to be expected: coldest month above 0 °C, no day of frost at 5 cm. */
  readonly isWarm: boolean
  readonly diffusivity_m2s: number
  /** Computed minus measured, at 100 cm. */
  readonly amplitude_K: number
  readonly delay_d: number
  /** Yearly mean at 100 cm minus that at 5 cm. */
  readonly mean_K: number
}

/** One diffusivity for each station from 5 to 50 cm, then 100 cm from the wave at 5 cm. */
export function stationErrors(stations: readonly SoilStation[]): StationError[] {
  return stations.map((station) => {
    const waves = station.soil_C.map(waveOfDays)
    const diffusivity_m2s = fitDiffusivity(
      FITTED.map((i) => STATION_DEPTHS_M[i]),
      FITTED.map((i) => waves[i]),
    )
    const below = waveBelow(waves[0], STATION_DEPTHS_M[0], STATION_DEPTHS_M[DEEPEST], diffusivity_m2s)
    return {
      station,
      isWarm: coldestMonth(station) > 0 && Math.min(...station.soil_C[0]) > 0,
      diffusivity_m2s,
      amplitude_K: below.amplitude - waves[DEEPEST].amplitude,
      delay_d: daysLater(below, waves[DEEPEST]),
      mean_K: waves[DEEPEST].mean - waves[0].mean,
    }
  })
}

function coldestMonth(station: SoilStation): number {
  const means = MONTH_START_D.slice(0, 12).map((start, month) =>
    average(station.outdoor_C.subarray(start, MONTH_START_D[month + 1])),
  )
  return Math.min(...means)
}

/** Mean and worst size of some errors. */
export const meanSize = (errors: readonly number[]): number => average(errors.map(Math.abs))
export const worstSize = (errors: readonly number[]): number => Math.max(...errors.map(Math.abs))
