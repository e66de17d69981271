import { HOURS } from '../climate/climate-year.ts'
import { MONTH_START_H, monthOfHour } from '../climate/calendar.ts'

export const DAYS = 365
export const J_PER_KWH = 3.6e6

/** A date without a year: month 1 to 12, day from 1, and the hour (0 to 23) in which it begins. */
export interface HourDate {
  readonly month: number
  readonly day: number
  readonly hour: number
}

/** A date without a year and hour. */
export type DayDate = Omit<HourDate, 'hour'>

/** Month (0 to 11) of each hour of the year. */
export const MONTH_OF_HOUR: Uint8Array = Uint8Array.from({ length: HOURS }, (_, hour) => monthOfHour(hour))

/** Date of hour 0 to 8,759 of the year. */
export function dateOfHour(hour: number): HourDate {
  const month = monthOfHour(hour)
  const within = hour - MONTH_START_H[month]
  return { month: month + 1, day: Math.floor(within / 24) + 1, hour: within % 24 }
}

/** Date of day 0 to 364 of the year. */
export function dateOfDay(day: number): DayDate {
  const { month, day: dayOfMonth } = dateOfHour(day * 24)
  return { month, day: dayOfMonth }
}

/** Months' means of 8,760 hourly values, 12 numbers. */
export function monthlyMeans(values: ArrayLike<number>): number[] {
  return monthlySums(values).map((sum, month) => sum / (MONTH_START_H[month + 1] - MONTH_START_H[month]))
}

/** Months' sums of 8,760 hourly values, 12 numbers. */
export function monthlySums(values: ArrayLike<number>): number[] {
  const sums = new Array<number>(12).fill(0)
  for (let hour = 0; hour < HOURS; hour++) sums[MONTH_OF_HOUR[hour]] += values[hour]
  return sums
}

/** Days' means of 8,760 hourly values, 365 numbers. */
export function dailyMeans(values: ArrayLike<number>): Float64Array {
  const means = new Float64Array(DAYS)
  for (let hour = 0; hour < HOURS; hour++) means[(hour / 24) | 0] += values[hour] / 24
  return means
}

export function sum(values: ArrayLike<number>): number {
  let total = 0
  for (let i = 0; i < values.length; i++) total += values[i]
  return total
}

/** The index of the entry lived before entry i of n, or -1 when i was lived first. */
export function before(i: number, first: number, n: number): number {
  return i === first ? -1 : (i + n - 1) % n
}
