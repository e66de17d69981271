import { HOURS } from '../climate/climate-year.ts'
import type { ElementTrace, ProbeTrace, SurfaceTrace, YearTrace } from '../year/year-trace.ts'
import type { RunningHouse } from './assemble.ts'
import type { RunningElement } from './running-element.ts'
import { storedFlow } from './live-year.ts'

/** What the hour loop says of the room each hour; flows into the room positive [W]. */
export interface RoomHour {
  readonly heating_W: number
  readonly cooling_W: number
  readonly windows_W: number
  readonly infiltration_W: number
  readonly ventilation_W: number
  readonly flush_W: number
  readonly outdoorAir_m3s: number
}

/** Listens to the hour loop and keeps a trace of the year. */
export interface Recorder {
  /** Before an element takes its step: all its inputs stand, its state is that of the hour's start. */
  outside(index: number, hour: number, element: RunningElement): void
  /** After its step. */
  element(index: number, hour: number, element: RunningElement): void
  room(hour: number, air_C: number, radiant_C: number, faceFlow_W: Float64Array, flows: RoomHour): void
  /** The finished trace. */
  trace(): YearTrace
}

/**
 * @param firstHour  the hour the year begins with
 * @param keepStates whether the modes of sections are kept for every hour (about 3 MB a section)
 */
export function traceRecorder(house: RunningHouse, firstHour: number, keepStates: boolean): Recorder {
  const series = () => new Float64Array(HOURS)
  const { elements, faces } = house
  const air_C = series()
  const radiant_C = series()
  const operative_C = series()
  const flows = {
    heating_W: series(),
    cooling_W: series(),
    windows_W: series(),
    infiltration_W: series(),
    ventilation_W: series(),
    flush_W: series(),
    outdoorAir_m3s: series(),
  }
  const flowNames = Object.keys(flows) as (keyof typeof flows)[]
  const surfaces: SurfaceTrace[] = faces.map((face) => ({
    name: face.surface.name,
    element: elements[face.element].name,
    part: face.surface.part,
    area_m2: face.surface.area_m2,
    temperature_C: series(),
    flow_W: series(),
  }))
  const elementTraces: ElementTrace[] = elements.map((element) => ({
    name: element.name,
    kind: element.kind,
    stored_J: series(),
    startStored_J: stored(element),
    outside_W: series(),
    state: keepStates && element.kind === 'section' ? new Float64Array(HOURS * element.modes) : null,
  }))
  const probes: ProbeTrace[] = elements.flatMap((element) =>
    element.reduced.probes.map((name) => ({ name, element: element.name, value: series() })),
  )
  const firstProbe: number[] = []
  elements.reduce((before, element) => {
    firstProbe.push(before)
    return before + element.reduced.probes.length
  }, 0)
  const faceInput = faces.map((face) => {
    const element = elements[face.element]
    return { element, column: element.room.find((link) => link.group === face.group)!.column }
  })
  const startAir_C = house.air.start_C

  return {
    outside(index, hour, element) {
      let total = 0
      for (const { group } of element.outdoor) total += wholeFlow(element, group)
      for (const { group } of element.constant) total += wholeFlow(element, group)
      elementTraces[index].outside_W[hour] = total
    },
    element(index, hour, element) {
      const { modes, state, reduced } = element
      const trace = elementTraces[index]
      trace.stored_J[hour] = stored(element)
      if (trace.state) trace.state.set(state, hour * modes)
      const first = firstProbe[index]
      for (let p = 0; p < reduced.probes.length; p++) {
        let value = 0
        for (let k = 0; k < modes; k++) value += reduced.probeGain[p * modes + k] * state[k]
        probes[first + p].value[hour] = value
      }
    },
    room(hour, air, radiant, faceFlow_W, now) {
      air_C[hour] = air
      radiant_C[hour] = radiant
      operative_C[hour] = 0.5 * (air + radiant)
      for (const name of flowNames) flows[name][hour] = now[name]
      for (let k = 0; k < faces.length; k++) {
        surfaces[k].flow_W[hour] = faceFlow_W[k]
        surfaces[k].temperature_C[hour] =
          faceInput[k].element.input[faceInput[k].column] - faceFlow_W[k] / faces[k].film_WK
      }
    },
    trace() {
      const { gains } = house.model
      const gains_W = series()
      for (let hour = 0; hour < HOURS; hour++)
        gains_W[hour] = gains.convective_W[hour % 24] + gains.radiative_W[hour % 24]
      return {
        firstHour,
        startAir_C,
        air_C,
        radiant_C,
        operative_C,
        ...flows,
        solar_W: house.windows.sun_W,
        gains_W,
        windowSolar_W: house.windows.each,
        airCapacity_JK: house.airCapacity_JK,
        surfaces,
        elements: elementTraces,
        probes,
      }
    },
  }
}

function stored(element: RunningElement): number {
  const { content } = element.reduced
  if (element.full) return element.full.stepper.stored_J() * element.size
  let total = 0
  for (let k = 0; k < element.modes; k++) total += content[k] * element.state[k]
  return total * element.size
}

/** Mean flow into a group of the whole element, all inputs counted [W]. */
function wholeFlow(element: RunningElement, group: number): number {
  const { response, columns, input } = element
  let flow = storedFlow(element, group)
  for (let j = 0; j < columns; j++) flow += response[group * columns + j] * input[j]
  return flow
}
