import { MONTH_DAYS, MONTH_NAMES, MONTH_STARTS } from './calendar.ts'
import { splitByMaxwell } from './beam.ts'
import { bendtQuantiles } from './clearness.ts'
import { HOURS } from './climate-year.ts'
import { hourShare } from './day-profile.ts'
import { closeDiffuse } from './diffuse-normal.ts'
import { DAY_MONTHS } from './month-curve.ts'
import type { MonthlyNormals } from './normals.ts'
import type { Seeded } from './seeded.ts'
import type { SunHours } from './solar-day.ts'

/** Radiation of a generated year. */
export interface RadiationYear {
  readonly global_Wm2: Float64Array
  readonly beam_Wm2: Float64Array
  readonly diffuse_Wm2: Float64Array
  /** Clearness of each day before the hours were drawn, 365 values. */
  readonly clearness: Float64Array
  /** Standard normal state behind the clearness of each day: high when clear for its month. */
  readonly fairness: Float64Array
}

/** Day to day persistence of clearness: Graham, Hollands and Unny, Solar Energy 40(2):83-92, 1988 (from memory). */
const DAY_PERSISTENCE = 0.29
/** Hour to hour: Graham and Hollands, Solar Energy 44(6):333-341, 1990 (0.54 ± 0.14). */
const HOUR_PERSISTENCE = 0.54

/**
 * Global, beam and diffuse radiation of a year from monthly means: daily clearness after Bendt,
 * Collares-Pereira and Rabl 1981 in the persistence of Graham, Hollands and Unny 1988, over the day after
 * Collares-Pereira and Rabl 1979, hourly variation after Graham and Hollands 1990, beam after Maxwell 1987.
 * Every month has exactly its normal.
 *
 * @throws RangeError for a month with more radiation than the sky lets through
 */
export function generateRadiation(normals: MonthlyNormals, sun: SunHours, random: Seeded): RadiationYear {
  const caps = hourCaps(sun, normals.place.elevation_m)
  const outsideDay = daySums(sun.outside_Wm2)
  const fairness = new Float64Array(365)
  for (let day = 0, state = random.normal(); day < 365; day++) {
    state = DAY_PERSISTENCE * state + Math.sqrt(1 - DAY_PERSISTENCE ** 2) * random.normal()
    fairness[day] = state
  }
  const capDay = daySums(caps.map((cap, i) => cap * sun.outside_Wm2[i]))
  const clearness = dailyClearness(normals, outsideDay, capDay, fairness)
  const global_Wm2 = hourlyGlobal(sun, caps, outsideDay, clearness, random)
  closeMonths(normals, global_Wm2)
  const beam_Wm2 = new Float64Array(HOURS)
  const diffuse_Wm2 = new Float64Array(HOURS)
  for (let i = 0; i < HOURS; i++) {
    const split = splitByMaxwell(global_Wm2[i], {
      outside_Wm2: sun.outside_Wm2[i],
      cosZenith: sun.cosZenith[i],
      sunlit: sun.sunlit[i],
    })
    beam_Wm2[i] = split.beam_Wm2
    diffuse_Wm2[i] = split.diffuse_Wm2
  }
  if (normals.diffuse_kWhm2day !== undefined) {
    closeDiffuse(normals.diffuse_kWhm2day, sun, global_Wm2, beam_Wm2, diffuse_Wm2)
  }
  return { global_Wm2, beam_Wm2, diffuse_Wm2, clearness, fairness }
}

/**
 * Highest hourly clearness: 0.80 with the sun overhead at sea level, rising with height as the clear sky of
 * FAO-56 equation 37 (0.75 + 2e-5 z), falling with air mass. Drawn along the 99th percentile of four US
 * stations at 109 to 1,650 m (0.82, 0.78, 0.75, 0.70 at air mass 1, 2, 3, 5); an assumption higher up.
 */
function hourCaps(sun: SunHours, elevation_m: number): Float64Array {
  const overhead = (0.8 * (0.75 + 2e-5 * elevation_m)) / 0.75
  return sun.cosZenith.map((cos) =>
    cos <= 0 ? 0 : overhead * Math.exp(-0.035 * (1 / Math.max(cos, 0.08) - 1)),
  )
}

