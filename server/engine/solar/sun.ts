/* eslint-disable no-restricted-globals -- suncalc takes its time as a Date; nothing here reads a clock */
import { getPosition } from 'suncalc'
import { HOURS, type ClimatePlace } from '../climate/climate-year.ts'
import { extraterrestrialNormal } from '../climate/solar-day.ts'

/**
 * The year whose sun stands for every year: 365 days, in the middle of the leap cycle, so that the dates
 * of solstices and equinoxes are at most half a day from their long-term mean.
 */
const REFERENCE_YEAR = 2014
const HOUR_MS = 3_600_000
const RAD = Math.PI / 180

/** Where the sun stands in each of 8,760 hours; see ClimateYear for the hours. */
export interface SunYear {
  /** Apparent altitude in the middle of the sunlit part of the hour, of the whole hour at night [deg]. */
  readonly altitude_deg: Float64Array
  /** Clockwise from north, at the same time [deg]. */
  readonly azimuth_deg: Float64Array
  /** Share of the hour with the sun's centre above the level horizon, 0 to 1. */
  readonly sunlit: Float64Array
  /** On a plane normal to the sun, outside the atmosphere [W/m²]. */
  readonly extraterrestrial_Wm2: Float64Array
}

/**
 * Sun position at one time.
 *
 * @param hour_h hours after 1 January 00:00 local standard time of the reference year
 * @returns altitude with refraction, azimuth clockwise from north [deg]
 */
export function sunAt(place: ClimatePlace, hour_h: number): { altitude_deg: number; azimuth_deg: number } {
  const time = new Date(Date.UTC(REFERENCE_YEAR, 0, 1) + (hour_h - place.timeZone_h) * HOUR_MS)
  const { altitude, azimuth } = getPosition(time, place.latitude_deg, place.longitude_deg)
  return { altitude_deg: altitude, azimuth_deg: azimuth }
}

/**
 * The sun through the year: position (suncalc) in the middle of the sunlit part of each hour. In hours
 * with the sun near the horizon the sunlit part is found from positions every quarter of an hour.
 */
export function sunOfYear(place: ClimatePlace): SunYear {
  const altitude_deg = new Float64Array(HOURS)
  const azimuth_deg = new Float64Array(HOURS)
  const sunlit = new Float64Array(HOURS)
  const extraterrestrial_Wm2 = new Float64Array(HOURS)
  for (let hour = 0; hour < HOURS; hour++) {
    let position = sunAt(place, hour + 0.5)
    sunlit[hour] = position.altitude_deg > 0 ? 1 : 0
    // The sun climbs at most 15° an hour, so beyond 8° the whole hour is of one kind.
    if (Math.abs(position.altitude_deg) < 8) {
      const part = sunlitPart(place, hour)
      sunlit[hour] = part.share
      if (part.share > 0) position = sunAt(place, part.middle_h)
    }
    altitude_deg[hour] = position.altitude_deg
    azimuth_deg[hour] = position.azimuth_deg
    extraterrestrial_Wm2[hour] = extraterrestrialNormal(Math.floor(hour / 24))
  }
  return { altitude_deg, azimuth_deg, sunlit, extraterrestrial_Wm2 }
}

/** Where within a span the sun crosses the horizon, as a share of it; refraction bends the way, so twice refined. */
function horizonCrossing(
  place: ClimatePlace,
  from_h: number,
  span_h: number,
  before_deg: number,
  after_deg: number,
): number {
  let [low, high, atLow, atHigh] = [0, 1, before_deg, after_deg]
  for (let pass = 0; pass < 2; pass++) {
    const middle = low + ((high - low) * atLow) / (atLow - atHigh)
    const atMiddle = sunAt(place, from_h + middle * span_h).altitude_deg
    if (atMiddle > 0 === atLow > 0) [low, atLow] = [middle, atMiddle]
    else [high, atHigh] = [middle, atMiddle]
  }
  return low + ((high - low) * atLow) / (atLow - atHigh)
}

function sunlitPart(place: ClimatePlace, hour: number): { share: number; middle_h: number } {
  const parts = 4
  let share = 0
  let moment = 0
  let before = sunAt(place, hour).altitude_deg
  for (let i = 0; i < parts; i++) {
    const after = sunAt(place, hour + (i + 1) / parts).altitude_deg
    const crossing =
      before > 0 === after > 0 ? 0 : horizonCrossing(place, hour + i / parts, 1 / parts, before, after)
    const from = before > 0 ? 0 : after > 0 ? crossing : 1
    const to = after > 0 ? 1 : before > 0 ? crossing : 1
    const lit = Math.max(0, to - from) / parts
    share += lit
    moment += lit * (hour + (i + 0.5 * (from + to)) / parts)
    before = after
  }
  return share > 0 ? { share, middle_h: moment / share } : { share: 0, middle_h: hour + 0.5 }
}

/** Cosine of the angle of incidence on a plane, negative behind it. */
export function incidenceCosine(
  altitude_deg: number,
  azimuth_deg: number,
  tilt_deg: number,
  faces_deg: number,
): number {
  const altitude = altitude_deg * RAD
  const tilt = tilt_deg * RAD
  return (
    Math.sin(altitude) * Math.cos(tilt) +
    Math.cos(altitude) * Math.sin(tilt) * Math.cos((azimuth_deg - faces_deg) * RAD)
  )
}
