import type { Library } from '#contract/library.ts'
import type { Option } from '#contract/option.ts'
import { floorArea } from '#contract/plan.ts'
import type { Side } from '#contract/side.ts'
import type { HouseElement } from '#engine/zone/house-model.ts'
import { coverSurface, wallExposure } from './ground-section.ts'
import { whole, type SurfaceFilms } from './surface-films.ts'
import type { Substances } from './substances.ts'
import type { WallParts } from './wall-parts.ts'

/** The part of a side's wall that stands free in the air. */
export function freeWall(
  side: Side,
  wall: WallParts,
  substances: Substances,
  films: SurfaceFilms,
): HouseElement {
  return {
    name: `${side.name}: wall`,
    spec: {
      kind: 'layers',
      layers: substances.assembly(side.wall),
      outsideFilm_Wm2K: films.outside.combined_Wm2K,
      insideFilm_Wm2K: whole(films.wall),
    },
    size: wall.restArea_m2,
    links: {
      outside: { to: 'outdoor', exposure: wallExposure(side, films) },
      inside: {
        to: 'room',
        surface: {
          name: `${side.name}: wall`,
          area_m2: wall.restArea_m2,
          ...films.wall,
          solarAbsorptance: side.insideAbsorptance,
          part: 'wall',
          faces_deg: side.faces_deg,
        },
      },
    },
  }
}

export function roofElement(
  option: Option,
  library: Library,
  substances: Substances,
  films: SurfaceFilms,
): HouseElement {
  const { roof } = option
  const area_m2 = roof.area_m2 ?? floorArea(option) / Math.cos((roof.tilt_deg * Math.PI) / 180)
  const { solarAbsorptance, emittance } = roof
  const surface = roof.cover
    ? coverSurface(roof.cover, option, library)
    : { solarAbsorptance, emittance, evaporativeShare: 0 }
  return {
    name: 'Roof',
    spec: {
      kind: 'layers',
      layers: substances.exposedAssembly(roof.assembly),
      outsideFilm_Wm2K: films.outside.combined_Wm2K,
      insideFilm_Wm2K: whole(films.ceiling),
    },
    size: area_m2,
    links: {
      outside: {
        to: 'outdoor',
        exposure: {
          tilt_deg: roof.tilt_deg,
          faces_deg: roof.faces_deg,
          ...surface,
          film_Wm2K: films.outside.combined_Wm2K,
          radiative_Wm2K: films.outside.radiative_Wm2K,
        },
      },
      inside: {
        to: 'room',
        surface: {
          name: 'Ceiling',
          area_m2,
          ...films.ceiling,
          solarAbsorptance: roof.insideAbsorptance,
          part: 'ceiling',
          faces_deg: null,
        },
      },
    },
  }
}

/** A floor over a constant temperature, as test cells have it; null for a floor on the ground. */
export function testFloor(option: Option, substances: Substances, films: SurfaceFilms): HouseElement | null {
  const { below, assembly, insideAbsorptance } = option.floor
  if (below.kind === 'ground') return null
  const area_m2 = floorArea(option)
  return {
    name: 'Floor',
    spec: {
      kind: 'layers',
      layers: substances.assembly(assembly),
      outsideFilm_Wm2K: below.film_Wm2K,
      insideFilm_Wm2K: whole(films.floor),
    },
    size: area_m2,
    links: {
      outside: { to: 'constant', temperature_C: below.temperature_C },
      inside: {
        to: 'room',
        surface: {
          name: 'Floor',
          area_m2,
          ...films.floor,
          solarAbsorptance: insideAbsorptance,
          part: 'floor',
          faces_deg: null,
        },
      },
    },
  }
}
