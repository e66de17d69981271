/** Lowest and highest daily clearness index of a month. */
export interface ClearnessRange {
  readonly low: number
  readonly high: number
}

/**
 * Range of daily clearness in a month of mean clearness KT: 0.05 and Hollands and Huget 1983,
 * 0.6313 + 0.267 KT - 11.9 (KT - 0.75)^8, as used by Knight, Klein and Duffie, Solar Energy 46(2):109-120,
 * 1991 (from memory). Kept 0.02 clear of the mean, for months clearer than the fit knows.
 */
export function clearnessRange(mean: number): ClearnessRange {
  const high = 0.6313 + 0.267 * mean - 11.9 * (mean - 0.75) ** 8
  return { low: Math.min(0.05, mean / 2), high: Math.max(high, mean + 0.02) }
}

/**
 * Mean of the exponential distribution of Bendt, Collares-Pereira and Rabl, Solar Energy 27:1-5, 1981
 * (from memory): F(k) = [exp(g low) - exp(g k)] / [exp(g low) - exp(g high)].
 */
function meanOf(g: number, { low, high }: ClearnessRange): number {
  const span = g * (high - low)
  // series near g = 0, where the closed form is 0/0
  if (Math.abs(span) < 1e-4) return (low + high) / 2 + (span * (high - low)) / 12
  return high - 1 / g + (high - low) / Math.expm1(span)
}

/**
 * Exponent g of that distribution for a wanted mean, by bisection.
 *
 * @throws RangeError when the mean is not inside the range
 */
export function bendtExponent(mean: number, range: ClearnessRange): number {
  if (!(mean > range.low && mean < range.high)) {
    throw new RangeError(`clearness ${mean} must be between ${range.low} and ${range.high}`)
  }
  let below = -2000
  let above = 2000
  for (let step = 0; step < 80; step++) {
    const g = (below + above) / 2
    if (meanOf(g, range) < mean) below = g
    else above = g
  }
  return (below + above) / 2
}

/**
 * The same exponent by the explicit fit of Herzog 1985 (from memory), 2 to 3 % off; kept to hold the bisection against.
 */
export function herzogExponent(mean: number, { low, high }: ClearnessRange): number {
  const x = (high - low) / (high - mean)
  return -1.498 + (1.184 * x - 27.182 * Math.exp(-1.5 * x)) / (high - low)
}

/**
 * Daily clearness of a month, sorted from dull to clear: the middles of equal parts of the distribution.
 *
 * @param mean  clearness of the month
 * @param days  how many
 * @param clear clearness of a cloudless day, which no day exceeds
 */
export function bendtQuantiles(mean: number, days: number, clear = 1): Float64Array {
  const widest = clearnessRange(mean)
  const range = { low: widest.low, high: Math.max(Math.min(widest.high, clear), mean + 0.02) }
  const g = bendtExponent(mean, range)
  const span = range.high - range.low
  return Float64Array.from({ length: days }, (_, i) => {
    const p = (i + 0.5) / days
    if (Math.abs(g * span) < 1e-6) return range.low + p * span
    // exp(g low) taken out, so that a large exponent does not overflow
    return g > 0
      ? range.high + Math.log(p + (1 - p) * Math.exp(-g * span)) / g
      : range.low + Math.log(1 - p + p * Math.exp(g * span)) / g
  })
}
