import type { Layer } from './specs.ts'

/** Which way heat flows through a surface: up through a ceiling, across a wall, down through a floor. */
export type HeatFlow = 'up' | 'horizontal' | 'down'

const STEFAN_BOLTZMANN = 5.670374e-8

/** Conventional surface resistances [m² K/W] (ISO 6946:2017, Table 7; from memory). */
export const SURFACE_RESISTANCE: Readonly<
  Record<HeatFlow, { readonly inside: number; readonly outside: number }>
> = {
  up: { inside: 0.1, outside: 0.04 },
  horizontal: { inside: 0.13, outside: 0.04 },
  down: { inside: 0.17, outside: 0.04 },
}

/** Convective coefficients at inner surfaces [W/(m² K)] (ISO 6946:2017, Annex C; from memory). */
export const INSIDE_CONVECTION: Readonly<Record<HeatFlow, number>> = { up: 5, horizontal: 2.5, down: 0.7 }

/** Convective coefficient at outer surfaces, 4 + 4 v [W/(m² K)], wind v [m/s] (ISO 6946:2017, Annex C; from memory). */
export function outsideConvection(wind_ms: number): number {
  return 4 + 4 * wind_ms
}

/** Radiative coefficient of a black surface, 4 σ T³ [W/(m² K)] (ISO 6946:2017, Annex C; from memory). */
export function blackRadiation(mean_C: number): number {
  return 4 * STEFAN_BOLTZMANN * (mean_C + 273.15) ** 3
}

/** Surface resistance 1 / (h_c + ε h_r0) [m² K/W] (ISO 6946:2017, Annex C; from memory). */
export function surfaceResistance(convection_Wm2K: number, emittance: number, mean_C: number): number {
  return 1 / (convection_Wm2K + emittance * blackRadiation(mean_C))
}

const AIR_mm = [0, 5, 7, 10, 15, 25, 50, 100, 300]
const AIR_m2KW: Readonly<Record<HeatFlow, readonly number[]>> = {
  up: [0, 0.11, 0.13, 0.15, 0.16, 0.16, 0.16, 0.16, 0.16],
  horizontal: [0, 0.11, 0.13, 0.15, 0.17, 0.18, 0.18, 0.18, 0.18],
  down: [0, 0.11, 0.13, 0.15, 0.17, 0.19, 0.21, 0.22, 0.23],
}

/**
 * Resistance of an unventilated air layer between surfaces of high emittance [m² K/W], linear between rows
 * (ISO 6946:2017, Table 8; from memory).
 *
 * @throws RangeError for a thickness outside 0 to 0.3 m
 */
export function airLayerResistance(thickness_m: number, flow: HeatFlow): number {
  const mm = thickness_m * 1000
  if (!(mm >= 0 && mm <= 300))
    throw new RangeError(`thickness_m of an air layer must be 0 to 0.3, got ${thickness_m}`)
  const row = AIR_m2KW[flow]
  let i = 1
  while (AIR_mm[i] < mm) i++
  const share = (mm - AIR_mm[i - 1]) / (AIR_mm[i] - AIR_mm[i - 1])
  return row[i - 1] + share * (row[i] - row[i - 1])
}

/** What a steady flow sees of a layer. */
export type SteadyLayer = Pick<Layer, 'thickness_m' | 'conductivity_WmK'>

export interface SurfacePair {
  readonly inside: number
  readonly outside: number
}

/**
 * Thermal transmittance of homogeneous layers, 1 / (R_si + Σ d/λ + R_se) [W/(m² K)] (ISO 6946:2017, 6.7.1;
 * from memory).
 *
 * @param layers in any order
 * @param surfaces_m2KW surface resistances; a wall's by default
 * @throws RangeError for a thickness or conductivity that is not more than 0
 */
export function uValue(
  layers: readonly SteadyLayer[],
  surfaces_m2KW: SurfacePair = SURFACE_RESISTANCE.horizontal,
): number {
  return 1 / layers.reduce((sum, layer, i) => sum + resistance(layer, `layers[${i}]`), both(surfaces_m2KW))
}

function both({ inside, outside }: SurfacePair): number {
  if (!(inside >= 0 && outside >= 0)) throw new RangeError('A surface resistance must not be negative.')
  return inside + outside
}

function resistance({ thickness_m, conductivity_WmK }: SteadyLayer, where: string): number {
  if (!(thickness_m > 0)) throw new RangeError(`${where}.thickness_m must be more than 0, got ${thickness_m}`)
  if (!(conductivity_WmK > 0))
    throw new RangeError(`${where}.conductivity_WmK must be more than 0, got ${conductivity_WmK}`)
  return thickness_m / conductivity_WmK
}

/** A layer, perhaps with parts of another conductivity side by side (studs in wool); shares of area sum to 1. */
export interface BridgedLayer {
  readonly thickness_m: number
  readonly parts: readonly { readonly share: number; readonly conductivity_WmK: number }[]
}

/** Bounds and mean of the combined method [m² K/W]. */
export interface CombinedResistance {
  /** R'_T, heat that flows straight through each section. */
  readonly upper_m2KW: number
  /** R''_T, heat that spreads at each layer. */
  readonly lower_m2KW: number
  readonly mean_m2KW: number
  readonly u_Wm2K: number
  /** Largest relative error, (R'_T - R''_T) / 2 R_T. */
  readonly largestError: number
}

/**
 * The combined method for layers with bridges (ISO 6946:2017, 6.7.2; from memory). Where several layers are
 * bridged their parts are taken to cross at random.
 *
 * @throws RangeError for shares that do not sum to 1, or a thickness or conductivity that is not more than 0
 */
export function combinedResistance(
  layers: readonly BridgedLayer[],
  surfaces_m2KW: SurfacePair = SURFACE_RESISTANCE.horizontal,
): CombinedResistance {
  let sections: { share: number; resistance: number }[] = [{ share: 1, resistance: both(surfaces_m2KW) }]
  let lower_m2KW = both(surfaces_m2KW)
  layers.forEach(({ thickness_m, parts }, i) => {
    const whole = parts.reduce((sum, part) => sum + part.share, 0)
    if (!(Math.abs(whole - 1) < 1e-9))
      throw new RangeError(`layers[${i}].parts must share 1, they share ${whole}`)
    const known = parts.map(({ share, conductivity_WmK }, p) => ({
      share,
      resistance: resistance({ thickness_m, conductivity_WmK }, `layers[${i}].parts[${p}]`),
    }))
    sections = sections.flatMap((section) =>
      known.map((part) => ({
        share: section.share * part.share,
        resistance: section.resistance + part.resistance,
      })),
    )
    lower_m2KW += 1 / known.reduce((sum, part) => sum + part.share / part.resistance, 0)
  })
  const upper_m2KW = 1 / sections.reduce((sum, section) => sum + section.share / section.resistance, 0)
  const mean_m2KW = 0.5 * (upper_m2KW + lower_m2KW)
  return {
    upper_m2KW,
    lower_m2KW,
    mean_m2KW,
    u_Wm2K: 1 / mean_m2KW,
    largestError: (upper_m2KW - lower_m2KW) / (2 * mean_m2KW),
  }
}
