import type { ClimatePlace } from './climate-year.ts'

/** Monthly means of a place, January to December, 12 values each. */
export interface MonthlyNormals {
  readonly place: ClimatePlace
  /** Where the figures come from, one line. */
  readonly source: string
  /** Parts that nobody measured, in words: "radiation from sunshine hours", "wind from memory". */
  readonly estimated: readonly string[]
  /** Mean of all hours [°C]. */
  readonly mean_C: readonly number[]
  /** Mean daily maximum [°C]. */
  readonly highest_C: readonly number[]
  /** Mean daily minimum [°C]. */
  readonly lowest_C: readonly number[]
  /** Global horizontal radiation [kWh/(m² day)]. */
  readonly global_kWhm2day: readonly number[]
  /** Diffuse horizontal radiation, where it is known [kWh/(m² day)]; the beam model decides otherwise. */
  readonly diffuse_kWhm2day?: readonly number[]
  readonly dewPoint_C: readonly number[]
  /** At 10 m above ground [m/s]. */
  readonly wind_ms: readonly number[]
  readonly pressure_Pa: readonly number[]
  /**
   * Standard deviation of daily mean temperatures about the mean of their month, averaged over the months
   * [K], where it is known; a rule fills in otherwise.
   */
  readonly daySpread_K?: number
}

/**
 * Makes sure that normals can be used.
 *
 * @throws RangeError that names the value, `global_kWhm2day[3]`
 */
export function checkNormals(normals: MonthlyNormals): void {
  const limits = {
    mean_C: [-70, 45],
    highest_C: [-70, 55],
    lowest_C: [-80, 45],
    global_kWhm2day: [0, 12],
    dewPoint_C: [-80, 32],
    wind_ms: [0, 30],
    pressure_Pa: [40000, 110000],
  } as const
  for (const [name, [low, high]] of Object.entries(limits)) {
    const values = normals[name as keyof typeof limits]
    if (values.length !== 12) throw new RangeError(`${name} must have 12 values, got ${values.length}`)
    values.forEach((value, month) => {
      if (value >= low && value <= high) return
      throw new RangeError(`${name}[${month}] must be between ${low} and ${high}, got ${value}`)
    })
  }
  normals.diffuse_kWhm2day?.forEach((value, month) => {
    if (value >= 0 && value <= normals.global_kWhm2day[month]) return
    throw new RangeError(
      `diffuse_kWhm2day[${month}] must be between 0 and the global radiation, got ${value}`,
    )
  })
  for (let month = 0; month < 12; month++) {
    const { lowest_C, mean_C, highest_C } = normals
    if (lowest_C[month] < mean_C[month] && mean_C[month] < highest_C[month]) continue
    throw new RangeError(`mean_C[${month}] must lie between lowest_C[${month}] and highest_C[${month}]`)
  }
  const { latitude_deg, longitude_deg, elevation_m, timeZone_h } = normals.place
  if (!(Math.abs(latitude_deg) <= 90))
    throw new RangeError(`latitude_deg must be -90 to 90, got ${latitude_deg}`)
  if (!(Math.abs(longitude_deg) <= 180)) {
    throw new RangeError(`longitude_deg must be -180 to 180, got ${longitude_deg}`)
  }
  if (!(timeZone_h >= -12 && timeZone_h <= 14)) {
    throw new RangeError(`timeZone_h must be -12 to 14, got ${timeZone_h}`)
  }
  if (!(elevation_m >= -430 && elevation_m <= 6000)) {
    throw new RangeError(`elevation_m must be -430 to 6000, got ${elevation_m}`)
  }
}
