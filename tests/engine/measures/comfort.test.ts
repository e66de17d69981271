import { expect, test } from 'vitest'
import {
  ASHRAE_55,
  EN_16798,
  comfort,
  comfortTemperature,
  countComfort,
  nextRunningMean,
  operativeTemperature,
  runningMeans,
  sevenDayRunningMean,
} from '#engine/measures/comfort.ts'
import { saturationPressure } from '#engine/measures/moist-air.ts'
import { predictedVote } from '#engine/measures/predicted-vote.ts'
import { series, yearWave } from './make-trace.ts'

test('comfort temperature is 0.33 Trm + 18.8 between 10 and 30 °C and not defined beyond (EN 16798-1:2019)', () => {
  expect([10, 15, 20, 25, 30].map((t) => comfortTemperature(EN_16798, t)!.toFixed(6))).toEqual([
    '22.100000',
    '23.750000',
    '25.400000',
    '27.050000',
    '28.700000',
  ])
  expect(comfortTemperature(EN_16798, 9.99)).toBeNull()
  expect(comfortTemperature(EN_16798, 30.01)).toBeNull()
})

test('comfort temperature is 0.31 Tpma + 17.8 between 10 and 33.5 °C (ASHRAE 55)', () => {
  expect(comfortTemperature(ASHRAE_55, 20)).toBeCloseTo(24, 9)
  expect(comfortTemperature(ASHRAE_55, 33.5)).toBeCloseTo(28.185, 9)
  expect(comfortTemperature(ASHRAE_55, 34)).toBeNull()
})

test('running mean: 20 °C yesterday after 15 °C gives 16 °C; seven days give 19.7105 °C (EN 16798-1, B.2)', () => {
  expect(nextRunningMean(20, 15)).toBeCloseTo(16, 9)
  expect(sevenDayRunningMean([20, 22, 18, 16, 19, 21, 23])).toBeCloseTo(19.7105, 4)
})

test('the running mean of a constant year is that constant; after one warm day it has risen by a fifth of it', () => {
  expect(runningMeans(series(12))[0]).toBeCloseTo(12, 9)
  const warm = series((hour) => (Math.floor(hour / 24) === 100 ? 22 : 12))
  const means = runningMeans(warm)
  expect(means[100]).toBeCloseTo(12, 9)
  expect(means[101]).toBeCloseTo(14, 9)
  expect(means[102]).toBeCloseTo(13.6, 9)
})

test('1 January remembers December: the running mean does not depend on where the year is cut', () => {
  const year = yearWave(10, 12, 200)
  const turned = series((hour) => year[(hour + 4000 - (4000 % 24)) % 8760])
  const days = Math.floor(4000 / 24)
  const a = runningMeans(year)
  const b = runningMeans(turned)
  expect(b[0]).toBeCloseTo(a[days], 6)
  expect(b[364]).toBeCloseTo(a[days - 1], 6)
})

test('hours and degree-hours outside a range are those counted by hand', () => {
  const values = series(22)
  values.fill(17, 0, 24) // 1 January: 24 h, 1 K below 18
  values.fill(28.5, 4344, 4354) // July: 10 h, 2.5 K above 26
  const found = countComfort('test', 'hand', values, () => [18, 26])
  expect(found).toMatchObject({ hours: 8760, below_h: 24, below_Kh: 24, above_h: 10, above_Kh: 25 })
  expect(found.month.below_h[0]).toBe(24)
  expect(found.month.above_Kh[6]).toBe(25)
})

test('adaptive categories widen from I to III, and days outside their validity are not counted', () => {
  // Outdoors always 20 °C: comfort 25.4; indoors 22: 3.4 K below.
  const found = comfort(series(22), series(20), { low_C: 20, high_C: 26 })
  const byName = Object.fromEntries(found.adaptive.map((count) => [count.name, count]))
  expect(byName['EN 16798-1 adaptive, I'].below_h).toBe(8760)
  expect(byName['EN 16798-1 adaptive, I'].below_Kh).toBeCloseTo(0.4 * 8760, 6)
  expect(byName['EN 16798-1 adaptive, II'].below_h).toBe(0)
  expect(found.fixed.below_h).toBe(0)
  const cold = comfort(series(12), series(5), { low_C: 20, high_C: 26 })
  expect(cold.adaptive.every((count) => count.hours === 0 && count.below_h === 0)).toBe(true)
  expect(cold.fixed.below_h).toBe(8760)
})

test('operative temperature is the mean of air and radiant', () => {
  expect(operativeTemperature(20, 24)).toBe(22)
})

test('predicted votes agree with ISO 7730 table D.1 to 0.02, dissatisfied to 1 %', () => {
  const rows = [
    [22, 22, 0.1, 60, 1.2, 0.5, -0.75, 17],
    [27, 27, 0.1, 60, 1.2, 0.5, 0.77, 17],
    [27, 27, 0.3, 60, 1.2, 0.5, 0.44, 9],
    [19, 19, 0.1, 40, 1.2, 1, -0.6, 13],
    [27, 27, 0.3, 60, 1.6, 0.5, 0.95, 24],
  ]
  for (const [
    air_C,
    radiant_C,
    airSpeed_ms,
    humidity,
    activity_met,
    clothing_clo,
    vote,
    dissatisfied,
  ] of rows) {
    const vapour_Pa = (humidity / 100) * saturationPressure(air_C)
    const found = predictedVote({
      air_C,
      radiant_C,
      airSpeed_ms,
      vapour_Pa,
      activity_met,
      work_met: 0,
      clothing_clo,
    })
    expect(Math.abs(found.vote - vote)).toBeLessThanOrEqual(0.02)
    expect(Math.abs(found.dissatisfied_pct - dissatisfied)).toBeLessThanOrEqual(1)
  }
})
