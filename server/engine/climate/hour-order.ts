import { hourName, MONTH_DAYS, MONTH_STARTS } from './calendar.ts'
import { HOURS } from './climate-year.ts'
import { ClimateFileError } from './climate-file-error.ts'

/** When an hour of a file ends, as its row says. */
export interface Stamp {
  readonly line: number
  /** 1 to 12. */
  readonly month: number
  readonly day: number
  /** 0 to 24; 0 means the end of the day before. */
  readonly hour: number
}

/**
 * Place of a stamped hour in the year, 0 to 8759.
 *
 * @throws ClimateFileError for 29 February, a day or an hour that no year has
 */
export function hourIndex(stamp: Stamp): number {
  const { line, month, day, hour } = stamp
  if (month === 2 && day === 29) {
    throw new ClimateFileError(
      line,
      '29 February: a climate year has 365 days. Leave the 24 hours of the leap day out.',
    )
  }
  if (!(month >= 1 && month <= 12 && day >= 1 && day <= MONTH_DAYS[month - 1])) {
    throw new ClimateFileError(line, `there is no day ${day} in month ${month}. Correct the date.`)
  }
  if (!(hour >= 0 && hour <= 24)) {
    throw new ClimateFileError(line, `there is no hour ${hour}. Hours end at 01:00 to 24:00.`)
  }
  const index = (MONTH_STARTS[month - 1] + day - 1) * 24 + hour - 1
  return index < 0 ? HOURS - 1 : index
}

/**
 * Makes sure that the rows are the 8,760 hours of a year, each once, from 1 January 01:00 to 31 December 24:00.
 *
 * @param stamps one for each row, in the order of the file
 * @throws ClimateFileError that tells missing, repeated and shuffled hours and a cut file apart
 */
export function checkHourOrder(stamps: readonly Stamp[]): void {
  const indices = stamps.map(hourIndex)
  if (indices[0] === HOURS - 1 && stamps[0].hour === 0) {
    throw new ClimateFileError(
      stamps[0].line,
      'the first hour is stamped 00:00, so hours are stamped at their beginning. Stamp them at their end, 01:00 to 24:00.',
    )
  }
  const first = indices.findIndex((index, i) => index !== i)
  if (first >= 0) throw outOfOrder(stamps, indices, first)
  if (indices.length < HOURS) {
    const last = stamps[stamps.length - 1]
    throw new ClimateFileError(
      last?.line ?? null,
      `the file ends after ${indices.length} of ${HOURS} hours: ${hourName(indices.length)} is the first that is missing. Get the whole file.`,
    )
  }
}

function outOfOrder(stamps: readonly Stamp[], indices: readonly number[], at: number): ClimateFileError {
  const { line } = stamps[at]
  const found = hourName(indices[at])
  if (at >= HOURS) {
    return new ClimateFileError(
      line,
      `more than ${HOURS} hours: ${found} comes after the end of the year. Keep one year.`,
    )
  }
  const before = indices.indexOf(indices[at])
  if (before < at) {
    return new ClimateFileError(
      line,
      `${found} is there twice, first in line ${stamps[before].line}. Remove one; a repeated hour often comes from summer time, use standard time.`,
    )
  }
  const wanted = hourName(at)
  const later = indices.indexOf(at, at)
  if (later >= 0) {
    return new ClimateFileError(
      line,
      `hours are out of order: expected ${wanted}, found ${found}; ${wanted} comes in line ${stamps[later].line}. Sort the rows by time.`,
    )
  }
  return new ClimateFileError(
    line,
    `${wanted} is missing: expected it here, found ${found}. Fill the gap; a missing hour in spring often comes from summer time, use standard time.`,
  )
}
