import type { BandMatrix } from './thermal-system.ts'

/** Real and imaginary parts of a complex band matrix, each stored as in BandMatrix. */
export interface ComplexBand {
  readonly size: number
  readonly halfWidth: number
  readonly re: Float64Array
  readonly im: Float64Array
}

/**
 * Factor L of K + iω C = L Lᵀ (without conjugation), for steady sines. K is positive definite, so every
 * pivot has a positive real part and no row need be exchanged.
 * Source: N. J. Higham, Factorizing complex symmetric matrices with positive definite real and imaginary
 * parts, Mathematics of Computation 67, 1998 (from memory).
 *
 * @param matrix    K
 * @param capacity  C, length size
 * @param omega_s   angular frequency [1/s]
 */
export function complexFactor(matrix: BandMatrix, capacity: Float64Array, omega_s: number): ComplexBand {
  const { size, halfWidth } = matrix
  const stride = halfWidth + 1
  const re = Float64Array.from(matrix.data)
  const im = new Float64Array(re.length)
  for (let i = 0; i < size; i++) im[i * stride + halfWidth] = omega_s * capacity[i]
  for (let i = 0; i < size; i++) {
    const first = Math.max(0, i - halfWidth)
    const row = i * stride + halfWidth - i
    for (let j = first; j <= i; j++) {
      const other = j * stride + halfWidth - j
      let x = re[row + j]
      let y = im[row + j]
      for (let k = Math.max(first, j - halfWidth); k < j; k++) {
        const a = re[row + k]
        const b = im[row + k]
        const c = re[other + k]
        const d = im[other + k]
        x -= a * c - b * d
        y -= a * d + b * c
      }
      if (j < i) {
        const c = re[other + j]
        const d = im[other + j]
        const square = c * c + d * d
        re[row + j] = (x * c + y * d) / square
        im[row + j] = (y * c - x * d) / square
      } else {
        const root = Math.sqrt(0.5 * (Math.hypot(x, y) + x))
        if (!(root > 0)) throw new RangeError(`The conductance matrix is not positive definite (row ${i}).`)
        re[row + i] = root
        im[row + i] = y / (2 * root)
      }
    }
  }
  return { size, halfWidth, re, im }
}

/** Solves L Lᵀ x = b in place; b and x are given by their real and imaginary parts. */
export function complexSolve(factor: ComplexBand, xRe: Float64Array, xIm: Float64Array): void {
  const { size, halfWidth, re, im } = factor
  const stride = halfWidth + 1
  const divide = (i: number, x: number, y: number) => {
    const c = re[i * stride + halfWidth]
    const d = im[i * stride + halfWidth]
    const square = c * c + d * d
    xRe[i] = (x * c + y * d) / square
    xIm[i] = (y * c - x * d) / square
  }
  for (let i = 0; i < size; i++) {
    const row = i * stride + halfWidth - i
    let x = xRe[i]
    let y = xIm[i]
    for (let k = Math.max(0, i - halfWidth); k < i; k++) {
      x -= re[row + k] * xRe[k] - im[row + k] * xIm[k]
      y -= re[row + k] * xIm[k] + im[row + k] * xRe[k]
    }
    divide(i, x, y)
  }
  for (let i = size - 1; i >= 0; i--) {
    const row = i * stride + halfWidth - i
    divide(i, xRe[i], xIm[i])
    const x = xRe[i]
    const y = xIm[i]
    for (let k = Math.max(0, i - halfWidth); k < i; k++) {
      xRe[k] -= re[row + k] * x - im[row + k] * y
      xIm[k] -= re[row + k] * y + im[row + k] * x
    }
  }
}
