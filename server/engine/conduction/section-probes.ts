import type { QuadMesh } from './quads.ts'
import type { SectionMesh } from './section.ts'
import { bermFoot, floorThickness, surfaceHeight, wallOuterFace } from './section-geometry.ts'
import type { Probe } from './thermal-system.ts'

/**
 * The probes asked for, and the heat contents that every section tells: `heat:store` (soil within the
 * umbrella’s reach, or the toe of the berm, or 1 m, down to 6 m below the floor), `heat:wall`, `heat:floor`.
 *
 * @throws RangeError for a probe outside the section
 */
export function sectionProbes(mesh: SectionMesh): Probe[] {
  const { spec } = mesh
  const outer_m = wallOuterFace(spec)
  const places = spec.probes.map((probe): Probe => {
    const x = outer_m + probe.fromWall_m
    const top = probe.fromWall_m > 0 ? surfaceHeight(spec, probe.fromWall_m) : spec.floorLevel_m
    const found = locate(mesh, x, top - probe.depth_m)
    if (!found) throw new RangeError(`probe ${probe.name} lies outside the section`)
    return { name: probe.name, ...found }
  })
  const underside = spec.floorLevel_m - floorThickness(spec)
  const reach = spec.umbrella?.reach_m ?? bermFoot(spec)?.toe_m ?? 1
  const parts = {
    'heat:store': new Map<number, number>(),
    'heat:wall': new Map<number, number>(),
    'heat:floor': new Map<number, number>(),
  }
  for (let c = 0; c < mesh.substance.length; c++) {
    const corners = mesh.corner.subarray(4 * c, 4 * c + 4)
    let x = 0
    let z = 0
    for (const node of corners) {
      x += 0.25 * mesh.x_m[node]
      z += 0.25 * mesh.z_m[node]
    }
    const isWall =
      x > spec.halfFloor_m && x < outer_m && z > Math.min(underside, 0, -(spec.footing?.depth_m ?? 0))
    const isFloor = x < spec.halfFloor_m && z > underside
    const isStore = !isWall && !isFloor && x < outer_m + reach && z > spec.floorLevel_m - 6
    const part = isWall ? 'heat:wall' : isFloor ? 'heat:floor' : isStore ? 'heat:store' : null
    if (!part) continue
    const { volumetricHeat_Jm3K } = mesh.substances[mesh.substance[c]]
    const quarter = 0.25 * volumetricHeat_Jm3K * quadArea(mesh, c)
    for (const node of corners) parts[part].set(node, (parts[part].get(node) ?? 0) + quarter)
  }
  const heat = Object.entries(parts).map(([name, weights]): Probe => ({
    name,
    node: Int32Array.from(weights.keys()),
    weight: Float64Array.from(weights.values()),
  }))
  return [...places, ...heat]
}

/** Area of a cell [m²]. */
export function quadArea(mesh: QuadMesh, cell: number): number {
  const [a, b, c, d] = mesh.corner.subarray(4 * cell, 4 * cell + 4)
  const { x_m: x, z_m: z } = mesh
  return 0.5 * ((x[c] - x[a]) * (z[d] - z[b]) - (x[d] - x[b]) * (z[c] - z[a]))
}

/** The cell around a place, and the weights of its corners; null in a void or outside. */
export function locate(
  mesh: SectionMesh,
  x: number,
  z: number,
): { node: Int32Array; weight: Float64Array } | null {
  const { columns, rows, nodeAt, z_m } = mesh
  const nz = rows.length
  let i = 0
  while (i + 2 < columns.length && columns[i + 1] <= x) i++
  if (x < columns[0] || x > columns[columns.length - 1]) return null
  const across = (x - columns[i]) / (columns[i + 1] - columns[i])
  for (let j = 0; j + 1 < nz; j++) {
    const corners = [
      nodeAt[i * nz + j],
      nodeAt[(i + 1) * nz + j],
      nodeAt[i * nz + j + 1],
      nodeAt[(i + 1) * nz + j + 1],
    ]
    if (corners.includes(-1)) continue
    const top = z_m[corners[0]] + across * (z_m[corners[1]] - z_m[corners[0]])
    const bottom = z_m[corners[2]] + across * (z_m[corners[3]] - z_m[corners[2]])
    if (z > top + 1e-9 || z < bottom - 1e-9) continue
    const down = (top - z) / (top - bottom)
    return {
      node: Int32Array.from(corners),
      weight: Float64Array.of(
        (1 - across) * (1 - down),
        across * (1 - down),
        (1 - across) * down,
        across * down,
      ),
    }
  }
  return null
}
