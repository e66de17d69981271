import { gridLines } from './mesh-lines.ts'
import type { QuadMesh } from './quads.ts'
import { bermFoot, wallOuterFace } from './section-geometry.ts'
import type { SectionSpec } from './specs.ts'

const LEAST_M = 0.002

/** Ascending, without repetition; those that must stay win over their neighbours. */
function stops(values: readonly number[]): number[] {
  const sorted = [...values].sort((a, b) => a - b)
  return sorted.filter((value, i) => i === 0 || value - sorted[i - 1] > LEAST_M)
}

/** Level ground has few lines that must be, so it affords smaller cells. */
const cellScale = (spec: SectionSpec) => (spec.berm ? 1 : 0.8)

/** Columns from the middle of the floor outwards [m]. */
export function columnLines(spec: SectionSpec): Float64Array {
  const outer_m = wallOuterFace(spec)
  const places = [0, spec.halfFloor_m, outer_m]
  let face = outer_m
  for (const layer of spec.wall) places.push((face -= layer.thickness_m))
  const tips: number[] = []
  const foot = bermFoot(spec)
  if (foot) places.push(outer_m + foot.crest_m, outer_m + foot.toe_m)
  if (spec.skirt) places.push(outer_m + spec.skirt.thickness_m)
  if (spec.umbrella) tips.push(outer_m + spec.umbrella.reach_m)
  if (spec.cover) places.push(outer_m + spec.cover.reach_m)
  const end = Math.max(...places, ...tips) + spec.extent.beyond_m
  const thin = (at: number) => {
    let start = outer_m
    for (const layer of spec.wall) {
      if (at < start && at > start - layer.thickness_m) return Math.max(layer.thickness_m / 3, 0.01)
      start -= layer.thickness_m
    }
    return Infinity
  }
  const fine = [spec.halfFloor_m, outer_m]
  const scale = cellScale(spec)
  const size = (at: number) => {
    const wall = 0.03 + 0.26 * Math.min(...fine.map((face_m) => Math.abs(at - face_m)))
    const tip = 0.08 + 0.26 * Math.min(Infinity, ...tips.map((tip_m) => Math.abs(at - tip_m)))
    const inBerm = foot && at > outer_m && at < outer_m + foot.toe_m ? 0.6 : Infinity
    return Math.min(scale * Math.min(wall, tip, inBerm, 2.5), thin(at))
  }
  return gridLines(stops([...places, ...tips, end]), size, spec.refinement)
}

/** Heights of the rows at the wall, downwards [m]. */
export function rowLines(spec: SectionSpec): Float64Array {
  const soilTop = spec.berm?.height_m ?? 0
  const places = [spec.wallTop_m, soilTop, 0, spec.floorLevel_m, -spec.extent.depth_m]
  let at = spec.floorLevel_m
  const thin: [number, number][] = []
  for (const layer of [...spec.floor].reverse()) {
    thin.push([at - layer.thickness_m, at])
    places.push((at -= layer.thickness_m))
  }
  let below = soilTop
  for (const layer of [...(spec.cover?.layers ?? []), ...(spec.umbrella?.layers ?? [])]) {
    thin.push([below - layer.thickness_m, below])
    places.push((below -= layer.thickness_m))
  }
  if (spec.footing) places.push(-spec.footing.depth_m)
  if (spec.skirt) places.push(spec.skirt.top_m, spec.skirt.bottom_m)
  const faces = [spec.floorLevel_m, soilTop]
  const scale = cellScale(spec)
  const size = (z: number) => {
    const face = 0.03 + 0.26 * Math.min(...faces.map((level) => Math.abs(z - level)))
    const foot = spec.footing ? 0.12 + 0.26 * Math.abs(z + spec.footing.depth_m) : Infinity
    const layer = thin.find(([low, high]) => z > low && z < high)
    const inLayer = layer ? Math.max((layer[1] - layer[0]) / 3, 0.008) : Infinity
    return Math.min(scale * Math.min(face, foot, 1.6), inLayer)
  }
  return gridLines(stops(places), size, spec.refinement).reverse()
}

/** Edges under a film, by boundary group, in the order that SectionSpec gives. */
export function sectionEdges(
  spec: SectionSpec,
  columns: Float64Array,
  rows: Float64Array,
  nodeAt: Int32Array,
): QuadMesh['edges'] {
  const outer_m = wallOuterFace(spec)
  const soilTop = spec.berm?.height_m ?? 0
  const foot = bermFoot(spec)
  const nz = rows.length
  const near = (list: Float64Array, value: number) =>
    list.reduce((best, item, i) => (Math.abs(item - value) < Math.abs(list[best] - value) ? i : best), 0)
  const inner = near(columns, spec.halfFloor_m)
  const outer = near(columns, outer_m)
  const floor = near(rows, spec.floorLevel_m)
  const surface = near(rows, soilTop)
  type Edge = readonly [number, number]
  const floorEdges: Edge[] = []
  for (let i = 0; i < inner; i++) floorEdges.push([nodeAt[i * nz + floor], nodeAt[(i + 1) * nz + floor]])
  const inside: Edge[] = []
  for (let j = 0; j < floor; j++) inside.push([nodeAt[inner * nz + j], nodeAt[inner * nz + j + 1]])
  const outside: Edge[] = []
  for (let j = 0; j < surface; j++) outside.push([nodeAt[outer * nz + j], nodeAt[outer * nz + j + 1]])
  const level: Edge[] = []
  const slope: Edge[] = []
  for (let i = outer; i + 1 < columns.length; i++) {
    const middle = 0.5 * (columns[i] + columns[i + 1]) - outer_m
    const isSlope = foot !== null && middle > foot.crest_m && middle < foot.toe_m
    ;(isSlope ? slope : level).push([nodeAt[i * nz + surface], nodeAt[(i + 1) * nz + surface]])
  }
  const { films } = spec
  return [
    { group: 'floor', film_Wm2K: films.floor, nodes: floorEdges },
    { group: 'wall-inside', film_Wm2K: films.wallInside, nodes: inside },
    { group: 'wall-outside', film_Wm2K: films.wallOutside, nodes: outside },
    { group: 'level', film_Wm2K: films.ground, nodes: level },
    { group: 'slope', film_Wm2K: films.ground, nodes: slope },
  ].filter(({ nodes }) => nodes.length > 0)
}
