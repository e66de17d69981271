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
  out: Float64Array = new Float64Array(matrix.size),
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
  const inverse = new Float64Array(size)
  for (let i = 0; i < size; i++) {
    const first = Math.max(0, i - halfWidth)
    const row = i * stride + halfWidth - i
    let j = first
    // Two columns and two sums at a time: each number read is used twice, and additions need not wait.
    for (; j + 1 < i; j += 2) {
      const left = j * stride + halfWidth - j
      const right = left + stride - 1
      let a = l[row + j]
      let b = l[row + j + 1]
      let a2 = 0
      let b2 = 0
      let k = first
      for (; k + 1 < j; k += 2) {
        const x = l[row + k]
        const y = l[row + k + 1]
        a -= x * l[left + k]
        b -= x * l[right + k]
        a2 -= y * l[left + k + 1]
        b2 -= y * l[right + k + 1]
      }
      if (k < j) {
        const x = l[row + k]
        a -= x * l[left + k]
        b -= x * l[right + k]
      }
      const value = (a + a2) * inverse[j]
      l[row + j] = value
      l[row + j + 1] = (b + b2 - value * l[right + j]) * inverse[j + 1]
    }
    for (; j < i; j++) {
      const left = j * stride + halfWidth - j
      l[row + j] = (l[row + j] - dotAt(l, row + first, l, left + first, j - first)) * inverse[j]
    }
    const square = l[row + i] - dotAt(l, row + first, l, row + first, i - first)
    if (!(square > 0)) throw new RangeError(`The conductance matrix is not positive definite (row ${i}).`)
    l[row + i] = Math.sqrt(square)
    inverse[i] = 1 / l[row + i]
  }
  return { size, halfWidth, data: l }
}

/** Solves L Lᵀ x = b in place. */
export function choleskySolve(factor: BandMatrix, x: Float64Array): Float64Array {
  const { size, halfWidth, data } = factor
  const stride = halfWidth + 1
  for (let i = 0; i < size; i++) {
    const at = i * stride + halfWidth - i
    const from = Math.max(0, i - halfWidth)
    const value = x[i] - dotAt(data, at + from, x, from, i - from)
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

/** Solves L Lᵀ x = b in place for several right-hand sides, two at a time so that the factor is read half as often. */
export function choleskySolveAll(factor: BandMatrix, columns: readonly Float64Array[]): void {
  for (let n = 0; n + 1 < columns.length; n += 2) solvePair(factor, columns[n], columns[n + 1])
  if (columns.length % 2 === 1) choleskySolve(factor, columns[columns.length - 1])
}

function solvePair({ size, halfWidth, data }: BandMatrix, x: Float64Array, y: Float64Array): void {
  const stride = halfWidth + 1
  for (let i = 0; i < size; i++) {
    const at = i * stride + halfWidth - i
    let a = x[i]
    let b = y[i]
    let a2 = 0
    let b2 = 0
    let k = Math.max(0, i - halfWidth)
    for (; k + 1 < i; k += 2) {
      const l = data[at + k]
      const l2 = data[at + k + 1]
      a -= l * x[k]
      b -= l * y[k]
      a2 -= l2 * x[k + 1]
      b2 -= l2 * y[k + 1]
    }
    if (k < i) {
      a -= data[at + k] * x[k]
      b -= data[at + k] * y[k]
    }
    const inverse = 1 / data[at + i]
    x[i] = (a + a2) * inverse
    y[i] = (b + b2) * inverse
  }
  for (let i = size - 1; i >= 0; i--) {
    const at = i * stride + halfWidth - i
    const inverse = 1 / data[at + i]
    const a = x[i] * inverse
    const b = y[i] * inverse
    x[i] = a
    y[i] = b
    for (let k = Math.max(0, i - halfWidth); k < i; k++) {
      const l = data[at + k]
      x[k] -= l * a
      y[k] -= l * b
    }
  }
}

/** Σ a[i + n] b[j + n] in four sums side by side, which a processor adds at once. */
export function dotAt(a: Float64Array, i: number, b: Float64Array, j: number, length: number): number {
  let s0 = 0
  let s1 = 0
  let s2 = 0
  let s3 = 0
  const whole = length - (length & 3)
  for (let n = 0; n < whole; n += 4) {
    s0 += a[i + n] * b[j + n]
    s1 += a[i + n + 1] * b[j + n + 1]
    s2 += a[i + n + 2] * b[j + n + 2]
    s3 += a[i + n + 3] * b[j + n + 3]
  }
  for (let n = whole; n < length; n++) s0 += a[i + n] * b[j + n]
  return s0 + s1 + (s2 + s3)
}
