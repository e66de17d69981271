import type { WindowModel } from '../zone/house-model.ts'

const RAD = Math.PI / 180

type Opening = Pick<WindowModel, 'width_m' | 'height_m' | 'overhang' | 'fins'>

/**
 * Sunlit share of an opening behind a level overhang and two fins square to the glass, exact for thin plates:
 * the overhang's shadow is the opening's strip below its edge's shadow, cut where it ends sideways; the fin on
 * the sun's side darkens a strip from its jamb inwards. Fins are taken to reach up to the overhang, or
 * endlessly up where there is none.
 *
 * @param side_deg sun's azimuth minus the facing, positive clockwise seen from above
 * @param tilt_deg of the glass: 90 upright; on leaning glass `height_m` and `rise_m` run along the slope
 * @returns 0 to 1; 0 for a sun behind glass that has plates, 1 for glass without
 */
export function sunlitShare(opening: Opening, altitude_deg: number, side_deg: number, tilt_deg = 90): number {
  const { width_m, height_m, overhang, fins } = opening
  if (!overhang && !fins) return 1
  const up = Math.sin(altitude_deg * RAD)
  const towards = Math.cos(altitude_deg * RAD) * Math.cos(side_deg * RAD)
  const aside = Math.cos(altitude_deg * RAD) * Math.abs(Math.sin(side_deg * RAD))
  const facing = towards * Math.sin(tilt_deg * RAD) + up * Math.cos(tilt_deg * RAD)
  if (facing <= 1e-12) return 0
  // The other fin throws its shadow away from the opening.
  const fin_m = fins ? Math.max(0, (aside / facing) * fins.depth_m - fins.gap_m) : 0
  const clear_m = Math.max(0, width_m - fin_m)
  if (clear_m === 0) return 0
  if (!overhang || up <= 0) return clear_m / width_m
  const dark_m = Math.min(height_m, Math.max(0, (overhang.depth_m * up) / facing - overhang.rise_m))
  if (dark_m === 0) return clear_m / width_m
  // The ray of a point y below the overhang comes through the overhang's level lean · y nearer the sun's side.
  // Where the plate has ended there, the point is lit: a corner at the sun's jamb, of which the fin takes its
  // strip.
  const lean = (aside * Math.sin(tilt_deg * RAD)) / up
  const lit = uncoveredCorner(overhang.rise_m, dark_m, lean, overhang.extra_m + fin_m, clear_m)
  return (clear_m * height_m - (clear_m * dark_m - lit)) / (width_m * height_m)
}

/**
 * How far the shadow of an endless level overhang reaches below the head of an opening, along the glass, at
 * most to its sill [m]:  depth · sin p / sin(p + tilt) - rise, which is depth · tan p - rise for upright glass.
 *
 * @param profile_deg p, see profileAngle
 */
export function shadedHeight(
  opening: Pick<Opening, 'height_m' | 'overhang'>,
  profile_deg: number,
  tilt_deg = 90,
): number {
  const { height_m, overhang } = opening
  if (!overhang) return 0
  const facing = Math.sin((profile_deg + tilt_deg) * RAD)
  if (facing <= 1e-12) return height_m
  const reach_m = (overhang.depth_m * Math.sin(profile_deg * RAD)) / facing
  return Math.min(height_m, Math.max(0, reach_m - overhang.rise_m))
}

/**
 * Profile angle of the sun, its altitude projected on an upright plane square to the wall:
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
 * Share of the sky's diffuse light left by overhang and fins, mean over the opening: what an endless level
 * overhang leaves of the view of the sky, by crossed strings (Hottel), times what endless fins leave. The
 * product is up to 0.05 off where both are deep. Light that the plates throw back is left out.
 */
export function skyShare(opening: Opening, tilt_deg = 90): number {
  const { height_m, overhang } = opening
  if (!overhang) return finShare(opening)
  const sky = 0.5 * (1 + Math.cos(tilt_deg * RAD))
  const covered = stripView(height_m, overhang.rise_m, overhang.depth_m, tilt_deg)
  return Math.max(0, 1 - covered / sky) * finShare(opening)
}

/** Share of the light from all around, sky and ground alike, left by endless fins on both sides. */
export function finShare({ width_m, fins }: Pick<Opening, 'width_m' | 'fins'>): number {
  return fins ? Math.max(0, 1 - 2 * stripView(width_m, fins.gap_m, fins.depth_m, 90)) : 1
}

/**
 * View factor from a strip of that height to an endless plate whose root lies `gap` beyond its edge, with an
 * angle between the two: crossed strings.
 */
function stripView(height: number, gap: number, depth: number, angle_deg: number): number {
  const tip = (from: number) =>
    Math.sqrt(from * from + depth * depth - 2 * from * depth * Math.cos(angle_deg * RAD))
  return (height + tip(gap) - tip(gap + height)) / (2 * height)
}
