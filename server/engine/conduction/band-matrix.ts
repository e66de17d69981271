import type { BandMatrix } from './thermal-system.ts'

/** An empty band matrix; see BandMatrix for its storage. */
export function bandMatrix(size: number, halfWidth: number): BandMatrix {
  return { size, halfWidth, data: new Float64Array(size * (halfWidth + 1)) }
}

/**
 * Adds a value at (i, j), and so at (j, i).
 *
 * @throws RangeError when the entry lies outside the band
 */
export function addAt(matrix: BandMatrix, i: number, j: number, value: number): void {
  const row = Math.max(i, j)
  const column = Math.min(i, j)
  const { halfWidth } = matrix
  if (row - column > halfWidth)
    throw new RangeError(`Entry (${i}, ${j}) lies outside the band of ${halfWidth}.`)
  matrix.data[row * (halfWidth + 1) + column - row + halfWidth] += value
}

/** Matrix times vector, into out. */
export function bandTimes(
  matrix: BandMatrix,
  x: Float64Array,
  out = new Float64Array(matrix.size),
): Float64Array {
  const { size, halfWidth, data } = matrix
  const stride = halfWidth + 1
  out.fill(0)
  for (let i = 0; i < size; i++) {
    const first = Math.max(0, i - halfWidth)
    const xi = x[i]
    let sum = 0
    for (let j = first, at = i * stride + first - i + halfWidth; j < i; j++, at++) {
      const value = data[at]
      sum += value * x[j]
      out[j] += value * xi
    }
    out[i] += sum + data[i * stride + halfWidth] * xi
  }
  return out
}

/**
 * Cholesky factor L of K + shift · C within the band, L Lᵀ (row by row; the band fills itself).
 *
 * @param matrix   K, symmetric positive definite
 * @param diagonal C, length size; null for none
 * @throws RangeError when the matrix is not positive definite
 */
export function choleskyFactor(
  matrix: BandMatrix,
  diagonal: Float64Array | null = null,
  shift = 0,
): BandMatrix {
  const { size, halfWidth } = matrix
  const stride = halfWidth + 1
  const l = Float64Array.from(matrix.data)
  if (diagonal) for (let i = 0; i < size; i++) l[i * stride + halfWidth] += shift * diagonal[i]
  for (let i = 0; i < size; i++) {
    const first = Math.max(0, i - halfWidth)
    const rowAt = i * stride + halfWidth - i
    for (let j = first; j <= i; j++) {
      const otherAt = j * stride + halfWidth - j
      let value = l[rowAt + j]
      for (let k = Math.max(first, j - halfWidth); k < j; k++) value -= l[rowAt + k] * l[otherAt + k]
      if (j < i) l[rowAt + j] = value / l[otherAt + j]
      else if (value > 0) l[rowAt + i] = Math.sqrt(value)
      else throw new RangeError(`The conductance matrix is not positive definite (row ${i}).`)
    }
  }
  return { size, halfWidth, data: l }
}

/** Solves L Lᵀ x = b in place. */
export function choleskySolve(factor: BandMatrix, x: Float64Array): Float64Array {
  const { size, halfWidth, data } = factor
  const stride = halfWidth + 1
  for (let i = 0; i < size; i++) {
    const at = i * stride + halfWidth - i
    let value = x[i]
    for (let k = Math.max(0, i - halfWidth); k < i; k++) value -= data[at + k] * x[k]
    x[i] = value / data[at + i]
  }
  for (let i = size - 1; i >= 0; i--) {
    const at = i * stride + halfWidth - i
    const value = x[i] / data[at + i]
    x[i] = value
    for (let k = Math.max(0, i - halfWidth); k < i; k++) x[k] -= data[at + k] * value
  }
  return x
}
