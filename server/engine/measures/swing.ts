import { MONTH_START_H } from '../climate/calendar.ts'
import { DAYS, dateOfDay, sum, type DayDate } from './months.ts'

/** Swing: a day's highest minus its lowest operative temperature. */
export interface SwingMeasures {
  /** 365 values, by day of the year [K]. */
  readonly day_K: number[]
  /** Mean swing of the days of each month, 12 values [K]. */
  readonly month_K: number[]
  /** Mean over the year [K]. */
  readonly year_K: number
  /** The day with the largest swing; the first one where several are alike. */
  readonly largest: DayDate & {
    readonly swing_K: number
    readonly lowest_C: number
    readonly highest_C: number
  }
}

/**
 * Swing by day (midnight to midnight, local standard time) and by month.
 *
 * @param operative_C 8,760 hourly values
 */
export function swing(operative_C: ArrayLike<number>): SwingMeasures {
  const day_K: number[] = []
  let largest = { swing_K: -1, lowest_C: 0, highest_C: 0, at: 0 }
  for (let day = 0; day < DAYS; day++) {
    let lowest_C = Infinity
    let highest_C = -Infinity
    for (let hour = day * 24; hour < day * 24 + 24; hour++) {
      lowest_C = Math.min(lowest_C, operative_C[hour])
      highest_C = Math.max(highest_C, operative_C[hour])
    }
    const swing_K = highest_C - lowest_C
    day_K.push(swing_K)
    if (swing_K > largest.swing_K) largest = { swing_K, lowest_C, highest_C, at: day }
  }
  const month_K = MONTH_START_H.slice(0, 12).map((start_h, month) => {
    const days = day_K.slice(start_h / 24, MONTH_START_H[month + 1] / 24)
    return sum(days) / days.length
  })
  const { at, ...rest } = largest
  return { day_K, month_K, year_K: sum(day_K) / DAYS, largest: { ...dateOfDay(at), ...rest } }
}
