import type { Option } from '#contract/option.ts'
import type { Side } from '#contract/side.ts'

/** A side's wall in two parts: below, with the ground section, and the rest above. */
export interface WallParts {
  /** Of the wall above the floor [m]. */
  readonly height_m: number
  /** Top of the section's wall above level ground [m]. */
  readonly sectionTop_m: number
  /** Inner face of the section's wall [m²]. */
  readonly sectionArea_m2: number
  /** What is left: neither opening nor section [m²]; 0 when there is nothing left. */
  readonly restArea_m2: number
  readonly openingArea_m2: number
}

/** So much of the wall above the soil belongs to the section, where the wall's foot loses heat two ways. */
const ABOVE_BERM_M = 0.3
const ABOVE_FLOOR_M = 0.4
/** The least that the section needs. */
const LEAST_M = 0.05

/** Splits a side's wall; openings reach low where the area above them does not suffice. */
export function wallParts(side: Side, option: Option): WallParts {
  const height_m = side.height_m ?? option.room.height_m
  const level_m = option.floor.level_m
  const openingArea_m2 = side.openings.reduce((sum, { width_m, height_m }) => sum + width_m * height_m, 0)
  const opaque_m2 = Math.max(0, side.length_m * height_m - openingArea_m2)
  if (option.floor.below.kind !== 'ground')
    return { height_m, sectionTop_m: level_m, sectionArea_m2: 0, restArea_m2: opaque_m2, openingArea_m2 }

  const soil_m = Math.max(side.berm?.height_m ?? 0, 0)
  const wanted_m = side.berm
    ? Math.max(soil_m + ABOVE_BERM_M, level_m + ABOVE_FLOOR_M)
    : Math.max(soil_m, level_m) + ABOVE_FLOOR_M
  const most_m = Math.min(level_m + height_m, level_m + opaque_m2 / side.length_m)
  const sectionTop_m = Math.max(Math.min(wanted_m, most_m), Math.max(soil_m, level_m) + LEAST_M)
  const sectionArea_m2 = side.length_m * (sectionTop_m - level_m)
  const rest = opaque_m2 - sectionArea_m2
  // A sliver of wall is not worth an element of its own.
  return { height_m, sectionTop_m, sectionArea_m2, restArea_m2: rest > 0.02 ? rest : 0, openingArea_m2 }
}
