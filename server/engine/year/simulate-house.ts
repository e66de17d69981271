import type { ClimateYear } from '../climate/climate-year.ts'
import type { SunYear } from '../solar/sun.ts'
import { assemble, type RunningHouse } from '../zone/assemble.ts'
import type { ElementCache } from '../zone/element-cache.ts'
import type { HouseModel } from '../zone/house-model.ts'
import { chargingYears } from './charging.ts'
import { repeatingYear, type RepeatingYear } from './repeating-year.ts'
import type { YearTrace } from './year-trace.ts'

export interface SimulateOptions {
  /** Reduced elements to share with other runs. */
  readonly cache?: ElementCache
  /** Where the sun stands through the year, when it is known from an earlier run at the same place. */
  readonly sun?: SunYear
  /** Also live the first years after building. */
  readonly charging?: { readonly month: number; readonly years: number } | null
  /** Keep the ground sections' modes for every hour, for pictures of the temperature field. */
  readonly keepStates?: boolean
}

export interface SimulatedHouse {
  readonly house: RunningHouse
  readonly cache: ElementCache
  readonly repeating: RepeatingYear
  /** Empty unless asked for. */
  readonly charging: readonly YearTrace[]
}

/**
 * One house in one climate: its repeating year and, on request, the years that lead to it.
 *
 * @throws RangeError naming the part of the house that cannot be
 */
export function simulateHouse(
  model: HouseModel,
  climate: ClimateYear,
  options: SimulateOptions = {},
): SimulatedHouse {
  const { cache = new Map(), sun, charging = null, keepStates = false } = options
  const house = assemble(model, climate, cache, sun)
  const years = charging ? chargingYears(house, cache, { ...charging, keepStates }) : []
  return { house, cache, repeating: repeatingYear(house, { keepStates }), charging: years }
}
