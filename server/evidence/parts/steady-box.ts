import { HOURS, type ClimateYear } from '#engine/climate/climate-year.ts'
import type { Layer } from '#engine/conduction/specs.ts'
import type { Exposure, HouseElement, HouseModel, RoomSurface } from '#engine/zone/house-model.ts'

/**
 * Weather that never changes: no sun, no wind, a sky as warm as the air.
 *
 * @param outdoor_C constant, or 8,760 hourly values
 */
export function dullWeather(outdoor_C: number | Float64Array): ClimateYear {
  const air_C = typeof outdoor_C === 'number' ? new Float64Array(HOURS).fill(outdoor_C) : outdoor_C
  const none = new Float64Array(HOURS)
  return {
    place: { name: 'nowhere', latitude_deg: 40, longitude_deg: 0, elevation_m: 0, timeZone_h: 0 },
    source: 'made for a check: no sun, no wind, the sky as warm as the air',
    outdoor_C: air_C,
    dewPoint_C: air_C.map((value) => value - 5),
    wind_ms: none,
    pressure_Pa: new Float64Array(HOURS).fill(101325),
    global_Wm2: none,
    beam_Wm2: none,
    diffuse_Wm2: none,
    sky_C: air_C,
  }
}

/** A plane that sees neither sun nor sky. */
export const blindExposure = (film_Wm2K: number): Exposure => ({
  tilt_deg: 90,
  faces_deg: 0,
  solarAbsorptance: 0,
  emittance: 0,
  film_Wm2K,
  radiative_Wm2K: 0,
  evaporativeShare: 0,
})

const layer = (
  name: string,
  conductivity_WmK: number,
  thickness_m: number,
  density_kgm3: number,
  heat_JkgK: number,
): Layer => ({
  name,
  thickness_m,
  conductivity_WmK,
  // The standard's insulation under the floor has no capacity: that of air stands for it.
  volumetricHeat_Jm3K: density_kgm3 * heat_JkgK || 1200,
})

/** From outside to inside. */
const BOX_LAYERS = {
  light: {
    wall: [
      layer('wood siding', 0.14, 0.009, 530, 900),
      layer('fibreglass quilt', 0.04, 0.066, 12, 840),
      layer('plasterboard', 0.16, 0.012, 950, 840),
    ],
    floor: [layer('insulation', 0.04, 1.003, 0, 0), layer('timber', 0.14, 0.025, 650, 1200)],
  },
  heavy: {
    wall: [
      layer('wood siding', 0.14, 0.009, 530, 900),
      layer('foam', 0.04, 0.0615, 10, 1400),
      layer('concrete block', 0.51, 0.1, 1400, 1000),
    ],
    floor: [layer('insulation', 0.04, 1.007, 0, 0), layer('concrete slab', 1.13, 0.08, 1400, 1000)],
  },
}
const ROOF = [
  layer('roof deck', 0.14, 0.019, 530, 900),
  layer('fibreglass quilt', 0.04, 0.1118, 12, 840),
  layer('plasterboard', 0.16, 0.01, 950, 840),
]

/** Combined films of the test box [W/(m² K)]. */
const INSIDE = 8.29
const OUTSIDE = 29.3

export const nothingHappens: Omit<HouseModel, 'room' | 'elements' | 'windows'> = {
  plainLoss_WK: 0,
  groundReflectance: new Array<number>(12).fill(0.2),
  horizon_deg: [],
  infiltration: { kind: 'fixed', changes_h: 0 },
  ventilation: { fresh_m3s: new Array<number>(24).fill(0), recovery: 0 },
  flush: null,
  gains: { convective_W: new Array<number>(24).fill(0), radiative_W: new Array<number>(24).fill(0) },
  heating: null,
  cooling: null,
}

/**
 * The test box of ANSI/ASHRAE Standard 140 with its windows as a plain loss of 36.0 W/K, so that only
 * conduction and air are left: ground at 10 °C under the floor, 200 W of gains when asked for.
 *
 * @param radiativeShare of the inner films; next to nothing makes the room one node, as a sum of UA values
 *   supposes (with a radiant node of its own a room loses less through its leaks)
 */
export function steadyBox(
  kind: 'light' | 'heavy',
  gains_W: number,
  set_C: number | null,
  radiativeShare = 1e-6,
): HouseModel {
  const surface = (name: string, area_m2: number, part: RoomSurface['part']): RoomSurface => ({
    name,
    area_m2,
    convective_Wm2K: INSIDE * (1 - radiativeShare),
    radiative_Wm2K: INSIDE * radiativeShare,
    solarAbsorptance: 0.6,
    part,
    faces_deg: null,
  })
  const plane = (
    name: string,
    area_m2: number,
    part: RoomSurface['part'],
    layers: readonly Layer[],
  ): HouseElement => ({
    name,
    spec: {
      kind: 'layers',
      layers,
      // The floor's insulation lies on the ground, with no film between.
      outsideFilm_Wm2K: part === 'floor' ? 1e6 : OUTSIDE,
      insideFilm_Wm2K: INSIDE,
    },
    size: area_m2,
    links: {
      inside: { to: 'room', surface: surface(name, area_m2, part) },
      outside:
        part === 'floor'
          ? { to: 'constant', temperature_C: 10 }
          : { to: 'outdoor', exposure: blindExposure(OUTSIDE) },
    },
  })
  const { wall, floor } = BOX_LAYERS[kind]
  const hours = (value: number) => new Array<number>(24).fill(value)
  return {
    ...nothingHappens,
    room: { floorArea_m2: 48, volume_m3: 129.6, depth_m: 6, airCapacityFactor: 1 },
    elements: [
      plane('walls', 63.6, 'wall', wall),
      plane('floor', 48, 'floor', floor),
      plane('roof', 48, 'ceiling', ROOF),
    ],
    windows: [],
    plainLoss_WK: 36,
    infiltration: { kind: 'fixed', changes_h: 0.411 },
    gains: { convective_W: hours(gains_W), radiative_W: hours(0) },
    heating:
      set_C === null
        ? null
        : {
            set_C: hours(set_C),
            months: [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12],
            power_W: 1e6,
            convectiveShare: 1,
            senses: 'air',
          },
  }
}
