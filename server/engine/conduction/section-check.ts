import { floorThickness } from './section-geometry.ts'
import type { Layer, SectionSpec, Substance } from './specs.ts'

/**
 * Checks a section once, at the door.
 *
 * @throws RangeError naming the field, its value and what it must be
 */
export function checkSection(spec: SectionSpec): void {
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
