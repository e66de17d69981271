/** Mean and first yearly harmonic of a series that covers one whole period. */
export interface Harmonic {
  readonly mean: number
  /** Half the swing of the harmonic, never negative, in the unit of the series. */
  readonly amplitude: number
  /** When the harmonic is highest [s from the start of the period], 0 <= warmest_s < period. */
  readonly warmest_s: number
  /** When the harmonic is lowest [s from the start of the period], 0 <= coldest_s < period. */
  readonly coldest_s: number
}

/**
 * Least-squares fit of one cosine to an evenly stepped series that covers exactly one period:
 *
 *   v(t) = mean + amplitude · cos(ω (t - warmest_s)),   ω = 2π / (n · step_s)
 *
 * Over a whole period the fit is the discrete Fourier coefficient (orthogonality of the cosines).
 *
 * @param values  n >= 3 values over one whole period, usually 8,760 hours
 * @param step_s  time between two values [s]
 * @param first_s time of values[0] from the start of the period [s]; by default the end of the first
 *                step, where the temperatures of a climate year stand; step_s / 2 suits means over a step
 * @throws RangeError for fewer than three values, a value that is not finite, or a step <= 0
 */
export function firstHarmonic(values: Float64Array, step_s = 3600, first_s = step_s): Harmonic {
  const n = values.length
  if (n < 3) throw new RangeError(`firstHarmonic: needs at least 3 values, got ${n}`)
  if (!(step_s > 0)) throw new RangeError(`firstHarmonic: step_s must be more than 0, got ${step_s}`)
  let sum = 0
  let inPhase = 0
  let outOfPhase = 0
  for (let i = 0; i < n; i++) {
    const value = values[i]
    const angle = (2 * Math.PI * i) / n
    sum += value
    inPhase += value * Math.cos(angle)
    outOfPhase += value * Math.sin(angle)
  }
  if (!Number.isFinite(sum)) throw new RangeError('firstHarmonic: values must be finite numbers')
  const period_s = n * step_s
  const warmest_s = (Math.atan2(outOfPhase, inPhase) / (2 * Math.PI)) * period_s + first_s
  return {
    mean: sum / n,
    amplitude: (2 / n) * Math.hypot(inPhase, outOfPhase),
    warmest_s: within(warmest_s, period_s),
    coldest_s: within(warmest_s + period_s / 2, period_s),
  }
}

function within(time_s: number, period_s: number): number {
  return ((time_s % period_s) + period_s) % period_s
}
