import { HOURS } from './climate-year.ts'
import { betweenNoons, DAY_MONTHS, monthCurve, monthMeans, noonPoints } from './month-curve.ts'
import { dailyMeans, dailyRanges, spreadAboutMonths } from './day-values.ts'
import type { MonthlyNormals } from './normals.ts'
import type { Seeded } from './seeded.ts'
import type { SunHours } from './solar-day.ts'

/**
 * Day to day persistence of temperature. About monthly means 29 US stations have 0.67 on average (0.56 to
 * 0.75, 2020; derived from data); taking the means away hides the slow part, and 0.74 here gives that 0.67.
 */
const PERSISTENCE = 0.74

/**
 * Standard deviation of daily mean temperatures about the mean of their month, year's average [K]:
 *
 *   0.19 + 0.098 × (warmest less coldest monthly mean) + 0.037 × |latitude|
 *
 * fitted to 29 stations of the U.S. Climate Reference Network, 2020, latitude 31 to 49 (rms 0.5 K of 4.0 K;
 * derived from data). An assumption elsewhere; latitude counts no further than 50 degrees.
 */
export function daySpread(normals: MonthlyNormals): number {
  if (normals.daySpread_K !== undefined) return normals.daySpread_K
  const latitude = Math.min(50, Math.abs(normals.place.latitude_deg))
  return 0.19 + 0.098 * yearlyRange(normals.mean_C) + 0.037 * latitude
}

function yearlyRange(mean_C: readonly number[]): number {
  return Math.max(...mean_C) - Math.min(...mean_C)
}

/** Outdoor temperature of a generated year. */
export interface TemperatureYear {
  readonly outdoor_C: Float64Array
  /** Departure of each day from the smooth yearly curve [K], 365 values; 0 on average in every month. */
  readonly anomaly_K: Float64Array
}

/**
 * Hourly outdoor temperature: a smooth yearly curve with the monthly means, daily departures that persist,
 * and a daily wave after Parton and Logan 1981 whose range follows the clearness of the day. The monthly
 * mean temperature and the monthly mean daily range are the normals'.
 *
 * @param clearness daily, 365 values
 * @param fairness  standard normal state behind it, 365 values
 */
export function generateTemperature(
  normals: MonthlyNormals,
  sun: SunHours,
  clearness: Float64Array,
  fairness: Float64Array,
  random: Seeded,
): TemperatureYear {
  const season_C = monthCurve(normals.mean_C)
  const anomaly_K = anomalies(normals, season_C, fairness, random)
  const mean_C = noonPoints(season_C.map((value, day) => value + anomaly_K[day]))
  const wanted_K = monthCurve(normals.highest_C.map((high, month) => high - normals.lowest_C[month]))
  const follow = rangeFactors(clearness, random)
  const unrest_K = hourlyUnrest(daySpread(normals), random)
  const range_K = wanted_K.map((range, day) => Math.max(0.3, range) * follow[day])

  let outdoor_C: Float64Array = new Float64Array(HOURS)
  // fronts and unrest widen the day beyond the sun's own wave, so that one is narrowed until months fit
  for (let round = 0; round < 6; round++) {
    outdoor_C = withWave(mean_C, range_K, unrest_K, sun)
    const reached = monthMeans(dailyRanges(outdoor_C))
    for (let day = 0; day < 365; day++) {
      const month = DAY_MONTHS[day]
      const wanted = normals.highest_C[month] - normals.lowest_C[month]
      range_K[day] *= Math.min(1.5, Math.max(0.5, wanted / reached[month]))
    }
  }
  const lacking_K = monthMeans(dailyMeans(outdoor_C)).map((value, month) => normals.mean_C[month] - value)
  const shift_K = monthCurve(lacking_K)
  return { outdoor_C: outdoor_C.map((value, i) => value + betweenNoons(shift_K, i + 1)), anomaly_K }
}

/**
 * First-order autoregressive daily departures, coupled to the sun: cloudy winter days are mild, cloudy
 * summer days cool. Scaled so that the year's average spread about monthly means is `daySpread`.
 */
