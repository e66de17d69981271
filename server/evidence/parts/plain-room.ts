import type { Layer } from '#engine/conduction/specs.ts'
import type { HouseElement, HouseModel, RoomSurface } from '#engine/zone/house-model.ts'
import { nothingHappens } from './steady-box.ts'

const SIDE_M = 4
const HEIGHT_M = 3

/**
 * A closed room of 4 by 4 by 3 m in the sun, with walls and roof of one layer, a floor on earth and no
 * glass to speak of.
 */
export function plainRoom(shell: Layer): HouseModel {
  const surface = (
    name: string,
    area_m2: number,
    part: RoomSurface['part'],
    faces_deg: number | null,
  ): RoomSurface => ({
    name,
    area_m2,
    convective_Wm2K: 2.5,
    radiative_Wm2K: 5.1,
    solarAbsorptance: 0.5,
    part,
    faces_deg,
  })
  const outer = (name: string, area_m2: number, tilt_deg: number, faces_deg: number): HouseElement => ({
    name,
    spec: { kind: 'layers', layers: [shell], outsideFilm_Wm2K: 25, insideFilm_Wm2K: 7.6 },
    size: area_m2,
    links: {
      outside: {
        to: 'outdoor',
        exposure: {
          tilt_deg,
          faces_deg,
          solarAbsorptance: 0.6,
          emittance: 0.9,
          film_Wm2K: 25,
          radiative_Wm2K: 5.1,
          evaporativeShare: 0,
        },
      },
      inside: {
        to: 'room',
        surface: surface(
          name,
          area_m2,
          tilt_deg === 0 ? 'ceiling' : 'wall',
          tilt_deg === 0 ? null : faces_deg,
        ),
      },
    },
  })
  const floor: HouseElement = {
    name: 'floor',
    spec: {
      kind: 'layers',
      layers: [{ name: 'earth', thickness_m: 1, conductivity_WmK: 1, volumetricHeat_Jm3K: 2e6 }],
      outsideFilm_Wm2K: 0,
      insideFilm_Wm2K: 7.6,
    },
    size: SIDE_M * SIDE_M,
    links: { inside: { to: 'room', surface: surface('floor', SIDE_M * SIDE_M, 'floor', null) } },
  }
  return {
    ...nothingHappens,
    room: {
      floorArea_m2: SIDE_M * SIDE_M,
      volume_m3: SIDE_M * SIDE_M * HEIGHT_M,
      depth_m: SIDE_M,
      airCapacityFactor: 1,
    },
    elements: [
      ...[0, 90, 180, 270].map((faces_deg) => outer(`wall ${faces_deg}`, SIDE_M * HEIGHT_M, 90, faces_deg)),
      outer('roof', SIDE_M * SIDE_M, 0, 0),
      floor,
    ],
    windows: [],
    infiltration: { kind: 'fixed', changes_h: 0.5 },
  }
}
