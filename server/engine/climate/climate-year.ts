/** Hours of the year the engine knows: 365 days, no 29 February. */
export const HOURS = 8760
export const HOUR_S = 3600

/** Where a climate year was measured or made for. */
export interface ClimatePlace {
  readonly name: string
  /** Degrees, north positive. */
  readonly latitude_deg: number
  /** Degrees, east positive. */
  readonly longitude_deg: number
  readonly elevation_m: number
  /** Standard time minus UTC [h]; no summer time. */
  readonly timeZone_h: number
}

/**
 * 8,760 hours of weather at one place.
 *
 * Entry i stands for the interval from i to i + 1 hours after 1 January 00:00, local standard time.
 * Radiation is the mean over that interval; every other quantity is the value at the end of it
 * (the convention of hourly station files that stamp the hour at its end).
 */
export interface ClimateYear {
  readonly place: ClimatePlace
  /** What the data are and where they come from, one line. */
  readonly source: string
  /** Dry-bulb temperature of the outdoor air [°C]. */
  readonly outdoor_C: Float64Array
  readonly dewPoint_C: Float64Array
  /** At 10 m above ground [m/s]. */
  readonly wind_ms: Float64Array
  /** Station pressure [Pa]. */
  readonly pressure_Pa: Float64Array
  /** Global horizontal radiation [W/m²]. */
  readonly global_Wm2: Float64Array
  /** Beam radiation on a plane normal to it [W/m²]. */
  readonly beam_Wm2: Float64Array
  /** Diffuse horizontal radiation [W/m²]. */
  readonly diffuse_Wm2: Float64Array
  /** Effective temperature of the whole sky vault for long-wave exchange [°C]. */
  readonly sky_C: Float64Array
}
