import { MONTH_DAYS } from '../climate/calendar.ts'
import { HOURS, type ClimateYear } from '../climate/climate-year.ts'
import { perezShares } from './perez.ts'
import { incidenceCosine, type SunYear } from './sun.ts'

const RAD = Math.PI / 180
const COS_85 = Math.cos(85 * RAD)

/** Sun on a plane by hour [W/m²], 8,760 values each. */
export interface PlaneIrradiance {
  /** Beam with the circumsolar part of the sky, which comes from the sun's direction. */
  readonly beam_Wm2: Float64Array
  readonly sky_Wm2: Float64Array
  readonly ground_Wm2: Float64Array
  /** Cosine of incidence at the sun's position of the hour. */
  readonly incidence: Float64Array
}

/**
 * Radiation on a tilted plane: beam from the file, diffuse after Perez et al. 1990, ground reflection
 * isotropic. A raised horizon takes away the beam behind it and its share of the sky.
 *
 * @param plane tilt_deg 0 flat, 90 upright; faces_deg clockwise from north
 * @param groundReflectance by month, 12 values
 * @param horizon_deg altitude of the horizon by azimuth, evenly spaced clockwise from north; empty when free
 */
export function planeIrradiance(
  climate: ClimateYear,
  sun: SunYear,
  plane: { readonly tilt_deg: number; readonly faces_deg: number },
  groundReflectance: readonly number[],
  horizon_deg: readonly number[],
): PlaneIrradiance {
  const beam_Wm2 = new Float64Array(HOURS)
  const sky_Wm2 = new Float64Array(HOURS)
  const ground_Wm2 = new Float64Array(HOURS)
  const incidence = new Float64Array(HOURS)
  const { tilt_deg, faces_deg } = plane
  const skyView = 0.5 * (1 + Math.cos(tilt_deg * RAD))
  const openSky = skyLeft(tilt_deg, faces_deg, horizon_deg)
  const sinTilt = Math.sin(tilt_deg * RAD)
  const { global_Wm2, beam_Wm2: normal_Wm2, diffuse_Wm2 } = climate
  let hour = 0
  for (let month = 0; month < 12; month++) {
    const groundView = 0.5 * (1 - Math.cos(tilt_deg * RAD)) * groundReflectance[month]
    for (const end = hour + 24 * MONTH_DAYS[month]; hour < end; hour++) {
      ground_Wm2[hour] = groundView * global_Wm2[hour]
      const diffuse = diffuse_Wm2[hour]
      const altitude = sun.altitude_deg[hour]
      const cosine = incidenceCosine(altitude, sun.azimuth_deg[hour], tilt_deg, faces_deg)
      incidence[hour] = cosine
      if (sun.sunlit[hour] === 0 || altitude <= 0) {
        sky_Wm2[hour] = diffuse * skyView * openSky
        continue
      }
      const isHidden = horizon_deg.length > 0 && altitude < horizonAt(horizon_deg, sun.azimuth_deg[hour])
      const facing = Math.max(0, cosine)
      let direct = normal_Wm2[hour] * facing
      let sky = diffuse * skyView
      if (diffuse > 0) {
        // The sky of a sunrise hour is that of its sunlit part.
        const lit = 1 / Math.max(sun.sunlit[hour], 0.05)
        const shares = perezShares(
          diffuse * lit,
          normal_Wm2[hour] * lit,
          sun.extraterrestrial_Wm2[hour],
          90 - altitude,
        )
        const around = diffuse * shares.circumsolar * (facing / Math.max(COS_85, Math.sin(altitude * RAD)))
        sky = Math.max(0, diffuse * ((1 - shares.circumsolar) * skyView + shares.horizon * sinTilt))
        direct += around
      }
      if (!isHidden) beam_Wm2[hour] = direct
      sky_Wm2[hour] = sky * openSky
    }
  }
  return { beam_Wm2, sky_Wm2, ground_Wm2, incidence }
}

/** Altitude of the horizon in a direction, between the given points [deg]. */
export function horizonAt(horizon_deg: readonly number[], azimuth_deg: number): number {
  const place = (((azimuth_deg % 360) + 360) % 360) / (360 / horizon_deg.length)
  const i = Math.floor(place) % horizon_deg.length
  const next = horizon_deg[(i + 1) % horizon_deg.length]
  return horizon_deg[i] + (place - Math.floor(place)) * (next - horizon_deg[i])
}

/**
 * Share of the plane's view of a uniform sky that stands above the horizon: ∫∫ cos(incidence) cos(a) da dγ from
 * the horizon up, over the same from the level up; in closed form over the altitude a, in steps of 5° around.
 */
function skyLeft(tilt_deg: number, faces_deg: number, horizon_deg: readonly number[]): number {
  if (horizon_deg.length === 0 || horizon_deg.every((altitude) => altitude <= 0)) return 1
  const level = Math.cos(tilt_deg * RAD)
  let seen = 0
  let whole = 0
  for (let azimuth = 2.5; azimuth < 360; azimuth += 5) {
    const towards = Math.sin(tilt_deg * RAD) * Math.cos((azimuth - faces_deg) * RAD)
    const above = (altitude: number) =>
      0.5 * level * Math.cos(altitude) ** 2 +
      0.25 * towards * (Math.PI - 2 * altitude - Math.sin(2 * altitude))
    // Behind its upper edge the plane sees the sky only above its own slope.
    const own = Math.max(0, Math.atan2(-towards, level))
    whole += above(own)
    seen += above(Math.max(own, horizonAt(horizon_deg, azimuth) * RAD))
  }
  return seen / whole
}
