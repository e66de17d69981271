import { expect, test } from 'vitest'
import { ClimateFileError } from '#engine/climate/climate-file-error.ts'
import { readHourlyCsv } from '#engine/climate/hourly-csv.ts'
import { standardPressure } from '#engine/climate/humidity.ts'
import { GLOBAL, hourlyLines, PLACE, withCell } from './file-makers.ts'

const lines = hourlyLines()
const text = (from: readonly string[]): string => from.join('\n')
const header = 7

test('a small file: place, order, and what was made for missing columns is said', () => {
  const year = readHourlyCsv(text(lines))
  expect(year.place).toEqual({ ...PLACE, name: 'Test' })
  expect([...year.outdoor_C.slice(0, 3)]).toEqual([1, 2, 3])
  expect(year.wind_ms[5000]).toBe(3)
  expect(year.pressure_Pa[0]).toBe(standardPressure(2161))
  expect(year.source).toContain('made for a test')
  expect(year.source).toMatch(/Erbs 1982.*wind taken as 3 m\/s.*pressure from the elevation.*sky temperature/)
  for (let i = 0; i < 8760; i++) {
    expect(year.diffuse_Wm2[i]).toBeLessThanOrEqual(GLOBAL[i])
    expect(year.beam_Wm2[i]).toBeGreaterThanOrEqual(0)
  }
})

test('units in the header are converted: °F, kJ/m², %, mph, inHg, and semicolons with decimal commas', () => {
  const changed = lines.map((line, i) => {
    if (i < header - 1) return line
    if (i === header - 1) {
      return 'time;outdoor temperature [°F];relative humidity (%);global radiation [kJ/m²];wind speed [mph];pressure [inHg]'
    }
    const [time, air_C, , global_Wm2] = line.split(',')
    return `${time};${String(Number(air_C) * 1.8 + 32).replace('.', ',')};50;${Number(global_Wm2) * 3.6};10;23`
  })
  const year = readHourlyCsv(text(changed))
  expect(year.outdoor_C[6]).toBeCloseTo(7, 9)
  expect(year.global_Wm2[12]).toBeCloseTo(GLOBAL[12], 9)
  expect(year.wind_ms[0]).toBeCloseTo(4.4704, 9)
  expect(year.pressure_Pa[0]).toBeCloseTo(77886.9, 0)
  // 9.3 °C at 20 °C and 50 %, the usual psychrometric table value
  expect(Math.abs(year.dewPoint_C[19] - 9.3)).toBeLessThan(0.1)
})

test('beam and diffuse that are given are kept; one of both completes the other', () => {
  const both = lines.map((line, i) =>
    i === header - 1
      ? `${line},beam radiation [W/m²],diffuse radiation [W/m²]`
      : i < header
        ? line
        : `${line},0,0`,
  )
  expect(Math.max(...readHourlyCsv(text(both)).beam_Wm2)).toBe(0)
  const one = lines.map((line, i) =>
    i === header - 1
      ? `${line},diffuse radiation [W/m²]`
      : i < header
        ? line
        : `${line},${line.split(',')[3]}`,
  )
  expect(Math.max(...readHourlyCsv(text(one)).beam_Wm2)).toBe(0)
})

test('long-wave radiation of the sky becomes its temperature (Stefan and Boltzmann: 315.7 W/m² is 0 °C)', () => {
  const given = lines.map((line, i) =>
    i === header - 1 ? `${line},sky radiation [W/m²]` : i < header ? line : `${line},315.66`,
  )
  expect(readHourlyCsv(text(given)).sky_C[100]).toBeCloseTo(0, 1)
})

const swapped = [...lines]
;[swapped[500], swapped[900]] = [swapped[900], swapped[500]]
const head = (from: string, to: string): string[] =>
  lines.with(header - 1, lines[header - 1].replace(from, to))

const faults: readonly (readonly [
  what: string,
  lines: readonly string[],
  line: number | null,
  words: RegExp,
])[] = [
  ['a missing hour', lines.toSpliced(100, 1), 101, /is missing/],
  ['a repeated hour', lines.toSpliced(100, 0, lines[99]), 101, /is there twice/],
  ['shuffled hours', swapped, 501, /out of order/],
  ['a cut file', lines.slice(0, 5000), 5000, /ends after 4993/],
  ['a leap day', lines.toSpliced(1423, 0, lines[1422].replace('02-28', '02-29')), 1424, /leap day/],
  ['a mark for missing values', withCell(lines, 60, 1, '9999'), 60, /a mark for a missing value/],
  ['80 °C', withCell(lines, 60, 1, '80'), 60, /possible are -90 to 60/],
  ['sun in the night', withCell(lines, 31, 3, '300'), 31, /below the horizon/],
  [
    'an unknown unit',
    head('[W/m²]', '[suns]'),
    header,
    /unit 'suns' of column 'global radiation' is not known/,
  ],
  ['no unit', head(' [W/m²]', ''), header, /names no unit/],
  ['an unknown column', head('dew point', 'dewpoint'), header, /no column 'dewpoint'. Known are/],
  ['a column twice', head('dew point', 'outdoor temperature'), header, /there twice/],
  ['no humidity', head('dew point [°C]', 'sky temperature [°C]'), header, /One is needed/],
  ['no radiation', head('global radiation', 'beam radiation'), header, /no column 'global radiation'/],
  ['no latitude', lines.toSpliced(1, 1), null, /no line '# latitude/],
  ['a latitude in words', lines.with(1, '# latitude: north'), 2, /latitude is 'north'/],
  ['a bad time', withCell(lines, 60, 0, 'noon'), 60, /'noon' is not a time/],
  ['no climate file', ['hello', 'world'], null, /not a climate file/],
  ['an empty file', [], null, /not a climate file/],
]

test.each(faults)('%s gives one message with the line of the file', (_, changed, line, words) => {
  try {
    readHourlyCsv(text(changed))
  } catch (error) {
    expect(error).toBeInstanceOf(ClimateFileError)
    expect((error as Error).message).toMatch(words)
    expect((error as ClimateFileError).line).toBe(line)
    return
  }
  throw new Error('nothing was thrown')
})
