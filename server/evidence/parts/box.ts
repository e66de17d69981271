import type { ClimateYear } from '#engine/climate/climate-year.ts'
import { repeatingYear } from '#engine/year/repeating-year.ts'
import { assemble } from '#engine/zone/assemble.ts'
import { readOption } from '#contract/read-option.ts'
import { toHouse } from '#modelling/to-house.ts'
import { loadLibrary } from '../../libraries/library.ts'
import { average } from './soil-wave.ts'

/** What is changed in an option document here. */
export interface BoxOption {
  readonly glazings: readonly Readonly<Record<string, unknown>>[]
  readonly sides: readonly Readonly<Record<string, unknown> & { openings?: readonly object[] }>[]
  readonly heating?: object
  readonly air: object
}

/** What is published of a test box. */
export interface BoxRun {
  readonly heating_MWh: number
  readonly cooling_MWh: number
  readonly peakHeating_kW: number
  readonly peakCooling_kW: number
  readonly highest_C: number
  readonly lowest_C: number
  readonly mean_C: number
}

/**
 * One test box through the program: option document, house, repeating year.
 *
 * @param text   the option file
 * @param change what is different in this case
 */
export function runBox(
  text: string,
  climate: ClimateYear,
  change: (option: BoxOption) => BoxOption = (option) => option,
): BoxRun {
  const library = loadLibrary()
  const option = readOption(change(JSON.parse(text) as BoxOption), library)
  const { trace } = repeatingYear(assemble(toHouse(option, library, 'dry'), climate))
  const sum = (flow_W: Float64Array) => flow_W.reduce((total, value) => total + value, 0)
  return {
    heating_MWh: sum(trace.heating_W) / 1e6,
    cooling_MWh: sum(trace.cooling_W) / 1e6,
    peakHeating_kW: Math.max(...trace.heating_W) / 1e3,
    peakCooling_kW: Math.max(...trace.cooling_W) / 1e3,
    highest_C: Math.max(...trace.air_C),
    lowest_C: Math.min(...trace.air_C),
    mean_C: average(trace.air_C),
  }
}
