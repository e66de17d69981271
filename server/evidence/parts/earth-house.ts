import type { Layer, SectionSpec, Substance } from '#engine/conduction/specs.ts'
import type {
  Exposure,
  GlazingData,
  HouseElement,
  HouseModel,
  RoomSurface,
} from '#engine/zone/house-model.ts'
import { nothingHappens } from './steady-box.ts'

/** Rain-shed loam, about 5 % water by mass. */
export const DRY_BERM_SOIL: Substance = {
  name: 'loam kept dry',
  conductivity_WmK: 0.75,
  volumetricHeat_Jm3K: 1.575e6,
}
const EARTH: Substance = { name: 'earth wall', conductivity_WmK: 0.8, volumetricHeat_Jm3K: 1.7e6 }
const BOARD: Substance = { name: 'board', conductivity_WmK: 0.035, volumetricHeat_Jm3K: 42000 }
const thick = (substance: Substance, thickness_m: number): Layer => ({ ...substance, thickness_m })

const LENGTH = { south: 8, north: 8, east: 6, west: 6 }
const FACES = { south: 180, north: 0, east: 90, west: 270 }
const FLOOR_M2 = 48
const PERIMETER_M = 28
const WALL_TOP_M = 2.4
const FILMS = { floor: 6, wallInside: 7.7, wallOutside: 25, ground: 20 }

/** Double glazing by angle of incidence, 0 to 90 degrees. */
const GLAZING: GlazingData = {
  u_Wm2K: 2.7,
  transmittance: [0.7, 0.7, 0.7, 0.69, 0.68, 0.66, 0.6, 0.46, 0.22, 0],
  solarFactor: [0.76, 0.76, 0.76, 0.75, 0.74, 0.71, 0.64, 0.5, 0.26, 0],
  diffuseTransmittance: 0.61,
  diffuseSolarFactor: 0.66,
}

const exposure = (tilt_deg: number, faces_deg: number, film_Wm2K: number): Exposure => ({
  tilt_deg,
  faces_deg,
  solarAbsorptance: 0.6,
  emittance: 0.9,
  film_Wm2K,
  radiative_Wm2K: 5,
  evaporativeShare: tilt_deg === 0 ? 0.3 : 0,
})

export interface EarthHouse {
  /** Earth against north, east and west, to 2.2 m. */
  readonly isBermed: boolean
  /** Board under the berm's cover, outwards from the wall; 0 for none. */
  readonly umbrella_m: number
  /** Thickness of the earth walls. */
  readonly wall_m: number
}

/**
 * A house of 6 by 8 m with earth walls, an insulated roof and 6 m² of glass to the south, free of
 * heating: what the sayings of the trade are tried on. The glass is counted beside the south wall, not cut
 * out of it.
 */
export function earthHouse({ isBermed, umbrella_m, wall_m }: EarthHouse): HouseModel {
  const halfFloor_m = FLOOR_M2 / PERIMETER_M
  const section = (side: keyof typeof LENGTH): HouseElement => {
    const isHeaped = isBermed && side !== 'south'
    const spec: SectionSpec = {
      kind: 'section',
      halfFloor_m,
      floorLevel_m: 0,
      floor: [thick(EARTH, 0.15)],
      wall: [thick(EARTH, wall_m)],
      wallTop_m: WALL_TOP_M,
      footing: { depth_m: 0.6, substance: EARTH },
      soil: DRY_BERM_SOIL,
      berm: isHeaped ? { height_m: 2.1, crest_m: 0.6, run: 2, soil: DRY_BERM_SOIL } : null,
      cover: isHeaped ? { layers: [thick(DRY_BERM_SOIL, 0.3)], reach_m: Math.max(umbrella_m, 5) } : null,
      umbrella: isHeaped && umbrella_m > 0 ? { layers: [thick(BOARD, 0.1)], reach_m: umbrella_m } : null,
      skirt: null,
      films: FILMS,
      extent: { depth_m: 15, beyond_m: 20 },
      refinement: 1,
      probes: [],
    }
    const length_m = LENGTH[side]
    const film = (total: number) => ({ convective_Wm2K: total - 5, radiative_Wm2K: 5 })
    const floor: RoomSurface = {
      name: `${side} floor`,
      area_m2: halfFloor_m * length_m,
      convective_Wm2K: FILMS.floor - 4,
      radiative_Wm2K: 4,
      solarAbsorptance: 0.7,
      part: 'floor',
      faces_deg: null,
    }
    const wall: RoomSurface = {
      name: `${side} wall`,
      area_m2: WALL_TOP_M * length_m,
      ...film(FILMS.wallInside),
      solarAbsorptance: 0.5,
      part: 'wall',
      faces_deg: FACES[side],
    }
    const upright = exposure(90, FACES[side], FILMS.wallOutside)
    return {
      name: side,
      spec,
      size: length_m,
      links: {
        floor: { to: 'room', surface: floor },
        'wall-inside': { to: 'room', surface: wall },
        'wall-outside': { to: 'outdoor', exposure: upright },
        level: { to: 'outdoor', exposure: exposure(0, 0, FILMS.ground) },
        slope: { to: 'outdoor', exposure: exposure(26.6, FACES[side], FILMS.ground) },
      },
    }
  }
  const roof: HouseElement = {
    name: 'roof',
    spec: {
      kind: 'layers',
      layers: [
        thick(BOARD, 0.2),
        thick({ name: 'timber', conductivity_WmK: 0.13, volumetricHeat_Jm3K: 8e5 }, 0.03),
      ],
      outsideFilm_Wm2K: 25,
      insideFilm_Wm2K: 10,
    },
    size: FLOOR_M2,
    links: {
      outside: { to: 'outdoor', exposure: { ...exposure(0, 0, 25), evaporativeShare: 0 } },
      inside: {
        to: 'room',
        surface: {
          name: 'ceiling',
          area_m2: FLOOR_M2,
          convective_Wm2K: 5,
          radiative_Wm2K: 5,
          solarAbsorptance: 0.3,
          part: 'ceiling',
          faces_deg: null,
        },
      },
    },
  }
  return {
    ...nothingHappens,
    room: { floorArea_m2: FLOOR_M2, volume_m3: 115, depth_m: 6, airCapacityFactor: 3 },
    elements: [...(Object.keys(LENGTH) as (keyof typeof LENGTH)[]).map(section), roof],
    windows: [
      {
        name: 'south glass',
        area_m2: 6,
        frameShare: 0.1,
        frameU_Wm2K: 2,
        glazing: GLAZING,
        exposure: exposure(90, 180, 25),
        convective_Wm2K: 2.5,
        radiative_Wm2K: 5.2,
        width_m: 4,
        height_m: 1.5,
        sill_m: 0.6,
        overhang: { depth_m: 0.6, rise_m: 0.2, extra_m: 1 },
        fins: null,
        shutter: null,
        shade: null,
      },
    ],
    infiltration: { kind: 'fixed', changes_h: 0.4 },
    gains: {
      convective_W: new Array<number>(24).fill(100),
      radiative_W: new Array<number>(24).fill(100),
    },
  }
}
