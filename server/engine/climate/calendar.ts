/** Days of the months of a year without 29 February. */
export const MONTH_DAYS: readonly number[] = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31]

/** Day of the year (0 to 365) on which each month starts; 13 entries, the last is 365. */
export const MONTH_STARTS: readonly number[] = MONTH_DAYS.reduce<number[]>(
  (starts, days) => [...starts, starts[starts.length - 1] + days],
  [0],
)

/** First hour of each month and the year's end: 13 values. */
export const MONTH_START_H: readonly number[] = MONTH_STARTS.map((day) => 24 * day)

const NAMES = 'January February March April May June July August September October November December'
export const MONTH_NAMES: readonly string[] = NAMES.split(' ')

/** Month 0 to 11 of day 0 to 364. */
export function monthOfDay(day: number): number {
  let month = 0
  while (day >= MONTH_STARTS[month + 1]) month++
  return month
}

/** Month (0 to 11) of an hour of the year (0 to 8,759). */
export const monthOfHour = (hour: number): number => monthOfDay(Math.floor(hour / 24))

/**
 * Whether an hour of the day (0 to 23, its beginning) lies in a span that may pass midnight.
 * Equal ends mean the whole day.
 */
export function hourWithin(hourOfDay: number, from_h: number, to_h: number): boolean {
  if (from_h === to_h) return true
  return from_h < to_h ? hourOfDay >= from_h && hourOfDay < to_h : hourOfDay >= from_h || hourOfDay < to_h
}

/** "5 March 14:00" for the hour that ends then; `index` 0 to 8759, hours end at 01:00 to 24:00. */
export function hourName(index: number): string {
  const day = Math.floor(index / 24)
  const month = monthOfDay(day)
  const hour = (index % 24) + 1
  return `${day - MONTH_STARTS[month] + 1} ${MONTH_NAMES[month]} ${String(hour).padStart(2, '0')}:00`
}
