import { MONTH_DAYS, MONTH_STARTS, monthOfDay } from './calendar.ts'

/** Month 0 to 11 of every day. */
export const DAY_MONTHS: Uint8Array = Uint8Array.from({ length: 365 }, (_, day) => monthOfDay(day))

/** Mean of daily values by month, 12 values. */
export function monthMeans(daily: Float64Array): Float64Array {
  const means = new Float64Array(12)
  for (let day = 0; day < 365; day++) means[DAY_MONTHS[day]] += daily[day] / MONTH_DAYS[DAY_MONTHS[day]]
  return means
}

/**
 * Smooth daily values through a year whose monthly means are the given ones: a cyclic cubic (Catmull-Rom)
 * through mid-month points, which are moved until every month has its mean to 1e-9. A plain curve through
 * the means themselves would flatten summer and winter.
 *
 * @param means 12 values
 * @returns 365 values
 */
export function monthCurve(means: ArrayLike<number>): Float64Array {
  const points = Float64Array.from(means)
  const daily = new Float64Array(365)
  for (let round = 0; round < 200; round++) {
    draw(points, daily)
    let worst = 0
    const reached = monthMeans(daily)
    for (let month = 0; month < 12; month++) {
      const lacking = means[month] - reached[month]
      points[month] += lacking
      worst = Math.max(worst, Math.abs(lacking))
    }
    if (worst < 1e-9) break
  }
  draw(points, daily)
  return daily
}

const middle = (month: number): number => MONTH_STARTS[month] + MONTH_DAYS[month] / 2

function draw(points: Float64Array, daily: Float64Array): void {
  for (let day = 0; day < 365; day++) {
    const noon = day + 0.5
    const month = DAY_MONTHS[day]
    // the month whose middle lies before this day
    const from = noon >= middle(month) ? month : (month + 11) % 12
    const to = (from + 1) % 12
    const length = (MONTH_DAYS[from] + MONTH_DAYS[to]) / 2
    const u = ((noon - middle(from) + 365) % 365) / length
    const [a, b, c, d] = [points[(from + 11) % 12], points[from], points[to], points[(to + 1) % 12]]
    daily[day] = b + 0.5 * u * (c - a + u * (2 * a - 5 * b + 4 * c - d + u * (3 * (b - c) + d - a)))
  }
}

/**
 * Value at a time between daily ones that stand at noon, straight between the noons, round the year's end.
 *
 * @param time_h from 1 January 00:00
 */
export function betweenNoons(daily: Float64Array, time_h: number): number {
  const noons = time_h / 24 - 0.5
  const before = Math.floor(noons)
  const share = noons - before
  return daily[(before + 365) % 365] * (1 - share) + daily[(before + 366) % 365] * share
}

/**
 * Noon points whose straight connections have the given daily means: a day's mean takes three quarters from
 * its own noon and an eighth from each neighbour's, which is undone here.
 *
 * @param means 365 daily means
 */
export function noonPoints(means: Float64Array): Float64Array {
  let points = Float64Array.from(means)
  // the error halves at least with each round
  for (let round = 0; round < 30; round++) {
    const at = points
    points = at.map((value, day) => {
      const reached = 0.75 * value + 0.125 * (at[(day + 364) % 365] + at[(day + 1) % 365])
      return value + means[day] - reached
    })
  }
  return points
}
