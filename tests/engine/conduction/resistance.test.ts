import { expect, test } from 'vitest'
import { uValue } from '#engine/live.ts'
import { airLayerResistance, combinedResistance } from '#engine/conduction/resistance.ts'

test('one layer: U = 1 / (0.13 + d/λ + 0.04) (ISO 6946, surface resistances for horizontal flow)', () => {
  expect(uValue([{ thickness_m: 0.4, conductivity_WmK: 0.8 }])).toBeCloseTo(1 / (0.13 + 0.5 + 0.04), 12)
})

test('the combined method of layers without bridges is their plain resistance (ISO 6946, 6.7.2)', () => {
  const whole = { thickness_m: 0.4, parts: [{ share: 1, conductivity_WmK: 0.8 }] }
  const found = combinedResistance([whole])
  expect(found.upper_m2KW).toBeCloseTo(0.67, 12)
  expect(found.lower_m2KW).toBeCloseTo(0.67, 12)
  expect(found.largestError).toBeCloseTo(0, 12)
})

test('a bridge lies between its limits and below the wall without it', () => {
  const parts = [
    { share: 0.1, conductivity_WmK: 50 },
    { share: 0.9, conductivity_WmK: 0.04 },
  ]
  const found = combinedResistance([{ thickness_m: 0.1, parts }])
  expect(found.lower_m2KW).toBeLessThan(found.mean_m2KW)
  expect(found.mean_m2KW).toBeLessThan(found.upper_m2KW)
  expect(found.upper_m2KW).toBeLessThan(0.17 + 0.1 / 0.04)
})

test('air layers are linear between rows (ISO 6946, Table 8: 10 mm 0.15, 15 mm 0.17 across)', () => {
  expect(airLayerResistance(0.0125, 'horizontal')).toBeCloseTo(0.16, 12)
})

test('throws RangeError naming what is out of range', () => {
  expect(() => uValue([{ thickness_m: -1, conductivity_WmK: 1 }])).toThrow('layers[0].thickness_m')
  expect(() => uValue([{ thickness_m: 1, conductivity_WmK: 0 }])).toThrow('layers[0].conductivity_WmK')
  expect(() => uValue([{ thickness_m: 1, conductivity_WmK: 1 }], { inside: -1, outside: 0 })).toThrow(
    'resistance',
  )
  expect(() => airLayerResistance(0.4, 'up')).toThrow('thickness_m')
  const half = { thickness_m: 0.1, parts: [{ share: 0.5, conductivity_WmK: 1 }] }
  expect(() => combinedResistance([half])).toThrow('layers[0].parts')
})
