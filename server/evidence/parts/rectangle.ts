import { addAt, choleskyFactor, choleskySolve } from '#engine/conduction/band-matrix.ts'
import { assembleQuads, type QuadMesh } from '#engine/conduction/quads.ts'
import type { Substance } from '#engine/conduction/specs.ts'
import type { ThermalSystem } from '#engine/conduction/thermal-system.ts'

/** A film so large that its surface has the temperature behind it [W/(m² K)]. */
export const FIXED_WM2K = 1e9

/** Part of the top, bottom, left or right side of a rectangle, with the film and temperature behind it. */
export interface Side {
  readonly side: 'top' | 'bottom' | 'left' | 'right'
  readonly from_m: number
  readonly to_m: number
  readonly film_Wm2K: number
  readonly temperature: number
}

export interface Rectangle {
  readonly mesh: QuadMesh
  readonly system: ThermalSystem
  readonly nodeAt: (x_m: number, z_m: number) => number
}

/**
 * Grid of cells between lines of x and z (both ascending), put together by the program's own assembly.
 * `bend` moves the nodes, for meshes that are not upright.
 */
export function rectangle(
  x_m: readonly number[],
  z_m: readonly number[],
  substanceAt: (x_m: number, z_m: number) => Substance,
  sides: readonly Side[],
  bend: (x_m: number, z_m: number) => readonly [number, number] = (x, z) => [x, z],
): Rectangle {
  const nx = x_m.length
  const nz = z_m.length
  const node = (i: number, j: number) => i * nz + j
  const places = x_m.flatMap((x) => z_m.map((z) => bend(x, z)))
  const substances: Substance[] = []
  const kinds: number[] = []
  const corner: number[] = []
  for (let i = 0; i + 1 < nx; i++)
    for (let j = 0; j + 1 < nz; j++) {
      const one = substanceAt(0.5 * (x_m[i] + x_m[i + 1]), 0.5 * (z_m[j] + z_m[j + 1]))
      if (!substances.includes(one)) substances.push(one)
      kinds.push(substances.indexOf(one))
      corner.push(node(i, j), node(i + 1, j), node(i + 1, j + 1), node(i, j + 1))
    }
  const edges = sides.map(({ side, from_m, to_m, film_Wm2K }, group) => {
    const isLevel = side === 'top' || side === 'bottom'
    const lines = isLevel ? x_m : z_m
    const at = (n: number) =>
      isLevel ? node(n, side === 'top' ? nz - 1 : 0) : node(side === 'right' ? nx - 1 : 0, n)
    const nodes: [number, number][] = []
    for (let n = 0; n + 1 < lines.length; n++) {
      const middle = 0.5 * (lines[n] + lines[n + 1])
      if (middle > from_m && middle < to_m) nodes.push([at(n), at(n + 1)])
    }
    return { group: String(group), film_Wm2K, nodes }
  })
  const mesh: QuadMesh = {
    x_m: Float64Array.from(places, ([x]) => x),
    z_m: Float64Array.from(places, ([, z]) => z),
    corner: Int32Array.from(corner),
    substance: Uint16Array.from(kinds),
    substances,
    edges,
  }
  const nearest = (lines: readonly number[], value: number) =>
    lines.reduce((best, line, n) => (Math.abs(line - value) < Math.abs(lines[best] - value) ? n : best), 0)
  return {
    mesh,
    system: assembleQuads(mesh),
    nodeAt: (x, z) => node(nearest(x_m, x), nearest(z_m, z)),
  }
}

/**
 * Steady temperatures and the flow from each boundary group into the body [W per m].
 *
 * @param inputs temperature behind each group, in the order of the system's boundaries
 */
export function steady(
  system: ThermalSystem,
  inputs: readonly number[],
): { temperature: Float64Array; flow: number[] } {
  const right = new Float64Array(system.capacity_JK.length)
  system.boundaries.forEach((boundary, g) =>
    boundary.node.forEach((node, i) => (right[node] += boundary.conductance_WK[i] * inputs[g])),
  )
  // Behind a film of 1e9 W/m²K the flow is a difference of nearly equal numbers, so it is taken from the
  // conduction inside: K T without the films.
  const temperature = choleskySolve(choleskyFactor(system.conductance_WK), right)
  // A node under two films shares it out by their conductances.
  const conducted = conductedFrom(system, temperature)
  const films = new Float64Array(temperature.length)
  for (const { node, conductance_WK } of system.boundaries)
    node.forEach((at, i) => (films[at] += conductance_WK[i]))
  const flow = system.boundaries.map(({ node, conductance_WK }) =>
    node.reduce((sum, at, i) => sum + (conducted[at] * conductance_WK[i]) / films[at], 0),
  )
  return { temperature, flow }
}

/**
 * Steady flow into the body at nodes whose temperatures are given, one by one [W per m].
 *
 * @param given nodes and their temperatures; all other sides are adiabatic
 */
export function flowOfFixed(
  system: ThermalSystem,
  given: readonly { readonly node: number; readonly temperature: number }[],
): number[] {
  const boundaries = given.map(({ node }, i) => ({
    name: String(i),
    node: Int32Array.of(node),
    conductance_WK: Float64Array.of(FIXED_WM2K),
  }))
  const conductance_WK = { ...system.conductance_WK, data: system.conductance_WK.data.slice() }
  for (const { node } of given) addAt(conductance_WK, node, node, FIXED_WM2K)
  const { flow } = steady(
    { ...system, conductance_WK, boundaries },
    given.map(({ temperature }) => temperature),
  )
  return flow
}

/** Heat that leaves each node by conduction inside the body: Σ_j K_ij (T_i - T_j). */
function conductedFrom(system: ThermalSystem, temperature: Float64Array): Float64Array {
  const { size, halfWidth, data } = system.conductance_WK
  const out = new Float64Array(size)
  for (let i = 0; i < size; i++)
    for (let j = Math.max(0, i - halfWidth); j < i; j++) {
      const flow = -data[i * (halfWidth + 1) + j - i + halfWidth] * (temperature[i] - temperature[j])
      out[i] += flow
      out[j] -= flow
    }
  return out
}
