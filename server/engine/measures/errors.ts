/** Error figures of a simulated series against a measured one. Differences are measured minus simulated. */
export interface ErrorFigures {
  readonly n: number
  /** Mean difference, in the unit of the series: positive when the simulation is too low. */
  readonly bias: number
  /** Root mean square difference with n as divisor, in the unit of the series. */
  readonly rmse: number
  /** Normalised mean bias error [%]; null when the measured mean is 0. */
  readonly nmbe_pct: number | null
  /** Coefficient of variation of the root mean square error [%]; null when the measured mean is 0. */
  readonly cvRmse_pct: number | null
}

/**
 * Error figures of ASHRAE Guideline 14 (2002 and 2014, section 5, (n - p) from memory):
 *
 *   NMBE = Σ(m - s) / ((n - p) m̄),   CV(RMSE) = √(Σ(m - s)² / (n - p)) / m̄
 *
 * They were written for energy. For temperatures use bias and rmse in K: a ratio to a Celsius mean
 * depends on where the scale has its zero.
 *
 * @param p number of adjusted parameters in the divisor: 1 for a tuned model, 0 for the plain mean
 * @throws RangeError for series of different lengths, or not more than p values
 */
export function errorFigures(
  measured: ArrayLike<number>,
  simulated: ArrayLike<number>,
  p: 0 | 1 = 1,
): ErrorFigures {
  const n = measured.length
  if (simulated.length !== n)
    throw new RangeError(`error figures: ${n} measured values but ${simulated.length} simulated ones`)
  if (n <= p) throw new RangeError(`error figures: needs more than ${p} values, got ${n}`)
  let difference = 0
  let square = 0
  let level = 0
  for (let i = 0; i < n; i++) {
    const d = measured[i] - simulated[i]
    difference += d
    square += d * d
    level += measured[i] / n
  }
  if (!Number.isFinite(square + level)) throw new RangeError('error figures: values must be finite numbers')
  return {
    n,
    bias: difference / n,
    rmse: Math.sqrt(square / n),
    nmbe_pct: level === 0 ? null : (100 * difference) / ((n - p) * level),
    cvRmse_pct: level === 0 ? null : (100 * Math.sqrt(square / (n - p))) / level,
  }
}
