import { dampingDepth, undisturbedGround } from '#engine/climate/ground.ts'
import { firstHarmonic, type Harmonic } from '#engine/climate/harmonic.ts'

const DAY_S = 86400
const YEAR_S = 365 * DAY_S

/** The yearly wave of daily means, which stand for the middle of their day. */
export const waveOfDays = (daily: Float64Array): Harmonic => firstHarmonic(daily, DAY_S, DAY_S / 2)

/**
 * The one diffusivity that carries the yearly wave through several depths: amplitude falls by e and phase
 * lags by 1 rad for each damping depth, so both logarithm of amplitude and phase are straight lines of
 * slope 1/d in depth; d by least squares over both.
 *
 * @param depth_m depths of the waves, at least two
 * @returns m²/s
 */
export function fitDiffusivity(depth_m: readonly number[], waves: readonly Harmonic[]): number {
  const omega = (2 * Math.PI) / YEAR_S
  const meanDepth = average(depth_m)
  const fall = waves.map((wave) => -Math.log(wave.amplitude))
  const lag = waves.map((wave) => omega * daysLater(wave, waves[0]) * DAY_S)
  let upper = 0
  let lower = 0
  depth_m.forEach((depth, i) => {
    const from = depth - meanDepth
    upper += from * (fall[i] - average(fall)) + from * (lag[i] - average(lag))
    lower += 2 * from * from
  })
  const damping_m = lower / upper
  return (damping_m * damping_m * omega) / 2
}

/** How many days wave a is later than wave b, -182.5 to 182.5. */
export function daysLater(a: Harmonic, b: Harmonic): number {
  const late = (a.coldest_s - b.coldest_s) / DAY_S
  return late - 365 * Math.round(late / 365)
}

/**
 * A wave known at one depth, as the undisturbed ground of the program has it at another.
 *
 * @param known  the wave at `from_m`
 * @param to_m   deeper than `from_m`
 */
export function waveBelow(known: Harmonic, from_m: number, to_m: number, diffusivity_m2s: number): Harmonic {
  const damping_m = dampingDepth(diffusivity_m2s)
  const wave = {
    mean_C: known.mean,
    amplitude_K: known.amplitude * Math.exp(from_m / damping_m),
    coldest_s: known.coldest_s - (from_m / damping_m) * (YEAR_S / (2 * Math.PI)),
    diffusivity_m2s,
  }
  const depth = Float64Array.of(to_m)
  const daily = Float64Array.from(
    { length: 365 },
    (_, day) => undisturbedGround(wave, depth, (day + 0.5) * DAY_S)[0],
  )
  return waveOfDays(daily)
}

export const average = (values: ArrayLike<number>): number => {
  let sum = 0
  for (let i = 0; i < values.length; i++) sum += values[i]
  return sum / values.length
}
