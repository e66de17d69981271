import type { Harmonic } from './harmonic.ts'

/** The yearly wave of the undisturbed ground surface and the soil that carries it down. */
export interface GroundWave {
  /** Yearly mean of the surface, and so of every depth [°C]. */
  readonly mean_C: number
  /** Half the yearly swing of the surface [K]. */
  readonly amplitude_K: number
  /** When the surface is coldest, from the start of the year [s]. */
  readonly coldest_s: number
  readonly diffusivity_m2s: number
}

const YEAR_S = 8760 * 3600

/**
 * Undisturbed ground temperature at some depths, at one time.
 *
 *   T(z, t) = mean - amplitude · exp(-z/d) · cos(ω (t - coldest) - z/d),   d = √(2 a / ω)
 *
 * with ω = 2π / 8760 h and a the diffusivity. True for uniform soil and a surface that follows one
 * yearly harmonic; snow, freezing and moving water are outside it.
 * Source: T. Kusuda and P. R. Achenbach, ASHRAE Transactions 71(1), 1965 (from memory; the same form was
 * read in the soil physics toolkit of Oklahoma State University); the same solution as Carslaw and Jaeger,
 * Conduction of Heat in Solids, 2nd ed., 1959, section 2.6 (from memory).
 *
 * @param wave     mean_C [°C], amplitude_K [K], coldest_s [s], diffusivity_m2s [m²/s]
 * @param depth_m  below the surface, positive downwards [m], length n
 * @param time_s   from the start of the year [s]
 * @param out      receives the temperatures [°C], length n; allocated when left out
 * @returns out
 * @throws RangeError for a negative depth, a diffusivity <= 0, an `out` of another length
 */
export function undisturbedGround(
  wave: GroundWave,
  depth_m: Float64Array,
  time_s: number,
  out: Float64Array = new Float64Array(depth_m.length),
): Float64Array {
  if (!(wave.diffusivity_m2s > 0)) {
    throw new RangeError(`diffusivity_m2s must be more than 0, got ${wave.diffusivity_m2s}`)
  }
  if (out.length !== depth_m.length) {
    throw new RangeError(`out must have the length of depth_m (${depth_m.length}), got ${out.length}`)
  }
  const omega = (2 * Math.PI) / YEAR_S
  const damping_m = dampingDepth(wave.diffusivity_m2s)
  const phase = omega * (time_s - wave.coldest_s)
  for (let i = 0; i < depth_m.length; i++) {
    const z = depth_m[i]
    if (!(z >= 0)) throw new RangeError(`depth_m[${i}] must not be negative, got ${z}`)
    const below = z / damping_m
    out[i] = wave.mean_C - wave.amplitude_K * Math.exp(-below) * Math.cos(phase - below)
  }
  return out
}

/**
 * Depth at which the yearly wave has 1/e = 36.8 % of its surface amplitude and is 58.1 days late:
 * d = √(2 a / ω) [m].
 *
 * @param diffusivity_m2s [m²/s], more than 0
 */
export function dampingDepth(diffusivity_m2s: number): number {
  return Math.sqrt((diffusivity_m2s * YEAR_S) / Math.PI)
}

/** How the surface of open ground differs from the air above it, over the year. */
export interface SurfaceOffset {
  /** Yearly mean of the surface above that of the air [K]. */
  readonly warmer_K: number
  /** Amplitude of the surface above that of the air [K]; negative under long snow. */
  readonly wider_K: number
  /** How long after the air the surface is coldest [s]. */
  readonly later_s: number
}

/**
 * Median of 60 complete stations of the U.S. Climate Reference Network, 2020, soil at 5 cm against air:
 * mean +1.9 K (10-90 %: +0.65 to +3.2), amplitude +0.2 K (-3.0 to +2.4), 2 days later (derived from data).
 */
export const OPEN_GROUND: SurfaceOffset = { warmer_K: 1.9, wider_K: 0.2, later_s: 2 * 86400 }

/**
 * Wave of the undisturbed ground surface from the first harmonic of the outdoor air.
 *
 * @param air              first harmonic of the outdoor temperature [°C, K, s]
 * @param diffusivity_m2s  of the soil [m²/s]
 * @param offset           of surface from air; the median of open ground by default
 */
export function groundWave(air: Harmonic, diffusivity_m2s: number, offset = OPEN_GROUND): GroundWave {
  return {
    mean_C: air.mean + offset.warmer_K,
    amplitude_K: Math.max(0, air.amplitude + offset.wider_K),
    coldest_s: air.coldest_s + offset.later_s,
    diffusivity_m2s,
  }
}
