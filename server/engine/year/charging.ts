import { HOURS, HOUR_S } from '../climate/climate-year.ts'
import { firstHarmonic } from '../climate/harmonic.ts'
import type { GroundWave } from '../climate/ground.ts'
import { undisturbedField } from '../conduction/field.ts'
import { projectField } from '../conduction/full-run.ts'
import type { SectionSpec } from '../conduction/specs.ts'
import type { RunningHouse } from '../zone/assemble.ts'
import type { RunningElement } from '../zone/running-element.ts'
import { MONTH_START_H } from '../climate/calendar.ts'
import type { ElementCache } from '../zone/element-cache.ts'
import { liveYear } from '../zone/live-year.ts'
import { traceRecorder } from '../zone/recorder.ts'
import { mean, setUniform } from './house-state.ts'
import type { YearTrace } from './year-trace.ts'

const YEAR_S = HOURS * HOUR_S

export interface ChargingOptions {
  /** Month of completion, 1 to 12; the first year begins on its first day. */
  readonly month: number
  readonly years: number
  readonly keepStates?: boolean
}

/**
 * The first years after building: the ground starts undisturbed (Kusuda and Achenbach 1965) in the
 * month of completion, everything else at the mean outdoor temperature of the thirty days before.
 *
 * @returns one trace a year; each begins with `firstHour`, the first hour of the month of completion
 * @throws RangeError for a month outside 1 to 12 or fewer than one year
 */
export function chargingYears(
  house: RunningHouse,
  cache: ElementCache,
  options: ChargingOptions,
): YearTrace[] {
  const { month, years, keepStates = false } = options
  if (!Number.isInteger(month) || month < 1 || month > 12)
    throw new RangeError(`The month of completion must be 1 to 12; it is ${month}.`)
  if (!Number.isInteger(years) || years < 1)
    throw new RangeError(`The number of charging years must be 1 or more; it is ${years}.`)
  const firstHour = MONTH_START_H[month - 1]
  const before_C = mean(house.climate.outdoor_C, firstHour - 720, 720)
  house.air.start_C = before_C
  house.elements.forEach((element, index) => {
    const { spec } = house.model.elements[index]
    setUniform(element, before_C)
    if (spec.kind === 'section') startUndisturbed(element, spec, cache, firstHour)
  })
  const traces: YearTrace[] = []
  for (let year = 0; year < years; year++) {
    const recorder = traceRecorder(house, firstHour, keepStates)
    liveYear(house, firstHour, null, recorder)
    traces.push(recorder.trace())
  }
  return traces
}

function startUndisturbed(
  element: RunningElement,
  spec: SectionSpec,
  cache: ElementCache,
  firstHour: number,
): void {
  const mesh = cache.get(JSON.stringify(spec))?.mesh
  const level = element.outdoor.find(({ group }) => element.reduced.boundaries[group] === 'level')
  if (!mesh || !level) return
  const equivalent = level.drive.linear_C.map((value, hour) => value + level.drive.step_K[hour])
  const wave = waveBelowFilm(equivalent, spec)
  const field = undisturbedField(mesh, wave, firstHour * HOUR_S)
  projectField(element.reduced, field, element.state)
}

/**
 * The yearly wave at the soil's surface, behind its film: amplitude ratio 1/√(1 + 2e + 2e²) and phase
 * atan(e / (1 + e)), e = λ / (h d), d = √(2 a / ω) (Carslaw and Jaeger 1959, section 2.6).
 *
 * @param equivalent_C hourly equivalent outdoor temperature of level ground, 8,760 values
 */
export function waveBelowFilm(
  equivalent_C: Float64Array,
  spec: Pick<SectionSpec, 'soil' | 'films'>,
): GroundWave {
  const { mean: mean_C, amplitude, coldest_s } = firstHarmonic(equivalent_C, HOUR_S)
  const diffusivity_m2s = spec.soil.conductivity_WmK / spec.soil.volumetricHeat_Jm3K
  const omega = (2 * Math.PI) / YEAR_S
  const depth_m = Math.sqrt((2 * diffusivity_m2s) / omega)
  const e = spec.soil.conductivity_WmK / (spec.films.ground * depth_m)
  return {
    mean_C,
    amplitude_K: amplitude / Math.sqrt(1 + 2 * e + 2 * e * e),
    coldest_s: coldest_s + Math.atan(e / (1 + e)) / omega,
    diffusivity_m2s,
  }
}
