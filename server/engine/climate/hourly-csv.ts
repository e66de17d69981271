import { beamOf, splitByErbs } from './beam.ts'
import { HOURS, type ClimatePlace, type ClimateYear } from './climate-year.ts'
import { ClimateFileError } from './climate-file-error.ts'
import { csvCells, textLines } from './csv-cells.ts'
import { checkHourOrder, type Stamp } from './hour-order.ts'
import { dewPointFromHumidity, standardPressure } from './humidity.ts'
import { cellNumber, checkTogether, plausible, QUANTITIES, type Quantity } from './plausible.ts'
import { hourlyCloud, skyFromRadiation, skyTemperatures } from './sky.ts'
import { sunHours, type SunHours } from './solar-day.ts'
import { unitConverter } from './units.ts'

/** Columns of our own hourly file, by the name in its header. */
const COLUMNS = {
  'outdoor temperature': QUANTITIES.outdoor,
  'dew point': QUANTITIES.dewPoint,
  'relative humidity': QUANTITIES.humidity,
  'global radiation': QUANTITIES.global,
  'beam radiation': QUANTITIES.beam,
  'diffuse radiation': QUANTITIES.diffuse,
  'wind speed': QUANTITIES.wind,
  pressure: QUANTITIES.pressure,
  'cloud cover': QUANTITIES.cloud,
  'sky radiation': QUANTITIES.skyRadiation,
  'sky temperature': QUANTITIES.skyTemperature,
} as const satisfies Record<string, Quantity>

type ColumnName = keyof typeof COLUMNS

/** Wind where a file has none [m/s]: a mean of open country; an assumption. */
const USUAL_WIND_MS = 3

/**
 * Reads Loamkeep's plain hourly file: lines `# key: value` for the place (`name`, `latitude`, `longitude`,
 * `elevation`, `time zone`, `source`), one header line with a unit in brackets behind each column, and 8,760
 * rows. `time` is month-day hour (`01-31 14:00`, a year in front is ignored) of the end of the hour,
 * local standard time.
 *
 *   # latitude: 36.45
 *   time,outdoor temperature [°C],dew point [°C],global radiation [W/m²]
 *   01-01 01:00,-4.2,-9,0
 *
 * `outdoor temperature`, `global radiation` and `dew point` or `relative humidity` must be there. Beam and
 * diffuse are made by Erbs when both are missing. `sky temperature`, `sky radiation` (downward long-wave) or
 * `cloud cover` decide the sky; without them the daily clearness does.
 *
 * @throws ClimateFileError with the line, for anything that is not such a year
 */
