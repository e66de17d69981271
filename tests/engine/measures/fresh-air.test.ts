import { expect, test } from 'vitest'
import { freshAir } from '#engine/measures/fresh-air.ts'
import { series } from './make-trace.ts'

const CFM_LS = 0.471947
const dwelling = {
  people: 4,
  bedrooms: 3,
  floorArea_m2: 1000 * 0.09290304,
  volume_m3: 8000 * 0.028316846592,
}

test('1,000 ft², three bedrooms, 8 ft high: 60 cfm by its people, 47 by 0.35 air changes, 40 before 2013, 60 from 2013 (ASHRAE 62, 62.2)', () => {
  const least = freshAir(series(0.02), dwelling).rules.map(({ least_Ls }) => least_Ls / CFM_LS)
  expect(least[0]).toBeCloseTo(60, 3) // 15 cfm for each of four is more than 46.7
  expect(least[1]).toBeCloseTo(40, 3)
  expect(least[2]).toBeCloseTo(60, 3)
  expect(freshAir(series(0.02), { ...dwelling, people: 2 }).rules[0].least_Ls / CFM_LS).toBeCloseTo(46.667, 2)
})

test('20 L/s for four people are 5 L/s each, below the 7 L/s of EN 16798-1 in all hours', () => {
  const found = freshAir(series(0.02), dwelling)
  expect(found.perPerson_Ls[3]).toBeCloseTo(5, 9)
  expect(found.rules[3]).toMatchObject({ least_Ls: 28, below_h: 8760 })
  expect(found.rules[3].monthsBelow).toHaveLength(12)
  expect(found.changes_h[0]).toBeCloseTo((0.02 * 3600) / dwelling.volume_m3, 9)
})

test('the least hour and the hours below are those that were closed', () => {
  const flow = series((hour) => (hour < 100 ? 0.004 : 0.04))
  const found = freshAir(flow, dwelling)
  expect(found.leastHour_Ls).toBeCloseTo(1, 9)
  expect(found.rules[3].below_h).toBe(100)
  expect(found.rules[3].monthsBelow).toEqual([])
})

test('throws RangeError for a dwelling without people', () => {
  expect(() => freshAir(series(0.02), { ...dwelling, people: 0 })).toThrow(RangeError)
})
