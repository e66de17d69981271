import type { ClimateYear } from '../../../server/engine/climate/climate-year.ts'
import { HOURS } from '../../../server/engine/climate/climate-year.ts'
import type { Layer, LayersSpec, SectionSpec } from '../../../server/engine/conduction/specs.ts'
import type {
  BoundaryLink,
  Exposure,
  GlazingData,
  HouseElement,
  HouseModel,
  RoomSurface,
  WindowModel,
} from '../../../server/engine/zone/house-model.ts'

export const earth = (thickness_m: number): Layer => ({
  name: 'earth',
  thickness_m,
  conductivity_WmK: 0.8,
  volumetricHeat_Jm3K: 1.5e6,
})
export const board = (thickness_m: number): Layer => ({
  name: 'board',
  thickness_m,
  conductivity_WmK: 0.036,
  volumetricHeat_Jm3K: 4.2e4,
})
export const soil = { name: 'soil', conductivity_WmK: 1.2, volumetricHeat_Jm3K: 2.0e6 }

export const exposure = (tilt_deg: number, faces_deg = 0): Exposure => ({
  tilt_deg,
  faces_deg,
  solarAbsorptance: 0.6,
  emittance: 0.9,
  film_Wm2K: 25,
  radiative_Wm2K: 4.6,
  evaporativeShare: 0,
})

export const roomSurface = (
  part: RoomSurface['part'],
  area_m2: number,
  faces_deg: number | null = null,
): RoomSurface => ({
  name: `${part} ${faces_deg ?? ''}`.trim(),
  area_m2,
  convective_Wm2K: 2.5,
  radiative_Wm2K: 5.2,
  solarAbsorptance: 0.6,
  part,
  faces_deg,
})

export function layered(
  name: string,
  layers: readonly Layer[],
  part: 'wall' | 'ceiling' | 'floor',
  area_m2: number,
  tilt_deg: number,
  faces_deg: number,
): HouseElement {
  const spec: LayersSpec = { kind: 'layers', layers, outsideFilm_Wm2K: 25, insideFilm_Wm2K: 7.7 }
  const inside: BoundaryLink = {
    to: 'room',
    surface: roomSurface(part, area_m2, part === 'wall' ? faces_deg : null),
  }
  return {
    name,
    spec,
    size: area_m2,
    links: { outside: { to: 'outdoor', exposure: exposure(tilt_deg, faces_deg) }, inside },
  }
}

export interface SectionChoice {
  readonly length_m?: number
  readonly faces_deg?: number
  readonly bermHeight_m?: number
  readonly reach_m?: number
  readonly board_m?: number
  readonly refinement?: number
}

export function section(choice: SectionChoice = {}): HouseElement {
  const {
    length_m = 10,
    faces_deg = 0,
    bermHeight_m = 0,
    reach_m = 0,
    board_m = 0.1,
    refinement = 1,
  } = choice
  const isBermed = bermHeight_m > 0
  const wallTop_m = isBermed ? bermHeight_m + 0.3 : 0.4
  const spec: SectionSpec = {
    kind: 'section',
    halfFloor_m: 1.8,
    floorLevel_m: 0,
    floor: [earth(0.15)],
    wall: [earth(0.4)],
    wallTop_m,
    footing: { depth_m: 0.6, substance: soil },
    soil,
    berm: isBermed ? { height_m: bermHeight_m, crest_m: 0.6, run: 2, soil } : null,
    cover: isBermed ? { layers: [earth(0.2)], reach_m: Math.max(reach_m, 1) } : null,
    umbrella: isBermed && reach_m > 0 ? { layers: [board(board_m)], reach_m } : null,
    skirt: null,
    films: { floor: 7.7, wallInside: 7.7, wallOutside: 25, ground: 20 },
    extent: { depth_m: 15, beyond_m: 20 },
    refinement,
    probes: [],
  }
  const wallArea_m2 = length_m * wallTop_m
  const links: Record<string, BoundaryLink> = {
    floor: { to: 'room', surface: roomSurface('floor', length_m * 1.8) },
    'wall-inside': { to: 'room', surface: roomSurface('wall', wallArea_m2, faces_deg) },
    'wall-outside': { to: 'outdoor', exposure: exposure(90, faces_deg) },
    level: { to: 'outdoor', exposure: { ...exposure(0), film_Wm2K: 20 } },
  }
  if (isBermed) links.slope = { to: 'outdoor', exposure: { ...exposure(26.6, faces_deg), film_Wm2K: 20 } }
  return { name: `section ${faces_deg}`, spec, size: length_m, links }
}

