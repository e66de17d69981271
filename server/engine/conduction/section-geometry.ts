import type { SectionSpec } from './specs.ts'

/** Outer face of the wall from the middle of the floor [m]. */
export function wallOuterFace(spec: SectionSpec): number {
  return spec.halfFloor_m + spec.wall.reduce((sum, layer) => sum + layer.thickness_m, 0)
}

/** Where the slope of the berm begins and ends, from the wall's outer face [m]; null without a berm. */
export function bermFoot(spec: SectionSpec): { crest_m: number; toe_m: number } | null {
  const { berm } = spec
  return berm ? { crest_m: berm.crest_m, toe_m: berm.crest_m + berm.height_m * berm.run } : null
}

/** Height of the soil's surface above level ground, at a distance from the wall's outer face [m]. */
export function surfaceHeight(spec: SectionSpec, fromWall_m: number): number {
  const { berm } = spec
  if (!berm) return 0
  const down = (fromWall_m - berm.crest_m) / berm.run
  return Math.min(berm.height_m, Math.max(0, berm.height_m - down))
}

const total = (layers: readonly { readonly thickness_m: number }[] | undefined) =>
  (layers ?? []).reduce((sum, layer) => sum + layer.thickness_m, 0)

/** Thickness of cover and umbrella together [m]. */
export const buriedThickness = (spec: SectionSpec) => total(spec.cover?.layers) + total(spec.umbrella?.layers)
export const floorThickness = (spec: SectionSpec) => total(spec.floor)
export { total as totalThickness }