function dailyClearness(
  normals: MonthlyNormals,
  outsideDay: Float64Array,
  capDay: Float64Array,
  fairness: Float64Array,
): Float64Array {
  const clearness = new Float64Array(365)
  for (let month = 0; month < 12; month++) {
    const start = MONTH_STARTS[month]
    const days = MONTH_DAYS[month]
    const wanted_Wh = normals.global_kWhm2day[month] * days * 1000
    const outside_Wh = total(outsideDay, start, days)
    // with the sun on the horizon for some minutes the normal is twilight and rounding, not clearness
    const isDark = outside_Wh < 100 * days
    if (outside_Wh === 0 || wanted_Wh === 0) continue
    const mean = wanted_Wh / outside_Wh
    if (isDark) {
      clearness.fill(Math.min(mean, 0.7), start, start + days)
      continue
    }
    const clear = total(capDay, start, days) / outside_Wh
    if (mean >= clear) {
      throw new RangeError(
        `global_kWhm2day[${month}] (${MONTH_NAMES[month]}) is ${normals.global_kWhm2day[month]}: more than a clear sky lets through, ${((clear * outside_Wh) / days / 1000).toFixed(2)}`,
      )
    }
    const sorted = bendtQuantiles(mean, days, 0.97 * clear)
    const order = Array.from({ length: days }, (_, i) => start + i)
    order.sort((a, b) => fairness[a] - fairness[b])
    order.forEach((day, rank) => (clearness[day] = sorted[rank]))
    // days are not equally long: close the sum, then keep every day under a clear sky
    for (let round = 0; round < 50; round++) {
      let reached_Wh = 0
      for (let day = start; day < start + days; day++) reached_Wh += clearness[day] * outsideDay[day]
      const factor = wanted_Wh / reached_Wh
      for (let day = start; day < start + days; day++) {
        const cap = outsideDay[day] > 0 ? (0.98 * capDay[day]) / outsideDay[day] : 0
        clearness[day] = Math.min(clearness[day] * factor, cap)
      }
      if (Math.abs(factor - 1) < 1e-9) break
    }
  }
  return clearness
}

function hourlyGlobal(
  sun: SunHours,
  caps: Float64Array,
  outsideDay: Float64Array,
  clearness: Float64Array,
  random: Seeded,
): Float64Array {
  const global_Wm2 = new Float64Array(HOURS)
  const drawn = new Float64Array(24)
  let state = random.normal()
  for (let day = 0; day < 365; day++) {
    const from = day * 24
    const day_Wh = clearness[day] * outsideDay[day]
    // spread about the smooth day, Graham and Hollands 1990: 0.16 sin(π K / 0.90) (from memory; 0.14 to 0.16
    // at K = 0.3 to 0.6 and 0.07 at 0.7 in four US stations)
    const spread = 0.16 * Math.sin((Math.PI * Math.min(clearness[day], 0.9)) / 0.9)
    let shares = 0
    for (let hour = 0; hour < 24; hour++) {
      if (sun.outside_Wm2[from + hour] > 0) {
        shares += profile(sun, from + hour, day)
      }
    }
    for (let hour = 0; hour < 24; hour++) {
      const i = from + hour
      state = HOUR_PERSISTENCE * state + Math.sqrt(1 - HOUR_PERSISTENCE ** 2) * random.normal()
      const outside = sun.outside_Wm2[i]
      if (outside <= 0 || shares <= 0) {
        drawn[hour] = 0
        continue
      }
      const smooth = Math.min((day_Wh * profile(sun, i, day)) / shares / outside, caps[i])
      const kt = Math.min(caps[i], Math.max(0.15 * smooth, smooth + spread * state))
      drawn[hour] = kt * outside
    }
    closeDay(drawn, day_Wh, caps, sun.outside_Wm2, from)
    global_Wm2.set(drawn, from)
  }
  return global_Wm2
}

/** Share of the day's radiation in an hour; its sunlit part alone in sunrise and sunset hours. */
function profile(sun: SunHours, i: number, day: number): number {
  const share = hourShare(sun.hourAngle_rad[i], sun.sunset_rad[day])
  // the middle of the hour may lie in the dark: take the lowest sun's share of the light instead
  return share > 0 ? share : 1e-4 * sun.sunlit[i]
}

/** Scales the hours of a day to its sum without lifting any above a clear sky. */
function closeDay(
  drawn: Float64Array,
  day_Wh: number,
  caps: Float64Array,
  outside_Wm2: Float64Array,
  from: number,
): void {
  for (let round = 0; round < 60; round++) {
    const reached = drawn.reduce((sum, value) => sum + value, 0)
    if (reached <= 0 || Math.abs(day_Wh - reached) < 1e-6) return
    const factor = day_Wh / reached
    for (let hour = 0; hour < 24; hour++) {
      drawn[hour] = Math.min(drawn[hour] * factor, caps[from + hour] * outside_Wm2[from + hour])
    }
  }
}

/** What the caps took from single days goes back to the whole month. */
function closeMonths(normals: MonthlyNormals, global_Wm2: Float64Array): void {
  const reached = new Float64Array(12)
  for (let i = 0; i < HOURS; i++) reached[DAY_MONTHS[Math.floor(i / 24)]] += global_Wm2[i]
  for (let i = 0; i < HOURS; i++) {
    const month = DAY_MONTHS[Math.floor(i / 24)]
    const wanted = normals.global_kWhm2day[month] * MONTH_DAYS[month] * 1000
    if (reached[month] > 0) global_Wm2[i] *= Math.min(1.5, wanted / reached[month])
  }
}

function daySums(hourly: Float64Array): Float64Array {
  return Float64Array.from({ length: 365 }, (_, day) => total(hourly, day * 24, 24))
}

function total(values: Float64Array, start: number, count: number): number {
  let sum = 0
  for (let i = start; i < start + count; i++) sum += values[i]
  return sum
}
