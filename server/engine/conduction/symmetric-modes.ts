/** Eigenvalues, ascending, and orthonormal eigenvectors: component i of vector k at `vectors[i * size + k]`. */
export interface SymmetricModes {
  readonly values: Float64Array
  readonly vectors: Float64Array
}

const MOST_SWEEPS = 60

/**
 * Eigenvalues and eigenvectors of a small symmetric positive definite matrix by cyclic Jacobi rotations.
 *
 * Heat leaves deep ground a million times more slowly than a thin layer, and books must still balance for
 * the slow modes: Jacobi with a relative threshold finds small eigenvalues to high relative accuracy where
 * methods that first make the matrix tridiagonal leave an error of 1e-16 of the largest one.
 * Source: J. Demmel and K. Veselić, Jacobi's method is more accurate than QR, SIAM J. Matrix Analysis 13,
 * 1992; rotations after H. Rutishauser, Numerische Mathematik 9, 1966 (both from memory).
 *
 * @param matrix full, row by row, size × size; not changed
 * @throws RangeError when it does not come to rest or a value is not a number
 */
export function symmetricModes(matrix: Float64Array, size: number): SymmetricModes {
  const a = Float64Array.from(matrix)
  // Rows are eigenvectors while rotating, so that both updates run along rows.
  const v = new Float64Array(size * size)
  for (let i = 0; i < size; i++) v[i * size + i] = 1
  let isAtRest = false
  for (let sweep = 0; sweep < MOST_SWEEPS && !isAtRest; sweep++) {
    isAtRest = true
    for (let p = 0; p < size - 1; p++)
      for (let q = p + 1; q < size; q++) {
        const off = a[p * size + q]
        const [app, aqq] = [a[p * size + p], a[q * size + q]]
        if (!(Math.abs(off) > 1e-16 * Math.sqrt(Math.abs(app * aqq)))) continue
        isAtRest = false
        const theta = (aqq - app) / (2 * off)
        const t = (theta < 0 ? -1 : 1) / (Math.abs(theta) + Math.sqrt(theta * theta + 1))
        const c = 1 / Math.sqrt(t * t + 1)
        const s = t * c
        rotateRows(a, p * size, q * size, size, c, s)
        for (let i = 0; i < size; i++) {
          a[i * size + p] = a[p * size + i]
          a[i * size + q] = a[q * size + i]
        }
        a[p * size + p] = app - t * off
        a[q * size + q] = aqq + t * off
        a[p * size + q] = 0
        a[q * size + p] = 0
        rotateRows(v, p * size, q * size, size, c, s)
      }
  }
  if (!isAtRest) throw new RangeError('The eigenvalues of a reduced system were not found.')
  const order = Array.from({ length: size }, (_, k) => k).sort((i, j) => a[i * size + i] - a[j * size + j])
  const values = Float64Array.from(order, (k) => a[k * size + k])
  if (!values.every(Number.isFinite))
    throw new RangeError('A reduced system holds a value that is no number.')
  const vectors = new Float64Array(size * size)
  order.forEach((from, k) => {
    for (let i = 0; i < size; i++) vectors[i * size + k] = v[from * size + i]
  })
  return { values, vectors }
}

function rotateRows(m: Float64Array, p: number, q: number, size: number, c: number, s: number): void {
  for (let i = 0; i < size; i++) {
    const x = m[p + i]
    const y = m[q + i]
    m[p + i] = c * x - s * y
    m[q + i] = s * x + c * y
  }
}
