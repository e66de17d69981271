import { expect, test } from 'vitest'
import { firstHarmonic } from '#engine/climate/harmonic.ts'

const YEAR_S = 8760 * 3600

function wave(mean: number, amplitude: number, warmest_s: number, first_s = 3600): Float64Array {
  return Float64Array.from(
    { length: 8760 },
    (_, i) => mean + amplitude * Math.cos((2 * Math.PI * (first_s + i * 3600 - warmest_s)) / YEAR_S),
  )
}

test('a pure yearly cosine gives back its own mean, amplitude and time (orthogonality of the cosines)', () => {
  const found = firstHarmonic(wave(9, 12.5, 200 * 86400))
  expect(found.mean).toBeCloseTo(9, 9)
  expect(found.amplitude).toBeCloseTo(12.5, 9)
  expect(found.warmest_s / 86400).toBeCloseTo(200, 6)
  expect(found.coldest_s / 86400).toBeCloseTo(17.5, 6)
})

test('higher harmonics and a daily wave leave the first harmonic alone', () => {
  const values = wave(5, 8, 210 * 86400)
  for (let i = 0; i < values.length; i++) {
    values[i] += 6 * Math.cos((2 * Math.PI * i) / 24) + 3 * Math.sin((4 * Math.PI * i) / 8760)
  }
  const found = firstHarmonic(values)
  expect(found.amplitude).toBeCloseTo(8, 9)
  expect(found.warmest_s / 86400).toBeCloseTo(210, 6)
})

test('a southern year is coldest in July', () => {
  expect(firstHarmonic(wave(15, 6, 10 * 86400)).coldest_s / 86400).toBeCloseTo(192.5, 6)
})

test('the time of the first value moves the phase and nothing else', () => {
  const found = firstHarmonic(wave(15, 6, 10 * 86400, 1800), 3600, 1800)
  expect(found.warmest_s / 86400).toBeCloseTo(10, 6)
})

test('throws RangeError for too few values, for NaN and for a step of nothing', () => {
  expect(() => firstHarmonic(new Float64Array(2))).toThrow(RangeError)
  expect(() => firstHarmonic(Float64Array.of(1, NaN, 2))).toThrow(/finite/)
  expect(() => firstHarmonic(new Float64Array(8), 0)).toThrow(/step_s/)
})
