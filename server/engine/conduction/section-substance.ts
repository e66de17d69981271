import { floorThickness, totalThickness, wallOuterFace } from './section-geometry.ts'
import type { Layer, SectionSpec, Substance } from './specs.ts'

/** What a cell is made of; null for the air of the room and outdoors. z at the wall, and where it really lies. */
export function substanceAt(spec: SectionSpec, x: number, row: number, z: number): Substance | null {
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
