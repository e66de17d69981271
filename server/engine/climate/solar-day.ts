import { HOURS, type ClimatePlace } from './climate-year.ts'

/** Total solar irradiance at one astronomical unit [W/m²] (Gueymard 2018: 1361.1; from memory). */
export const SOLAR_CONSTANT_WM2 = 1361.1

const RAD = Math.PI / 180

/** Day angle B of Spencer 1971 [rad] for day 0 to 364. */
const dayAngle = (day: number): number => (2 * Math.PI * day) / 365

/**
 * Declination of the sun at noon [rad], Spencer 1971 (series of seven terms; error below 0.04 degrees).
 *
 * @param day 0 for 1 January to 364
 */
export function declination(day: number): number {
  const B = dayAngle(day)
  return (
    0.006918 -
    0.399912 * Math.cos(B) +
    0.070257 * Math.sin(B) -
    0.006758 * Math.cos(2 * B) +
    0.000907 * Math.sin(2 * B) -
    0.002697 * Math.cos(3 * B) +
    0.00148 * Math.sin(3 * B)
  )
}

/** Solar time minus mean time [h], Spencer 1971 (from memory); day 0 to 364. */
export function equationOfTime(day: number): number {
  const B = dayAngle(day)
  const minutes =
    229.18 *
    (0.000075 +
      0.001868 * Math.cos(B) -
      0.032077 * Math.sin(B) -
      0.014615 * Math.cos(2 * B) -
      0.040849 * Math.sin(2 * B))
  return minutes / 60
}

/** Extraterrestrial radiation on a plane normal to the sun [W/m²], Spencer 1971; day 0 to 364. */
export function extraterrestrialNormal(day: number): number {
  const B = dayAngle(day)
  return (
    SOLAR_CONSTANT_WM2 *
    (1.00011 +
      0.034221 * Math.cos(B) +
      0.00128 * Math.sin(B) +
      0.000719 * Math.cos(2 * B) +
      0.000077 * Math.sin(2 * B))
  )
}

/** Hour angle of sunset [rad], 0 in polar night, π in polar day. */
export function sunsetAngle(latitude_deg: number, declination_rad: number): number {
  const argument = -Math.tan(latitude_deg * RAD) * Math.tan(declination_rad)
  return Math.acos(Math.min(1, Math.max(-1, argument)))
}

/** Solar time minus standard time [h] at a place; day 0 to 364. */
export function solarTimeShift(place: ClimatePlace, day: number): number {
  return (4 * (place.longitude_deg - 15 * place.timeZone_h)) / 60 + equationOfTime(day)
}

/** Sun geometry of all hours of a year at one place; entry i is the interval from i to i + 1 hours. */
export interface SunHours {
  /** Extraterrestrial radiation on the horizontal, mean over the interval [W/m²]; 0 at night. */
  readonly outside_Wm2: Float64Array
  /** Mean cosine of the zenith angle over the sunlit part of the interval; 0 at night. */
  readonly cosZenith: Float64Array
  /** Sunlit part of the interval, 0 to 1. */
  readonly sunlit: Float64Array
  /** Hour angle at the middle of the interval [rad], within -π to π. */
  readonly hourAngle_rad: Float64Array
  /** By day: hour angle of sunset [rad], length 365. */
  readonly sunset_rad: Float64Array
  /** By day: solar noon in standard time [h], length 365. */
  readonly noon_h: Float64Array
}

/**
 * Hourly extraterrestrial radiation by the exact integral between hour angles, so that sunrise and sunset
 * hours close:
 *
 *   I0 = (12/π) I0n [cos φ cos δ (sin w2 - sin w1) + (w2 - w1) sin φ sin δ]
 *
 * with w1, w2 clipped to the sunlit part of the day. Declination is held over the day. Standard geometry,
 * as in Duffie and Beckman, Solar Engineering of Thermal Processes, section 1.10 (from memory).
 */
export function sunHours(place: ClimatePlace): SunHours {
  const outside_Wm2 = new Float64Array(HOURS)
  const cosZenith = new Float64Array(HOURS)
  const sunlit = new Float64Array(HOURS)
  const hourAngle_rad = new Float64Array(HOURS)
  const sunset_rad = new Float64Array(365)
  const noon_h = new Float64Array(365)
  const hour_rad = Math.PI / 12
  for (let day = 0; day < 365; day++) {
    const delta = declination(day)
    const ws = sunsetAngle(place.latitude_deg, delta)
    const normal = extraterrestrialNormal(day)
    const upright = Math.sin(place.latitude_deg * RAD) * Math.sin(delta)
    const swinging = Math.cos(place.latitude_deg * RAD) * Math.cos(delta)
    const shift_h = solarTimeShift(place, day)
    sunset_rad[day] = ws
    noon_h[day] = 12 - shift_h
    for (let hour = 0; hour < 24; hour++) {
      const i = day * 24 + hour
      const start = (hour + shift_h - 12) * hour_rad
      hourAngle_rad[i] = turned(start + hour_rad / 2)
      let area = 0
      let lit = 0
      // an hour may reach into the neighbouring solar day where clock and sun differ by hours
      for (const turn of [-2 * Math.PI, 0, 2 * Math.PI]) {
        const w1 = Math.max(start + turn, -ws)
        const w2 = Math.min(start + hour_rad + turn, ws)
        if (w2 <= w1) continue
        lit += (w2 - w1) / hour_rad
        area += (swinging * (Math.sin(w2) - Math.sin(w1)) + (w2 - w1) * upright) / hour_rad
      }
      if (lit > 0 && area > 0) {
        sunlit[i] = lit
        outside_Wm2[i] = normal * area
        cosZenith[i] = area / lit
      }
    }
  }
  return { outside_Wm2, cosZenith, sunlit, hourAngle_rad, sunset_rad, noon_h }
}

/** Sine of the sun's elevation at a time of the year [h from 1 January 00:00, standard time]. */
export function sinElevation(place: ClimatePlace, time_h: number): number {
  const day = Math.min(364, Math.max(0, Math.floor(time_h / 24)))
  const delta = declination(day)
  const w = ((time_h - day * 24 + solarTimeShift(place, day) - 12) * Math.PI) / 12
  const phi = place.latitude_deg * RAD
  return Math.sin(phi) * Math.sin(delta) + Math.cos(phi) * Math.cos(delta) * Math.cos(w)
}

function turned(angle: number): number {
  const whole = 2 * Math.PI
  return angle - whole * Math.round(angle / whole)
}
