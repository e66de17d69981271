import { expect, test } from 'vitest'
import { minus, times } from '#engine/conduction/complex.ts'
import { periodicProperties, swingHeatCapacity, usefulDepth } from '#engine/conduction/periodic.ts'
import { EARTH_WALL, layer } from './make-systems.ts'

const FILMS = { inside: 0.13, outside: 0.04 }

test('det Z = 1 for any construction (ISO 13786, clause 7)', () => {
  for (const period_s of [86400, 365 * 86400]) {
    const [a, b, c, d] = periodicProperties(EARTH_WALL.layers, FILMS, period_s).matrix
    const [re, im] = minus(times(a, d), times(b, c))
    expect(re).toBeCloseTo(1, 8)
    expect(im).toBeCloseTo(0, 8)
  }
})

test('very slow swings pass as steady heat does, fast ones hardly at all', () => {
  const slow = periodicProperties(EARTH_WALL.layers, FILMS, 1e12)
  expect(slow.through.size / slow.u_Wm2K).toBeCloseTo(1, 6)
  expect(slow.decrement).toBeCloseTo(1, 6)
  expect(periodicProperties(EARTH_WALL.layers, FILMS, 3600).decrement).toBeLessThan(0.001)
})

test('turning a wall round swaps its sides and leaves what passes through', () => {
  const there = periodicProperties(EARTH_WALL.layers, FILMS)
  const back = periodicProperties([...EARTH_WALL.layers].reverse(), { inside: 0.04, outside: 0.13 })
  expect(back.through.size).toBeCloseTo(there.through.size, 10)
  expect(back.through.ahead_s).toBeCloseTo(there.through.ahead_s, 4)
  expect(back.inside.size).toBeCloseTo(there.outside.size, 8)
  expect(back.outsideCapacity_Jm2K).toBeCloseTo(there.insideCapacity_Jm2K, 4)
})

test('the first layer serves the day, the soil behind it the year', () => {
  const layers = [layer(6, 1.2, 2e6), layer(0.15, 0.8, 1.7e6)]
  const [soil, earth] = usefulDepth(layers, { kind: 'endless' })
  expect(earth.day_Whm2K).toBeGreaterThan(soil.day_Whm2K)
  expect(soil.year_Whm2K).toBeGreaterThan(10 * earth.year_Whm2K)
})

test('a thin layer over an adiabatic back holds ρ c d for each kelvin of swing', () => {
  expect(swingHeatCapacity([layer(0.01, 0.6, 1.6e6)])).toBeCloseTo((0.01 * 1.6e6) / 3600, 3)
  const [plaster] = usefulDepth([layer(0.01, 0.6, 1.6e6)], { kind: 'film', film_Wm2K: 0 })
  expect(plaster.day_Whm2K).toBeCloseTo((0.01 * 1.6e6) / 3600, 3)
})

test('throws RangeError for no layer, a bad value, a period that is not more than 0, or a wall too thick', () => {
  expect(() => periodicProperties([], FILMS)).toThrow('layers')
  expect(() => periodicProperties([layer(0, 1, 1e6)], FILMS)).toThrow('layers[0]')
  expect(() => periodicProperties([layer(1, 1, 1e6)], { inside: -1, outside: 0 })).toThrow(
    'surface resistance',
  )
  expect(() => periodicProperties([layer(1, 1, 1e6)], FILMS, 0)).toThrow('period_s')
  expect(() => periodicProperties([layer(500, 1, 2e6)], FILMS)).toThrow('too thick')
})
