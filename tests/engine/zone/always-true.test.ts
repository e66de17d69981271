import { expect, test } from 'vitest'
import { HOURS, HOUR_S, type ClimateYear } from '../../../server/engine/climate/climate-year.ts'
import { sunOfYear } from '../../../server/engine/solar/sun.ts'
import { repeatingYear } from '../../../server/engine/year/repeating-year.ts'
import type { YearTrace } from '../../../server/engine/year/year-trace.ts'
import { assemble } from '../../../server/engine/zone/assemble.ts'
import type { ElementCache } from '../../../server/engine/zone/element-cache.ts'
import type { HouseModel } from '../../../server/engine/zone/house-model.ts'
import { allMonths, bermedHouse, earthRoom, weather, window } from './make-house.ts'

const cache: ElementCache = new Map()
const year = (model: HouseModel, climate: ClimateYear) => repeatingYear(assemble(model, climate, cache)).trace
const largest = (values: ArrayLike<number>) =>
  Array.from(values).reduce((most, value) => Math.max(most, Math.abs(value)), 0)
const heated = {
  set_C: Array.from({ length: 24 }, (_, hour) => (hour > 5 && hour < 22 ? 19 : 15)),
  months: allMonths,
  power_W: 2500,
  convectiveShare: 0.6,
  senses: 'operative' as const,
}

/** In minus out minus stored over the whole house, hour by hour, over the throughput of the year. */
function residual(trace: YearTrace): { worst: number; throughput: number } {
  let throughput = 0
  let worst = 0
  for (let hour = 0; hour < HOURS; hour++) {
    const before = hour - 1
    let flow =
      trace.solar_W[hour] +
      trace.gains_W[hour] +
      trace.heating_W[hour] -
      trace.cooling_W[hour] +
      trace.windows_W[hour] +
      trace.infiltration_W[hour] +
      trace.ventilation_W[hour] +
      trace.flush_W[hour]
    throughput += Math.abs(flow) * HOUR_S
    let stored_J =
      trace.airCapacity_JK * (trace.air_C[hour] - (hour === 0 ? trace.startAir_C : trace.air_C[before]))
    for (const element of trace.elements) {
      flow += element.outside_W[hour]
      throughput += Math.abs(element.outside_W[hour]) * HOUR_S
      stored_J += element.stored_J[hour] - (hour === 0 ? element.startStored_J : element.stored_J[before])
    }
    worst = Math.max(worst, Math.abs(flow * HOUR_S - stored_J))
  }
  return { worst, throughput }
}

test('ledger: what enters minus what leaves is what is stored, every hour, to 1e-9 of a mean hour and 1e-6 of the year', () => {
  const model = bermedHouse(
    {},
    { heating: heated, gains: { convective_W: Array(24).fill(100), radiative_W: Array(24).fill(150) } },
  )
  const { worst, throughput } = residual(year(model, weather()))
  expect(worst * HOURS).toBeLessThan(1e-6 * throughput)
})

test('at rest: without sun and gains, air, sky and ground at 12 °C, everything ends at 12 °C', () => {
  const calm = weather({ yearly_K: 0, daily_K: 0, sun_Wm2: 0, mean_C: 12 })
  const still = { ...calm, sky_C: calm.outdoor_C.slice() }
  const trace = year(bermedHouse(), still)
  expect(largest(trace.operative_C.map((value) => value - 12))).toBeLessThan(1e-6)
  for (const surface of trace.surfaces)
    expect(largest(surface.temperature_C.map((value) => value - 12))).toBeLessThan(1e-6)
})

test('mirrored: with the sun’s path mirrored, east glass and west glass trade places, hour by hour', () => {
  const climate = weather()
  const sun = sunOfYear(climate.place)
  const mirroredSun = { ...sun, azimuth_deg: sun.azimuth_deg.map((azimuth) => (360 - azimuth) % 360) }
  const east = repeatingYear(assemble(earthRoom({ windows: [window(90, 6)] }), climate, cache, sun)).trace
  const west = repeatingYear(
    assemble(earthRoom({ windows: [window(270, 6)] }), climate, cache, mirroredSun),
  ).trace
  expect(largest(east.operative_C.map((value, hour) => value - west.operative_C[hour]))).toBeLessThan(1e-9)
})

test('linear: twice the sun through the glass does twice as much while nothing switches', () => {
  const [none, half, whole] = [0, 0.5, 1].map(
    (passes) =>
      year(earthRoom({ windows: [window(180, 6, { shade: { passes, months: allMonths } })] }), weather())
        .operative_C,
  )
  const first = half.map((value, hour) => value - none[hour])
  const second = whole.map((value, hour) => value - half[hour])
  expect(largest(first)).toBeGreaterThan(1.5)
  expect(largest(first.map((value, hour) => value - second[hour]))).toBeLessThan(0.02)
})

test('linear: gains of 400 W warm the room twice as much as gains of 200 W', () => {
  const [none, some, more] = [0, 200, 400].map(
    (power) =>
      year(
        earthRoom({
          gains: { convective_W: Array(24).fill(power * 0.5), radiative_W: Array(24).fill(power * 0.5) },
        }),
        weather(),
      ).operative_C,
  )
  const first = some.map((value, hour) => value - none[hour])
  const second = more.map((value, hour) => value - some[hour])
  expect(largest(first)).toBeGreaterThan(1)
  expect(largest(first.map((value, hour) => value - second[hour]))).toBeLessThan(0.03)
})

test('the same input gives the same output to the last bit', () => {
  const model = bermedHouse({}, { heating: heated })
  const once = year(model, weather())
  const again = repeatingYear(assemble(model, weather())).trace
  expect(again.operative_C).toEqual(once.operative_C)
  expect(again.heating_W).toEqual(once.heating_W)
})

test('other hemisphere: the house turned round, the climate shifted by half a year, gives the same year but for the orbit', () => {
  const shift_h = 182 * 24
  const shift = (values: Float64Array) => values.map((_, hour) => values[(hour + shift_h) % HOURS])
  const north = weather({ latitude_deg: 40 })
  const south: ClimateYear = {
    ...north,
    place: { ...north.place, latitude_deg: -40 },
    outdoor_C: shift(north.outdoor_C),
    sky_C: shift(north.sky_C),
    global_Wm2: shift(north.global_Wm2),
    beam_Wm2: shift(north.beam_Wm2),
    diffuse_Wm2: shift(north.diffuse_Wm2),
  }
  const inNorth = year(earthRoom({ windows: [window(180, 6)] }), north).operative_C
  const inSouth = year(earthRoom({ windows: [window(0, 6)] }), south).operative_C
  const dark = year(earthRoom({ windows: [window(180, 6)] }), weather({ sun_Wm2: 0 })).operative_C
  const mean = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0) / HOURS
  const difference = inNorth.map((value, hour) => value - inSouth[(hour + HOURS - shift_h) % HOURS])
  // The orbit makes the northern half-year of high sun 7.6 days longer than the southern one, so about
  // 7.6/365 of what the sun does to the room comes at the other height. At single hours the dates of
  // equal sun are up to five days, the clock up to twenty minutes apart: 1 K.
  const sunWarms_K = mean(inNorth) - mean(dark)
  expect(sunWarms_K).toBeGreaterThan(2)
  expect(Math.abs(mean(difference))).toBeLessThan((7.6 / 365) * sunWarms_K)
  expect(largest(difference)).toBeLessThan(1)
})
