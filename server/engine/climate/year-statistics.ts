import type { ClimateYear } from './climate-year.ts'
import { dailyHighest, dailyLowest, dailyMeans, dailyRanges, monthSpreads } from './day-values.ts'
import { DAY_MONTHS, monthMeans } from './month-curve.ts'
import type { MonthlyNormals } from './normals.ts'
import { sunHours } from './solar-day.ts'

/** How a year varies; spreads are standard deviations about monthly means. */
export interface YearStatistics {
  /** Of daily mean temperatures, by month [K], 12 values. */
  readonly monthSpreads_K: Float64Array
  /** The same, averaged over the year [K]. */
  readonly spread_K: number
  /** Correlation of each day's mean temperature with the day before, about monthly means. */
  readonly persistence: number
  /** Mean daily range of temperature and its spread [K]. */
  readonly range_K: number
  readonly rangeSpread_K: number
  /** Of daily clearness, averaged over the year. */
  readonly clearnessSpread: number
  /** Share of beam in global radiation over the year, and by month, 12 values. */
  readonly beamShare: number
  readonly monthBeamShares: Float64Array
}

/** How a year varies, to hold a generated one against a measured one. */
export function yearStatistics(year: ClimateYear): YearStatistics {
  const temperature_C = dailyMeans(year.outdoor_C)
  const range_K = dailyRanges(year.outdoor_C)
  const global_Wm2 = dailyMeans(year.global_Wm2)
  const outside_Wm2 = dailyMeans(sunHours(year.place).outside_Wm2)
  const monthGlobal = monthMeans(global_Wm2)
  const monthDiffuse = monthMeans(dailyMeans(year.diffuse_Wm2))
  const spreads_K = monthSpreads(temperature_C)
  return {
    monthSpreads_K: spreads_K,
    spread_K: mean(spreads_K),
    persistence: persistence(temperature_C),
    range_K: mean(range_K),
    rangeSpread_K: mean(monthSpreads(range_K)),
    clearnessSpread: mean(
      monthSpreads(global_Wm2.map((value, day) => (outside_Wm2[day] > 0 ? value / outside_Wm2[day] : 0))),
    ),
    beamShare: 1 - mean(year.diffuse_Wm2) / mean(year.global_Wm2),
    monthBeamShares: monthGlobal.map((value, month) => (value > 0 ? 1 - monthDiffuse[month] / value : 0)),
  }
}

/** Monthly normals of a year, with its diffuse radiation and the spread of its days. */
export function normalsOf(year: ClimateYear): MonthlyNormals {
  const months = (daily: Float64Array): number[] => Array.from(monthMeans(daily))
  return {
    place: year.place,
    source: `monthly means of: ${year.source}`,
    estimated: [],
    mean_C: months(dailyMeans(year.outdoor_C)),
    highest_C: months(dailyHighest(year.outdoor_C)),
    lowest_C: months(dailyLowest(year.outdoor_C)),
    global_kWhm2day: months(dailyMeans(year.global_Wm2)).map((value_Wm2) => value_Wm2 * 0.024),
    diffuse_kWhm2day: months(dailyMeans(year.diffuse_Wm2)).map((value_Wm2) => value_Wm2 * 0.024),
    dewPoint_C: months(dailyMeans(year.dewPoint_C)),
    wind_ms: months(dailyMeans(year.wind_ms)),
    pressure_Pa: months(dailyMeans(year.pressure_Pa)),
    daySpread_K: mean(monthSpreads(dailyMeans(year.outdoor_C))),
  }
}

function mean(values: Float64Array): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length
}

function persistence(daily: Float64Array): number {
  const means = monthMeans(daily)
  const departures = daily.map((value, day) => value - means[DAY_MONTHS[day]])
  let together = 0
  let squares = departures[0] ** 2
  for (let day = 1; day < 365; day++) {
    together += departures[day] * departures[day - 1]
    squares += departures[day] ** 2
  }
  return together / squares
}
