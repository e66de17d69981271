import { HOURS, type ClimateYear } from '../../server/engine/climate/climate-year.ts'
import { temperatureField } from '../../server/engine/conduction/field.ts'
import type { FullRunOptions } from '../../server/engine/conduction/full-run.ts'
import type { SunYear } from '../../server/engine/solar/sun.ts'
import { repeatingYear } from '../../server/engine/year/repeating-year.ts'
import type { YearTrace } from '../../server/engine/year/year-trace.ts'
import { assemble, type RunningHouse } from '../../server/engine/zone/assemble.ts'
import type { ElementCache } from '../../server/engine/zone/element-cache.ts'
import type { HouseModel } from '../../server/engine/zone/house-model.ts'
import { liveYear } from '../../server/engine/zone/live-year.ts'
import { traceRecorder } from '../../server/engine/zone/recorder.ts'
import { once } from './timing.ts'

/**
 * The same meshes, the same year, the same room loop. Run time against all nodes by Crank-Nicolson with one
 * solve an hour, the least work that a full run can do. Accuracy against all nodes by TR-BDF2 with two
 * solves an hour: hourly Crank-Nicolson rings at fine surface cells when the sun comes and goes, and would
 * be judged more by its own error than by that of the modes (both are given).
 *
 * @param loopMs the reduced hour loop's time for a year
 */
export function benchFull(model: HouseModel, climate: ClimateYear, sun: SunYear, loopMs: number) {
  const setUpReducedMs = once(() => assemble(model, climate, new Map(), sun))
  const cache: ElementCache = new Map()
  // All begin with the state of the repeating year, so that no jump at the start is measured.
  const start = assemble(model, climate, cache, sun)
  repeatingYear(start)
  const run = (full: FullRunOptions | null) => liveFrom(start, assembled(model, climate, sun, cache, full))
  const reduced = run(null)
  const hourly = run({ substeps: 1, scheme: 'crank-nicolson' })
  const stiff = run({ substeps: 1, scheme: 'tr-bdf2' })
  const difference_K = (trace: YearTrace) =>
    trace.operative_C.reduce(
      (most, value, hour) => Math.max(most, Math.abs(value - reduced.trace.operative_C[hour])),
      0,
    )
  const ours = groundHeat(reduced.trace)
  const theirs = groundHeat(stiff.trace)
  return {
    run_time_ratio: hourly.loopMs / loopMs,
    run_time_ratio_with_set_up: (hourly.setUpMs + hourly.loopMs) / (setUpReducedMs + loopMs),
    full_year_ms: hourly.loopMs,
    reduced_year_ms: loopMs,
    reduced_set_up_ms: setUpReducedMs,
    largest_operative_difference_K: difference_K(stiff.trace),
    largest_operative_difference_from_hourly_crank_nicolson_K: difference_K(hourly.trace),
    yearly_ground_heat_difference_share: Math.abs(ours - theirs) / Math.abs(theirs),
  }
}

/** Heat from the room into all ground sections over the year [Wh]. */
function groundHeat(trace: YearTrace): number {
  const sections = new Set(trace.elements.filter(({ kind }) => kind === 'section').map(({ name }) => name))
  let heat = 0
  for (const surface of trace.surfaces)
    if (sections.has(surface.element)) for (let hour = 0; hour < HOURS; hour++) heat += surface.flow_W[hour]
  return heat
}

function assembled(
  model: HouseModel,
  climate: ClimateYear,
  sun: SunYear,
  cache: ElementCache,
  full: FullRunOptions | null,
): { house: RunningHouse; setUpMs: number } {
  let house!: RunningHouse
  const setUpMs = once(() => (house = assemble(model, climate, cache, sun, full)))
  return { house, setUpMs }
}

/** One year from the state of another house that is built alike. */
function liveFrom(
  start: RunningHouse,
  { house, setUpMs }: { house: RunningHouse; setUpMs: number },
): { trace: YearTrace; setUpMs: number; loopMs: number } {
  house.air.start_C = start.air.start_C
  house.elements.forEach((element, i) => {
    element.state.set(start.elements[i].state)
    element.full?.stepper.setField(temperatureField(start.elements[i].reduced, start.elements[i].state))
  })
  // Recording adds less than a hundredth to a full year; the reduced loop is timed without it elsewhere.
  const recorder = traceRecorder(house, 0, false)
  const loopMs = once(() => liveYear(house, 0, null, recorder))
  return { trace: recorder.trace(), setUpMs, loopMs }
}
