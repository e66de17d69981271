import { HOURS, type ClimateYear } from '#engine/climate/climate-year.ts'
import type { Layer, SectionSpec } from '#engine/conduction/specs.ts'
import type { Fuel } from '#engine/measures/firewood.ts'
import type { HouseModel, RoomSurface } from '#engine/zone/house-model.ts'
import type { ElementTrace, SurfaceTrace, YearTrace } from '#engine/year/year-trace.ts'

/** 8,760 values of a number or of a function of the hour. */
export function series(value: number | ((hour: number) => number)): Float64Array {
  return Float64Array.from({ length: HOURS }, (_, hour) => (typeof value === 'number' ? value : value(hour)))
}

/** A yearly cosine that is highest at a day; means of the hour stand at its middle. */
export function yearWave(mean: number, amplitude: number, warmestDay: number, offset_h = 0.5): Float64Array {
  return series(
    (hour) => mean + amplitude * Math.cos((2 * Math.PI * (hour + offset_h - warmestDay * 24)) / HOURS),
  )
}

export function makeClimate(over: Partial<ClimateYear> = {}): ClimateYear {
  return {
    place: { name: 'Nowhere', latitude_deg: 40, longitude_deg: 0, elevation_m: 0, timeZone_h: 0 },
    source: 'made for a test',
    outdoor_C: yearWave(10, 12, 200, 1),
    dewPoint_C: series(5),
    wind_ms: series(2),
    pressure_Pa: series(101325),
    global_Wm2: yearWave(150, 100, 172),
    beam_Wm2: series(0),
    diffuse_Wm2: series(0),
    sky_C: series(0),
    ...over,
  }
}

export function makeSurface(over: Partial<SurfaceTrace> = {}): SurfaceTrace {
  const surface = { name: 'floor', element: 'ground', part: 'floor' as const, area_m2: 20 }
  return { ...surface, temperature_C: series(20), flow_W: series(0), ...over }
}

export function makeElement(over: Partial<ElementTrace> = {}): ElementTrace {
  const element = { name: 'ground', kind: 'section' as const, startStored_J: 0, state: null }
  return { ...element, stored_J: series(0), outside_W: series(0), ...over }
}

/** A year at rest at 20 °C without any flow. */
export function makeTrace(over: Partial<YearTrace> = {}): YearTrace {
  return {
    firstHour: 0,
    startAir_C: 20,
    air_C: series(20),
    radiant_C: series(20),
    operative_C: series(20),
    heating_W: series(0),
    cooling_W: series(0),
    solar_W: series(0),
    gains_W: series(0),
    windows_W: series(0),
    infiltration_W: series(0),
    ventilation_W: series(0),
    flush_W: series(0),
    outdoorAir_m3s: series(0.01),
    windowSolar_W: [],
    airCapacity_JK: 1e5,
    surfaces: [makeSurface()],
    elements: [makeElement()],
    probes: [],
    ...over,
  }
}

/**
 * A year whose books are right by construction: given flows of the room, the floor takes whatever is
 * left over, and the ground stores what floor and outdoors give it.
 */
export function makeClosedTrace(
  firstHour: number,
  flow: (name: string) => (hour: number) => number,
  over: Partial<YearTrace> = {},
): YearTrace {
  const base = makeTrace({
    firstHour,
    startAir_C: 15,
    air_C: series((hour) => 20 + flow('air')(hour) / 100),
    solar_W: series(flow('solar')).map(Math.abs),
    gains_W: series(flow('gains')).map(Math.abs),
    heating_W: series(flow('heating')).map(Math.abs),
    cooling_W: series(flow('cooling')).map(Math.abs),
    windows_W: series(flow('windows')),
    infiltration_W: series(flow('infiltration')),
    ventilation_W: series(flow('ventilation')),
    flush_W: series(flow('flush')),
  })
  const outside_W = series(flow('outside'))
  const floor_W = series(0)
  const stored_J = series(0)
  const startStored_J = 5e8
  let air = base.startAir_C
  let stored = startStored_J
  for (let step = 0; step < HOURS; step++) {
    const i = (firstHour + step) % HOURS
    floor_W[i] =
      base.solar_W[i] +
      base.gains_W[i] +
      base.heating_W[i] -
      base.cooling_W[i] +
      base.windows_W[i] +
      base.infiltration_W[i] +
      base.ventilation_W[i] +
      base.flush_W[i] -
      (base.airCapacity_JK * (base.air_C[i] - air)) / 3600
    stored += 3600 * (floor_W[i] + outside_W[i])
    stored_J[i] = stored
    air = base.air_C[i]
  }
  return {
    ...base,
    surfaces: [makeSurface({ flow_W: floor_W })],
    elements: [makeElement({ stored_J, startStored_J, outside_W })],
    ...over,
  }
}

