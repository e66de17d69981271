/** A stream of random numbers that is the same on every machine for the same seed. */
export interface Seeded {
  /** Evenly spread in [0, 1). */
  readonly uniform: () => number
  /** Standard normal: mean 0, standard deviation 1. */
  readonly normal: () => number
}

/**
 * Seeded generator: the 32-bit "small fast counting" generator sfc32 of Chris Doty-Humphrey (PractRand,
 * 2010; from memory), started from the seed by 12 rounds as its author advises. Integer operations only,
 * so it is bit-reproducible. Normal numbers by the inverse distribution, one for each uniform number.
 *
 * @param seed any whole number; its lowest 32 bits count
 */
export function seeded(seed: number): Seeded {
  if (!Number.isInteger(seed)) throw new RangeError(`seed must be a whole number, got ${seed}`)
  let a = 0
  let b = seed | 0
  let c = 0x9e3779b9 | 0
  let counter = 1
  const next = (): number => {
    const sum = (((a + b) | 0) + counter) | 0
    counter = (counter + 1) | 0
    a = b ^ (b >>> 9)
    b = (c + (c << 3)) | 0
    c = (c << 21) | (c >>> 11)
    c = (c + sum) | 0
    return sum >>> 0
  }
  for (let i = 0; i < 12; i++) next()
  const uniform = (): number => next() / 4294967296
  // half a step up, so that 0 and 1 never reach the inverse
  return { uniform, normal: () => normalQuantile((next() + 0.5) / 4294967296) }
}

/**
 * Inverse of the standard normal distribution, Hastings 1955 in Abramowitz and Stegun 1964, 26.2.23
 * (absolute error below 4.5e-4; from memory), enough for weather.
 *
 * @param p probability, above 0 and below 1
 */
export function normalQuantile(p: number): number {
  const tail = p < 0.5 ? p : 1 - p
  const t = Math.sqrt(-2 * Math.log(tail))
  const x =
    t - (2.515517 + t * (0.802853 + t * 0.010328)) / (1 + t * (1.432788 + t * (0.189269 + t * 0.001308)))
  return p < 0.5 ? -x : x
}
