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
  /** Nearest and farthest edge of the patch from the sill's foot [m], not cut at the wall across. */
  readonly from_m: number
  readonly to_m: number
}

/**
 * The sun's patch on the floor behind an opening, in section: an endless overhang takes the light off the top
 * of the opening, and what comes in at a height lands at height / tan(profile) further in.
 *
 * @param profile_deg vertical shadow angle, see profileAngle
 * @param tilt_deg of the glass, 90 upright; leaning glass goes inwards from its sill up
 * @returns null where no beam comes in: sun down or behind the glass, or the opening wholly shaded
 */
export function litFloor(opening: Opening, profile_deg: number, tilt_deg = 90): LitFloor | null {
  if (!(profile_deg > 0 && profile_deg + tilt_deg < 180)) return null
  const lit_m = opening.height_m - shadedHeight(opening, profile_deg, tilt_deg)
  if (lit_m <= 0) return null
  const fromHeight_m = opening.sill_m
  const toHeight_m = fromHeight_m + lit_m * Math.sin(tilt_deg * RAD)
  const perHeight = Math.cos(profile_deg * RAD) / Math.sin(profile_deg * RAD)
  return {
    profile_deg,
    fromHeight_m,
    toHeight_m,
    from_m: fromHeight_m * perHeight,
    to_m: toHeight_m * perHeight + lit_m * Math.cos(tilt_deg * RAD),
  }
}

/** Share of the beam through an opening that lands on the floor before it meets the wall across, 0 to 1. */
export function floorShare(
  opening: Opening,
  profile_deg: number,
  roomDepth_m: number,
  tilt_deg = 90,
): number {
  // Where an endless overhang would shade all, beam comes in past the ends of a short one, at any height.
  const patch =
    litFloor(opening, profile_deg, tilt_deg) ??
    litFloor({ ...opening, overhang: null }, profile_deg, tilt_deg)
  if (!patch) return 0
  if (patch.to_m <= roomDepth_m) return 1
  return Math.max(0, (roomDepth_m - patch.from_m) / (patch.to_m - patch.from_m))
}