export const dryWood: Fuel = {
  name: 'hardwood, air-dry',
  netHeat_MJkg: 15,
  stackedHeat_MJm3: (24 * 1055.06) / 3.624556,
}

export const adobe: Layer = {
  name: 'adobe',
  thickness_m: 0.3,
  conductivity_WmK: 0.6,
  volumetricHeat_Jm3K: 1.6e6,
}
export const clay = { name: 'clay', conductivity_WmK: 1.5, volumetricHeat_Jm3K: 3e6 }

const face = (name: string, part: RoomSurface['part'], area_m2: number): RoomSurface => ({
  name,
  area_m2,
  part,
  convective_Wm2K: 2.5,
  radiative_Wm2K: 5.2,
  solarAbsorptance: 0.6,
  faces_deg: part === 'wall' ? 0 : null,
})

export const bermedSection: SectionSpec = {
  kind: 'section',
  halfFloor_m: 2.5,
  floorLevel_m: -0.5,
  floor: [{ ...adobe, name: 'earth floor', thickness_m: 0.1 }],
  wall: [adobe],
  wallTop_m: 2,
  footing: null,
  soil: clay,
  berm: { height_m: 1.5, crest_m: 1, run: 2, soil: clay },
  cover: null,
  umbrella: null,
  skirt: null,
  films: { floor: 6, wallInside: 7.7, wallOutside: 20, ground: 20 },
  extent: { depth_m: 15, beyond_m: 20 },
  refinement: 1,
  probes: [],
}

/** A small house: one bermed section, one roof, one partition with the room on both sides. */
export function makeModel(over: Partial<HouseModel> = {}): HouseModel {
  const exposure = {
    tilt_deg: 0,
    faces_deg: 0,
    solarAbsorptance: 0.7,
    emittance: 0.9,
    film_Wm2K: 20,
    radiative_Wm2K: 5,
    evaporativeShare: 0,
  }
  return {
    room: { floorArea_m2: 50, volume_m3: 125, depth_m: 5, airCapacityFactor: 5 },
    elements: [
      {
        name: 'ground',
        spec: bermedSection,
        size: 10,
        links: {
          floor: { to: 'room', surface: face('floor', 'floor', 25) },
          'wall-inside': { to: 'room', surface: face('north wall', 'wall', 25) },
          'wall-outside': { to: 'outdoor', exposure: { ...exposure, tilt_deg: 90 } },
          level: { to: 'outdoor', exposure },
          slope: { to: 'outdoor', exposure },
        },
      },
      {
        name: 'roof',
        spec: {
          kind: 'layers',
          layers: [{ name: 'straw', thickness_m: 0.4, conductivity_WmK: 0.06, volumetricHeat_Jm3K: 1.5e5 }],
          outsideFilm_Wm2K: 20,
          insideFilm_Wm2K: 7.7,
        },
        size: 50,
        links: {
          outside: { to: 'outdoor', exposure },
          inside: { to: 'room', surface: face('ceiling', 'ceiling', 50) },
        },
      },
      {
        name: 'partition',
        spec: { kind: 'layers', layers: [adobe], outsideFilm_Wm2K: 7.7, insideFilm_Wm2K: 7.7 },
        size: 10,
        links: {
          outside: { to: 'room', surface: face('partition, far face', 'mass', 10) },
          inside: { to: 'room', surface: face('partition', 'mass', 10) },
        },
      },
    ],
    windows: [],
    plainLoss_WK: 0,
    groundReflectance: new Array(12).fill(0.2),
    horizon_deg: [],
    infiltration: { kind: 'fixed', changes_h: 0.3 },
    ventilation: { fresh_m3s: new Array(24).fill(0), recovery: 0 },
    flush: null,
    gains: { convective_W: new Array(24).fill(0), radiative_W: new Array(24).fill(0) },
    heating: null,
    cooling: null,
    ...over,
  }
}
