import { HOURS, HOUR_S } from '../climate/climate-year.ts'
import type { SteppedElement } from '../conduction/full-run.ts'
import { hourStep } from '../conduction/hour-step.ts'
import type { ReducedElement } from '../conduction/thermal-system.ts'
import type { Driven } from './driven.ts'
import type { Drives } from './drives.ts'
import type { HouseElement, RoomSurface } from './house-model.ts'

/** One surface of the room as the hour loop sees it. */
export interface RoomFace {
  readonly surface: RoomSurface
  /** Index of its element in `elements`. */
  readonly element: number
  /** Its boundary group there. */
  readonly group: number
  /** Film conductance, area times film [W/K]. */
  readonly film_WK: number
  /** Convective and radiative share of the film, summing to 1. */
  readonly convective: number
  readonly radiative: number
  /** Short-wave and radiative gains that it absorbs, by hour [W]. */
  readonly absorbed_W: Float64Array
  /** The part of `absorbed_W` that is sun [W]. */
  readonly sun_W: Float64Array
  /** Share of radiant heating power that falls on it. */
  readonly radiantShare: number
}

/**
 * A conducting element, ready to be stepped. Inputs stand in `input`: one column for each room group
 * (constant within the hour), two for each outdoor group (start and end of the hour), one for each
 * constant group.
 */
export interface RunningElement {
  readonly name: string
  readonly kind: HouseElement['spec']['kind']
  readonly size: number
  readonly reduced: ReducedElement
  readonly modes: number
  readonly columns: number
  /** Modes; written by the hour loop. */
  readonly state: Float64Array
  readonly input: Float64Array
  /** decay, length modes. */
  readonly decay: Float64Array
  /** `gain[j * modes + k]`: input column j, mode k. */
  readonly gain: Float64Array
  /** Whole element: flow into it from group g is -Σ_k history[g * modes + k] m_k + Σ_j response[g * columns + j] input_j [W]. */
  readonly history: Float64Array
  readonly response: Float64Array
  /** Indices into `faces`, with the group and column of each. */
  readonly room: readonly { readonly face: number; readonly group: number; readonly column: number }[]
  readonly outdoor: readonly { readonly group: number; readonly column: number; readonly drive: Driven }[]
  readonly constant: readonly { readonly group: number; readonly column: number }[]
  /** All nodes stepped in time instead of the modes, for comparisons; null in every usual run. */
  readonly full: { readonly stepper: SteppedElement; readonly history_W: Float64Array } | null
}

/**
 * Lays out one element for the hour loop and adds its faces in the room to `faces`.
 *
 * @param index   its place among the elements
 * @param stepper steps all nodes instead of the modes; null in every usual run
 * @throws RangeError when a boundary has no link, or a face's area and film are not those of the element
 */
export function runningElement(
  element: HouseElement,
  index: number,
  reduced: ReducedElement,
  stepper: SteppedElement | null,
  drives: Drives,
  faces: RoomFace[],
): RunningElement {
  const { modes } = reduced
  const step = hourStep(reduced, HOUR_S)
  const groups = reduced.boundaries.length
  const size = element.size
  const room: RunningElement['room'][number][] = []
  const outdoor: RunningElement['outdoor'][number][] = []
  const constant: (RunningElement['constant'][number] & { temperature_C: number })[] = []
  let columns = 0
  reduced.boundaries.forEach((name, group) => {
    const link = element.links[name]
    if (!link) throw new RangeError(`${element.name}: nothing is said about its boundary "${name}".`)
    if (link.to === 'room') {
      const { surface } = link
      const film = surface.convective_Wm2K + surface.radiative_Wm2K
      const film_WK = reduced.conductance_WK[group] * size
      if (Math.abs(film_WK - film * surface.area_m2) > 1e-6 * film_WK)
        throw new RangeError(
          `${surface.name}: its area ${surface.area_m2} m² times its film ${film} W/m²K is not the ${film_WK} W/K of its element.`,
        )
      room.push({ face: faces.length, group, column: columns++ })
      faces.push({
        surface,
        element: index,
        group,
        film_WK,
        convective: surface.convective_Wm2K / film,
        radiative: surface.radiative_Wm2K / film,
        absorbed_W: new Float64Array(HOURS),
        sun_W: new Float64Array(HOURS),
        radiantShare: 0,
      })
    } else if (link.to === 'outdoor') {
      outdoor.push({ group, column: columns, drive: drives.of(link.exposure) })
      columns += 2
    } else {
      constant.push({ group, column: columns++, temperature_C: link.temperature_C })
    }
  })

  const gain = new Float64Array(modes * columns)
  const response = new Float64Array(groups * columns)
  const history = new Float64Array(groups * modes)
  const { response0, response1 } = stepper ?? step
  const fill = (group: number, column: number, start: number, end: number) => {
    for (let k = 0; k < modes; k++) {
      const at = k * groups + group
      gain[column * modes + k] += start * step.gain0[at] + end * step.gain1[at]
    }
    for (let g = 0; g < groups; g++) {
      const at = g * groups + group
      response[g * columns + column] += size * (start * response0[at] + end * response1[at])
    }
  }
  for (const { group, column } of room) fill(group, column, 1, 1)
  for (const { group, column } of constant) fill(group, column, 1, 1)
  for (const { group, column } of outdoor) {
    fill(group, column, 1, 0)
    fill(group, column + 1, 0, 1)
  }
  for (let g = 0; g < groups; g++)
    for (let k = 0; k < modes; k++) history[g * modes + k] = size * step.meanState[k * groups + g]

  const input = new Float64Array(columns)
  for (const { column, temperature_C } of constant) input[column] = temperature_C
  return {
    name: element.name,
    kind: element.spec.kind,
    size,
    reduced,
    modes,
    columns,
    state: new Float64Array(modes),
    input,
    decay: step.decay,
    gain,
    history,
    response,
    room,
    outdoor,
    constant,
    full: stepper && { stepper, history_W: new Float64Array(groups) },
  }
}