function anomalies(
  normals: MonthlyNormals,
  season_C: Float64Array,
  fairness: Float64Array,
  random: Seeded,
): Float64Array {
  const coldest = Math.min(...normals.mean_C)
  const range = Math.max(1, yearlyRange(normals.mean_C))
  const raw = new Float64Array(365)
  let state = random.normal()
  for (let day = 0; day < 365; day++) {
    // innovations correlated with the sky: -0.2 at 0 °C and below to +0.4 at 20 °C and above (correlation of
    // daily sun with daily mean -0.2 to 0.25 in 29 US stations, up to 0.7 in dry summers; derived from data)
    const tie = Math.min(0.4, Math.max(-0.2, -0.2 + 0.03 * season_C[day]))
    const fresh = tie * fairness[day] + Math.sqrt(1 - tie * tie) * random.normal()
    state = PERSISTENCE * state + Math.sqrt(1 - PERSISTENCE ** 2) * fresh
    // winter half wider than summer: 1.27 to 0.73 of the average in the same 29 stations
    const warmth = (season_C[day] - coldest) / range
    raw[day] = state * (1.27 - 0.54 * Math.min(1, Math.max(0, warmth)))
  }
  const drift = monthCurve(monthMeans(raw))
  const centred = raw.map((value, day) => value - drift[day])
  const wanted_K = daySpread(normals)
  let scale = wanted_K
  for (let round = 0; round < 20; round++) {
    const reached = spreadAboutMonths(season_C.map((value, day) => value + scale * centred[day]))
    scale = Math.max(0.05, scale * (1 + 0.8 * (wanted_K / reached - 1)))
  }
  return centred.map((value) => value * scale)
}

/**
 * Range of each day over the mean of its month: 0.35 + 0.65 × clearness over its mean, times a random part
 * of 30 % (regression on four US stations gives 0.22 to 0.45 and 0.78 to 0.55, rest 0.19 to 0.37; derived
 * from data).
 */
function rangeFactors(clearness: Float64Array, random: Seeded): Float64Array {
  const means = monthMeans(clearness)
  const factors = clearness.map((value, day) => {
    const mean = means[DAY_MONTHS[day]]
    const bySun = mean > 0 ? 0.35 + (0.65 * value) / mean : 1
    return Math.max(0.15, bySun * (1 + 0.3 * random.normal()))
  })
  const closing = monthMeans(factors)
  return factors.map((value, day) => value / closing[DAY_MONTHS[day]])
}

/** Restless part of hourly temperatures: persistence 0.85 from hour to hour, a quarter of the daily spread. */
function hourlyUnrest(spread_K: number, random: Seeded): Float64Array {
  const keep = 0.85
  const unrest = new Float64Array(HOURS)
  let state = random.normal()
  for (let i = 0; i < HOURS; i++) {
    state = keep * state + Math.sqrt(1 - keep * keep) * random.normal()
    unrest[i] = 0.25 * spread_K * state
  }
  return unrest
}

function withWave(
  mean_C: Float64Array,
  range_K: Float64Array,
  unrest_K: Float64Array,
  sun: SunHours,
): Float64Array {
  const shapes = Array.from({ length: 365 }, (_, day) => dayShape(sun.sunset_rad[day], sun.noon_h[day]))
  return Float64Array.from({ length: HOURS }, (_, i) => {
    const day = Math.floor(i / 24)
    return betweenNoons(mean_C, i + 1) + betweenNoons(range_K, i + 1) * shapes[day][i % 24] + unrest_K[i]
  })
}

/**
 * Daily wave of temperature about its mean, for hours ending at 1 to 24, with a range of about 1: a sine from
 * sunrise with its top 1.86 h after noon, an exponential fall of 2.2 through the night; W. Parton and
 * J. Logan, Agricultural Meteorology 23:205-216, 1981 (from memory). Days count as 4 to 20 hours long.
 */
export function dayShape(sunset_rad: number, noon_h: number): Float64Array {
  const light_h = Math.min(20, Math.max(4, (24 / Math.PI) * sunset_rad))
  const night_h = 24 - light_h
  const atSunset = Math.sin((Math.PI * light_h) / (light_h + 2 * 1.86))
  const left = Math.exp(-2.2)
  const shape = Float64Array.from({ length: 24 }, (_, hour) => {
    const sinceRise = (((hour + 1 - noon_h + light_h / 2) % 24) + 24) % 24
    if (sinceRise <= light_h) return Math.sin((Math.PI * sinceRise) / (light_h + 2 * 1.86))
    // the remnant of the exponential is taken out, so that the night ends where the day begins
    const fall = (Math.exp((-2.2 * (sinceRise - light_h)) / night_h) - left) / (1 - left)
    return atSunset * fall
  })
  const mean = shape.reduce((sum, value) => sum + value, 0) / 24
  return shape.map((value) => value - mean)
}
