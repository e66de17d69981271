import { HOURS } from '../climate/climate-year.ts'
import { DAYS, MONTH_OF_HOUR, dateOfHour, type HourDate } from './months.ts'

export interface ExtremeHour extends HourDate {
  readonly temperature_C: number
}

/** How long a temperature stays beyond one limit. */
export interface Beyond {
  readonly limit_C: number
  readonly hours: number
  /** Hours of each month, 12 values. */
  readonly month_h: number[]
  /** Days with at least one such hour. */
  readonly days: number
  /** Most of those days in a row. */
  readonly daysInARow: number
}

export interface ExtremeMeasures {
  readonly coldest: ExtremeHour
  readonly warmest: ExtremeHour
  readonly mean_C: number
  readonly below: Beyond[]
  readonly above: Beyond[]
}

/** How the hours of a year follow each other. */
export interface YearOrder {
  /** The hour of the calendar year lived first. */
  readonly firstHour: number
  /** Whether the year's end joins its beginning, as in the repeating year. */
  readonly repeats: boolean
}

/**
 * Coldest and warmest hour, and time spent below and above some limits.
 *
 * @param values_C 8,760 hourly values in calendar order
 * @param limits   strictly below each of `below_C`, strictly above each of `above_C`
 * @param order    decides which days stand next to each other
 */
export function extremes(
  values_C: ArrayLike<number>,
  limits: { readonly below_C: readonly number[]; readonly above_C: readonly number[] },
  order: YearOrder,
): ExtremeMeasures {
  let coldest = 0
  let warmest = 0
  let total = 0
  for (let hour = 0; hour < HOURS; hour++) {
    if (values_C[hour] < values_C[coldest]) coldest = hour
    if (values_C[hour] > values_C[warmest]) warmest = hour
    total += values_C[hour]
  }
  return {
    coldest: { ...dateOfHour(coldest), temperature_C: values_C[coldest] },
    warmest: { ...dateOfHour(warmest), temperature_C: values_C[warmest] },
    mean_C: total / HOURS,
    below: limits.below_C.map((limit_C) => beyond(limit_C, order, (hour) => values_C[hour] < limit_C)),
    above: limits.above_C.map((limit_C) => beyond(limit_C, order, (hour) => values_C[hour] > limit_C)),
  }
}

function beyond(limit_C: number, order: YearOrder, isBeyond: (hour: number) => boolean): Beyond {
  const month_h = new Array<number>(12).fill(0)
  const day = new Array<boolean>(DAYS).fill(false)
  let hours = 0
  for (let hour = 0; hour < HOURS; hour++)
    if (isBeyond(hour)) {
      hours++
      month_h[MONTH_OF_HOUR[hour]]++
      day[(hour / 24) | 0] = true
    }
  const days = day.filter(Boolean).length
  return {
    limit_C,
    hours,
    month_h,
    days,
    daysInARow: longestRun(day, Math.floor(order.firstHour / 24), order.repeats),
  }
}

/** Longest run of true entries, read from `first` on around to the entry before it; joined end to start when it repeats. */
export function longestRun(entries: readonly boolean[], first: number, repeats: boolean): number {
  const n = entries.length
  let longest = 0
  let run = 0
  for (let i = 0; i < (repeats ? 2 * n : n); i++) {
    run = entries[(first + i) % n] ? run + 1 : 0
    longest = Math.max(longest, run)
  }
  return Math.min(longest, n)
}
