import { HOURS } from '../climate/climate-year.ts'
import type { RunningHouse } from '../zone/assemble.ts'
import type { RunningElement } from '../zone/running-element.ts'

/** All modes of all elements, one after the other, and the room air last. */
export function houseState(house: RunningHouse): Float64Array {
  const length = house.elements.reduce((sum, element) => sum + element.modes, 1)
  const out = new Float64Array(length)
  let at = 0
  for (const element of house.elements) {
    out.set(element.state, at)
    at += element.modes
  }
  out[at] = house.air.start_C
  return out
}

/** The reverse of houseState. */
export function setHouseState(house: RunningHouse, state: Float64Array): void {
  let at = 0
  for (const element of house.elements) {
    element.state.set(state.subarray(at, at + element.modes))
    at += element.modes
  }
  house.air.start_C = state[at]
}

/** Every element and the room air at one temperature [°C]. */
export function setUniform(element: RunningElement, temperature_C: number): void {
  const { content } = element.reduced
  element.full?.stepper.setUniform(temperature_C)
  for (let k = 0; k < element.modes; k++) element.state[k] = content[k] * temperature_C
}

/** A first guess of the repeating year: everything at the yearly mean of what its outdoor sides meet. */
export function startFromOutdoorMean(house: RunningHouse): void {
  const air_C = mean(house.climate.outdoor_C, 0, HOURS)
  house.air.start_C = air_C
  for (const element of house.elements) {
    const outside = element.outdoor.map(
      ({ drive }) => mean(drive.linear_C, 0, HOURS) + mean(drive.step_K, 0, HOURS),
    )
    const constant = element.constant.map(({ column }) => element.input[column])
    const all = [...outside, ...constant]
    setUniform(element, all.length > 0 ? all.reduce((sum, value) => sum + value, 0) / all.length : air_C)
  }
}

/** Mean of `length` hourly values from hour `from` on, running past the year's end. */
export function mean(values: Float64Array, from: number, length: number): number {
  let sum = 0
  for (let i = 0; i < length; i++) sum += values[(from + i + HOURS) % HOURS]
  return sum / length
}
