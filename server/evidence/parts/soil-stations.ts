/** Depths of the soil thermometers of the U.S. Climate Reference Network [m]. */
export const STATION_DEPTHS_M: readonly number[] = [0.05, 0.1, 0.2, 0.5, 1]

/** One station over one year of 365 days; every series holds daily values. */
export interface SoilStation {
  /** Number in the Weather Bureau - Army - Navy list. */
  readonly wban: string
  readonly latitude_deg: number
  readonly longitude_deg: number
  /** Mean air temperature of each day [°C]. */
  readonly outdoor_C: Float64Array
  /** Global horizontal radiation, mean of the day [W/m²]. */
  readonly global_Wm2: Float64Array
  /** Rain and melted snow of the year [mm]; missing days count as dry. */
  readonly rain_mm: number
  /** Mean relative humidity of each day [%]; null where the station has none. */
  readonly humidity_pct: Float64Array | null
  /** By depth, in the order of STATION_DEPTHS_M [°C]. */
  readonly soil_C: readonly Float64Array[]
}

const DAYS = 365

/**
 * Reads the daily product of the U.S. Climate Reference Network for 2020. The leap day is left out, as in
 * every climate year of the program, so that the year has 365 days; missing days (16 in a row at most)
 * are filled straight between their neighbours, round the end of the year.
 *
 * @param text comma-separated, columns by name
 * @throws RangeError for a station without 365 days or with a quantity that is missing all year
 */
export function readSoilStations(text: string): SoilStation[] {
  const [head, ...lines] = text.trim().split(/\r?\n/)
  const names = head.split(',')
  const rowsOf = new Map<string, string[][]>()
  for (const line of lines) {
    const cells = line.split(',')
    if (cells[names.indexOf('lst_date')].endsWith('-02-29')) continue
    const wban = cells[names.indexOf('wban')]
    const rows = rowsOf.get(wban)
    if (rows) rows.push(cells)
    else rowsOf.set(wban, [cells])
  }
  return [...rowsOf].map(([wban, rows]) => {
    if (rows.length !== DAYS) throw new RangeError(`Station ${wban} has ${rows.length} days, not ${DAYS}.`)
    const read = (name: string): Float64Array | null => {
      const at = names.indexOf(name)
      return fillGaps(Float64Array.from(rows, (cells) => (cells[at] === '' ? NaN : Number(cells[at]))))
    }
    const needed = (name: string): Float64Array => {
      const values = read(name)
      if (!values) throw new RangeError(`Station ${wban} has no ${name}.`)
      return values
    }
    return {
      wban,
      longitude_deg: Number(rows[0][names.indexOf('longitude')]),
      latitude_deg: Number(rows[0][names.indexOf('latitude')]),
      outdoor_C: needed('t_daily_avg'),
      global_Wm2: needed('solarad_daily').map((mega) => (mega * 1e6) / 86400),
      rain_mm: rows.reduce((sum, cells) => sum + Number(cells[names.indexOf('p_daily_calc')]), 0),
      humidity_pct: read('rh_daily_avg'),
      soil_C: [5, 10, 20, 50, 100].map((depth) => needed(`soil_temp_${depth}_daily`)),
    }
  })
}

/** NaN becomes the straight line between the neighbours, round the end; null when all are NaN. */
export function fillGaps(values: Float64Array): Float64Array | null {
  const n = values.length
  const first = values.findIndex((value) => !Number.isNaN(value))
  if (first < 0) return null
  const out = values.slice()
  let last = first
  for (let step = 1; step <= n; step++) {
    const here = (first + step) % n
    if (Number.isNaN(values[here])) continue
    const gap = (here - last + n) % n || n
    for (let k = 1; k < gap; k++)
      out[(last + k) % n] = values[last] + ((values[here] - values[last]) * k) / gap
    last = here
  }
  return out
}
