import { assembleQuads, type QuadMesh } from './quads.ts'
import { checkSection } from './section-check.ts'
import { bermFoot, surfaceHeight, totalThickness, wallOuterFace } from './section-geometry.ts'
import { columnLines, rowLines, sectionEdges } from './section-lines.ts'
import { sectionProbes } from './section-probes.ts'
import { substanceAt } from './section-substance.ts'
import type { SectionSpec, Substance } from './specs.ts'
import type { ThermalSystem } from './thermal-system.ts'

/** A section's mesh: a grid of columns and rows with voids, for 1 m of length. */
export interface SectionMesh extends QuadMesh {
  readonly spec: SectionSpec
  /** Columns, outwards [m]. */
  readonly columns: Float64Array
  /** Heights of the rows at the wall, downwards [m]. */
  readonly rows: Float64Array
  /** Node of column i and row j, `nodeAt[i * rows.length + j]`; -1 in a void. */
  readonly nodeAt: Int32Array
  /** Cells as (column, row), `place[2 * cell]`, `place[2 * cell + 1]`. */
  readonly place: Int32Array
}

/**
 * The half-section of one side as a thermal system for 1 m of length; see SectionSpec for its groups.
 * Rows are level under the floor and in the wall; outside they run parallel to the surface through
 * cover and umbrella and flatten out below, so that a board on a slope is one unbroken layer.
 *
 * @throws RangeError naming the part of the section that cannot be
 */
export function sectionSystem(spec: SectionSpec): { system: ThermalSystem; mesh: SectionMesh } {
  checkSection(spec)
  const mesh = sectionMesh(spec)
  return { system: assembleQuads(mesh, sectionProbes(mesh)), mesh }
}

function sectionMesh(spec: SectionSpec): SectionMesh {
  const columns = columnLines(spec)
  const rows = rowLines(spec)
  const nx = columns.length
  const nz = rows.length
  const outer_m = wallOuterFace(spec)
  const soilTop = spec.berm?.height_m ?? 0
  const buried = totalThickness(spec.cover?.layers) + totalThickness(spec.umbrella?.layers)
  const depthEnd = soilTop + spec.extent.depth_m

  const heightAt = (i: number, j: number): number => {
    const from = columns[i] - outer_m
    const depth = soilTop - rows[j]
    if (from <= 1e-9 || depth < -1e-9) return rows[j]
    const surface = surfaceHeight(spec, from)
    const steep = stretch(spec, from)
    if (depth <= buried) return surface - depth * steep
    const below = (depth - buried) / (depthEnd - buried)
    return surface - buried * steep - below * (surface - buried * steep + spec.extent.depth_m)
  }

  const substances: Substance[] = []
  const known = new Map<string, number>()
  const indexOf = (one: Substance) => {
    const key = `${one.conductivity_WmK} ${one.volumetricHeat_Jm3K} ${one.name}`
    let index = known.get(key)
    if (index === undefined) {
      known.set(key, (index = substances.length))
      substances.push(one)
    }
    return index
  }
  const place: number[] = []
  const kinds: number[] = []
  for (let i = 0; i + 1 < nx; i++)
    for (let j = 0; j + 1 < nz; j++) {
      const middle =
        0.25 * (heightAt(i, j) + heightAt(i + 1, j) + heightAt(i, j + 1) + heightAt(i + 1, j + 1))
      const one = substanceAt(
        spec,
        0.5 * (columns[i] + columns[i + 1]),
        0.5 * (rows[j] + rows[j + 1]),
        middle,
      )
      if (!one) continue
      place.push(i, j)
      kinds.push(indexOf(one))
    }

  const nodeAt = new Int32Array(nx * nz).fill(-1)
  for (let c = 0; c < kinds.length; c++) {
    const i = place[2 * c]
    const j = place[2 * c + 1]
    for (const at of [i * nz + j, i * nz + j + 1, (i + 1) * nz + j, (i + 1) * nz + j + 1]) nodeAt[at] = 0
  }
  const x: number[] = []
  const z: number[] = []
  for (let i = 0; i < nx; i++)
    for (let j = 0; j < nz; j++)
      if (nodeAt[i * nz + j] === 0) {
        nodeAt[i * nz + j] = x.length
        x.push(columns[i])
        z.push(heightAt(i, j))
      }
  const corner = new Int32Array(4 * kinds.length)
  for (let c = 0; c < kinds.length; c++) {
    const i = place[2 * c]
    const j = place[2 * c + 1]
    // Rows run downwards, so anticlockwise begins at the lower left.
    corner[4 * c] = nodeAt[i * nz + j + 1]
    corner[4 * c + 1] = nodeAt[(i + 1) * nz + j + 1]
    corner[4 * c + 2] = nodeAt[(i + 1) * nz + j]
    corner[4 * c + 3] = nodeAt[i * nz + j]
  }
  return {
    spec,
    columns,
    rows,
    nodeAt,
    place: Int32Array.from(place),
    x_m: Float64Array.from(x),
    z_m: Float64Array.from(z),
    corner,
    substance: Uint16Array.from(kinds),
    substances,
    edges: sectionEdges(spec, columns, rows, nodeAt),
  }
}

/** Vertical over across-the-layer thickness: more than 1 on the slope, the mean of both at its ends. */
function stretch(spec: SectionSpec, from_m: number): number {
  const foot = bermFoot(spec)
  if (!foot || !spec.berm) return 1
  const onSlope = Math.hypot(1, spec.berm.run) / spec.berm.run
  if (from_m < foot.crest_m - 1e-9 || from_m > foot.toe_m + 1e-9) return 1
  if (from_m > foot.crest_m + 1e-9 && from_m < foot.toe_m - 1e-9) return onSlope
  return 0.5 * (1 + onSlope)
}
