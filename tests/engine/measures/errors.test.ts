import { expect, test } from 'vitest'
import { errorFigures } from '#engine/measures/errors.ts'

const measured = [100, 120, 90, 80, 60, 40, 30, 35, 50, 70, 95, 110]
const simulated = [104, 118, 93, 78, 63, 39, 32, 33, 52, 73, 91, 113]

test('NMBE and CV(RMSE) of a small sample, with p = 1 and p = 0 (ASHRAE Guideline 14)', () => {
  const tuned = errorFigures(measured, simulated, 1)
  expect(tuned.nmbe_pct).toBeCloseTo(-1.1157, 4)
  expect(tuned.cvRmse_pct).toBeCloseTo(3.8788, 4)
  const plain = errorFigures(measured, simulated, 0)
  expect(plain.nmbe_pct).toBeCloseTo(-1.0227, 4)
  expect(plain.cvRmse_pct).toBeCloseTo(3.7137, 4)
})

test('a simulation that is 2 K too warm throughout has a bias of -2 and an rmse of 2', () => {
  const found = errorFigures([10, 12, 14], [12, 14, 16])
  expect(found.bias).toBeCloseTo(-2, 12)
  expect(found.rmse).toBeCloseTo(2, 12)
})

test('a measured mean of 0 leaves the ratios out', () => {
  expect(errorFigures([-1, 1], [0, 0], 0)).toMatchObject({ nmbe_pct: null, cvRmse_pct: null })
})

test('throws RangeError for series of different lengths, too short ones and NaN', () => {
  expect(() => errorFigures([1, 2], [1])).toThrow(RangeError)
  expect(() => errorFigures([1], [1], 1)).toThrow(RangeError)
  expect(() => errorFigures([1, NaN], [1, 2])).toThrow(RangeError)
})
