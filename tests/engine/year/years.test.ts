import { expect, test } from 'vitest'
import { HOURS } from '#engine/climate/climate-year.ts'
import { firstHarmonic } from '#engine/climate/harmonic.ts'
import { FixedPointAccelerator } from '#engine/year/anderson.ts'
import { chargingYears, waveBelowFilm } from '#engine/year/charging.ts'
import { repeatingYear } from '#engine/year/repeating-year.ts'
import { assemble } from '#engine/zone/assemble.ts'
import type { ElementCache } from '#engine/zone/element-cache.ts'
import { liveYear } from '#engine/zone/live-year.ts'
import { bermedHouse, weather } from '../zone/make-house.ts'

const cache: ElementCache = new Map()
const climate = weather()

test('the repeating year repeats: two further plain years differ by less than 0.01 K at every face and hour', () => {
  const house = assemble(bermedHouse(), climate, cache)
  const { closure_K, years } = repeatingYear(house)
  expect(closure_K).toBeLessThanOrEqual(0.01)
  expect(years).toBeLessThan(15)
  const faces = house.faces.length
  const [once, again] = [new Float64Array(HOURS * faces), new Float64Array(HOURS * faces)]
  liveYear(house, 0, once, null)
  liveYear(house, 0, again, null)
  expect(once.every((value, i) => Math.abs(value - again[i]) < 0.01)).toBe(true)
})

test('brute repetition from a cold start arrives at the same year', () => {
  const house = assemble(bermedHouse(), climate, cache)
  const { trace } = repeatingYear(house)
  const plain = assemble(bermedHouse(), climate, cache)
  const faces = plain.faces.length
  const last = new Float64Array(HOURS * faces)
  for (let year = 0; year < 60; year++) liveYear(plain, 0, year === 59 ? last : null, null)
  trace.surfaces.forEach((surface, k) => {
    for (let hour = 0; hour < HOURS; hour += 97)
      expect(Math.abs(surface.temperature_C[hour] - last[hour * faces + k])).toBeLessThan(0.01)
  })
})

test('charging years come closer to the repeating year, one after the other', () => {
  const house = assemble(bermedHouse(), climate, cache)
  const settled = repeatingYear(house).trace.operative_C
  const years = chargingYears(house, cache, { month: 10, years: 4 })
  const off = years.map(({ operative_C }) => {
    let sum = 0
    for (let hour = 0; hour < HOURS; hour++) sum += Math.abs(operative_C[hour] - settled[hour])
    return sum / HOURS
  })
  expect(years.every(({ firstHour }) => firstHour === 273 * 24)).toBe(true)
  expect(off[1]).toBeLessThan(off[0])
  expect(off[3]).toBeLessThan(off[1])
  expect(off[3]).toBeLessThan(0.5)
})

test('charging refuses a month or a number of years that cannot be', () => {
  const house = assemble(bermedHouse(), climate, cache)
  expect(() => chargingYears(house, cache, { month: 13, years: 1 })).toThrow(/month of completion/)
  expect(() => chargingYears(house, cache, { month: 3, years: 0 })).toThrow(/charging years/)
})

test('behind a film of 25 W/m²K a yearly wave keeps 0.9736 and is 1.515 days late on clay (Carslaw and Jaeger 1959, 2.6)', () => {
  const air = Float64Array.from(
    { length: HOURS },
    (_, hour) => -10 * Math.cos((2 * Math.PI * (hour + 1)) / HOURS),
  )
  const clay = { name: 'clay', conductivity_WmK: 1.5, volumetricHeat_Jm3K: 3e6 }
  const films = { floor: 6, wallInside: 7.7, wallOutside: 25, ground: 25 }
  const wave = waveBelowFilm(air, { soil: clay, films })
  expect(wave.amplitude_K / firstHarmonic(air).amplitude).toBeCloseTo(0.9736, 4)
  expect(wave.coldest_s / 86400).toBeCloseTo(1.515, 2)
})

test('Anderson’s acceleration finds the fixed point of a linear map of three slow modes in five steps', () => {
  const rates = [0.9, 0.8, 0.5]
  const map = (x: Float64Array) => x.map((value, i) => rates[i] * value + 1)
  const accelerator = new FixedPointAccelerator()
  let x = new Float64Array(3)
  for (let step = 0; step < 5; step++) x = Float64Array.from(accelerator.next(x, map(x)))
  rates.forEach((rate, i) => expect(x[i]).toBeCloseTo(1 / (1 - rate), 6))
})
