import { fillGaps } from './soil-stations.ts'

/** Hourly soil temperatures of one place at many depths, without gaps. */
export interface DeepSoil {
  readonly depth_m: readonly number[]
  /** Hours from the first record, evenly spaced. */
  readonly hours: number
  /** Calendar month (1 to 12) of each hour. */
  readonly month: Uint8Array
  /** By depth [°C]. */
  readonly soil_C: readonly Float64Array[]
  /** Hours that were missing, not a number or a spike at some depth, filled straight between their neighbours. */
  readonly filled: number
}

const HOUR_MS = 3_600_000

/**
 * Reads hourly soil temperatures: a column `time_cst` (month/day/year hour:minute) and columns `T5cm` …
 * Missing hours and spikes are filled straight between their neighbours, depth by depth.
 *
 * @throws RangeError for a time that cannot be read or a depth without any value
 */
export function readDeepSoil(text: string): DeepSoil {
  const [head, ...lines] = text.trim().split(/\r?\n/)
  const names = head.split(',')
  const timeAt = names.indexOf('time_cst')
  const columns = names.flatMap((name, at) => {
    const match = /^T(\d+)cm$/.exec(name)
    return match ? [{ at, depth_m: Number(match[1]) / 100 }] : []
  })
  const rows = lines.map((line) => line.split(','))
  const times = rows.map((cells) => timeOf(cells[timeAt]))
  const first = times[0]
  const hours = Math.round((times[times.length - 1] - first) / HOUR_MS) + 1
  const raw = columns.map(() => new Float64Array(hours).fill(NaN))
  rows.forEach((cells, row) => {
    const hour = Math.round((times[row] - first) / HOUR_MS)
    columns.forEach(({ at }, depth) => {
      const value = cells[at] === '' ? NaN : Number(cells[at])
      if (Number.isFinite(value)) raw[depth][hour] = value
    })
  })
  for (const series of raw) dropSpikes(series)
  let filled = 0
  for (let hour = 0; hour < hours; hour++) if (raw.some((series) => Number.isNaN(series[hour]))) filled++
  return {
    depth_m: columns.map(({ depth_m }) => depth_m),
    hours,
    month: Uint8Array.from(
      { length: hours },
      (_, hour) => new Date(first + hour * HOUR_MS).getUTCMonth() + 1,
    ),
    soil_C: raw.map((series, depth) => {
      const whole = fillGaps(series)
      if (!whole) throw new RangeError(`There is no value at ${columns[depth].depth_m} m.`)
      return whole
    }),
    filled,
  }
}

/** A single hour more than 10 K above both its neighbours is a fault of the logger, not soil: it becomes NaN. */
function dropSpikes(series: Float64Array): void {
  for (let hour = 1; hour < series.length - 1; hour++)
    if (series[hour] - series[hour - 1] > 10 && series[hour] - series[hour + 1] > 10) series[hour] = NaN
}

/** Standard time without summer time, so it may be read as if it were universal time. */
function timeOf(text: string): number {
  const match = /^(\d+)\/(\d+)\/(\d+) (\d+):(\d+)$/.exec(text)
  if (!match) throw new RangeError(`'${text}' is not a time like 10/2/14 12:00.`)
  const [month, day, year, hour, minute] = match.slice(1).map(Number)
  return Date.UTC(2000 + year, month - 1, day, hour, minute)
}
