/**
 * Grid lines through given stops, fine where asked and growing smoothly between.
 *
 * Between two stops there are as many cells as the integral of 1/size asks for, each with an equal share
 * of that integral.
 *
 * @param stops  ascending positions that must be lines [m]
 * @param size   wanted cell size at a position, more than 0 [m]
 * @param refinement divides every cell
 */
export function gridLines(
  stops: readonly number[],
  size: (at: number) => number,
  refinement: number,
): Float64Array {
  const lines: number[] = [stops[0]]
  for (let s = 0; s + 1 < stops.length; s++) {
    const { at, share } = cellsUpTo(stops[s], stops[s + 1], size)
    const whole = share[share.length - 1]
    const count = Math.max(1, Math.ceil(whole - 1e-6)) * refinement
    let i = 0
    for (let n = 1; n < count; n++) {
      const goal = (whole * n) / count
      while (share[i + 1] < goal) i++
      lines.push(at[i] + ((goal - share[i]) / (share[i + 1] - share[i])) * (at[i + 1] - at[i]))
    }
    lines.push(stops[s + 1])
  }
  return Float64Array.from(lines)
}

/** Number of cells from the start up to places between two stops, in steps of a small part of the wanted size. */
function cellsUpTo(
  from: number,
  to: number,
  size: (at: number) => number,
): { at: number[]; share: number[] } {
  const at = [from]
  const share = [0]
  // From whichever end: a step must be small against the size at both of its ends.
  for (let place = from; place < to;) {
    const here = 0.1 * size(place + 1e-9 * (to - from))
    let step = Math.min(here, to - place)
    step = Math.min(step, Math.max(0.1 * size(place + step - 1e-9 * (to - from)), 0.05 * here))
    const next = to - place - step < 1e-9 * (to - from) ? to : place + step
    share.push(share[share.length - 1] + (next - place) / size(0.5 * (place + next)))
    at.push(next)
    place = next
  }
  return { at, share }
}
