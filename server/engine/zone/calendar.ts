/** First hour of each month of a 365-day year, and the year's end: 13 values. */
export const MONTH_START_H: readonly number[] = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31].reduce(
  (starts, days) => [...starts, starts[starts.length - 1] + 24 * days],
  [0],
)

/** Month (0 to 11) of an hour of the year (0 to 8,759). */
export function monthOfHour(hour: number): number {
  let month = 0
  while (month < 11 && hour >= MONTH_START_H[month + 1]) month++
  return month
}

/**
 * Whether an hour of the day (0 to 23, its beginning) lies in a span that may pass midnight.
 * Equal ends mean the whole day.
 */
export function hourWithin(hourOfDay: number, from_h: number, to_h: number): boolean {
  if (from_h === to_h) return true
  return from_h < to_h ? hourOfDay >= from_h && hourOfDay < to_h : hourOfDay >= from_h || hourOfDay < to_h
}
