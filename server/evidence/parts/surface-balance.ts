import type { LibraryCover } from '#contract/cover.ts'
import { HOURS, HOUR_S, type ClimateYear } from '#engine/climate/climate-year.ts'
import type { Harmonic } from '#engine/climate/harmonic.ts'
import { dewPointFromHumidity, standardPressure } from '#engine/climate/humidity.ts'
import { hourlyCloud, skyTemperatures } from '#engine/climate/sky.ts'
import { sunHours } from '#engine/climate/solar-day.ts'
import { waveBelowFilm } from '#engine/year/charging.ts'
import { drivenTemperature, type PlaneSun } from '#engine/zone/driven.ts'
import { surfaceFilms } from '#modelling/surface-films.ts'
import type { Substance } from '#engine/conduction/specs.ts'
import type { SoilStation } from './soil-stations.ts'
import { waveBelow } from './soil-wave.ts'

/**
 * A year of the program's weather from the daily means of a station: every hour of a day has the day's
 * mean. The surface balance is linear in air, sky and sun, so yearly mean and first harmonic of the ground
 * need no more; nothing shorter than a day can be asked of it. Where the height of the station is unknown
 * it counts as sea level, which makes a clear sky at 1,500 m about 5 W/m² too warm.
 *
 * @throws RangeError for a station without humidity
 */
export function weatherOfDays(station: SoilStation): ClimateYear {
  const { humidity_pct } = station
  if (!humidity_pct) throw new RangeError(`Station ${station.wban} has no humidity.`)
  const hourly = (daily: Float64Array) =>
    Float64Array.from({ length: HOURS }, (_, hour) => daily[Math.floor(hour / 24)])
  const place = {
    name: station.wban,
    latitude_deg: station.latitude_deg,
    longitude_deg: station.longitude_deg,
    elevation_m: 0,
    timeZone_h: Math.round(station.longitude_deg / 15),
  }
  const outdoor_C = hourly(station.outdoor_C)
  const dewPoint_C = hourly(
    station.outdoor_C.map((air_C, day) => dewPointFromHumidity(air_C, humidity_pct[day])),
  )
  const global_Wm2 = hourly(station.global_Wm2)
  const pressure_Pa = new Float64Array(HOURS).fill(standardPressure(0))
  const cloud = hourlyCloud(global_Wm2, sunHours(place).outside_Wm2)
  return {
    place,
    source: 'daily means of a reference station',
    outdoor_C,
    dewPoint_C,
    wind_ms: new Float64Array(HOURS),
    pressure_Pa,
    global_Wm2,
    beam_Wm2: new Float64Array(HOURS),
    diffuse_Wm2: global_Wm2,
    sky_C: skyTemperatures({ outdoor_C, dewPoint_C, pressure_Pa, cloud }),
  }
}

/**
 * The yearly wave at a depth below level ground, from air, sun and sky alone: the surface balance of the
 * program and the wave that it starts undisturbed ground from.
 *
 * @param cover on the ground, with its typical properties
 */
export function waveFromWeather(
  climate: ClimateYear,
  cover: Pick<LibraryCover, 'solarAbsorptance' | 'emittance' | 'evaporativeShare'>,
  soil: Substance,
  depth_m: number,
): Harmonic {
  const { ground } = surfaceFilms({})
  const film_Wm2K = ground.combined_Wm2K
  const exposure = {
    tilt_deg: 0,
    faces_deg: 0,
    solarAbsorptance: cover.solarAbsorptance.typical,
    emittance: cover.emittance.typical,
    film_Wm2K,
    radiative_Wm2K: ground.radiative_Wm2K,
    evaporativeShare: cover.evaporativeShare.typical,
  }
  const none = new Float64Array(HOURS)
  // On level ground beam and sky together are the global radiation.
  const sun: PlaneSun = { beam_Wm2: none, sky_Wm2: climate.global_Wm2, ground_Wm2: none }
  const { linear_C, step_K } = drivenTemperature(climate, exposure, sun)
  const equivalent_C = linear_C.map((value, hour) => value + step_K[hour])
  const films = { floor: film_Wm2K, wallInside: film_Wm2K, wallOutside: film_Wm2K, ground: film_Wm2K }
  const wave = waveBelowFilm(equivalent_C, { soil, films })
  const surface = {
    mean: wave.mean_C,
    amplitude: wave.amplitude_K,
    coldest_s: wave.coldest_s,
    warmest_s: wave.coldest_s + (HOURS / 2) * HOUR_S,
  }
  return waveBelow(surface, 0, depth_m, wave.diffusivity_m2s)
}
