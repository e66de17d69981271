/**
 * Anderson's acceleration of a fixed-point iteration x = g(x) (D. G. Anderson, Journal of the ACM
 * 12(4), 1965, type II): the next x is the combination of the last results whose residuals cancel best.
 */
export class FixedPointAccelerator {
  private readonly points: Float64Array[] = []
  private readonly residuals: Float64Array[] = []
  private readonly depth: number

  /** @param depth how many earlier iterations are remembered */
  constructor(depth = 5) {
    this.depth = depth
  }

  forget(): void {
    this.points.length = 0
    this.residuals.length = 0
  }

  /**
   * @param x  where the map was taken
   * @param gx its value there, same length
   * @returns the next x to try, a new array
   */
  next(x: Float64Array, gx: Float64Array): Float64Array {
    const residual = gx.map((value, i) => value - x[i])
    this.points.push(gx.slice())
    this.residuals.push(residual)
    if (this.points.length > this.depth + 1) {
      this.points.shift()
      this.residuals.shift()
    }
    const n = this.residuals.length - 1
    const next = gx.slice()
    if (n === 0) return next
    const steps = Array.from({ length: n }, (_, j) =>
      this.residuals[j + 1].map((value, i) => value - this.residuals[j][i]),
    )
    const weight = leastSquares(steps, residual)
    for (let j = 0; j < n; j++)
      for (let i = 0; i < next.length; i++) next[i] -= weight[j] * (this.points[j + 1][i] - this.points[j][i])
    return next
  }
}

/** Weights that bring Σ weight_j column_j nearest to target; dependent columns get weight 0. */
function leastSquares(columns: readonly Float64Array[], target: Float64Array): Float64Array {
  const basis: Float64Array[] = []
  const upper: number[][] = []
  const kept: number[] = []
  columns.forEach((column, j) => {
    const rest = column.slice()
    const scale = Math.sqrt(dot(column, column))
    const row = basis.map((unit) => {
      const part = dot(unit, rest)
      for (let i = 0; i < rest.length; i++) rest[i] -= part * unit[i]
      return part
    })
    const length = Math.sqrt(dot(rest, rest))
    if (!(length > 1e-10 * scale)) return
    basis.push(rest.map((value) => value / length))
    upper.push([...row, length])
    kept.push(j)
  })
  const weight = new Float64Array(columns.length)
  const right = basis.map((unit) => dot(unit, target))
  for (let j = kept.length - 1; j >= 0; j--) {
    let value = right[j]
    for (let l = j + 1; l < kept.length; l++) value -= upper[l][j] * weight[kept[l]]
    weight[kept[j]] = value / upper[j][j]
  }
  return weight
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i]
  return sum
}