export function readHourlyCsv(text: string): ClimateYear {
  const lines = textLines(text)
  const headerAt = lines.findIndex((line) => line.trim() !== '' && !line.trimStart().startsWith('#'))
  const delimiter = headerAt >= 0 && lines[headerAt].includes(';') ? ';' : ','
  const header = headerAt < 0 ? [] : csvCells(lines[headerAt], delimiter)
  while (header.length > 0 && header[header.length - 1] === '') header.pop()
  if (header[0]?.toLowerCase() !== 'time') {
    throw new ClimateFileError(
      null,
      "this is not a climate file: expected a TMY3 file, or lines '# key: value' and then a header that begins with 'time'.",
    )
  }
  const { place, source } = readPlace(lines.slice(0, headerAt))
  const rows = lines.slice(headerAt + 1).map((line) => csvCells(line, delimiter))
  const lineOf = (row: number): number => headerAt + 2 + row
  checkHourOrder(rows.map((cells, row) => readStamp(cells[0], lineOf(row))))

  const columns = readHeader(header, headerAt + 1)
  const series = (name: ColumnName): Float64Array | null => {
    const column = columns.get(name)
    if (column === undefined) return null
    return Float64Array.from(rows, (cells, row) => {
      const cell = delimiter === ';' ? cells[column.at]?.replace(',', '.') : cells[column.at]
      const value = cellNumber(cell, name, lineOf(row))
      return plausible(COLUMNS[name], column.toSI(value), lineOf(row), value)
    })
  }
  const needed = (name: ColumnName): Float64Array => {
    const values = series(name)
    if (values !== null) return values
    throw new ClimateFileError(headerAt + 1, `there is no column '${name}'. It is needed.`)
  }

  const outdoor_C = needed('outdoor temperature')
  const global_Wm2 = needed('global radiation')
  const dewPoint_C = series('dew point') ?? fromHumidity(outdoor_C, series('relative humidity'), headerAt + 1)
  const givenBeam = series('beam radiation')
  checkTogether(
    { place, outdoor_C, dewPoint_C, global_Wm2, beam_Wm2: givenBeam },
    rows.map((_, row) => lineOf(row)),
  )
  const sun = sunHours(place)
  const { beam_Wm2, diffuse_Wm2, made } = split(global_Wm2, givenBeam, series('diffuse radiation'), sun)
  const wind_ms = series('wind speed')
  const pressure_Pa = series('pressure') ?? new Float64Array(HOURS).fill(standardPressure(place.elevation_m))
  const notes = [
    ...made,
    ...(wind_ms === null ? [`wind taken as ${USUAL_WIND_MS} m/s`] : []),
    ...(columns.has('pressure') ? [] : ['pressure from the elevation']),
  ]
  const sky = skyOf(series, { outdoor_C, dewPoint_C, pressure_Pa }, global_Wm2, sun)
  return {
    place,
    source: [source, ...notes, ...sky.made].join('; '),
    outdoor_C,
    dewPoint_C,
    wind_ms: wind_ms ?? new Float64Array(HOURS).fill(USUAL_WIND_MS),
    pressure_Pa,
    global_Wm2,
    beam_Wm2,
    diffuse_Wm2,
    sky_C: sky.sky_C,
  }
}

interface ReadColumn {
  readonly at: number
  readonly toSI: (value: number) => number
}

function readHeader(header: readonly string[], line: number): ReadonlyMap<ColumnName, ReadColumn> {
  const columns = new Map<ColumnName, ReadColumn>()
  for (let at = 1; at < header.length; at++) {
    const parts = /^(.*?)\s*[[(]([^\])]*)[\])]$/.exec(header[at])
    if (parts === null) {
      throw new ClimateFileError(
        line,
        `column '${header[at]}' names no unit. Write it like 'wind speed [m/s]'.`,
      )
    }
    const name = parts[1].toLowerCase()
    if (!(name in COLUMNS)) {
      throw new ClimateFileError(
        line,
        `there is no column '${parts[1]}'. Known are ${Object.keys(COLUMNS).join(', ')}. Rename it or leave it out.`,
      )
    }
    const known = name as ColumnName
    if (columns.has(known)) {
      throw new ClimateFileError(line, `the column '${name}' is there twice. Keep one.`)
    }
    const { unit } = COLUMNS[known]
    const found = unitConverter(parts[2], unit)
    if (found === null) {
      throw new ClimateFileError(
        line,
        `the unit '${parts[2]}' of column '${name}' is not known. Give it in ${unit}.`,
      )
    }
    columns.set(known, { at, toSI: found })
  }
  return columns
}

function readPlace(lines: readonly string[]): { readonly place: ClimatePlace; readonly source: string } {
  const keys = new Map<string, { readonly value: string; readonly line: number }>()
  lines.forEach((text, i) => {
    const parts = /^\s*#\s*([^:]+?)\s*:\s*(.*?)[\s,;]*$/.exec(text)
    if (parts !== null) keys.set(parts[1].toLowerCase(), { value: parts[2], line: i + 1 })
  })
  const number = (key: string, low: number, high: number, unit: RegExp): number => {
    const entry = keys.get(key)
    if (entry === undefined) {
      throw new ClimateFileError(null, `there is no line '# ${key}: …' above the header. It is needed.`)
    }
    const value = Number(entry.value.replace(unit, '') || NaN)
    if (value >= low && value <= high) return value
    throw new ClimateFileError(
      entry.line,
      `${key} is '${entry.value}'; expected a number from ${low} to ${high}.`,
    )
  }
  return {
    place: {
      name: keys.get('name')?.value || 'unnamed place',
      latitude_deg: number('latitude', -90, 90, /\s*°$/),
      longitude_deg: number('longitude', -180, 180, /\s*°$/),
      elevation_m: number('elevation', -430, 6000, /\s*m$/),
      timeZone_h: number('time zone', -12, 14, /\s*h$/),
    },
    source: keys.get('source')?.value || 'hourly file without a stated source',
  }
}

