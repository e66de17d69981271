import { exponential, minus, over, plus, scaled, size, times, type Complex } from './complex.ts'
import { penetrationDepth, periodicField, type Behind } from './periodic-depth.ts'
import type { Layer } from './specs.ts'

const DAY_S = 86400
const YEAR_S = 365 * DAY_S

/** A steady sine as amplitude and time shift: positive when it runs ahead of the temperature that drives it. */
export interface Swing {
  /** W/(m² K) */
  readonly size: number
  readonly ahead_s: number
}

/** What a plane construction does with a sine of one period (ISO 13786). Side 1 is inside, side 2 outside. */
export interface PeriodicProperties {
  /** Heat transfer matrix from inside to outside, surface to surface with its films: Z11, Z12, Z21, Z22. */
  readonly matrix: readonly [Complex, Complex, Complex, Complex]
  /** Thermal admittance: flow into the inside per kelvin of swing inside, Y11; outside Y22. */
  readonly inside: Swing
  readonly outside: Swing
  /** Periodic thermal transmittance Y12; its shift is negative, within one period. */
  readonly through: Swing
  /** Steady transmittance [W/(m² K)]. */
  readonly u_Wm2K: number
  /** Decrement factor |Y12| / U. */
  readonly decrement: number
  /** Areal heat capacities κ1 and κ2 [J/(m² K)]. */
  readonly insideCapacity_Jm2K: number
  readonly outsideCapacity_Jm2K: number
}

/**
 * Periodic properties by the heat transfer matrix:
 *
 *   Z = Z(se) Z(N) … Z(1) Z(si),   Y11 = -Z11 / Z12,   Y22 = -Z22 / Z12,   Y12 = -1 / Z12
 *   κ1 = (T / 2π) |(Z11 - 1) / Z12|,   κ2 = (T / 2π) |(Z22 - 1) / Z12|
 *
 * Source: ISO 13786:2017, clause 7 (from memory). Any period: a day, a year.
 *
 * @param layers           from outside to inside
 * @param surfaces_m2KW    surface resistances inside and outside, 0 or more [m² K/W]
 * @throws RangeError for no layers, values that are not more than 0, or layers some 700 penetration depths thick
 */
export function periodicProperties(
  layers: readonly Layer[],
  surfaces_m2KW: { readonly inside: number; readonly outside: number },
  period_s = DAY_S,
): PeriodicProperties {
  if (layers.length === 0) throw new RangeError('layers: at least one layer is needed')
  if (!(period_s > 0)) throw new RangeError(`period_s must be more than 0, got ${period_s}`)
  let resistance = surfaces_m2KW.inside + surfaces_m2KW.outside
  let matrix = film(surfaces_m2KW.inside)
  for (let i = layers.length - 1; i >= 0; i--) {
    const { thickness_m, conductivity_WmK, volumetricHeat_Jm3K } = layers[i]
    if (!(thickness_m > 0 && conductivity_WmK > 0 && volumetricHeat_Jm3K > 0))
      throw new RangeError(`layers[${i}] needs thickness, conductivity and heat capacity above 0`)
    resistance += thickness_m / conductivity_WmK
    matrix = product(slab(layers[i], period_s), matrix)
  }
  matrix = product(film(surfaces_m2KW.outside), matrix)
  const [z11, z12, , z22] = matrix
  if (!Number.isFinite(size(z11)) || !Number.isFinite(size(z12)))
    throw new RangeError(`layers: too thick for a period of ${period_s} s`)
  const through = swing(scaled(over([1, 0], z12), -1), period_s)
  const one: Complex = [1, 0]
  const perTurn = period_s / (2 * Math.PI)
  return {
    matrix,
    inside: swing(scaled(over(z11, z12), -1), period_s),
    outside: swing(scaled(over(z22, z12), -1), period_s),
    // What has passed a wall comes later, by less than one period as far as a steady sine can tell.
    through: {
      size: through.size,
      ahead_s: through.ahead_s > 0 ? through.ahead_s - period_s : through.ahead_s,
    },
    u_Wm2K: 1 / resistance,
    decrement: through.size * resistance,
    insideCapacity_Jm2K: perTurn * size(over(minus(z11, one), z12)),
    outsideCapacity_Jm2K: perTurn * size(over(minus(z22, one), z12)),
  }
}

