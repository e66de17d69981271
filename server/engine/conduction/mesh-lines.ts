/**
 * Grid lines through given stops, fine where asked and growing smoothly between.
 *
 * @param stops  ascending positions that must be lines [m]
 * @param size   wanted cell size at a position [m]
 * @param refinement divides every cell
 */
export function gridLines(
  stops: readonly number[],
  size: (at: number) => number,
  refinement: number,
): Float64Array {
  const lines: number[] = [stops[0]]
  for (let s = 0; s + 1 < stops.length; s++) {
    const from = stops[s]
    const length = stops[s + 1] - from
    const steps = 64
    const share = new Float64Array(steps + 1)
    for (let i = 0; i < steps; i++)
      share[i + 1] = share[i] + length / steps / size(from + ((i + 0.5) / steps) * length)
    const count = Math.max(1, Math.ceil(share[steps] - 1e-6)) * refinement
    let i = 0
    for (let n = 1; n < count; n++) {
      const goal = (share[steps] * n) / count
      while (share[i + 1] < goal) i++
      lines.push(from + ((i + (goal - share[i]) / (share[i + 1] - share[i])) / steps) * length)
    }
    lines.push(stops[s + 1])
  }
  return Float64Array.from(lines)
}
