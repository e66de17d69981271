import { expect, test } from 'vitest'
import { HOURS } from '#engine/climate/climate-year.ts'
import { sunOfYear } from '#engine/solar/sun.ts'
import { repeatingYear } from '#engine/year/repeating-year.ts'
import { airDensity, leakageFlow } from '#engine/zone/air.ts'
import { assemble } from '#engine/zone/assemble.ts'
import { drivenTemperature } from '#engine/zone/driven.ts'
import type { ElementCache } from '#engine/zone/element-cache.ts'
import type { HouseModel, PlantModel } from '#engine/zone/house-model.ts'
import { angleBetween, sunSharing } from '#engine/zone/sun-sharing.ts'
import {
  allMonths,
  board,
  earth,
  earthRoom,
  exposure,
  house,
  layered,
  roomSurface,
  weather,
  window,
} from './make-house.ts'

const cache: ElementCache = new Map()
const climate = weather()
const sun = sunOfYear(climate.place)
const year = (model: HouseModel) => repeatingYear(assemble(model, climate, cache, sun)).trace
const lowest = (values: Float64Array) => values.reduce((least, value) => Math.min(least, value), Infinity)
const highest = (values: Float64Array) => values.reduce((most, value) => Math.max(most, value), -Infinity)
const heater = (more: Partial<PlantModel>): PlantModel => ({
  set_C: Array(24).fill(19),
  months: allMonths,
  power_W: 1e6,
  convectiveShare: 0.4,
  senses: 'operative',
  ...more,
})

test('backup heat holds what its thermostat feels, to a millionth of a kelvin', () => {
  for (const senses of ['air', 'operative'] as const) {
    const trace = year(earthRoom({ heating: heater({ senses }) }))
    const felt = senses === 'air' ? trace.air_C : trace.operative_C
    trace.heating_W.forEach((power, hour) => {
      if (power > 0) expect(Math.abs(felt[hour] - 19)).toBeLessThan(1e-6)
      else expect(felt[hour]).toBeGreaterThan(19 - 1e-9)
    })
    expect(highest(trace.heating_W)).toBeGreaterThan(500)
  }
})

test('a heater of 800 W gives 800 W and no more, and the room is then colder than wanted', () => {
  const trace = year(earthRoom({ heating: heater({ power_W: 800 }) }))
  const full = Array.from(trace.heating_W.keys()).filter((hour) => trace.heating_W[hour] > 799.999)
  expect(highest(trace.heating_W)).toBeLessThanOrEqual(800)
  expect(full.length).toBeGreaterThan(100)
  for (const hour of full) expect(trace.operative_C[hour]).toBeLessThan(19 + 1e-6)
})

test('heat is off in months and hours in which it is not wanted', () => {
  const set_C = Array.from({ length: 24 }, (_, hour) => (hour < 6 ? null : 19))
  const trace = year(earthRoom({ heating: heater({ set_C, months: [1, 2] }) }))
  trace.heating_W.forEach((power, hour) => {
    if (hour % 24 < 6 || hour >= 59 * 24) expect(power).toBe(0)
  })
  expect(highest(trace.heating_W)).toBeGreaterThan(100)
})

test('night shutters of 1 m²K/W lower the loss of the windows and lift the coldest hour', () => {
  const shutter = { resistance_m2KW: 1, from_h: 17, to_h: 8, months: allMonths }
  const bare = year(earthRoom({ windows: [window(180, 8)] }))
  const shut = year(earthRoom({ windows: [window(180, 8, { shutter })] }))
  expect(lowest(shut.operative_C)).toBeGreaterThan(lowest(bare.operative_C) + 0.3)
  expect(highest(shut.solar_W)).toBeCloseTo(highest(bare.solar_W), 6)
})

test('night flush opens only when the room was warm and warmer than outdoors, and takes off the peak', () => {
  const flush = { changes_h: 6, from_h: 20, to_h: 8, months: [6, 7, 8], above_C: 22, byAtLeast_K: 2 }
  const closed = year(earthRoom({ windows: [window(180, 8)] }))
  const open = year(earthRoom({ windows: [window(180, 8)], flush }))
  let opened = 0
  for (let hour = 1; hour < HOURS; hour++) {
    if (open.flush_W[hour] === 0) continue
    opened++
    expect(open.air_C[hour - 1]).toBeGreaterThan(22)
    expect(open.air_C[hour - 1] - climate.outdoor_C[hour - 1]).toBeGreaterThanOrEqual(2)
    expect(hour % 24 >= 20 || hour % 24 < 8).toBe(true)
    expect(hour).toBeGreaterThanOrEqual(151 * 24)
  }
  expect(opened).toBeGreaterThan(50)
  expect(highest(open.operative_C)).toBeLessThan(highest(closed.operative_C) - 0.3)
})

