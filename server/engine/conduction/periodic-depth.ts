import type { Layer } from './specs.ts'
import { exponential, minus, over, plus, scaled, times, type Complex } from './complex.ts'

/** What lies behind the last layer. */
export type Behind =
  /** A film to a temperature that stays constant; 0 for an adiabatic back. */
  | { readonly kind: 'film'; readonly film_Wm2K: number }
  /** A second room face that swings like the first. */
  | { readonly kind: 'alike' }
  /** More of the last layer, without end. */
  | { readonly kind: 'endless' }

/** Depth at which a swing in a material has fallen to 1/e, √(λ T / (π ρ c)) (ISO 13786, 3.1) [m]. */
export function penetrationDepth(
  layer: Pick<Layer, 'conductivity_WmK' | 'volumetricHeat_Jm3K'>,
  period_s: number,
): number {
  return Math.sqrt((layer.conductivity_WmK * period_s) / (Math.PI * layer.volumetricHeat_Jm3K))
}

/** A steady sine in plane layers, driven by their inner face. Phasors for 1 K at that face. */
export interface PeriodicField {
  readonly thickness_m: number
  /** Temperature at a depth behind the inner face [K per K]. */
  readonly temperature: (depth_m: number) => Complex
  /** Heat flow at a depth, towards the outside [W/m² per K]. */
  readonly flow: (depth_m: number) => Complex
  /** Heat held between the face and a depth: (flow in - flow out) / iω [J/m² per K]. */
  readonly held: (depth_m: number) => Complex
}

interface Slab {
  readonly from_m: number
  readonly thickness_m: number
  /** (1 + i) / δ [1/m]. */
  readonly wave: Complex
  /** Characteristic admittance λ (1 + i) / δ [W/(m² K)]. */
  readonly admittance: Complex
  /** Waves at the slab's inner face: outwards, and from the outside back [K per K]. */
  readonly out: Complex
  readonly back: Complex
}

/**
 * The periodic solution of ISO 13786:2017 (clause 7; the heat conduction equation for a sine), written
 * as waves outwards and back instead of transfer matrices, so that deep layers do not overflow.
 *
 * @param layers   from the inner face outwards
 * @param period_s of the sine
 * @throws RangeError for no layers, a thickness, conductivity or heat capacity that is not more than 0
 */
export function periodicField(layers: readonly Layer[], behind: Behind, period_s: number): PeriodicField {
  if (layers.length === 0) throw new RangeError('periodic field: there is no layer')
  for (const layer of layers)
    if (!(layer.thickness_m > 0 && layer.conductivity_WmK > 0 && layer.volumetricHeat_Jm3K > 0))
      throw new RangeError(
        `periodic field: ${layer.name} needs thickness, conductivity and heat capacity above 0`,
      )
  const omega = (2 * Math.PI) / period_s
  const driven =
    behind.kind === 'alike'
      ? addFields(slabs(layers, 'held', period_s), mirrored(layers, period_s))
      : slabs(layers, behind, period_s)
  const thickness_m = layers.reduce((total, layer) => total + layer.thickness_m, 0)
  const at = (depth_m: number) =>
    driven.find((slab) => depth_m <= slab.from_m + slab.thickness_m) ?? driven.at(-1)!
  const waves = (depth_m: number) => {
    const slab = at(depth_m)
    const x = depth_m - slab.from_m
    return {
      slab,
      out: times(slab.out, exponential(scaled(slab.wave, -x))),
      back: times(slab.back, exponential(scaled(slab.wave, x - slab.thickness_m))),
    }
  }
  const flow = (depth_m: number) => {
    const { slab, out, back } = waves(depth_m)
    return times(slab.admittance, minus(out, back))
  }
  return {
    thickness_m,
    temperature: (depth_m) => {
      const { out, back } = waves(depth_m)
      return plus(out, back)
    },
    flow,
    held: (depth_m) => over(minus(flow(0), flow(depth_m)), [0, omega]),
  }
}

/** `back` of a slab is kept at its outer end: the wave there, before it travels back. */
function slabs(layers: readonly Layer[], behind: Behind | 'held', period_s: number): Slab[] {
  const parts = layers.map((layer) => {
    const depth = penetrationDepth(layer, period_s)
    const wave: Complex = [1 / depth, 1 / depth]
    return { layer, wave, admittance: scaled(wave, layer.conductivity_WmK) }
  })
  // Reflection at each slab's outer end, from outside inwards: (Y_c - Y_behind) / (Y_c + Y_behind).
  const reflection: Complex[] = new Array(parts.length)
  let next: Complex | null = null
  for (let i = parts.length - 1; i >= 0; i--) {
    const { layer, wave, admittance } = parts[i]
    if (next === null)
      reflection[i] =
        behind === 'held'
          ? [-1, 0]
          : behind.kind === 'endless'
            ? [0, 0]
            : reflect(admittance, [behind.kind === 'film' ? behind.film_Wm2K : 0, 0])
    else reflection[i] = reflect(admittance, next)
    const round = times(reflection[i], exponential(scaled(wave, -2 * layer.thickness_m)))
    next = times(admittance, over(minus([1, 0], round), plus([1, 0], round)))
  }
  // Then from the inner face outwards: 1 K at the face.
  const found: Slab[] = []
  let face: Complex = [1, 0]
  let from_m = 0
  parts.forEach(({ layer, wave, admittance }, i) => {
    const through = exponential(scaled(wave, -layer.thickness_m))
    const round = times(times(reflection[i], through), through)
    const out = over(face, plus([1, 0], round))
    const arriving = times(out, through)
    const back = times(reflection[i], arriving)
    found.push({ from_m, thickness_m: layer.thickness_m, wave, admittance, out, back })
    face = plus(arriving, back)
    from_m += layer.thickness_m
  })
  return found
}

function reflect(admittance: Complex, behind: Complex): Complex {
  return over(minus(admittance, behind), plus(admittance, behind))
}

/** The field driven by 1 K at the outer face while the inner one is held, in the order of `layers`. */
function mirrored(layers: readonly Layer[], period_s: number): Slab[] {
  const total = layers.reduce((sum, layer) => sum + layer.thickness_m, 0)
  return slabs([...layers].reverse(), 'held', period_s)
    .reverse()
    .map((slab) => ({
      ...slab,
      from_m: total - slab.from_m - slab.thickness_m,
      // What runs outwards there runs inwards here: each wave is known where it starts.
      out: slab.back,
      back: slab.out,
    }))
}

function addFields(a: readonly Slab[], b: readonly Slab[]): Slab[] {
  return a.map((slab, i) => ({ ...slab, out: plus(slab.out, b[i].out), back: plus(slab.back, b[i].back) }))
}
