import type { WindowModel } from '../zone/house-model.ts'
import { shadedHeight } from './shading.ts'

const RAD = Math.PI / 180

type Opening = Pick<WindowModel, 'height_m' | 'sill_m' | 'overhang'>

/** Where the beam through an opening lands on a level floor, square to the wall. */
export interface LitFloor {
  readonly profile_deg: number
  /** Lower and upper edge of the lit part of the opening, above the floor [m]. */
  readonly fromHeight_m: number
  readonly toHeight_m: number
  /** Nearest and farthest edge of the patch from the wall [m], not cut at the wall across. */
  readonly from_m: number
  readonly to_m: number
}

/**
 * The sun's patch on the floor behind an upright opening, in section: an endless overhang takes the light off
 * the top of the opening, and what is left lands at height / tan(profile).
 *
 * @param profile_deg vertical shadow angle, see profileAngle
 * @returns null where no beam comes in: sun down or behind the wall, or the opening wholly shaded
 */
export function litFloor(opening: Opening, profile_deg: number): LitFloor | null {
  if (!(profile_deg > 0 && profile_deg < 90)) return null
  const fromHeight_m = opening.sill_m
  const lit_m = opening.height_m - shadedHeight(opening, profile_deg)
  if (lit_m <= 0) return null
  const toHeight_m = fromHeight_m + lit_m
  const slope = Math.tan(profile_deg * RAD)
  return { profile_deg, fromHeight_m, toHeight_m, from_m: fromHeight_m / slope, to_m: toHeight_m / slope }
}

/** Share of the beam through an opening that lands on the floor before it meets the wall across, 0 to 1. */
export function floorShare(opening: Opening, profile_deg: number, roomDepth_m: number): number {
  const patch = litFloor(opening, profile_deg)
  if (!patch) return profile_deg >= 90 ? 1 : 0
  // Rays that come through below this height reach the floor.
  const reach_m = roomDepth_m * Math.tan(profile_deg * RAD)
  const { fromHeight_m, toHeight_m } = patch
  return Math.min(1, Math.max(0, (reach_m - fromHeight_m) / (toHeight_m - fromHeight_m)))
}
