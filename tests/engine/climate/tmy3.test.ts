import { expect, test } from 'vitest'
import { ClimateFileError } from '#engine/climate/climate-file-error.ts'
import { clearSkyEmissivity, skyTemperature } from '#engine/climate/sky.ts'
import { readTmy3 } from '#engine/climate/tmy3.ts'
import { evidenceInputs } from '../../../server/evidence/inputs.ts'
import { GLOBAL, tmy3Lines, withCell } from './file-makers.ts'

const lines = tmy3Lines()
const text = (from: readonly string[]): string => from.join('\n')

test('the hour stamped 01:00 becomes entry 0 and the place comes from line 1 (TMY3 manual, NREL/TP-581-43156)', () => {
  const year = readTmy3(text(lines))
  expect([...year.outdoor_C.slice(0, 25)]).toEqual([...Array.from({ length: 24 }, (_, i) => i + 1), 1])
  expect(year.global_Wm2[12]).toBe(GLOBAL[12])
  expect(year.pressure_Pa[0]).toBe(78400)
  expect(year.place).toEqual({
    name: 'TEST, NM',
    latitude_deg: 36.45,
    longitude_deg: -105.667,
    elevation_m: 2161,
    timeZone_h: -7,
  })
  expect(year.sky_C[0]).toBeCloseTo(skyTemperature(1, clearSkyEmissivity(-5.5, 1, 78400), 0.5), 9)
})

test('traps of real files: BOM, CRLF, quotes, short times, seconds, trailing commas, letter case, doubled brackets', () => {
  const changed = lines.map((line, i) => {
    if (i === 1) return `${line.toUpperCase().replace('DNI (W/M^2)', '"DNI (W/m^2))"')},`
    if (i === 0) return `${line},,,`
    return `${line
      .replace(/,0(\d):00,/, ',$1:00,')
      .replace('24:00', '24:00:00')
      .replace(/^0/, '')},255.4`
  })
  const year = readTmy3(`\ufeff${changed.join('\r\n')}\r\n\r\n`)
  expect(year.outdoor_C).toEqual(readTmy3(text(lines)).outdoor_C)
  expect(year.beam_Wm2).toEqual(readTmy3(text(lines)).beam_Wm2)
})

test('midnight stamped 00:00 of the next day is the last hour of the day', () => {
  const shifted = lines.map((line, i) => {
    if (i < 2 || !line.includes(',24:00,')) return line
    const next = lines[i + 1]?.slice(0, 10) ?? '01/01/1995'
    return `${next},00:00${line.slice(16)}`
  })
  expect(readTmy3(text(shifted)).outdoor_C[23]).toBe(24)
})

function fault(changed: readonly string[]): ClimateFileError {
  try {
    readTmy3(text(changed))
  } catch (error) {
    expect(error).toBeInstanceOf(ClimateFileError)
    expect(error).toBeInstanceOf(RangeError)
    return error as ClimateFileError
  }
  throw new Error('nothing was thrown')
}

const swapped = [...lines]
;[swapped[500], swapped[900]] = [swapped[900], swapped[500]]

