import { expect, test } from 'vitest'
import { complexFactor, complexSolve } from '#engine/conduction/band-complex.ts'
import {
  addAt,
  bandMatrix,
  bandTimes,
  choleskyFactor,
  choleskySolve,
  choleskySolveAll,
} from '#engine/conduction/band-matrix.ts'
import type { BandMatrix } from '#engine/conduction/thermal-system.ts'
import { seeded } from './make-systems.ts'

/** Conductances between neighbours near and far, and a little to the surroundings. */
function network(size: number, halfWidth: number, random: () => number): BandMatrix {
  const matrix = bandMatrix(size, halfWidth)
  for (let i = 0; i < size; i++) {
    addAt(matrix, i, i, 0.01 * random())
    for (const j of [i - 1, i - halfWidth + 1, i - halfWidth]) {
      if (j < 0 || j >= i) continue
      const conductance = random()
      addAt(matrix, i, i, conductance)
      addAt(matrix, j, j, conductance)
      addAt(matrix, i, j, -conductance)
    }
  }
  return matrix
}

for (const [size, halfWidth] of [
  [1, 0],
  [7, 1],
  [60, 5],
  [61, 12],
  [200, 45],
] as const)
  test(`solving and multiplying back returns the right-hand side, ${size} nodes, half width ${halfWidth}`, () => {
    const random = seeded(size)
    const matrix = network(size, halfWidth, random)
    const capacity = Float64Array.from({ length: size }, random)
    const right = Float64Array.from({ length: size }, () => random() - 0.5)
    const x = choleskySolve(choleskyFactor(matrix, capacity, 0.3), right.slice())
    const back = bandTimes(matrix, x).map((value, i) => value + 0.3 * capacity[i] * x[i])
    right.forEach((value, i) => expect(back[i]).toBeCloseTo(value, 11))
  })

test('three right-hand sides at once are solved as one by one', () => {
  const random = seeded(5)
  const factor = choleskyFactor(network(50, 6, random))
  const columns = [0, 1, 2].map(() => Float64Array.from({ length: 50 }, () => random() - 0.5))
  const one = columns.map((column) => choleskySolve(factor, column.slice()))
  choleskySolveAll(factor, columns)
  columns.forEach((column, c) => column.forEach((value, i) => expect(value).toBeCloseTo(one[c][i], 9)))
})

test('a steady sine solved in complex numbers satisfies (K + iωC) x = b', () => {
  const random = seeded(3)
  const matrix = network(80, 9, random)
  const capacity = Float64Array.from({ length: 80 }, random)
  const right = Float64Array.from({ length: 80 }, () => random() - 0.5)
  const re = right.slice()
  const im = new Float64Array(80)
  complexSolve(complexFactor(matrix, capacity, 0.7), re, im)
  const [kRe, kIm] = [bandTimes(matrix, re), bandTimes(matrix, im)]
  right.forEach((value, i) => {
    expect(kRe[i] - 0.7 * capacity[i] * im[i]).toBeCloseTo(value, 11)
    expect(kIm[i] + 0.7 * capacity[i] * re[i]).toBeCloseTo(0, 11)
  })
})

test('throws RangeError for a matrix that is not positive definite, and for an entry outside the band', () => {
  const matrix = bandMatrix(3, 1)
  for (let i = 0; i < 3; i++) addAt(matrix, i, i, 1)
  addAt(matrix, 1, 0, -2)
  expect(() => choleskyFactor(matrix)).toThrow(RangeError)
  expect(() => addAt(matrix, 0, 2, 1)).toThrow('outside the band')
})
