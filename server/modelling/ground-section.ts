import type { Library } from '#contract/library.ts'
import type { Option } from '#contract/option.ts'
import { floorArea, planOf } from '#contract/plan.ts'
import type { Side } from '#contract/side.ts'
import type { SectionSpec } from '#engine/conduction/specs.ts'
import type { BoundaryLink, Exposure, HouseElement, RoomSurface } from '#engine/zone/house-model.ts'
import { whole, type SurfaceFilms } from './surface-films.ts'
import type { Substances } from './substances.ts'
import type { WallParts } from './wall-parts.ts'

/** The mesh goes so far below level ground and beyond everything built. */
const EXTENT = { depth_m: 15, beyond_m: 20 }

interface Parts {
  readonly option: Option
  readonly library: Library
  readonly substances: Substances
  readonly films: SurfaceFilms
}

/** Floor strip, foot of the wall and ground of one side, as a section along its length. */
export function groundSection(side: Side, wall: WallParts, parts: Parts): HouseElement {
  const { option, films } = parts
  const spec = sectionSpec(side, wall, parts)
  const surface = coverSurface(side.cover?.surface ?? option.site.ground, option, parts.library)
  const ground = { film_Wm2K: films.ground.combined_Wm2K, radiative_Wm2K: films.ground.radiative_Wm2K }
  const outdoor = (exposure: Exposure): BoundaryLink => ({ to: 'outdoor', exposure })
  const floor: RoomSurface = {
    name: `${side.name}: floor`,
    area_m2: side.length_m * spec.halfFloor_m,
    ...films.floor,
    solarAbsorptance: option.floor.insideAbsorptance,
    part: 'floor',
    faces_deg: null,
  }
  const inside: RoomSurface = {
    name: side.berm ? `${side.name}: wall behind the berm` : `${side.name}: foot of the wall`,
    area_m2: wall.sectionArea_m2,
    ...films.wall,
    solarAbsorptance: side.insideAbsorptance,
    part: 'wall',
    faces_deg: side.faces_deg,
  }
  const slope_deg = side.berm ? (Math.atan(1 / side.berm.runPerRise) * 180) / Math.PI : 0
  return {
    name: `${side.name}: ground`,
    spec,
    size: side.length_m,
    links: {
      floor: { to: 'room', surface: floor },
      'wall-inside': { to: 'room', surface: inside },
      'wall-outside': outdoor(wallExposure(side, films)),
      level: outdoor({ tilt_deg: 0, faces_deg: 0, ...surface, ...ground }),
      ...(side.berm && {
        slope: outdoor({ tilt_deg: slope_deg, faces_deg: side.faces_deg, ...surface, ...ground }),
      }),
    },
  }
}

function sectionSpec(side: Side, wall: WallParts, parts: Parts): SectionSpec {
  const { option, substances, films } = parts
  const { berm, skirt, footing } = side
  if (!option.soil) throw new RangeError('A floor on the ground needs a soil.')
  const buried = side.umbrella ?? side.wing
  const wallLayers = substances.assembly(side.wall)
  const half_m = floorArea(option) / planOf(option.sides).perimeter_m
  return {
    kind: 'section',
    halfFloor_m: half_m,
    floorLevel_m: option.floor.level_m,
    floor: substances.assembly(option.floor.assembly),
    wall: wallLayers,
    wallTop_m: wall.sectionTop_m,
    footing: footing ? { depth_m: footing.depth_m, substance: substances.of(footing.material) } : null,
    soil: substances.of(option.soil.id),
    berm: berm
      ? {
          height_m: berm.height_m,
          crest_m: berm.crest_m,
          run: berm.runPerRise,
          soil: substances.of(berm.soil ?? option.soil.id),
        }
      : null,
    cover: coverLayers(side, parts),
    umbrella: buried ? { layers: substances.layers(buried.layers), reach_m: buried.reach_m } : null,
    skirt: skirt
      ? {
          substance: substances.of(skirt.material),
          thickness_m: skirt.thickness_m,
          top_m: skirt.top_m,
          bottom_m: skirt.bottom_m,
        }
      : null,
    films: {
      floor: whole(films.floor),
      wallInside: whole(films.wall),
      wallOutside: films.outside.combined_Wm2K,
      ground: films.ground.combined_Wm2K,
    },
    extent: EXTENT,
    refinement: 1,
    probes: side.probes ?? usualProbes(side, thickness(wallLayers), half_m),
  }
}

function coverLayers(side: Side, { library, substances }: Parts): SectionSpec['cover'] {
  const { cover, berm } = side
  if (!cover) return null
  const usual = library.covers.get(cover.surface)?.layer
  const layers = cover.layers ?? (usual ? [usual] : [])
  if (layers.length === 0) return null
  const buried_m = (side.umbrella ?? side.wing)?.reach_m ?? 0
  const toe_m = berm ? berm.crest_m + berm.runPerRise * berm.height_m : 2
  return { layers: substances.exposedLayers(layers), reach_m: cover.reach_m ?? Math.max(buried_m, toe_m) }
}

/** How a cover looks at sun and sky. */
export function coverSurface(id: string, option: Option, library: Library) {
  const own = option.covers.find((row) => row.id === id)
  if (own) {
    const { solarAbsorptance, emittance, evaporativeShare } = own
    return { solarAbsorptance, emittance, evaporativeShare }
  }
  const row = library.covers.get(id)
  if (!row) throw new RangeError(`There is no cover "${id}".`)
  return {
    solarAbsorptance: row.solarAbsorptance.typical,
    emittance: row.emittance.typical,
    evaporativeShare: row.evaporativeShare.typical,
  }
}

export function wallExposure(side: Side, films: SurfaceFilms): Exposure {
  return {
    tilt_deg: 90,
    faces_deg: side.faces_deg,
    solarAbsorptance: side.solarAbsorptance,
    emittance: side.emittance,
    film_Wm2K: films.outside.combined_Wm2K,
    radiative_Wm2K: films.outside.radiative_Wm2K,
    evaporativeShare: 0,
  }
}

/** In a berm 1, 2 and 4 m from the wall, at half its height where it is still that high; and below the floor. */
function usualProbes(side: Side, wall_m: number, half_m: number): SectionSpec['probes'] {
  const { berm } = side
  const inBerm = (berm ? [1, 2, 4] : []).map((fromWall_m) => {
    const { height_m, crest_m, runPerRise } = berm!
    const surface_m = height_m - Math.max(0, fromWall_m - crest_m) / runPerRise
    return {
      name: `berm, ${fromWall_m} m from the wall`,
      fromWall_m,
      depth_m: Math.max(0.5, Math.max(0, surface_m) - height_m / 2),
    }
  })
  // A little off the middle of the floor, which is the edge of the section.
  const middle_m = -(wall_m + 0.95 * half_m)
  const belowFloor = [1, 3].map((depth_m) => ({
    name: `${depth_m} m below the floor`,
    fromWall_m: middle_m,
    depth_m,
  }))
  return [...inBerm, ...belowFloor]
}

const thickness = (layers: readonly { readonly thickness_m: number }[]) =>
  layers.reduce((sum, layer) => sum + layer.thickness_m, 0)
