import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'
import { backupHeat } from '#engine/measures/backup-heat.ts'
import { CORD_M3, firewood, netHeatOfWood } from '#engine/measures/firewood.ts'
import { dryWood, series } from './make-trace.ts'

test('2,000 kWh of heat are under half a cord of dry hardwood (24 million Btu a cord, stove 65 %)', () => {
  const wood = firewood(2000, dryWood, 0.65)
  // By hand: 2,000 kWh = 6.824 million Btu; / (24 · 0.65) = 0.4375 cords.
  expect(wood.cords).toBeCloseTo(0.4375, 3)
  expect(wood.mass_kg).toBeCloseTo(7200 / 0.65 / 15, 6)
  expect(wood.steres).toBeCloseTo(wood.cords * CORD_M3, 9)
})

test('a cord is 128 cubic feet, 3.6246 m³', () => {
  expect(CORD_M3).toBeCloseTo(3.6246, 4)
})

test('wood of 18.5 MJ/kg dry matter with 20 % water gives 14.3 MJ/kg (EN ISO 18125 conversion)', () => {
  expect(netHeatOfWood(18.5, 0.2)).toBeCloseTo(14.31, 2)
})

test('the woods in the library hold together: ranges in order, heat values those of their dry matter, 1,300 to 1,900 kg a cord of hardwood', () => {
  const library = JSON.parse(readFileSync('data/fuels.json', 'utf8'))
  for (const wood of library.woods) {
    expect(wood.netHeat_MJkg.low).toBeLessThan(wood.netHeat_MJkg.typical)
    expect(wood.netHeat_MJkg.typical).toBeLessThan(wood.netHeat_MJkg.high)
    expect(wood.cordHeatProvenance).toBeTruthy()
  }
  const dry = library.woods.find(({ id }: { id: string }) => id === 'hardwood_dry')
  expect(dry.netHeat_MJkg.low).toBeCloseTo(netHeatOfWood(18.2, 0.2), 0)
  expect(dry.netHeat_MJkg.high).toBeCloseTo(netHeatOfWood(18.8, 0.15), 1)
  const cord_kg = (dry.cordHeat_MBtu.typical * 1055.06) / dry.netHeat_MJkg.typical
  expect(cord_kg).toBeGreaterThan(1300)
  expect(cord_kg).toBeLessThan(1900)
})

test('backup heat by month, its hours and its strongest hour', () => {
  const heating = series((hour) => (hour < 744 ? 1000 : 0))
  heating[30] = 2500
  const found = backupHeat(heating, dryWood, 0.65)
  expect(found.month_kWh[0]).toBeCloseTo(745.5, 9)
  expect(found.year_kWh).toBeCloseTo(745.5, 9)
  expect(found.hours).toBe(744)
  expect(found.peak).toEqual({ month: 1, day: 2, hour: 6, power_W: 2500 })
  expect(found.firewood.heat_kWh).toBe(found.year_kWh)
  expect(backupHeat(series(0), dryWood, 0.65).peak).toBeNull()
})

test('throws RangeError for a stove of no or more than full efficiency', () => {
  expect(() => firewood(1, dryWood, 0)).toThrow(RangeError)
  expect(() => firewood(1, dryWood, 1.2)).toThrow(RangeError)
})
