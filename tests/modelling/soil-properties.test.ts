import { expect, test } from 'vitest'
import { johansen, kerstenClay, kerstenSand, volumetricHeat } from '#modelling/soil-properties.ts'
import { soilChecks } from '../../server/evidence/soils.checks.ts'
import { evidenceInputs } from '../../server/evidence/inputs.ts'
import type { Check } from '../../server/evidence/check.ts'

test('clay with 10 % water at 1600 kg/m³ has 1.007 W/(m K), sand with 4 % at 1700 has 1.364 (Kersten 1949)', () => {
  expect(kerstenClay(10, 1600)).toBeCloseTo(1.007, 3)
  expect(kerstenSand(4, 1700)).toBeCloseTo(1.364, 3)
})

test('dry is dry and full is full: the ends of the course (Johansen 1975)', () => {
  expect(johansen(0, 1500, 0.4, 'fine')).toBeCloseTo(0.209, 3)
  expect(johansen(1, 1500, 0.4, 'fine')).toBeCloseTo(1.545, 3)
})

test('soil of 1500 kg/m³ with 10 % water holds 1.888 MJ/(m³ K)', () => {
  expect(volumetricHeat(10, 1500)).toBeCloseTo(1.888e6, -3)
})

test('outside their validity the formulas throw RangeError and name the value', () => {
  expect(() => kerstenClay(3, 1500)).toThrow(/water_percent must be at least 7, got 3/)
  expect(() => kerstenSand(0.5, 1500)).toThrow(/water_percent must be at least 1, got 0.5/)
  expect(() => johansen(1.2, 1500, 0.4, 'fine')).toThrow(/saturation must be 0 to 1, got 1.2/)
  expect(() => johansen(0.5, 2700, 0.4, 'fine')).toThrow(/leaves no pores/)
})

test('every check of the soils holds, and none is left out', () => {
  const checks = soilChecks.run(evidenceInputs) as readonly Check[]
  expect(checks.filter(({ holds }) => !holds)).toEqual([])
  expect(checks).toHaveLength(25)
})