test('seasonal shade passes its share of the sun in its months only', () => {
  const bare = year(earthRoom({ windows: [window(180, 8)] }))
  const shaded = year(earthRoom({ windows: [window(180, 8, { shade: { passes: 0.3, months: [7] } })] }))
  for (let hour = 0; hour < HOURS; hour++) {
    const isJuly = hour >= 181 * 24 && hour < 212 * 24
    expect(shaded.solar_W[hour]).toBeCloseTo((isJuly ? 0.3 : 1) * bare.solar_W[hour], 6)
  }
})

test('leaks: 500 cm² at 20 K and 4 m/s let in 44.7 L/s (basic model of ASHRAE Fundamentals, from memory)', () => {
  expect(leakageFlow(500, 0.000145, 0.000319, -20, 4)).toBeCloseTo(0.5 * Math.sqrt(0.0029 + 0.005104), 12)
  expect(leakageFlow(500, 0.000145, 0.000319, 20, 4)).toBeCloseTo(0.0447, 4)
})

test('air at 1609 m has 0.822 of its density at sea level (ANSI/ASHRAE Standard 140, within 0.5 %)', () => {
  expect(airDensity(1609) / airDensity(0)).toBeGreaterThan(0.822 * 0.995)
  expect(airDensity(1609) / airDensity(0)).toBeLessThan(0.822 * 1.005)
})

test('a plane without sun under a sky as warm as the air is driven by the air alone', () => {
  const still = { ...climate, sky_C: climate.outdoor_C }
  const { linear_C, step_K } = drivenTemperature(still, exposure(30, 180), null)
  expect(linear_C).toEqual(climate.outdoor_C)
  expect(highest(step_K)).toBe(0)
})

test('sol-air: 600 W/m² on 0.6 absorptance behind 25 W/m²K lifts a plane by 14.4 K, less what evaporates', () => {
  const flat = (value: number) => new Float64Array(HOURS).fill(value)
  const sunny = { beam_Wm2: flat(400), sky_Wm2: flat(150), ground_Wm2: flat(50) }
  expect(drivenTemperature(climate, exposure(0), sunny).step_K[12]).toBeCloseTo(14.4, 9)
  const moist = { ...exposure(0), evaporativeShare: 0.5 }
  expect(drivenTemperature(climate, moist, sunny).step_K[12]).toBeCloseTo(7.2, 9)
})

// The box of ANSI/ASHRAE Standard 140: 8 × 6 × 2.7 m, 12 m² of glass to the south, absorptance 0.6.
const box = [
  roomSurface('floor', 48),
  roomSurface('ceiling', 48),
  roomSurface('wall', 21.6, 0),
  roomSurface('wall', 16.2, 90),
  roomSurface('wall', 9.6, 180),
  roomSurface('wall', 16.2, 270),
]

test('sun on the floor of the Standard 140 box: 0.64 stays there, 0.035 leaves through the glass (its table, within 0.02)', () => {
  const shares = sunSharing(box, 180, 12, 12 * 0.659).floorBeam
  expect(Math.abs(shares[0] - 0.642)).toBeLessThan(0.02)
  const lost = 1 - shares.reduce((sum, share) => sum + share, 0)
  expect(Math.abs(lost - 0.035)).toBeLessThan(0.02)
})

test('what surfaces take and what leaves again is all the sun there was', () => {
  for (const shares of Object.values(sunSharing(box, 180, 12, 0))) {
    expect(shares.reduce((sum: number, share: number) => sum + share, 0)).toBeCloseTo(1, 12)
  }
})

test('directions: the smaller angle between them', () => {
  expect(angleBetween(350, 10)).toBe(20)
  expect(angleBetween(10, 350)).toBe(20)
  expect(angleBetween(0, 180)).toBe(180)
})

test('throws RangeError naming what does not fit: a boundary without a link, films that differ, glass beyond its film', () => {
  const wall = layered('wall', [board(0.05), earth(0.3)], 'wall', 15, 90, 180)
  const unlinked = { ...wall, links: { inside: wall.links.inside } }
  expect(() => assemble(house([unlinked]), climate)).toThrow(
    'wall: nothing is said about its boundary "outside"',
  )
  const larger = { ...wall, size: 16 }
  expect(() => assemble(house([larger]), climate)).toThrow(/wall 180: its area/)
  const leaky = window(180, 5, { glazing: { ...window(180, 5).glazing, u_Wm2K: 9 } })
  expect(() => assemble(earthRoom({ windows: [leaky] }), climate)).toThrow('window 180: its U-value 9.00')
  expect(() => assemble(house([]), climate)).toThrow('no surface')
})
