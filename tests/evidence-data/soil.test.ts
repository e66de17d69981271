import { expect, test } from 'vitest'
import { undisturbedGround } from '#engine/climate/ground.ts'
import type { DeepSoil } from '../../server/evidence/parts/deep-soil.ts'
import { readDeepSoil } from '../../server/evidence/parts/deep-soil.ts'
import { fitColumn, runColumn } from '../../server/evidence/parts/ground-column.ts'
import { fillGaps, readSoilStations } from '../../server/evidence/parts/soil-stations.ts'
import { fitDiffusivity, waveBelow, waveOfDays } from '../../server/evidence/parts/soil-wave.ts'

const DAY_S = 86400
const DIFFUSIVITY_M2S = 5e-7
const wave = { mean_C: 10, amplitude_K: 12, coldest_s: 30 * DAY_S, diffusivity_m2s: DIFFUSIVITY_M2S }
const daysAt = (depth_m: number) =>
  Float64Array.from(
    { length: 365 },
    (_, day) => undisturbedGround(wave, Float64Array.of(depth_m), (day + 0.5) * DAY_S)[0],
  )

test('the fit finds the diffusivity that made the waves (Kusuda and Achenbach 1965)', () => {
  const depths = [0.05, 0.1, 0.2, 0.5]
  expect(fitDiffusivity(depths, depths.map(daysAt).map(waveOfDays))).toBeCloseTo(DIFFUSIVITY_M2S, 10)
})

test('a wave carried from 5 to 100 cm is the wave at 100 cm (Kusuda and Achenbach 1965)', () => {
  const carried = waveBelow(waveOfDays(daysAt(0.05)), 0.05, 1, DIFFUSIVITY_M2S)
  const direct = waveOfDays(daysAt(1))
  expect(carried.amplitude).toBeCloseTo(direct.amplitude, 6)
  expect(carried.coldest_s / DAY_S).toBeCloseTo(direct.coldest_s / DAY_S, 4)
})

test('a column driven by the wave at 5 cm has the wave at 1 m, and its fit the diffusivity (Carslaw and Jaeger 1959, 2.6)', () => {
  const depth_m = [0.05, 0.5, 1]
  const hours = 4 * 8760
  const soil_C = depth_m.map((depth) =>
    Float64Array.from(
      { length: hours },
      (_, hour) => undisturbedGround(wave, Float64Array.of(depth), hour * 3600)[0],
    ),
  )
  const measured: DeepSoil = { depth_m, hours, month: new Uint8Array(hours), soil_C, filled: 0 }
  const { soil_C: computed } = runColumn(measured, DIFFUSIVITY_M2S)
  let worst = 0
  for (let hour = 0; hour < hours; hour++)
    worst = Math.max(worst, Math.abs(computed[1][hour] - soil_C[2][hour]))
  expect(worst).toBeLessThan(0.05)
  expect(fitColumn(measured, 8760, 2 * 8760) / DIFFUSIVITY_M2S).toBeCloseTo(1, 1)
})

test('gaps are filled straight between their neighbours, round the end', () => {
  expect([...fillGaps(Float64Array.of(NaN, 1, NaN, NaN, 4, NaN))!]).toEqual([2, 1, 2, 3, 4, 3])
  expect(fillGaps(Float64Array.of(NaN, NaN))).toBeNull()
})

test('a spike of one hour, a missing hour and a value that is no number are filled', () => {
  const text = [
    'station,time_cst,T5cm,T10cm',
    'x,10/2/14 12:00,1,5',
    'x,10/2/14 13:00,2,25',
    'x,10/2/14 14:00,3,6',
    'x,10/2/14 16:00,nan,8',
    'x,10/2/14 17:00,6,9',
  ].join('\n')
  const soil = readDeepSoil(text)
  expect(soil.hours).toBe(6)
  expect(soil.filled).toBe(3)
  expect([...soil.soil_C[0]]).toEqual([1, 2, 3, 4, 5, 6])
  expect([...soil.soil_C[1]]).toEqual([5, 5.5, 6, 7, 8, 9])
  expect(() => readDeepSoil(text.replace('10/2/14 12:00', 'noon'))).toThrow(/noon/)
})

test('a station without a whole year is refused by its number', () => {
  const text = 'wban,lst_date\n12345,2020-01-01'
  expect(() => readSoilStations(text)).toThrow('Station 12345 has 1 days, not 365.')
})
