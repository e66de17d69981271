import type { Option } from './option.ts'

/** Outline of a house whose sides are known by length and direction only. */
export interface Plan {
  readonly perimeter_m: number
  /** How far from the start one ends after going round all sides [m]. */
  readonly gap_m: number
  /** Inside the sides in the order given, and inside the convex outline that they could make [m²]. */
  readonly orderedArea_m2: number
  readonly convexArea_m2: number
}

type Sides = readonly { readonly length_m: number; readonly faces_deg: number }[]

export function planOf(sides: Sides): Plan {
  const sorted = [...sides].sort((a, b) => a.faces_deg - b.faces_deg)
  const ordered = walk(sides)
  return {
    perimeter_m: sides.reduce((sum, side) => sum + side.length_m, 0),
    gap_m: ordered.gap_m,
    orderedArea_m2: ordered.area_m2,
    convexArea_m2: walk(sorted).area_m2,
  }
}

/** Floor area of an option [m²]: as given, or inside its sides. */
export function floorArea(option: Pick<Option, 'room' | 'sides'>): number {
  if (option.room.floorArea_m2 !== undefined) return option.room.floorArea_m2
  const { orderedArea_m2, convexArea_m2 } = planOf(option.sides)
  return orderedArea_m2 > 0.3 * convexArea_m2 ? orderedArea_m2 : convexArea_m2
}

/** Clockwise around the house: a side that faces north is walked from west to east. */
function walk(sides: Sides): { gap_m: number; area_m2: number } {
  let east = 0
  let north = 0
  let doubled = 0
  for (const { length_m, faces_deg } of sides) {
    const along = ((faces_deg + 90) * Math.PI) / 180
    const nextEast = east + length_m * Math.sin(along)
    const nextNorth = north + length_m * Math.cos(along)
    doubled += nextEast * north - east * nextNorth
    east = nextEast
    north = nextNorth
  }
  return { gap_m: Math.hypot(east, north), area_m2: Math.abs(doubled) / 2 }
}
