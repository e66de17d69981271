import { HOURS, HOUR_S } from '../climate/climate-year.ts'
import type { RunningHouse } from '../zone/assemble.ts'
import { liveYear } from '../zone/live-year.ts'
import { traceRecorder } from '../zone/recorder.ts'
import { FixedPointAccelerator } from './anderson.ts'
import { houseState, setHouseState, startFromOutdoorMean } from './house-state.ts'
import type { YearTrace } from './year-trace.ts'

const YEAR_S = HOURS * HOUR_S

export interface RepeatingYear {
  readonly trace: YearTrace
  /** Simulated years until it closed, the recorded one included. */
  readonly years: number
  /** Largest difference of any face from the year before, any hour [K]. */
  readonly closure_K: number
}

export interface RepeatingYearOptions {
  /** No face may differ by more than this from the year before, at any hour [K]. */
  readonly closure_K?: number
  readonly mostYears?: number
  readonly keepStates?: boolean
}

/**
 * The year that repeats itself: the house long after it was built.
 *
 * After each simulated year every mode is carried to where it would settle if the room's year stayed
 * as it was, m* = (m_end - e^{-λY} m_start) / (1 - e^{-λY}), which takes the slow modes of the ground
 * decades ahead at once; Anderson's acceleration then takes care of the room's answer. When that has
 * come to rest two plain years are lived, and the second must repeat the first at every hour.
 *
 * @throws RangeError when it does not close within `mostYears`
 */
export function repeatingYear(house: RunningHouse, options: RepeatingYearOptions = {}): RepeatingYear {
  const { closure_K = 0.01, mostYears = 60, keepStates = false } = options
  const faceCount = house.faces.length
  let before = new Float64Array(HOURS * faceCount)
  let now = new Float64Array(HOURS * faceCount)
  const accelerator = new FixedPointAccelerator()
  const kept = yearDecay(house)
  const mass_JK = wholeCapacity(house)

  startFromOutdoorMean(house)
  let start = houseState(house)
  let years = 0
  let rest_K = 0.2 * closure_K
  for (;;) {
    let change_K = Infinity
    let smallest_K = Infinity
    while (change_K > rest_K && years < mostYears) {
      setHouseState(house, start)
      liveYear(house, 0, null, null)
      years++
      const end = houseState(house)
      const settled = end.map((value, i) => (value - kept[i] * start[i]) / (1 - kept[i]))
      change_K = rootMean(settled, start, mass_JK)
      if (change_K > 3 * smallest_K) accelerator.forget()
      smallest_K = Math.min(smallest_K, change_K)
      start = change_K > rest_K ? accelerator.next(start, settled) : settled
    }
    setHouseState(house, start)
    liveYear(house, 0, before, null)
    const recorder = traceRecorder(house, 0, keepStates)
    liveYear(house, 0, now, recorder)
    years += 2
    const worst_K = largestDifference(before, now)
    if (worst_K <= closure_K) return { trace: recorder.trace(), years, closure_K: worst_K }
    if (years >= mostYears)
      throw new RangeError(
        `The year does not repeat itself after ${years} years: a surface still differs by ${worst_K.toFixed(3)} K.`,
      )
    start = houseState(house)
    accelerator.forget()
    rest_K *= 0.3
    ;[before, now] = [now, before]
  }
}

/** e^{-λ year} of every mode, in the order of the house state; 0 for the room air. */
function yearDecay(house: RunningHouse): Float64Array {
  const all: number[] = []
  for (const element of house.elements)
    for (let k = 0; k < element.modes; k++) all.push(Math.exp(-element.reduced.decay_s[k] * YEAR_S))
  return Float64Array.from([...all, 0])
}

function wholeCapacity(house: RunningHouse): number {
  let total = 0
  for (const element of house.elements) for (const capacity of element.reduced.capacity_JK) total += capacity
  return total
}

/** Root mean square temperature difference of all mass; modes are orthonormal in the heat capacity. */
function rootMean(a: Float64Array, b: Float64Array, mass_JK: number): number {
  let sum = 0
  for (let i = 0; i < a.length - 1; i++) sum += (a[i] - b[i]) ** 2
  return Math.sqrt(sum / mass_JK)
}

function largestDifference(a: Float64Array, b: Float64Array): number {
  let worst = 0
  for (let i = 0; i < a.length; i++) worst = Math.max(worst, Math.abs(a[i] - b[i]))
  return worst
}