const faults: readonly (readonly [
  what: string,
  lines: readonly string[],
  line: number | null,
  words: RegExp,
])[] = [
  ['a missing hour', lines.toSpliced(100, 1), 101, /5 January 03:00 is missing/],
  ['a repeated hour', lines.toSpliced(100, 0, lines[99]), 101, /is there twice, first in line 100/],
  ['shuffled hours', swapped, 501, /out of order.*comes in line 901/],
  ['a cut file', lines.slice(0, 5000), 5000, /ends after 4998 of 8760 hours/],
  ['too many hours', [...lines, lines[2]], 8763, /more than 8760 hours/],
  [
    'a leap day',
    lines.toSpliced(1418, 0, lines[1417].replace('02/28', '02/29')),
    1419,
    /29 February.*leap day out/,
  ],
  ['a day that no month has', withCell(lines, 50, 0, '13/40/1995'), 50, /no day 40 in month 13/],
  ['half hours', withCell(lines, 50, 1, '24:30'), 50, /not a full hour/],
  ['a date in words', withCell(lines, 50, 0, '2 Jan'), 50, /not a date/],
  [
    'the mark -9900',
    withCell(lines, 700, 7, '-9900'),
    700,
    /outdoor temperature is -9900, a mark for a missing value/,
  ],
  ['the mark 9999', withCell(lines, 700, 10, '9999'), 700, /pressure is 9999, a mark/],
  ['the mark 99.9 as a temperature', withCell(lines, 700, 7, '99.9'), 700, /99\.9, a mark/],
  ['80 °C', withCell(lines, 700, 7, '80'), 700, /80 °C; possible are -90 to 60/],
  [
    'a dew point far above the air',
    withCell(lines, 26, 9, '27'),
    26,
    /dew point 27 °C is above the air at 24/,
  ],
  [
    'sun in the night',
    withCell(lines, 26, 2, '200'),
    26,
    /200 W\/m² of sun at 1 January 24:00.*below the horizon/,
  ],
  ['negative radiation', withCell(lines, 14, 2, '-5'), 14, /global radiation is -5/],
  ['beam above the solar constant', withCell(lines, 14, 4, '1450'), 14, /more than the sun sends/],
  ['words for numbers', withCell(lines, 14, 7, 'warm'), 14, /'warm', not a number/],
  ['an empty cell', withCell(lines, 14, 7, ''), 14, /outdoor temperature is missing/],
  [
    'degrees Fahrenheit',
    lines.with(1, lines[1].replace('Dry-bulb (C)', 'Dry-bulb (F)')),
    2,
    /'f'; TMY3 files have it in 'c'/,
  ],
  ['no wind column', lines.with(1, lines[1].replace('Wspd (m/s)', 'Gusts (m/s)')), 2, /no column 'wspd/],
  ['a latitude of 95', lines.with(0, lines[0].replace('36.450', '95')), 1, /latitude of the station is 95/],
  ['no climate file', ['{"a": 1}', '{}', '{}'], null, /not a TMY3 file/],
  ['an empty file', [''], null, /not a TMY3 file/],
  [
    'hours stamped at their beginning',
    lines.map((l) => l.replace(/,(\d\d):00,/, (_, h) => `,${String(Number(h) - 1).padStart(2, '0')}:00,`)),
    3,
    /stamped at their beginning/,
  ],
  ['the wrong time zone', lines.with(0, lines[0].replace('-7.0', '2.0')), 11, /Check time zone/],
  ['no sun all year', lines.map((l, i) => (i < 2 ? l : withCell([l], 1, 2, '0')[0])), null, /0 all year/],
]

test.each(faults)('%s gives one message with the line of the file', (_, changed, line, words) => {
  const error = fault(changed)
  expect(error.message).toMatch(words)
  if (line === 11) expect(error.line).toBeGreaterThan(2)
  else expect(error.line).toBe(line)
  expect(error.message).not.toContain('\n')
})

const denver = evidenceInputs.shared('climate/tmy3-725650.csv.gz')

test.skipIf(denver === null)(
  'Denver 725650: monthly means agree with the normals computed from the same file by others',
  () => {
    const year = readTmy3(denver as string)
    const mean = (values: Float64Array, from: number, to: number): number =>
      values.slice(from, to).reduce((sum, value) => sum + value, 0) / (to - from)
    const { places } = JSON.parse(evidenceInputs.data('climates/normals.json'))
    const row = places.find(({ id }: { id: string }) => id === 'denver')
    expect(Math.abs(mean(year.outdoor_C, 0, 744) - row.mean_C[0])).toBeLessThan(0.06)
    expect(Math.abs(mean(year.global_Wm2, 0, 744) * 0.024 - row.global_kWhm2day[0])).toBeLessThan(0.006)
    expect(Math.abs(mean(year.dewPoint_C, 8016, 8760) - row.dewPoint_C[11])).toBeLessThan(0.06)
  },
)
