import { addAt, bandMatrix } from '#engine/conduction/band-matrix.ts'
import { layersSystem, type LayersOptions } from '#engine/conduction/layers.ts'
import type { Layer, LayersSpec } from '#engine/conduction/specs.ts'
import type { Boundary, ThermalSystem } from '#engine/conduction/thermal-system.ts'

/** Numbers from 0 to 1, the same each time (Park and Miller 1988). */
export function seeded(seed: number): () => number {
  let state = seed + 1
  return () => (state = (state * 16807) % 2147483647) / 2147483647
}

export const layer = (thickness_m: number, conductivity_WmK: number, volumetricHeat_Jm3K: number): Layer => ({
  name: 'layer',
  thickness_m,
  conductivity_WmK,
  volumetricHeat_Jm3K,
})

export const EARTH_WALL: LayersSpec = {
  kind: 'layers',
  layers: [
    layer(0.02, 0.8, 1.6e6),
    layer(0.1, 0.036, 45000),
    layer(0.02, 0.12, 1200),
    layer(0.3, 0.6, 1.6e6),
  ],
  outsideFilm_Wm2K: 20,
  insideFilm_Wm2K: 8,
}

export const earthWall = (options?: LayersOptions): ThermalSystem => layersSystem(EARTH_WALL, options)

/** A block of soil, 24 by 20 cells growing downwards and outwards, with three groups along its surface. */
export function soilBlock(): ThermalSystem {
  const [columns, rows] = [20, 24]
  const wide = Array.from({ length: columns }, (_, i) => 0.05 * 1.25 ** i)
  const deep = Array.from({ length: rows }, (_, j) => 0.02 * 1.3 ** j)
  const size = columns * rows
  const capacity_JK = new Float64Array(size)
  const conductance_WK = bandMatrix(size, columns)
  const join = (a: number, b: number, conductance: number) => {
    addAt(conductance_WK, a, a, conductance)
    addAt(conductance_WK, b, b, conductance)
    addAt(conductance_WK, a, b, -conductance)
  }
  for (let j = 0; j < rows; j++)
    for (let i = 0; i < columns; i++) {
      const node = j * columns + i
      capacity_JK[node] = 2e6 * wide[i] * deep[j]
      if (i > 0) join(node, node - 1, (1.2 * deep[j]) / (0.5 * (wide[i] + wide[i - 1])))
      if (j > 0) join(node, node - columns, (1.2 * wide[i]) / (0.5 * (deep[j] + deep[j - 1])))
    }
  const group = (name: string, from: number, to: number, film: number): Boundary => {
    const node = Int32Array.from({ length: to - from }, (_, i) => from + i)
    const films = Float64Array.from(node, (n) => film * wide[n])
    node.forEach((n, i) => addAt(conductance_WK, n, n, films[i]))
    return { name, node, conductance_WK: films }
  }
  const boundaries = [group('floor', 0, 8, 6), group('wall', 8, 11, 8), group('level', 11, 20, 20)]
  const probes = [{ name: 'deep', node: Int32Array.of(12 * columns + 4), weight: Float64Array.of(1) }]
  return { capacity_JK, conductance_WK, boundaries, probes }
}
