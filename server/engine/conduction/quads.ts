import { addAt, bandMatrix } from './band-matrix.ts'
import type { Substance } from './specs.ts'
import type { Boundary, Probe, ThermalSystem } from './thermal-system.ts'

/** A mesh of quadrilaterals in the x-z plane, for 1 m across it. */
export interface QuadMesh {
  readonly x_m: Float64Array
  readonly z_m: Float64Array
  /** Four nodes of each cell, anticlockwise, `corner[4 * cell + 0..3]`. */
  readonly corner: Int32Array
  /** Index into `substances` of each cell. */
  readonly substance: Uint16Array
  readonly substances: readonly Substance[]
  /** Edges under a film, by boundary group. */
  readonly edges: readonly {
    readonly group: string
    readonly film_Wm2K: number
    readonly nodes: readonly (readonly [number, number])[]
  }[]
}

const GAUSS = 1 / Math.sqrt(3)

/**
 * Assembles C dT/dt = -K T + B u on quadrilaterals: bilinear elements, 2 by 2 Gauss points, heat
 * capacity lumped to the corners (Zienkiewicz and Taylor, The Finite Element Method, from memory).
 *
 * @throws RangeError for a cell that is turned over
 */
export function assembleQuads(mesh: QuadMesh, probes: readonly Probe[] = []): ThermalSystem {
  const { x_m, z_m, corner, substance, substances } = mesh
  const nodes = x_m.length
  const cells = substance.length
  let halfWidth = 0
  for (let cell = 0; cell < cells; cell++)
    for (let a = 0; a < 4; a++)
      for (let b = 0; b < a; b++)
        halfWidth = Math.max(halfWidth, Math.abs(corner[4 * cell + a] - corner[4 * cell + b]))
  const capacity_JK = new Float64Array(nodes)
  const conductance_WK = bandMatrix(nodes, halfWidth)
  const gradientX = new Float64Array(4)
  const gradientZ = new Float64Array(4)
  for (let cell = 0; cell < cells; cell++) {
    const { conductivity_WmK, volumetricHeat_Jm3K } = substances[substance[cell]]
    const at = 4 * cell
    for (let point = 0; point < 4; point++) {
      const r = point & 1 ? GAUSS : -GAUSS
      const s = point & 2 ? GAUSS : -GAUSS
      const shape = [(1 - r) * (1 - s), (1 + r) * (1 - s), (1 + r) * (1 + s), (1 - r) * (1 + s)]
      const dr = [-(1 - s), 1 - s, 1 + s, -(1 + s)]
      const ds = [-(1 - r), -(1 + r), 1 + r, 1 - r]
      let xr = 0
      let xs = 0
      let zr = 0
      let zs = 0
      for (let a = 0; a < 4; a++) {
        const node = corner[at + a]
        xr += 0.25 * dr[a] * x_m[node]
        xs += 0.25 * ds[a] * x_m[node]
        zr += 0.25 * dr[a] * z_m[node]
        zs += 0.25 * ds[a] * z_m[node]
      }
      const area = xr * zs - xs * zr
      if (!(area > 0)) throw new RangeError(`Cell ${cell} of the section is turned over.`)
      for (let a = 0; a < 4; a++) {
        gradientX[a] = (0.25 * (dr[a] * zs - ds[a] * zr)) / area
        gradientZ[a] = (0.25 * (ds[a] * xr - dr[a] * xs)) / area
        capacity_JK[corner[at + a]] += 0.25 * shape[a] * area * volumetricHeat_Jm3K
      }
      for (let a = 0; a < 4; a++)
        for (let b = 0; b <= a; b++)
          addAt(
            conductance_WK,
            corner[at + a],
            corner[at + b],
            conductivity_WmK * area * (gradientX[a] * gradientX[b] + gradientZ[a] * gradientZ[b]),
          )
    }
  }
  return {
    capacity_JK,
    conductance_WK,
    boundaries: mesh.edges.map((edge) => film(mesh, edge, conductance_WK)),
    probes,
  }
}

function film(
  mesh: QuadMesh,
  edge: QuadMesh['edges'][number],
  matrix: ReturnType<typeof bandMatrix>,
): Boundary {
  const sum = new Map<number, number>()
  for (const [a, b] of edge.nodes) {
    const half = 0.5 * edge.film_Wm2K * Math.hypot(mesh.x_m[a] - mesh.x_m[b], mesh.z_m[a] - mesh.z_m[b])
    for (const node of [a, b]) sum.set(node, (sum.get(node) ?? 0) + half)
  }
  for (const [node, value] of sum) addAt(matrix, node, node, value)
  return {
    name: edge.group,
    node: Int32Array.from(sum.keys()),
    conductance_WK: Float64Array.from(sum.values()),
  }
}
