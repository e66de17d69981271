import { expect, test } from 'vitest'
import { dayText, listText, monthsText } from '#modelling/dates.ts'

test('days and months read as people write them', () => {
  expect(dayText({ month: 1, day: 20 })).toBe('20 January')
  expect(monthsText([3])).toBe('March')
  expect(monthsText([3, 4])).toBe('March and April')
  expect(monthsText([1, 2, 3, 4, 10, 11, 12])).toBe('October to April')
  expect(monthsText([1, 3, 5, 7])).toBe('January, March, May and July')
  expect(listText(['a', 'b', 'c'])).toBe('a, b and c')
})