/** Clear double glass, from the angular curve of two 3 mm panes. */
export const doubleGlass: GlazingData = {
  u_Wm2K: 2.8,
  transmittance: [0.747, 0.746, 0.744, 0.739, 0.728, 0.705, 0.647, 0.507, 0.242, 0],
  solarFactor: [0.789, 0.789, 0.787, 0.784, 0.775, 0.753, 0.696, 0.554, 0.282, 0],
  diffuseTransmittance: 0.659,
  diffuseSolarFactor: 0.705,
}

export const window = (faces_deg: number, area_m2: number, more: Partial<WindowModel> = {}): WindowModel => ({
  name: `window ${faces_deg}`,
  area_m2,
  frameShare: 0,
  frameU_Wm2K: 2,
  glazing: doubleGlass,
  exposure: exposure(90, faces_deg),
  convective_Wm2K: 2.5,
  radiative_Wm2K: 5.2,
  width_m: area_m2 / 1.5,
  height_m: 1.5,
  sill_m: 0.5,
  overhang: null,
  fins: null,
  shutter: null,
  shade: null,
  ...more,
})

const none24 = Array.from({ length: 24 }, () => 0)
export const allMonths = Array.from({ length: 12 }, (_, month) => month + 1)

export function house(elements: readonly HouseElement[], more: Partial<HouseModel> = {}): HouseModel {
  return {
    room: { floorArea_m2: 36, volume_m3: 90, depth_m: 6, airCapacityFactor: 3 },
    elements,
    windows: [],
    plainLoss_WK: 0,
    groundReflectance: allMonths.map(() => 0.2),
    horizon_deg: [],
    infiltration: { kind: 'fixed', changes_h: 0.4 },
    ventilation: { fresh_m3s: none24, recovery: 0 },
    flush: null,
    gains: { convective_W: none24, radiative_W: none24 },
    heating: null,
    cooling: null,
    ...more,
  }
}

/** A light-roofed earthen room on layers alone: quick to run. */
export const earthRoom = (more: Partial<HouseModel> = {}): HouseModel =>
  house(
    [
      layered('south wall', [board(0.05), earth(0.3)], 'wall', 15, 90, 180),
      layered('east wall', [board(0.05), earth(0.3)], 'wall', 15, 90, 90),
      layered('west wall', [board(0.05), earth(0.3)], 'wall', 15, 90, 270),
      layered('roof', [board(0.2), earth(0.03)], 'ceiling', 36, 0, 0),
      layered('floor', [board(0.1), earth(0.15)], 'floor', 36, 0, 0),
    ],
    more,
  )

/** Bermed to the north, level ground to the south, layered elsewhere. */
export const bermedHouse = (choice: SectionChoice = {}, more: Partial<HouseModel> = {}): HouseModel =>
  house(
    [
      section({ bermHeight_m: 2, reach_m: 5, ...choice, faces_deg: 0, length_m: 10 }),
      section({ faces_deg: 180, length_m: 10, refinement: choice.refinement }),
      layered('south wall', [board(0.05), earth(0.3)], 'wall', 8, 90, 180),
      layered('roof', [board(0.2), earth(0.03)], 'ceiling', 36, 0, 0),
    ],
    { windows: [window(180, 9)], ...more },
  )

export interface Weather {
  readonly mean_C?: number
  readonly yearly_K?: number
  readonly daily_K?: number
  readonly sun_Wm2?: number
  readonly latitude_deg?: number
}

/** A made-up climate of plain waves: yearly and daily cosine, sun as a half sine of the day, clear half of the time. */
export function weather(choice: Weather = {}): ClimateYear {
  const { mean_C = 9, yearly_K = 11, daily_K = 6, sun_Wm2 = 700, latitude_deg = 40 } = choice
  const series = (value: (hour: number) => number) =>
    Float64Array.from({ length: HOURS }, (_, hour) => value(hour))
  const air = (hour: number) =>
    mean_C -
    yearly_K * Math.cos((2 * Math.PI * (hour - 15 * 24)) / HOURS) -
    daily_K * Math.cos((2 * Math.PI * (hour - 3)) / 24)
  const sun = (hour: number) => {
    const noon = Math.sin((Math.PI * ((hour % 24) + 0.5 - 7)) / 10)
    return noon > 0 && hour % 24 > 6 && hour % 24 < 17 ? sun_Wm2 * noon : 0
  }
  return {
    place: { name: 'made up', latitude_deg, longitude_deg: 0, elevation_m: 300, timeZone_h: 0 },
    source: 'plain waves, for tests',
    outdoor_C: series(air),
    dewPoint_C: series((hour) => air(hour) - 6),
    wind_ms: series(() => 3),
    pressure_Pa: series(() => 97_000),
    global_Wm2: series((hour) => sun(hour) * 0.75),
    beam_Wm2: series((hour) => sun(hour) * 0.7),
    diffuse_Wm2: series((hour) => sun(hour) * 0.25),
    sky_C: series((hour) => air(hour) - 12),
  }
}
