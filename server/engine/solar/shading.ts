import type { WindowModel } from '../zone/house-model.ts'

const RAD = Math.PI / 180

type Opening = Pick<WindowModel, 'width_m' | 'height_m' | 'overhang' | 'fins'>

/**
 * Sunlit share of an upright opening behind an overhang and two fins, exact for thin plates: the
 * overhang's shadow is the opening's strip below its edge's shadow, cut where it ends sideways; the
 * fin on the sun's side darkens a strip from its jamb inwards. Fins are taken to reach up to the overhang, or
 * endlessly up where there is none.
 *
 * @param profile_deg  vertical shadow angle: tan(profile) = tan(altitude) / cos(azimuth - facing)
 * @param side_deg     sun's azimuth minus the facing, positive clockwise seen from above, within ±90
 */
export function sunlitShare(opening: Opening, profile_deg: number, side_deg: number): number {
  const { width_m, height_m, overhang, fins } = opening
  if (!overhang && !fins) return 1
  // A high sun behind an upright plane still meets a leaning opening, from above the overhang.
  if (Math.abs(side_deg) >= 90) return overhang ? 0 : 1
  const sideways = Math.abs(Math.tan(side_deg * RAD))
  // The other fin throws its shadow away from the opening.
  const fin_m = fins ? Math.max(0, sideways * fins.depth_m - fins.gap_m) : 0
  const clear_m = Math.max(0, width_m - fin_m)
  if (clear_m === 0) return 0
  if (!overhang) return clear_m / width_m
  const dark_m = shadedHeight(opening, profile_deg)
  if (dark_m === 0) return clear_m / width_m
  // A point y below the overhang is shaded by the plate at the distance y / tan(profile) from the wall, and
  // tan(side) times that distance nearer the sun. Where the plate has ended there, the point is lit: a corner
  // at the sun's jamb, of which the fin takes its strip.
  const lean = sideways / Math.tan(profile_deg * RAD)
  const lit = uncoveredCorner(overhang.rise_m, dark_m, lean, overhang.extra_m + fin_m, clear_m)
  return (clear_m * height_m - (clear_m * dark_m - lit)) / (width_m * height_m)
}

/** How far the shadow of an endless overhang reaches below the head of an opening, at most to its sill [m]. */
export function shadedHeight(opening: Pick<Opening, 'height_m' | 'overhang'>, profile_deg: number): number {
  const { height_m, overhang } = opening
  if (!overhang) return 0
  if (profile_deg >= 90) return height_m
  return Math.min(height_m, Math.max(0, overhang.depth_m * Math.tan(profile_deg * RAD) - overhang.rise_m))
}

/**
 * Profile angle of the sun, its altitude projected on a plane square to the wall:
 * tan(profile) = tan(altitude) / cos(side) (Duffie and Beckman, section 1.6, from memory). More than 90 for a
 * sun behind the wall [deg].
 */
export function profileAngle(altitude_deg: number, side_deg: number): number {
  return Math.atan2(Math.tan(altitude_deg * RAD), Math.cos(side_deg * RAD)) / RAD
}

/** Azimuth of the sun seen from a facing, positive clockwise, from -180 to 180 [deg]. */
export function sideAngle(azimuth_deg: number, faces_deg: number): number {
  return ((((azimuth_deg - faces_deg + 180) % 360) + 360) % 360) - 180
}

/** Area of the strip rise..rise+dark below the overhang that its end does not cover: ∫ clamp(lean y - extra, 0, clear) dy. */
function uncoveredCorner(rise: number, dark: number, lean: number, extra: number, clear: number): number {
  if (lean === 0) return 0
  const integral = (y: number) => {
    const start = extra / lean
    const end = (extra + clear) / lean
    const over = Math.min(Math.max(y, start), end) - start
    return 0.5 * lean * over * over + Math.max(0, y - end) * clear
  }
  return integral(rise + dark) - integral(rise)
}

/**
 * Share of the sky's diffuse light left by overhang and fins: mean view factor of the opening to the sky
 * past an endless overhang (crossed strings, Hottel) times the same for endless fins, of which half stands
 * before the sky.
 */
export function skyShare(opening: Opening): number {
  const { width_m, height_m, overhang, fins } = opening
  let share = 1
  if (overhang) share *= 1 - stripView(height_m, overhang.rise_m, overhang.depth_m) / 0.5
  if (fins) share *= 1 - stripView(width_m, fins.gap_m, fins.depth_m) * 2
  return Math.max(0, share)
}

/** View factor from a strip of that height to an endless plate square to it, `gap` beyond its edge: crossed strings. */
function stripView(height: number, gap: number, depth: number): number {
  const far = Math.hypot(height + gap, depth)
  const near = Math.hypot(gap, depth)
  return (height + near - far) / (2 * height)
}
