import { HOURS } from './climate-year.ts'

/**
 * Emissivity of a clear sky, Berdahl and Martin 1984 (from memory), with hour and elevation terms:
 *
 *   0.711 + 0.56 (Td/100) + 0.73 (Td/100)² + 0.013 cos(2π t/24) + 0.00012 (p - 1000 hPa)
 *
 * @param dewPoint_C   Td
 * @param hour         t, solar or standard time from midnight [h]
 * @param pressure_Pa  station pressure
 */
export function clearSkyEmissivity(dewPoint_C: number, hour: number, pressure_Pa: number): number {
  const x = dewPoint_C / 100
  const eps =
    0.711 +
    0.56 * x +
    0.73 * x * x +
    0.013 * Math.cos((2 * Math.PI * hour) / 24) +
    0.00012 * (pressure_Pa / 100 - 1000)
  return Math.min(1, Math.max(0.3, eps))
}

/**
 * Share of the way from a clear sky to a black one that a full cover of low and middle cloud goes;
 * Martin and Berdahl 1984 give about 0.8 for one layer (from memory).
 */
const CLOUD_EMISSION = 0.8

/**
 * Effective temperature of the whole sky vault [°C].
 *
 * @param outdoor_C    air temperature
 * @param emissivity   of the clear sky
 * @param cloud        share of the sky under cloud, 0 to 1
 */
export function skyTemperature(outdoor_C: number, emissivity: number, cloud: number): number {
  const eps = emissivity + (1 - emissivity) * CLOUD_EMISSION * cloud
  return (outdoor_C + 273.15) * eps ** 0.25 - 273.15
}

/** Stefan-Boltzmann constant [W/(m² K⁴)], CODATA. */
const SIGMA = 5.670374e-8

/** Long-wave radiation that the sky sends down [W/m²] at its effective temperature. */
export function skyRadiation(sky_C: number): number {
  return SIGMA * (sky_C + 273.15) ** 4
}

/** Effective temperature [°C] of a sky that sends down so much long-wave radiation [W/m²]. */
export function skyFromRadiation(radiation_Wm2: number): number {
  return (radiation_Wm2 / SIGMA) ** 0.25 - 273.15
}

/**
 * Cloud share from the daily clearness index, where nobody observed clouds: clear at 0.75, overcast at
 * 0.20, straight between. A rule fitted to the long-wave radiation of two sites; an assumption elsewhere.
 */
export function cloudFromClearness(clearness: number): number {
  return Math.min(1, Math.max(0, (0.75 - clearness) / 0.55))
}

/**
 * Cloud share for every hour from radiation: the daily clearness index, held at noon and straight between
 * the noons. Days without sun take the value between the days around that have one.
 *
 * @param global_Wm2   horizontal radiation, 8,760 hours
 * @param outside_Wm2  the same outside the atmosphere
 */
export function hourlyCloud(global_Wm2: Float64Array, outside_Wm2: Float64Array): Float64Array {
  const daily = new Float64Array(365).fill(NaN)
  for (let day = 0; day < 365; day++) {
    let inside = 0
    let outside = 0
    for (let i = day * 24; i < day * 24 + 24; i++) {
      inside += global_Wm2[i]
      outside += outside_Wm2[i]
    }
    // below 300 Wh/m2 a day the index says more about refraction and horizon than about cloud
    if (outside > 300) daily[day] = cloudFromClearness(inside / outside)
  }
  fillGaps(daily)
  const cloud = new Float64Array(HOURS)
  for (let i = 0; i < HOURS; i++) {
    const noons = (i + 1) / 24 - 0.5
    const before = Math.floor(noons)
    const share = noons - before
    cloud[i] = daily[(before + 365) % 365] * (1 - share) + daily[(before + 1) % 365] * share
  }
  return cloud
}

/** Fills NaN days straight between their neighbours, round the end of the year; all NaN becomes 0.6. */
function fillGaps(daily: Float64Array): void {
  const n = daily.length
  const known = daily.findIndex((value) => !Number.isNaN(value))
  if (known < 0) {
    daily.fill(0.6) // no sun all year: the usual cloud amount of high latitudes, an assumption
    return
  }
  let last = known
  for (let step = 1; step <= n; step++) {
    const here = (known + step) % n
    if (Number.isNaN(daily[here])) continue
    const gap = (here - last + n) % n || n
    for (let k = 1; k < gap; k++) {
      daily[(last + k) % n] = daily[last] + ((daily[here] - daily[last]) * k) / gap
    }
    last = here
  }
}

/** What the sky of a year is computed from; arrays of 8,760 hours. */
export interface SkyInputs {
  readonly outdoor_C: Float64Array
  readonly dewPoint_C: Float64Array
  readonly pressure_Pa: Float64Array
  /** 0 to 1. */
  readonly cloud: Float64Array
}

/** Effective sky temperature of every hour [°C]: clear sky by Berdahl and Martin, then cloud. */
export function skyTemperatures(inputs: SkyInputs): Float64Array {
  const { outdoor_C, dewPoint_C, pressure_Pa, cloud } = inputs
  return outdoor_C.map((air_C, i) =>
    skyTemperature(air_C, clearSkyEmissivity(dewPoint_C[i], (i + 1) % 24, pressure_Pa[i]), cloud[i]),
  )
}
