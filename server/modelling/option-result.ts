import type { Library } from '#contract/library.ts'
import type { Option } from '#contract/option.ts'
import { SOIL_STATES, type SoilState } from '#contract/soil.ts'
import type { ClimatePlace, ClimateYear } from '#engine/climate/climate-year.ts'
import type { YearMeasures } from '#engine/measures/summary.ts'
import { sunOfYear } from '#engine/solar/sun.ts'
import type { YearTrace } from '#engine/year/year-trace.ts'
import type { ElementCache } from '#engine/zone/element-cache.ts'
import { monthlyExtremes, type MonthlyExtremes } from './monthly-extremes.ts'
import { simulateOption, type OptionYears, type SoilYear } from './simulate-option.ts'

/** The repeating year, and the first years after building where they were asked for. */
export interface RunResult {
  readonly measures: YearMeasures
  readonly operative: MonthlyExtremes
  /** Hours in which backup heat ran at its full power. */
  readonly heatingAtLimit_h: number
  /** Simulated years until the year repeated itself, and how far the last two differ at most [K]. */
  readonly yearsToClose: number
  readonly closure_K: number
  readonly charging: readonly YearMeasures[]
}

export interface StateResult {
  readonly state: SoilState
  /** As designed, with backup heat and cooling. */
  readonly lived: RunResult
  /** Without a fire: no backup heat and no cooling. The same as `lived` for a design without them. */
  readonly free: RunResult
}

/** What is known of an option in a climate, plain data: all three soil states, or one where nothing touches the ground. */
export interface OptionResult {
  readonly loamkeepResult: 1
  readonly option: { readonly name: string; readonly place: string | null }
  readonly climate: { readonly place: ClimatePlace; readonly source: string }
  readonly guess: SoilState
  /** The fixed comfort range of the option. */
  readonly comfort: Option['comfort']
  readonly hasGround: boolean
  readonly hasHeating: boolean
  readonly hasCooling: boolean
  readonly charging: { readonly month: number; readonly years: number } | null
  readonly states: readonly StateResult[]
}

export interface OptionRuns {
  readonly result: OptionResult
  /** Hourly series of the repeating year as designed, by soil state. */
  readonly traces: ReadonlyMap<SoilState, YearTrace>
}

export interface OptionResultSettings {
  /** Also live the first years after building, from this month (1 to 12) on. */
  readonly charging?: { readonly month: number; readonly years: number } | null
  /** Reduced elements to share with other runs. */
  readonly cache?: ElementCache
}

/**
 * One option in one climate, for dry, damp and wet soil, as designed and without a fire.
 *
 * @throws RangeError naming the part of the house that the engine cannot take
 */
export function optionResult(
  option: Option,
  library: Library,
  climate: ClimateYear,
  settings: OptionResultSettings = {},
): OptionRuns {
  const { charging = null, cache = new Map() } = settings
  const choice = { charging, cache, sun: sunOfYear(climate.place) }
  const lived = simulateOption(option, library, climate, choice)
  const hasHeating = option.heating !== undefined
  const hasCooling = option.cooling !== undefined
  const free: OptionYears =
    hasHeating || hasCooling
      ? simulateOption({ ...option, heating: undefined, cooling: undefined }, library, climate, choice)
      : lived
  const hasGround = option.floor.below.kind === 'ground'
  const guess = option.soil?.guess ?? 'damp'
  const states = hasGround ? SOIL_STATES : [guess]
  const result: OptionResult = {
    loamkeepResult: 1,
    option: { name: option.name, place: option.place ?? null },
    climate: { place: climate.place, source: climate.source },
    guess,
    comfort: option.comfort,
    hasGround,
    hasHeating,
    hasCooling,
    charging,
    states: states.map((state) => ({
      state,
      lived: runResult(lived[state]),
      free: runResult(free[state]),
    })),
  }
  return { result, traces: new Map(states.map((state) => [state, lived[state].simulated.repeating.trace])) }
}

function runResult({ simulated, measures, charging }: SoilYear): RunResult {
  const { trace, years, closure_K } = simulated.repeating
  const { heating } = simulated.house.model
  const atLimit = (power_W: number) => heating !== null && power_W >= 0.999 * heating.power_W
  return {
    measures,
    operative: monthlyExtremes(trace.operative_C),
    heatingAtLimit_h: trace.heating_W.reduce((hours, power_W) => hours + (atLimit(power_W) ? 1 : 0), 0),
    yearsToClose: years,
    closure_K,
    charging,
  }
}
