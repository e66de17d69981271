/** Hourly series of one surface of the room. */
export interface SurfaceTrace {
  readonly name: string
  readonly element: string
  readonly part: 'floor' | 'wall' | 'ceiling' | 'mass'
  readonly area_m2: number
  /** Mean face temperature in the hour [°C]. */
  readonly temperature_C: Float64Array
  /** Heat from the room (films and absorbed sun) into the surface, mean of the hour [W]. */
  readonly flow_W: Float64Array
}

export interface ElementTrace {
  readonly name: string
  readonly kind: 'layers' | 'lumped' | 'section'
  /** Heat stored above 0 °C at the end of each hour [J]. */
  readonly stored_J: Float64Array
  /** The same at the start of the year's first hour [J]. */
  readonly startStored_J: number
  /** Heat that comes in from outdoors and from constant boundaries, mean of the hour [W], absorbed sun included. */
  readonly outside_W: Float64Array
  /** Modes at the end of each hour, `state[hour * modes + k]`; null when not kept. */
  readonly state: Float64Array | null
}

export interface ProbeTrace {
  readonly name: string
  readonly element: string
  /** At the end of each hour: °C for places, J per metre of length for heat contents. */
  readonly value: Float64Array
}

/**
 * One simulated year: 8,760 hourly values each. Entry i is hour i of the calendar year (0 begins on
 * 1 January), in whatever order they were lived through: a charging year that begins in October has
 * its October to December before its January. `firstHour` is the hour it began with (0 for the
 * repeating year), so entry firstHour - 1 is its last hour, and the hour before entry firstHour is the
 * start state, not entry firstHour - 1.
 * Flows are means of the hour, positive into the room, unless said otherwise.
 */
export interface YearTrace {
  readonly firstHour: number
  /** Room air at the start of the first hour [°C]. */
  readonly startAir_C: number
  readonly air_C: Float64Array
  readonly radiant_C: Float64Array
  /** Mean of air and radiant temperature [°C]. */
  readonly operative_C: Float64Array
  readonly heating_W: Float64Array
  /** Heat taken out by cooling, positive when it cools [W]. */
  readonly cooling_W: Float64Array
  /** Sun that stays in the room: absorbed by its surfaces or released to its air [W]. */
  readonly solar_W: Float64Array
  readonly gains_W: Float64Array
  /** Through glass, frames and doors by conduction, without sun [W]. */
  readonly windows_W: Float64Array
  readonly infiltration_W: Float64Array
  readonly ventilation_W: Float64Array
  readonly flush_W: Float64Array
  /** Infiltration, fresh air and flush together [m³/s]. */
  readonly outdoorAir_m3s: Float64Array
  /** Sun passing each window (transmitted and inward-flowing) [W], by window. */
  readonly windowSolar_W: readonly { readonly name: string; readonly flow_W: Float64Array }[]
  /** Capacity of room air and furniture [J/K]. */
  readonly airCapacity_JK: number
  readonly surfaces: readonly SurfaceTrace[]
  readonly elements: readonly ElementTrace[]
  readonly probes: readonly ProbeTrace[]
}