function readStamp(cell: string | undefined, line: number): Stamp {
  const parts = /^(?:\d{4}-)?(\d{1,2})-(\d{1,2})[ T](\d{1,2}):00(?::00)?$/.exec(cell ?? '')
  if (parts === null) {
    throw new ClimateFileError(
      line,
      `'${(cell ?? '').slice(0, 30)}' is not a time like 01-31 14:00 (month-day and full hour).`,
    )
  }
  return { line, month: Number(parts[1]), day: Number(parts[2]), hour: Number(parts[3]) }
}

function fromHumidity(
  outdoor_C: Float64Array,
  humidity_pct: Float64Array | null,
  line: number,
): Float64Array {
  if (humidity_pct === null) {
    throw new ClimateFileError(
      line,
      "there is no column 'dew point' and none 'relative humidity'. One is needed.",
    )
  }
  return outdoor_C.map((air_C, i) => dewPointFromHumidity(air_C, humidity_pct[i]))
}

function split(
  global_Wm2: Float64Array,
  beam: Float64Array | null,
  diffuse: Float64Array | null,
  sun: SunHours,
): { readonly beam_Wm2: Float64Array; readonly diffuse_Wm2: Float64Array; readonly made: readonly string[] } {
  if (beam !== null && diffuse !== null) return { beam_Wm2: beam, diffuse_Wm2: diffuse, made: [] }
  const hour = (i: number) => ({
    outside_Wm2: sun.outside_Wm2[i],
    cosZenith: sun.cosZenith[i],
    sunlit: sun.sunlit[i],
  })
  if (beam !== null) {
    const diffuse_Wm2 = global_Wm2.map((value, i) => Math.max(0, value - beam[i] * sun.cosZenith[i]))
    return { beam_Wm2: beam, diffuse_Wm2, made: ['diffuse radiation as the rest of global and beam'] }
  }
  if (diffuse !== null) {
    const beam_Wm2 = global_Wm2.map((value, i) =>
      Math.min(1400, Math.max(0, beamOf(value - diffuse[i], hour(i)))),
    )
    return { beam_Wm2, diffuse_Wm2: diffuse, made: ['beam radiation as the rest of global and diffuse'] }
  }
  const parts = Array.from(global_Wm2, (value, i) => splitByErbs(value, hour(i)))
  return {
    beam_Wm2: Float64Array.from(parts, (part) => part.beam_Wm2),
    diffuse_Wm2: Float64Array.from(parts, (part) => part.diffuse_Wm2),
    made: ['beam and diffuse radiation by Erbs 1982'],
  }
}

function skyOf(
  series: (name: ColumnName) => Float64Array | null,
  air: Pick<ClimateYear, 'outdoor_C' | 'dewPoint_C' | 'pressure_Pa'>,
  global_Wm2: Float64Array,
  sun: SunHours,
): { readonly sky_C: Float64Array; readonly made: readonly string[] } {
  const given = series('sky temperature')
  if (given !== null) return { sky_C: given, made: [] }
  const radiation = series('sky radiation')
  if (radiation !== null) return { sky_C: radiation.map(skyFromRadiation), made: [] }
  const cover = series('cloud cover')
  const cloud =
    cover === null ? hourlyCloud(global_Wm2, sun.outside_Wm2) : cover.map((percent) => percent / 100)
  const by = cover === null ? 'dew point and daily clearness' : 'dew point and cloud cover'
  return { sky_C: skyTemperatures({ ...air, cloud }), made: [`sky temperature from ${by}`] }
}
