import { expect, test } from 'vitest'
import { siUnits, usUnits } from '#modelling/units.ts'

const us = await usUnits()

test('temperatures and differences convert apart: 20 °C is 68 °F, 5 K are 9 °F', () => {
  expect(us.temperature(20)).toBe('68 °F')
  expect(us.temperature(-40)).toBe('-40 °F')
  expect(us.difference(5)).toBe('9.0 °F')
  expect(siUnits.temperature(-0.04)).toBe('0.0 °C')
})

test('lengths as builders say them: 1.93 m is 6 ft 4 in, 114.3 mm are 4 1/2 in (1 in = 25.4 mm)', () => {
  expect(us.length(1.93)).toBe(`6'-4"`)
  expect(us.length(0.1143)).toBe('4 1/2"')
  expect(us.length(0.3048)).toBe(`1'-0"`)
  expect(us.length(-0.6096)).toBe(`-2'-0"`)
})

test('R 10 h ft² °F/Btu is 1.761 m² K/W, U 1 W/(m² K) is 0.176 Btu/(h ft² °F)', () => {
  expect(us.resistance(1.7611)).toBe('R 10')
  expect(us.uValue(1)).toBe('U 0.176')
})

test('293.07 kWh are a million Btu, 1 kW is 3,412 Btu/h, 0.4719 L/s are 1 cfm', () => {
  expect(us.heat(293.07)).toBe('1.0 million Btu')
  expect(us.power(1000)).toBe('3,400 Btu/h')
  expect(us.airFlow(4.719)).toBe('10 cfm')
})

test('a year’s heat and wood are rounded to tens', () => {
  expect(siUnits.heat(2017)).toBe('2,020 kWh')
  expect(siUnits.wood({ mass_kg: 743, steres: 1.62, cords: 0.45 })).toBe('740 kg of wood (1.6 steres)')
  expect(us.wood({ mass_kg: 1690, steres: 3.62, cords: 1 })).toBe('1.0 cord of wood (3,730 lb)')
})
