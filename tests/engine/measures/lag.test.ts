import fc from 'fast-check'
import { expect, test } from 'vitest'
import { firstHarmonic } from '#engine/climate/harmonic.ts'
import { lagBehind, lags } from '#engine/measures/lag.ts'
import { makeClimate, makeSurface, makeTrace, series, yearWave } from './make-trace.ts'

test('the lag of a shifted yearly sine is the shift, the damping the ratio of the amplitudes', () => {
  fc.assert(
    fc.property(
      fc.double({ min: -90, max: 270, noNaN: true }),
      fc.double({ min: 0.1, max: 15, noNaN: true }),
      (shift_d, amplitude) => {
        const climate = makeClimate({ outdoor_C: yearWave(8, 10, 200, 1) })
        const trace = makeTrace({ operative_C: yearWave(18, amplitude, 200 + shift_d) })
        const room = lags(trace, climate).find((line) => line.kind === 'room')!
        expect(room.behindAir_d).toBeCloseTo(shift_d, 6)
        expect(room.damping).toBeCloseTo(amplitude / 10, 9)
      },
    ),
    { numRuns: 15 },
  )
})

test('lag counts from a quarter year early to three quarters late', () => {
  const at = (day: number) => firstHarmonic(yearWave(0, 1, day, 1))
  expect(lagBehind(at(110), at(200))).toBeCloseTo(-90, 6)
  expect(lagBehind(at(100), at(200))).toBeCloseTo(265, 6)
})

test('faces and probes are measured behind air and sun, heat probes are not temperatures', () => {
  const trace = makeTrace({
    operative_C: yearWave(20, 3, 230),
    surfaces: [makeSurface({ name: 'north wall', temperature_C: yearWave(18, 2.4, 245) })],
    probes: [
      { name: 'berm 2 m', element: 'ground', value: yearWave(12, 5, 260, 1) },
      { name: 'heat:store', element: 'ground', value: series(1e9) },
    ],
  })
  const lines = lags(trace, makeClimate()) // air warmest on day 200, sun on day 172
  expect(lines.map((line) => line.name)).toEqual([
    'outdoor air',
    'global horizontal radiation',
    'room',
    'north wall',
    'ground: berm 2 m',
  ])
  const berm = lines.at(-1)!
  expect(berm.behindAir_d).toBeCloseTo(60, 6)
  expect(berm.behindSun_d).toBeCloseTo(88, 6)
  expect(berm.damping).toBeCloseTo(5 / 12, 9)
  expect(berm.perSun).toBeCloseTo(0.05, 9)
  expect(berm.warmest).toEqual({ month: 9, day: 18 })
  expect(lines[3].behindAir_d).toBeCloseTo(45, 6)
})
