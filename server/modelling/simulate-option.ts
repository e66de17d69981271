import type { Library } from '#contract/library.ts'
import type { Option } from '#contract/option.ts'
import { SOIL_STATES, type SoilState } from '#contract/soil.ts'
import type { ClimateYear } from '#engine/climate/climate-year.ts'
import { measureYear, type YearMeasures } from '#engine/measures/summary.ts'
import { sunOfYear, type SunYear } from '#engine/solar/sun.ts'
import { simulateHouse, type SimulatedHouse } from '#engine/year/simulate-house.ts'
import type { ElementCache } from '#engine/zone/element-cache.ts'
import { measureSettings } from './measure-settings.ts'
import { toHouse } from './to-house.ts'

export interface SimulateOptionChoice {
  /** The first years after building, from a month of completion (1 to 12). */
  readonly charging?: { readonly month: number; readonly years: number } | null
  /** Keep the ground sections' modes for every hour, for pictures of the temperature field. */
  readonly keepStates?: boolean
  /** Reduced elements to share with other runs. */
  readonly cache?: ElementCache
  /** The sun at the climate's place, when known from an earlier run. */
  readonly sun?: SunYear
}

/** One option in one soil state. */
export interface SoilYear {
  readonly simulated: SimulatedHouse
  /** Of the repeating year. */
  readonly measures: YearMeasures
  /** Of each charging year, the first one first. */
  readonly charging: readonly YearMeasures[]
}

/** An option's years for dry, damp and wet soil; the same object three times where no soil touches the house. */
export type OptionYears = Readonly<Record<SoilState, SoilYear>>

/**
 * Everything seasonal for dry, damp and wet soil in one call.
 *
 * @throws RangeError naming the part of the house that cannot be
 */
export function simulateOption(
  option: Option,
  library: Library,
  climate: ClimateYear,
  choice: SimulateOptionChoice = {},
): OptionYears {
  const { cache = new Map(), charging = null, keepStates = false } = choice
  const sun = choice.sun ?? sunOfYear(climate.place)
  const run = (state: SoilState): SoilYear => {
    const model = toHouse(option, library, state)
    const simulated = simulateHouse(model, climate, { cache, sun, charging, keepStates })
    const settings = measureSettings(option, library, model)
    return {
      simulated,
      measures: measureYear(simulated.repeating.trace, climate, settings),
      charging: simulated.charging.map((trace) =>
        measureYear(trace, climate, { ...settings, repeats: false }),
      ),
    }
  }
  const [dry, damp, wet] = option.soil ? SOIL_STATES.map(run) : Array<SoilYear>(3).fill(run('damp'))
  return { dry, damp, wet }
}
