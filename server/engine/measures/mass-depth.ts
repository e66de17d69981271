import type { Layer } from '../conduction/specs.ts'
import type { HouseElement, HouseModel } from '../zone/house-model.ts'
import { size } from '../conduction/complex.ts'
import { periodicField, type Behind, type PeriodicField } from '../conduction/periodic-depth.ts'

const DAY_S = 86400
const YEAR_S = 365 * DAY_S
const WH_PER_J = 1 / 3600
/** Earth behind a wall or under a floor is looked at down to this depth [m]. */
const EARTH_M = 6

/** Heat that a swing of 1 K (highest minus lowest) at the inner face moves, for one period. */
export interface SwingDepth {
  /** In the whole depth shown [Wh/m² per K]. */
  readonly held_Whm2K: number
  /** Smallest depth from the face that holds 90 % of that [m]. */
  readonly depth90_m: number
}

/** A slice of a wall or floor, counted from the room. */
export interface DepthSlice {
  readonly to_m: number
  /** Heat that the slice itself takes up and gives back, for each centimetre of it [Wh/m² per K]. */
  readonly day_Whm2K: number
  readonly year_Whm2K: number
  /** Heat that everything from the face to here takes up and gives back together; less than the sum of the slices, which peak at different times. */
  readonly dayUpTo_Whm2K: number
  readonly yearUpTo_Whm2K: number
}

/** What part of one wall or floor serves the day, and what part the season. */
export interface MassDepth {
  readonly name: string
  readonly element: string
  /** Of the construction, without the earth behind it [m]. */
  readonly construction_m: number
  readonly day: SwingDepth
  readonly year: SwingDepth
  /** Centimetre by centimetre to 1 m, then every 10 cm. */
  readonly slices: DepthSlice[]
}

/**
 * Heat held by depth for the swing of a day and of a year at the inner face, by the periodic solution
 * (ISO 13786; over an adiabatic back the daily total is the diurnal heat capacity of Balcomb et al.,
 * Passive Solar Heating Analysis, ASHRAE 1984).
 *
 * @param layers         from the room outwards, earth included
 * @param construction_m how much of that is the construction
 */
export function massDepth(
  name: string,
  element: string,
  layers: readonly Layer[],
  behind: Behind,
  construction_m: number,
): MassDepth {
  const day = periodicField(layers, behind, DAY_S)
  const year = periodicField(layers, behind, YEAR_S)
  const slices: DepthSlice[] = []
  let from_m = 0
  while (from_m < day.thickness_m - 1e-9) {
    const to_m = Math.min(day.thickness_m, round(from_m + (from_m < 1 - 1e-9 ? 0.01 : 0.1)))
    const perCentimetre = (0.01 / (to_m - from_m)) * WH_PER_J
    slices.push({
      to_m,
      day_Whm2K: between(day, from_m, to_m) * perCentimetre,
      year_Whm2K: between(year, from_m, to_m) * perCentimetre,
      dayUpTo_Whm2K: size(day.held(to_m)) * WH_PER_J,
      yearUpTo_Whm2K: size(year.held(to_m)) * WH_PER_J,
    })
    from_m = to_m
  }
  return { name, element, construction_m, day: swingDepth(day), year: swingDepth(year), slices }
}

function between(field: PeriodicField, from_m: number, to_m: number): number {
  const [a, b] = [field.held(from_m), field.held(to_m)]
  return Math.hypot(b[0] - a[0], b[1] - a[1])
}

/** The first depth that holds 90 % of the whole, by steps of 1 mm. */
function swingDepth(field: PeriodicField): SwingDepth {
  const total = size(field.held(field.thickness_m))
  const steps = Math.ceil(field.thickness_m / 0.001)
  let depth90_m = field.thickness_m
  for (let i = 1; i <= steps; i++) {
    const depth = Math.min(field.thickness_m, i * 0.001)
    if (size(field.held(depth)) >= 0.9 * total) {
      depth90_m = depth
      break
    }
  }
  return { held_Whm2K: total * WH_PER_J, depth90_m }
}

function round(value: number): number {
  return Math.round(value * 1e6) / 1e6
}

/**
 * The depths of every wall, floor and partition of a house. Layers are taken as they are; of a section
 * the floor with the soil below it, and the wall with the berm's or the natural soil behind it, both
 * as if they went on without end (corners and the way around the footing are left out).
 */
export function massDepths(model: HouseModel): MassDepth[] {
  return model.elements.flatMap((element) => depthsOf(element))
}

function depthsOf(element: HouseElement): MassDepth[] {
  const { spec, name } = element
  if (spec.kind === 'lumped') return []
  if (spec.kind === 'layers') {
    const layers = [...spec.layers].reverse()
    const behind: Behind =
      spec.outsideFilm_Wm2K > 0 && element.links.outside?.to === 'room'
        ? { kind: 'alike' }
        : { kind: 'film', film_Wm2K: spec.outsideFilm_Wm2K }
    return [massDepth(name, name, layers, behind, thickness(layers))]
  }
  const earth = (soil: Omit<Layer, 'thickness_m'>): Layer => ({ ...soil, thickness_m: EARTH_M })
  const floor = [...spec.floor].reverse()
  const wall = [...spec.wall].reverse()
  const behindWall = earth(spec.berm?.soil ?? spec.soil)
  const endless: Behind = { kind: 'endless' }
  // A wall with no berm that rises from level ground has air behind it, not soil.
  const isEarthBehind = spec.berm !== null || spec.floorLevel_m < 0
  const open: Behind = { kind: 'film', film_Wm2K: spec.films.wallOutside }
  return [
    massDepth(`${name}: floor`, name, [...floor, earth(spec.soil)], endless, thickness(floor)),
    isEarthBehind
      ? massDepth(`${name}: wall`, name, [...wall, behindWall], endless, thickness(wall))
      : massDepth(`${name}: wall`, name, wall, open, thickness(wall)),
  ]
}

function thickness(layers: readonly Layer[]): number {
  return layers.reduce((total, layer) => total + layer.thickness_m, 0)
}
