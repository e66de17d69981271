import { type ClimatePlace, type ClimateYear } from './climate-year.ts'
import { ClimateFileError } from './climate-file-error.ts'
import { csvCells, textLines } from './csv-cells.ts'
import { checkHourOrder, type Stamp } from './hour-order.ts'
import { cellNumber, checkTogether, plausible, QUANTITIES, type Quantity } from './plausible.ts'
import { hourlyCloud, skyTemperatures } from './sky.ts'
import { sunHours } from './solar-day.ts'

interface Column {
  readonly base: string
  readonly unit: string
}

const COLUMNS = {
  outdoor: { base: 'dry-bulb', unit: 'c' },
  dewPoint: { base: 'dew-point', unit: 'c' },
  global: { base: 'ghi', unit: 'w/m^2' },
  beam: { base: 'dni', unit: 'w/m^2' },
  diffuse: { base: 'dhi', unit: 'w/m^2' },
  wind: { base: 'wspd', unit: 'm/s' },
  pressure: { base: 'pressure', unit: 'mbar' },
} as const satisfies Record<string, Column>

/** Whether a text looks like a TMY3 file; says nothing about whether it is a good one. */
export function looksLikeTmy3(text: string): boolean {
  const head = text.slice(0, 4000).toLowerCase()
  return head.includes('date (mm/dd/yyyy)') && head.includes('time (hh:mm)')
}

/**
 * Reads a TMY3 file (typical years of the US national solar radiation data base): one line with the
 * station, one with column names, 8,760 hours stamped at their end in local standard time, whose
 * radiation is the sum over the preceding hour (S. Wilcox and W. Marion, Users Manual for TMY3 Data Sets,
 * NREL/TP-581-43156, 2008). The hour stamped 01:00 becomes entry 0.
 *
 * Columns are found by name, whatever their order and letter case; further columns are ignored. The sky
 * temperature comes from dew point, pressure and opaque cloud cover (from the daily clearness index in
 * files without that column).
 *
 * @throws ClimateFileError with the line, for anything that is not such a year
 */
export function readTmy3(text: string): ClimateYear {
  const lines = textLines(text)
  if (lines.length < 3 || !looksLikeTmy3(text)) {
    throw new ClimateFileError(
      null,
      "this is not a TMY3 file: its second line must name the columns, from 'Date (MM/DD/YYYY)' and 'Time (HH:MM)' on.",
    )
  }
  const place = readStation(csvCells(lines[0]))
  const header = csvCells(lines[1]).map(columnName)
  const rows = lines.slice(2).map((line) => csvCells(line))
  const dateAt = columnAt(header, { base: 'date', unit: 'mm/dd/yyyy' })
  const timeAt = columnAt(header, { base: 'time', unit: 'hh:mm' })
  checkHourOrder(rows.map((cells, i) => readStamp(cells[dateAt], cells[timeAt], i + 3)))

  const series = (column: Column, quantity: Quantity, factor = 1): Float64Array => {
    const at = columnAt(header, column)
    return Float64Array.from(rows, (cells, i) => {
      const value = cellNumber(cells[at], quantity.name, i + 3)
      return plausible(quantity, value * factor, i + 3, value)
    })
  }
  const outdoor_C = series(COLUMNS.outdoor, QUANTITIES.outdoor)
  const dewPoint_C = series(COLUMNS.dewPoint, QUANTITIES.dewPoint)
  const global_Wm2 = series(COLUMNS.global, QUANTITIES.global)
  const beam_Wm2 = series(COLUMNS.beam, QUANTITIES.beam)
  const diffuse_Wm2 = series(COLUMNS.diffuse, QUANTITIES.diffuse)
  const wind_ms = series(COLUMNS.wind, QUANTITIES.wind)
  const pressure_Pa = series(COLUMNS.pressure, QUANTITIES.pressure, 100)
  checkTogether(
    { place, outdoor_C, dewPoint_C, global_Wm2, beam_Wm2 },
    rows.map((_, i) => i + 3),
  )

  const hasCloud = header.some((name) => name.base === 'opqcld')
  const cloud = hasCloud
    ? series({ base: 'opqcld', unit: 'tenths' }, QUANTITIES.cloud, 10).map((percent) => percent / 100)
    : hourlyCloud(global_Wm2, sunHours(place).outside_Wm2)
  return {
    place,
    source: `Typical year TMY3 of station ${csvCells(lines[0])[0]}, ${place.name}, read from a file; sky temperature computed from dew point and ${hasCloud ? 'opaque cloud cover' : 'daily clearness'}`,
    outdoor_C,
    dewPoint_C,
    wind_ms,
    pressure_Pa,
    global_Wm2,
    beam_Wm2,
    diffuse_Wm2,
    sky_C: skyTemperatures({ outdoor_C, dewPoint_C, pressure_Pa, cloud }),
  }
}

function readStation(cells: readonly string[]): ClimatePlace {
  const [, name, state] = cells
  const number = (at: number, what: string, low: number, high: number): number => {
    const value = cellNumber(cells[at], what, 1)
    if (value >= low && value <= high) return value
    throw new ClimateFileError(1, `the ${what} of the station is ${value}; expected ${low} to ${high}.`)
  }
  return {
    name: state ? `${name}, ${state}` : name,
    timeZone_h: number(3, 'time zone', -12, 14),
    latitude_deg: number(4, 'latitude', -90, 90),
    longitude_deg: number(5, 'longitude', -180, 180),
    elevation_m: number(6, 'elevation', -430, 6000),
  }
}

/** "DNI (W/m^2))" -> base "dni", unit "w/m^2": letter case, spaces and doubled brackets vary among files. */
function columnName(cell: string): Column {
  const [base, unit = ''] = cell.toLowerCase().split('(')
  return { base: base.trim(), unit: unit.replace(/[)\s]/g, '') }
}

function columnAt(header: readonly Column[], wanted: Column): number {
  const at = header.findIndex((name) => name.base === wanted.base)
  if (at < 0) throw new ClimateFileError(2, `there is no column '${wanted.base} (${wanted.unit})'.`)
  if (header[at].unit !== wanted.unit) {
    throw new ClimateFileError(
      2,
      `the column '${wanted.base}' is in '${header[at].unit}'; TMY3 files have it in '${wanted.unit}'. Convert the values.`,
    )
  }
  return at
}

function readStamp(date: string | undefined, time: string | undefined, line: number): Stamp {
  const day = /^(\d{1,2})\/(\d{1,2})\/\d{2,4}$/.exec(date ?? '')
  const hour = /^(\d{1,2}):(\d{2})(?::\d{2})?$/.exec(time ?? '')
  if (day === null) {
    throw new ClimateFileError(line, `'${date ?? ''}' is not a date like 01/31/1995 (month/day/year).`)
  }
  if (hour === null || Number(hour[2]) !== 0) {
    throw new ClimateFileError(line, `'${time ?? ''}' is not a full hour like 01:00, 01:00 to 24:00.`)
  }
  return { line, month: Number(day[1]), day: Number(day[2]), hour: Number(hour[1]) }
}
