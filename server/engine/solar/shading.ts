import type { WindowModel } from '../zone/house-model.ts'

const RAD = Math.PI / 180

type Opening = Pick<WindowModel, 'width_m' | 'height_m' | 'overhang' | 'fins'>

/**
 * Sunlit share of an upright opening behind an overhang and two fins, exact for thin plates: the
 * overhang's shadow is the opening's strip below its edge's shadow, cut where it ends sideways; the
 * fins darken strips from the jambs inwards.
 *
 * @param profile_deg  vertical shadow angle: tan(profile) = tan(altitude) / cos(azimuth - facing)
 * @param side_deg     sun's azimuth minus the facing, positive clockwise seen from above, within ±90
 */
export function sunlitShare(opening: Opening, profile_deg: number, side_deg: number): number {
  const { width_m, height_m, overhang, fins } = opening
  if (!overhang && !fins) return 1
  const sideways = Math.tan(side_deg * RAD)
  // The shadow moves away from the sun: looking out, a sun clockwise of the facing throws it anticlockwise.
  const fin_m = fins ? Math.max(0, Math.abs(sideways) * fins.depth_m - fins.gap_m) : 0
  const clear_m = Math.max(0, width_m - fin_m)
  if (clear_m === 0) return 0
  if (!overhang) return clear_m / width_m
  const drop_m = overhang.depth_m * Math.tan(profile_deg * RAD) - overhang.rise_m
  const dark_m = Math.min(height_m, Math.max(0, drop_m))
  if (dark_m === 0) return clear_m / width_m
  // Sideways, the edge's shadow is shifted by depth · tan(side); points of the overhang nearer the wall by less.
  // A point at height y below the overhang is shaded by the plate at distance y / tan(profile) from the wall,
  // shifted there by that distance times tan(side): the lit corner is a triangle or trapezium.
  const lean = Math.abs(sideways) / Math.tan(profile_deg * RAD)
  const lit = uncoveredCorner(overhang.rise_m, dark_m, lean, overhang.extra_m, clear_m)
  return (clear_m * height_m - (clear_m * dark_m - lit)) / (width_m * height_m)
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
 * past an endless overhang (crossed strings, Hottel) times the same for the fins.
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
