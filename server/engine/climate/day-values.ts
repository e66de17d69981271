import { DAY_MONTHS, monthMeans } from './month-curve.ts'

/** Mean of every day, 365 values. */
export function dailyMeans(hourly: Float64Array): Float64Array {
  return Float64Array.from({ length: 365 }, (_, day) => {
    let sum = 0
    for (let i = day * 24; i < day * 24 + 24; i++) sum += hourly[i]
    return sum / 24
  })
}

/** Highest hour of every day, 365 values. */
export function dailyHighest(hourly: Float64Array): Float64Array {
  return Float64Array.from({ length: 365 }, (_, day) => Math.max(...hourly.subarray(day * 24, day * 24 + 24)))
}

/** Lowest hour of every day, 365 values. */
export function dailyLowest(hourly: Float64Array): Float64Array {
  return Float64Array.from({ length: 365 }, (_, day) => Math.min(...hourly.subarray(day * 24, day * 24 + 24)))
}

/** Highest less lowest hour of every day, 365 values. */
export function dailyRanges(hourly: Float64Array): Float64Array {
  return Float64Array.from({ length: 365 }, (_, day) => {
    const hours = hourly.subarray(day * 24, day * 24 + 24)
    return Math.max(...hours) - Math.min(...hours)
  })
}

/** Standard deviation about the mean of the month, 12 values [unit of the values]. */
export function monthSpreads(daily: Float64Array): Float64Array {
  const means = monthMeans(daily)
  return monthMeans(daily.map((value, day) => (value - means[DAY_MONTHS[day]]) ** 2)).map(Math.sqrt)
}

/** Standard deviation about the mean of the month, averaged over the months [unit of the values]. */
export function spreadAboutMonths(daily: Float64Array): number {
  return monthSpreads(daily).reduce((sum, value) => sum + value, 0) / 12
}