type Square = readonly [Complex, Complex, Complex, Complex]

function film(resistance_m2KW: number): Square {
  if (!(resistance_m2KW >= 0))
    throw new RangeError(`A surface resistance must not be negative, got ${resistance_m2KW}`)
  return [
    [1, 0],
    [-resistance_m2KW, 0],
    [0, 0],
    [1, 0],
  ]
}

/** cosh(κd), -sinh(κd)/(λκ), -λκ sinh(κd), cosh(κd) with κ = (1 + i)/δ. */
function slab(layer: Layer, period_s: number): Square {
  const depth_m = penetrationDepth(layer, period_s)
  const x = layer.thickness_m / depth_m
  const rise = exponential([x, x])
  const fall = exponential([-x, -x])
  const cosh = scaled(plus(rise, fall), 0.5)
  const sinh = scaled(minus(rise, fall), 0.5)
  const own = scaled([1, 1], layer.conductivity_WmK / depth_m)
  return [cosh, scaled(over(sinh, own), -1), scaled(times(own, sinh), -1), cosh]
}

function product(a: Square, b: Square): Square {
  return [
    plus(times(a[0], b[0]), times(a[1], b[2])),
    plus(times(a[0], b[1]), times(a[1], b[3])),
    plus(times(a[2], b[0]), times(a[3], b[2])),
    plus(times(a[2], b[1]), times(a[3], b[3])),
  ]
}

function swing(value: Complex, period_s: number): Swing {
  return { size: size(value), ahead_s: (period_s * Math.atan2(value[1], value[0])) / (2 * Math.PI) }
}

/**
 * Heat that plane layers take up and give back for each kelvin of swing at their inner face
 * [Wh/(m² K)]; over an adiabatic back and a day this is the diurnal heat capacity of J. D. Balcomb et al.,
 * Passive Solar Heating Analysis, ASHRAE 1984.
 *
 * @param layers from outside to inside
 */
export function swingHeatCapacity(
  layers: readonly Layer[],
  period_s = DAY_S,
  behind: Behind = { kind: 'film', film_Wm2K: 0 },
): number {
  const field = periodicField([...layers].reverse(), behind, period_s)
  return size(field.held(field.thickness_m)) / 3600
}

/** What one layer holds by itself, for each kelvin of swing at the inner face [Wh/(m² K)]. */
export interface LayerService {
  readonly name: string
  readonly thickness_m: number
  readonly day_Whm2K: number
  readonly year_Whm2K: number
}

/**
 * Which layer serves the day, and which the season. Layers swing at different times, so their shares add up
 * to more than the whole. (Centimetre by centimetre: massDepth in engine/measures.)
 *
 * @param layers from outside to inside
 * @param behind what lies outside the outermost layer
 * @returns in the order of `layers`
 */
export function usefulDepth(layers: readonly Layer[], behind: Behind): LayerService[] {
  const fromRoom = [...layers].reverse()
  const day = periodicField(fromRoom, behind, DAY_S)
  const year = periodicField(fromRoom, behind, YEAR_S)
  let from_m = 0
  return fromRoom
    .map(({ name, thickness_m }) => {
      const to_m = Math.min(from_m + thickness_m, day.thickness_m)
      const held = ({ held }: typeof day) => size(minus(held(to_m), held(from_m))) / 3600
      const service = { name, thickness_m, day_Whm2K: held(day), year_Whm2K: held(year) }
      from_m = to_m
      return service
    })
    .reverse()
}
