import { HOURS, type ClimateYear } from '../climate/climate-year.ts'
import { fullStepper, type FullRunOptions } from '../conduction/full-run.ts'
import { AIR_HEAT_JKGK, airDensity } from './air.ts'
import type { SunYear } from '../solar/sun.ts'
import type { HouseModel } from './house-model.ts'
import { outdoorDrives } from './drives.ts'
import { cachedElement, type ElementCache } from './element-cache.ts'
import { runningElement, type RoomFace, type RunningElement } from './running-element.ts'
import { windowSeries, type WindowSeries } from './window-series.ts'
import { monthOfHour } from '../climate/calendar.ts'

/** Everything the hour loop needs, allocated and checked once. */
export interface RunningHouse {
  readonly model: HouseModel
  readonly climate: ClimateYear
  readonly elements: readonly RunningElement[]
  readonly faces: readonly RoomFace[]
  readonly windows: WindowSeries
  /** Constant part of the room matrix: air-air, air-radiant, radiant-radiant [W/K]. */
  readonly matrix: { readonly aa: number; readonly ar: number; readonly rr: number }
  /** Absorbed sun and radiant gains as they reach air and radiant node, by hour [W]. */
  readonly sunOnAir_W: Float64Array
  readonly sunOnRadiant_W: Float64Array
  /** The same for 1 W of radiant heating. */
  readonly radiantOnAir: number
  readonly radiantOnRadiant: number
  readonly airCapacity_JK: number
  /** Density times specific heat of air at the site [J/(m³ K)]. */
  readonly airHeat_Jm3K: number
  /** Month (0 to 11) by hour. */
  readonly month: Uint8Array
  /** Room air at the start of the next hour [°C]; written by the hour loop. */
  readonly air: { start_C: number }
}

/**
 * Checks a house once, reduces what conducts and lays out all hourly series.
 *
 * @param cache reduced elements by their spec; hand the same one in again when only windows, air or
 *   habits changed, and nothing is reduced twice
 * @param full steps all nodes of every element in time instead of its modes, to measure what the modes cost
 * @param sun where the sun stands through the year; computed for the climate's place when left out
 * @throws RangeError with the name of the element or window and what is wrong with it
 */
export function assemble(
  model: HouseModel,
  climate: ClimateYear,
  cache: ElementCache = new Map(),
  sun?: SunYear,
  full: FullRunOptions | null = null,
): RunningHouse {
  const drives = outdoorDrives(model, climate, sun)
  const faces: RoomFace[] = []
  const elements = model.elements.map((element, index) => {
    const cached = cachedElement(element.spec, element.name, cache)
    const stepper = full ? fullStepper(cached.system, full) : null
    return runningElement(element, index, cached.reduced, stepper, drives, faces)
  })
  if (faces.length === 0) throw new RangeError('The room has no surface.')
  const windows = windowSeries(model, climate, drives, faces)
  shareRadiantGains(model, faces)

  const density = airDensity(climate.place.elevation_m)
  const airHeat_Jm3K = density * AIR_HEAT_JKGK
  const radiant = roomSums(elements, faces, (face) => face.radiantShare)
  const sunOnAir_W = new Float64Array(HOURS)
  const sunOnRadiant_W = new Float64Array(HOURS)
  addAbsorbed(elements, faces, sunOnAir_W, sunOnRadiant_W)

  const month = new Uint8Array(HOURS)
  for (let hour = 0; hour < HOURS; hour++) month[hour] = monthOfHour(hour)
  return {
    model,
    climate,
    elements,
    faces,
    windows,
    matrix: roomMatrix(elements, faces),
    sunOnAir_W,
    sunOnRadiant_W,
    radiantOnAir: radiant.air,
    radiantOnRadiant: radiant.radiant,
    airCapacity_JK: airHeat_Jm3K * model.room.volume_m3 * model.room.airCapacityFactor,
    airHeat_Jm3K,
    month,
    air: { start_C: 15 },
  }
}

/** Radiant gains fall on all faces by area, hour of the day by hour of the day. */
function shareRadiantGains(model: HouseModel, faces: RoomFace[]): void {
  const area = faces.reduce((sum, face) => sum + face.surface.area_m2, 0)
  faces.forEach((face, k) => {
    const share = face.surface.area_m2 / area
    faces[k] = { ...face, radiantShare: share }
    for (let hour = 0; hour < HOURS; hour++)
      face.absorbed_W[hour] = face.sun_W[hour] + share * model.gains.radiative_W[hour % 24]
  })
}

/**
 * What heat absorbed at the faces does to the two room nodes: a part passes the film to air and
 * radiant node, the rest goes into the element at once:  Σ_k f_k (W_k - Σ_l R_kl W_l / G_l)
 */
function roomSums(
  elements: readonly RunningElement[],
  faces: readonly RoomFace[],
  heat: (face: RoomFace) => number,
): { air: number; radiant: number } {
  let air = 0
  let radiant = 0
  for (const element of elements)
    for (const row of element.room) {
      const face = faces[row.face]
      let rest = heat(face)
      for (const col of element.room)
        rest -=
          (element.response[row.group * element.columns + col.column] * heat(faces[col.face])) /
          faces[col.face].film_WK
      air += face.convective * rest
      radiant += face.radiative * rest
    }
  return { air, radiant }
}

function addAbsorbed(
  elements: readonly RunningElement[],
  faces: readonly RoomFace[],
  air: Float64Array,
  radiant: Float64Array,
) {
  for (let k = 0; k < faces.length; k++) {
    // Linear in each face: find what 1 W there does, then scale its series.
    const unit = roomSums(elements, faces, (face) => (face === faces[k] ? 1 : 0))
    const { absorbed_W } = faces[k]
    for (let hour = 0; hour < HOURS; hour++) {
      air[hour] += unit.air * absorbed_W[hour]
      radiant[hour] += unit.radiant * absorbed_W[hour]
    }
  }
}

/** Conductances among air, radiant node and the elements' present response, all faces. */
function roomMatrix(elements: readonly RunningElement[], faces: readonly RoomFace[]): RunningHouse['matrix'] {
  let aa = 0
  let ar = 0
  let rr = 0
  for (const face of faces) {
    aa += face.film_WK * face.convective * (1 - face.convective)
    ar -= face.film_WK * face.convective * face.radiative
    rr += face.film_WK * face.radiative * (1 - face.radiative)
  }
  for (const element of elements)
    for (const row of element.room)
      for (const col of element.room) {
        const response = element.response[row.group * element.columns + col.column]
        const a = faces[row.face]
        const b = faces[col.face]
        aa += a.convective * response * b.convective
        ar += a.convective * response * b.radiative
        rr += a.radiative * response * b.radiative
      }
  return { aa, ar, rr }
}
