import fc from 'fast-check'
import { expect, test } from 'vitest'
import { damp, minimumSurface, temperatureFactor } from '#engine/measures/damp.ts'
import { indoorVapour } from '#engine/measures/indoor-vapour.ts'
import {
  humidityRatio,
  moistAirVolume,
  saturationPressureIso13788,
  vapourPressureOfDewPoint,
  vapourPressureOfRatio,
} from '#engine/measures/moist-air.ts'
import { makeClimate, makeSurface, makeTrace, series } from './make-trace.ts'

const steady = (kgh: number) => ({ vapour_kgh: new Array(24).fill(kgh), volume_m3: 125, buffer: 1 })

test('20 °C at 50 % asks for a surface of 12.62 °C, fRsi 0.705 at -5 °C and 0.631 at 0 °C (ISO 13788; DIN 4108-2: 12.6 °C, 0.70)', () => {
  const surface = minimumSurface(0.5 * saturationPressureIso13788(20))
  expect(Math.abs(surface - 12.62)).toBeLessThan(0.02)
  expect(temperatureFactor(surface, 20, -5)).toBeCloseTo(0.705, 3)
  expect(temperatureFactor(surface, 20, 0)).toBeCloseTo(0.631, 3)
  expect(temperatureFactor(19, 20, 16)).toBeNull()
})

test('steady sources settle at W = W_out + G / (ρ Q) (ISO 13788, 4.3.2, mass balance)', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 0.4, noNaN: true }),
      fc.double({ min: 0.02, max: 0.1, noNaN: true }),
      (kgh, flow) => {
        const climate = makeClimate({ dewPoint_C: series(2) })
        const found = indoorVapour(series(20), series(flow), climate, steady(kgh), 0)
        const outdoor = humidityRatio(vapourPressureOfDewPoint(2), 101325)
        const density = 1 / moistAirVolume(20, outdoor, 101325)
        const expected = vapourPressureOfRatio(outdoor + kgh / 3600 / (density * flow), 101325)
        expect(found[8000]).toBeCloseTo(Math.min(expected, saturationPressureIso13788(20)), 6)
      },
    ),
    { numRuns: 10 },
  )
})

test('without sources the room takes on the outdoor vapour pressure, and without any air it saturates and no more', () => {
  const climate = makeClimate({ dewPoint_C: series(7) })
  expect(indoorVapour(series(20), series(0.02), climate, steady(0), 0)[5000]).toBeCloseTo(
    vapourPressureOfDewPoint(7),
    6,
  )
  expect(indoorVapour(series(18), series(0), climate, steady(0.2), 0)[5000]).toBeCloseTo(
    saturationPressureIso13788(18),
    6,
  )
})

test('buffering flattens the day and leaves the mean alone', () => {
  const climate = makeClimate({ dewPoint_C: series(2) })
  const evening = Array.from({ length: 24 }, (_, hour) => (hour >= 18 && hour < 22 ? 0.6 : 0.05))
  const of = (buffer: number) =>
    indoorVapour(series(22), series(0.03), climate, { vapour_kgh: evening, volume_m3: 125, buffer }, 0)
  const day = (values: Float64Array) => [...values.slice(4800, 4824)]
  const range = (values: number[]) => Math.max(...values) - Math.min(...values)
  const mean = (values: number[]) => values.reduce((a, b) => a + b) / 24
  expect(range(day(of(8)))).toBeLessThan(0.6 * range(day(of(1))))
  expect(mean(day(of(8))) / mean(day(of(1)))).toBeCloseTo(1, 2)
})

test('a humid summer sweats on a 16 °C floor when aired, in July and not in January, and the month is flagged', () => {
  const isJuly = (hour: number) => hour >= 181 * 24 && hour < 212 * 24
  const climate = makeClimate({
    outdoor_C: series((hour) => (isJuly(hour) ? 28 : 0)),
    dewPoint_C: series((hour) => (isJuly(hour) ? 20 : -6)),
  })
  const trace = makeTrace({
    surfaces: [
      makeSurface({ name: 'floor', temperature_C: series(16) }),
      makeSurface({ name: 'ceiling', part: 'ceiling', temperature_C: series(25) }),
    ],
  })
  const found = damp(trace, climate, steady(0.05))
  const [floor, ceiling] = found.surfaces
  expect(floor.aired.condensation_h[6]).toBe(744)
  expect(floor.aired.condensation_h[0]).toBe(0)
  expect(floor.flaggedAired).toEqual([7])
  // By hand: e(20 °C) 2337 Pa over e(25 °C) 3165.9 Pa = 74 %.
  expect(ceiling.aired.humidity[6]).toBeCloseTo(2337 / 3165.9, 3)
  expect(ceiling.flaggedAired).toEqual([])
  expect(found.worst).toMatchObject({ surface: 'floor', month: 7 })
  expect(found.flagged).toContainEqual(expect.objectContaining({ month: 7, aired: ['floor'] }))
  expect(floor.fRsi[6]).toBeNull()
  expect(floor.fRsi[0]).toBeCloseTo(16 / 20, 9)
})

test('80 % at the face is flagged before anything condenses', () => {
  const trace = makeTrace({ surfaces: [makeSurface({ temperature_C: series(12) })] })
  // e = 0.85 e_sat(12 °C): outdoors at that dew point, no sources.
  const climate = makeClimate({ dewPoint_C: series(9.57) })
  const [floor] = damp(trace, climate, steady(0)).surfaces
  expect(floor.closed.humidity[0]).toBeGreaterThan(0.84)
  expect(floor.flaggedClosed).toHaveLength(12)
  expect(floor.closed.over80_h[0]).toBe(744)
  expect(floor.closed.condensation_h[0]).toBe(0)
})

test('a single pane at -10 °C outdoors stands at 20 - 5.6 · 0.13 · 30 = -1.84 °C and sweats at 35 % indoors', () => {
  const climate = makeClimate({ outdoor_C: series(-10), dewPoint_C: series(4) })
  const found = damp(makeTrace(), climate, steady(0), [{ name: 'south', u_Wm2K: 5.6 }])
  const glass = found.surfaces.at(-1)!
  expect(glass.part).toBe('glass')
  expect(glass.fRsi[0]).toBeCloseTo(1 - 5.6 * 0.13, 6)
  expect(glass.closed.condensation_h[0]).toBe(744)
  expect(found.worst!.surface).toBe('floor') // glass does not stand for mould
})
