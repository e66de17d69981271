import { expect, test } from 'vitest'
import { dampingDepth, groundWave, undisturbedGround, type GroundWave } from '#engine/climate/ground.ts'

const DAY_S = 86400
const wave: GroundWave = {
  mean_C: 11.7,
  amplitude_K: 10.6,
  coldest_s: 35 * DAY_S,
  diffusivity_m2s: 0.05 / DAY_S,
}

test('the numbers worked out for Kusuda and Achenbach 1965 with their own inputs, to 0.001 K', () => {
  const expected: Readonly<Record<number, readonly number[]>> = {
    35: [1.1, 5.294, 8.579, 10.722],
    126: [11.654, 8.851, 8.276, 8.804],
    217: [22.3, 18.082, 14.791, 12.653],
    309: [11.654, 14.494, 15.097, 14.588],
  }
  for (const [day, rows] of Object.entries(expected)) {
    const found = undisturbedGround(wave, Float64Array.of(0, 1, 2, 3), Number(day) * DAY_S)
    rows.forEach((value, i) => expect(Math.abs(found[i] - value)).toBeLessThan(1e-3))
  }
})

test('at one damping depth the year is 58.1 days late and 36.8 % as wide (Carslaw and Jaeger 1959, 2.6)', () => {
  const d = dampingDepth(wave.diffusivity_m2s)
  const late_s = (365 * DAY_S) / (2 * Math.PI)
  expect(late_s / DAY_S).toBeCloseTo(58.1, 1)
  const coldest = undisturbedGround(wave, Float64Array.of(d), wave.coldest_s + late_s)[0]
  expect(coldest).toBeCloseTo(11.7 - 10.6 * Math.exp(-1), 9)
})

test('damping depth: 2.24 m at 0.5e-6 m2/s, 3.17 m at 1e-6 (closed form, worked out by hand)', () => {
  expect(dampingDepth(0.5e-6)).toBeCloseTo(2.24, 2)
  expect(dampingDepth(1e-6)).toBeCloseTo(3.17, 2)
})

test('throws RangeError naming depth_m[1] when it is negative', () => {
  expect(() => undisturbedGround(wave, Float64Array.of(1, -1), 0)).toThrow(/depth_m\[1\]/)
  expect(() => undisturbedGround({ ...wave, diffusivity_m2s: 0 }, Float64Array.of(1), 0)).toThrow(RangeError)
  expect(() => undisturbedGround(wave, Float64Array.of(1), 0, new Float64Array(2))).toThrow(/length/)
})

test('open ground is a little warmer than the air and two days later (median of 60 stations, 2020)', () => {
  const ground = groundWave({ mean: 8, amplitude: 11, warmest_s: 0, coldest_s: 20 * DAY_S }, 5e-7)
  expect(ground.mean_C).toBeCloseTo(9.9, 9)
  expect(ground.amplitude_K).toBeCloseTo(11.2, 9)
  expect(ground.coldest_s / DAY_S).toBeCloseTo(22, 9)
})
