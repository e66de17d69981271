import { HOURS, type ClimateYear } from '../../server/engine/climate/climate-year.ts'
import type { FullRunOptions } from '../../server/engine/conduction/full-run.ts'
import type { SunYear } from '../../server/engine/solar/sun.ts'
import { setUniform } from '../../server/engine/year/house-state.ts'
import type { YearTrace } from '../../server/engine/year/year-trace.ts'
import { assemble } from '../../server/engine/zone/assemble.ts'
import type { ElementCache } from '../../server/engine/zone/element-cache.ts'
import type { HouseModel } from '../../server/engine/zone/house-model.ts'
import { liveYear } from '../../server/engine/zone/live-year.ts'
import { traceRecorder } from '../../server/engine/zone/recorder.ts'
import { once } from './timing.ts'

/** Where both begin: everything at one temperature. */
const START_C = 12

/**
 * The same meshes, the same year, the same room loop: all nodes by Crank-Nicolson with one step an hour
 * against the modes. Its accuracy is judged by a finer run (four steps of TR-BDF2 an hour), since hourly
 * Crank-Nicolson rings at the surfaces.
 *
 * @param loopMs the reduced hour loop's time for a year
 */
export function benchFull(model: HouseModel, climate: ClimateYear, sun: SunYear, loopMs: number) {
  const setUpReducedMs = once(() => assemble(model, climate, new Map(), sun))
  const cache: ElementCache = new Map()
  const reduced = run(model, climate, sun, cache, null)
  const hourly = run(model, climate, sun, cache, { substeps: 1, scheme: 'crank-nicolson' })
  const fine = run(model, climate, sun, cache, { substeps: 4, scheme: 'tr-bdf2' })
  const ground = (trace: YearTrace) => {
    const sections = new Set(trace.elements.filter(({ kind }) => kind === 'section').map(({ name }) => name))
    let gross = 0
    let net = 0
    for (const surface of trace.surfaces)
      if (sections.has(surface.element))
        for (let hour = 0; hour < HOURS; hour++) {
          net += surface.flow_W[hour]
          gross += Math.abs(surface.flow_W[hour])
        }
    return { net, gross }
  }
  const largest = (trace: YearTrace) =>
    reduced.trace.operative_C.reduce(
      (most, value, hour) => Math.max(most, Math.abs(value - trace.operative_C[hour])),
      0,
    )
  const [ours, theirs] = [ground(reduced.trace), ground(fine.trace)]
  return {
    run_time_ratio: hourly.loopMs / loopMs,
    run_time_ratio_with_set_up: (hourly.setUpMs + hourly.loopMs) / (setUpReducedMs + loopMs),
    full_year_ms: hourly.loopMs,
    reduced_set_up_ms: setUpReducedMs,
    largest_operative_difference_K: largest(fine.trace),
    largest_operative_difference_from_hourly_steps_K: largest(hourly.trace),
    yearly_ground_heat_difference_share: Math.abs(ours.net - theirs.net) / Math.abs(theirs.net),
    yearly_ground_heat_difference_of_gross_share: Math.abs(ours.net - theirs.net) / theirs.gross,
  }
}

function run(
  model: HouseModel,
  climate: ClimateYear,
  sun: SunYear,
  cache: ElementCache,
  full: FullRunOptions | null,
): { trace: YearTrace; setUpMs: number; loopMs: number } {
  let house!: ReturnType<typeof assemble>
  const setUpMs = once(() => (house = assemble(model, climate, cache, sun, full)))
  const begin = () => {
    for (const element of house.elements) setUniform(element, START_C)
    house.air.start_C = START_C
  }
  begin()
  const loopMs = full ? once(() => liveYear(house, 0, null, null)) : 0
  begin()
  const recorder = traceRecorder(house, 0, false)
  liveYear(house, 0, null, recorder)
  return { trace: recorder.trace(), setUpMs, loopMs }
}
