import { assembleQuads, type QuadMesh } from './quads.ts'
import { gridLines } from './mesh-lines.ts'
import { bermFoot, floorThickness, surfaceHeight, totalThickness, wallOuterFace } from './section-geometry.ts'
import type { Layer, SectionSpec, Substance } from './specs.ts'
import type { Probe, ThermalSystem } from './thermal-system.ts'

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

function checkSection(spec: SectionSpec): void {
  const fail = (what: string): never => {
    throw new RangeError(what)
  }
  const positive = (name: string, value: number) => {
    if (!(value > 0 && value < Infinity)) fail(`${name} must be more than 0, got ${value}`)
  }
  positive('halfFloor_m', spec.halfFloor_m)
  const layers = (name: string, list: readonly Layer[]) =>
    list.forEach((layer, i) => {
      positive(`${name}[${i}].thickness_m`, layer.thickness_m)
      substance(`${name}[${i}]`, layer)
    })
  const substance = (name: string, one: Substance) => {
    positive(`${name}.conductivity_WmK`, one.conductivity_WmK)
    positive(`${name}.volumetricHeat_Jm3K`, one.volumetricHeat_Jm3K)
  }
  if (spec.wall.length === 0) fail('wall: at least one layer is needed')
  layers('wall', spec.wall)
  layers('floor', spec.floor)
  substance('soil', spec.soil)
  for (const [name, film] of Object.entries(spec.films)) positive(`films.${name}`, film)
  positive('extent.depth_m', spec.extent.depth_m)
  positive('extent.beyond_m', spec.extent.beyond_m)
  const soilTop = spec.berm?.height_m ?? 0
  if (spec.berm) {
    positive('berm.height_m', spec.berm.height_m)
    positive('berm.crest_m', spec.berm.crest_m)
    if (!(spec.berm.run >= 0.3)) fail(`berm.run must be 0.3 or more, got ${spec.berm.run}`)
    substance('berm.soil', spec.berm.soil)
  }
  if (!(spec.wallTop_m >= soilTop - 1e-9))
    fail(`wallTop_m (${spec.wallTop_m}) lies below the soil outside (${soilTop})`)
  if (!(spec.wallTop_m > spec.floorLevel_m))
    fail(`wallTop_m (${spec.wallTop_m}) lies below the floor (${spec.floorLevel_m})`)
  const underside = spec.floorLevel_m - floorThickness(spec)
  if (!(spec.extent.depth_m + underside > 1))
    fail(`extent.depth_m (${spec.extent.depth_m}) must reach below the floor`)
  if (spec.footing && !(-spec.footing.depth_m <= Math.min(underside, 0) + 1e-9))
    fail(`footing.depth_m (${spec.footing.depth_m}) must reach below the floor's underside (${underside})`)
  if (spec.skirt) {
    const { top_m, bottom_m, thickness_m } = spec.skirt
    positive('skirt.thickness_m', thickness_m)
    if (!(top_m > bottom_m)) fail(`skirt.top_m (${top_m}) must lie above its bottom_m (${bottom_m})`)
    if (!(top_m <= soilTop + 1e-9)) fail(`skirt.top_m (${top_m}) lies above the soil (${soilTop})`)
    if (spec.berm && thickness_m >= spec.berm.crest_m)
      fail('skirt.thickness_m must be less than berm.crest_m')
  }
  if (spec.cover) layers('cover.layers', spec.cover.layers)
  if (spec.umbrella) {
    layers('umbrella.layers', spec.umbrella.layers)
    positive('umbrella.reach_m', spec.umbrella.reach_m)
  }
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

/** What a cell is made of; null for the air of the room and outdoors. z at the wall, and where it really lies. */
function substanceAt(spec: SectionSpec, x: number, row: number, z: number): Substance | null {
  const outer_m = wallOuterFace(spec)
  const soilTop = spec.berm?.height_m ?? 0
  const underside = spec.floorLevel_m - floorThickness(spec)
  if (x < spec.halfFloor_m) {
    if (row > spec.floorLevel_m) return null
    return layerAt([...spec.floor].reverse(), spec.floorLevel_m - row) ?? spec.soil
  }
  if (x < outer_m) {
    const wallFoot = Math.min(underside, 0)
    if (row > wallFoot) return layerAt(spec.wall, outer_m - x) ?? spec.soil
    if (spec.footing && row > -spec.footing.depth_m) return spec.footing.substance
    return spec.soil
  }
  const depth = soilTop - row
  const from = x - outer_m
  if (depth < 0) return null
  const { skirt } = spec
  if (skirt && from < skirt.thickness_m && row < skirt.top_m && row > skirt.bottom_m) return skirt.substance
  const cover_m = totalThickness(spec.cover?.layers)
  if (spec.cover && from < spec.cover.reach_m) {
    const layer = layerAt(spec.cover.layers, depth)
    if (layer) return layer
  }
  if (spec.umbrella && from < spec.umbrella.reach_m && depth > cover_m) {
    const layer = layerAt(spec.umbrella.layers, depth - cover_m)
    if (layer) return layer
  }
  return spec.berm && z > 0 ? spec.berm.soil : spec.soil
}

function layerAt(layers: readonly Layer[], depth_m: number): Layer | null {
  let end = 0
  for (const layer of layers) {
    end += layer.thickness_m
    if (depth_m < end) return layer
  }
  return null
}

const LEAST_M = 0.002

/** Ascending, without repetition; those that must stay win over their neighbours. */
function stops(values: readonly number[]): number[] {
  const sorted = [...values].sort((a, b) => a - b)
  return sorted.filter((value, i) => i === 0 || value - sorted[i - 1] > LEAST_M)
}

/** Level ground has few lines that must be, so it affords smaller cells. */
const cellScale = (spec: SectionSpec) => (spec.berm ? 1 : 0.8)

function columnLines(spec: SectionSpec): Float64Array {
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

function rowLines(spec: SectionSpec): Float64Array {
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

function sectionEdges(
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

function sectionProbes(mesh: SectionMesh): Probe[] {
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
