import fc from 'fast-check'
import { expect, test } from 'vitest'
import { extremes, longestRun } from '#engine/measures/extremes.ts'
import { dateOfHour, monthlyMeans } from '#engine/measures/months.ts'
import { swing } from '#engine/measures/swing.ts'
import { series } from './make-trace.ts'

test('a constant year has no swing', () => {
  fc.assert(
    fc.property(fc.double({ min: -30, max: 45, noNaN: true }), (level) => {
      const found = swing(series(level))
      expect(Math.max(...found.day_K)).toBe(0)
      expect(found.month_K).toEqual(new Array(12).fill(0))
    }),
    { numRuns: 10 },
  )
})

test('a day of 18 to 24 °C swings 6 K, whatever the level of the year', () => {
  const found = swing(
    series((hour) => 5 * Math.floor(hour / 24) + (hour % 24 === 15 ? 24 : hour % 24 === 6 ? 18 : 21)),
  )
  expect(found.year_K).toBeCloseTo(6, 9)
  expect(found.day_K).toHaveLength(365)
})

test('the largest swing is found with its date and its own highest and lowest', () => {
  const values = series(20)
  const noon = (31 + 28 + 20) * 24 + 12
  values[noon] = 29
  values[noon - 8] = 16
  expect(swing(values).largest).toEqual({ month: 3, day: 21, swing_K: 13, lowest_C: 16, highest_C: 29 })
  expect(swing(values).month_K[2]).toBeCloseTo(13 / 31, 9)
})

test('dates: hour 0 is 1 January 00:00, hour 8,759 is 31 December 23:00, 1 March follows 28 February', () => {
  expect(dateOfHour(0)).toEqual({ month: 1, day: 1, hour: 0 })
  expect(dateOfHour(8759)).toEqual({ month: 12, day: 31, hour: 23 })
  expect(dateOfHour(59 * 24)).toEqual({ month: 3, day: 1, hour: 0 })
  expect(dateOfHour(59 * 24 - 1)).toEqual({ month: 2, day: 28, hour: 23 })
})

test('monthly means weigh every hour of the month alike', () => {
  expect(monthlyMeans(series((hour) => dateOfHour(hour).month))).toEqual([
    1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12,
  ])
})

test('coldest and warmest hour carry their dates, and hours beyond limits are counted strictly', () => {
  const values = series(20)
  values[14 * 24 + 7] = 9.5
  values[200 * 24 + 16] = 31
  const found = extremes(values, { below_C: [20, 10], above_C: [20, 31] }, { firstHour: 0, repeats: true })
  expect(found.coldest).toEqual({ month: 1, day: 15, hour: 7, temperature_C: 9.5 })
  expect(found.warmest).toEqual({ month: 7, day: 20, hour: 16, temperature_C: 31 })
  expect(found.below.map(({ hours, days }) => [hours, days])).toEqual([
    [1, 1],
    [1, 1],
  ])
  expect(found.above.map(({ hours }) => hours)).toEqual([1, 0])
  expect(found.above[0].month_h[6]).toBe(1)
})

test('a cold spell over New Year is one run in the repeating year, two in a first year that starts in January', () => {
  const cold = (hour: number) => (hour < 4 * 24 || hour >= 362 * 24 ? 5 : 18)
  const limits = { below_C: [10], above_C: [] }
  expect(extremes(series(cold), limits, { firstHour: 0, repeats: true }).below[0].daysInARow).toBe(7)
  expect(extremes(series(cold), limits, { firstHour: 0, repeats: false }).below[0].daysInARow).toBe(4)
  expect(extremes(series(cold), limits, { firstHour: 273 * 24, repeats: false }).below[0].daysInARow).toBe(7)
})

test('a year that is cold throughout is a run of all its days and no more', () => {
  expect(longestRun([true, true, true], 1, true)).toBe(3)
  expect(longestRun([false, false], 0, true)).toBe(0)
})
