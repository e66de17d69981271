import { undisturbedGround, type GroundWave } from '../climate/ground.ts'
import { locate } from './section-probes.ts'
import type { SectionMesh } from './section.ts'
import type { ReducedElement } from './thermal-system.ts'

/** Undisturbed ground at every node, depth below level ground; soil heaped above it is taken at the surface's temperature. */
export function undisturbedField(mesh: SectionMesh, wave: GroundWave, time_s: number): Float64Array {
  return undisturbedGround(
    wave,
    mesh.z_m.map((z) => Math.max(0, -z)),
    time_s,
  )
}

/**
 * Temperature of every node of a section at one time: the basis times the modes.
 *
 * @param state modes at that time, length reduced.modes
 * @param out   receives the temperatures [°C], one for each node; allocated when left out
 */
export function temperatureField(
  reduced: ReducedElement,
  state: ArrayLike<number>,
  out: Float64Array = new Float64Array(reduced.capacity_JK.length),
): Float64Array {
  const { modes, basis } = reduced
  for (let node = 0, at = 0; node < out.length; node++) {
    let value = 0
    for (let k = 0; k < modes; k++, at++) value += basis[at] * state[k]
    out[node] = value
  }
  return out
}

/** The field at the end of an hour of the year (0 to 8,759), from a trace that kept its states. */
export function fieldOfHour(reduced: ReducedElement, states: Float64Array, hour: number): Float64Array {
  const { modes } = reduced
  if (!(hour >= 0 && (hour + 1) * modes <= states.length))
    throw new RangeError(`hour must be 0 to ${states.length / modes - 1}, got ${hour}`)
  return temperatureField(reduced, states.subarray(hour * modes, (hour + 1) * modes))
}

const WEEK_H = 168

/**
 * The 52 weeks of a year: the mean field of each (the 365th day belongs to none).
 *
 * @param states modes of every hour, `states[hour * modes + k]`, as an element's trace keeps them
 */
export function weeklyFields(reduced: ReducedElement, states: Float64Array): Float64Array[] {
  const { modes } = reduced
  return Array.from({ length: 52 }, (_, week) => {
    const mean = new Float64Array(modes)
    for (let hour = week * WEEK_H; hour < (week + 1) * WEEK_H; hour++)
      for (let k = 0; k < modes; k++) mean[k] += states[hour * modes + k] / WEEK_H
    return temperatureField(reduced, mean)
  })
}

/** A field on a regular raster, row by row from above. */
export interface FieldGrid {
  readonly columns: number
  readonly rows: number
  /** Middle of the first column and row, and the spacing [m]; x from the middle of the floor, z above level ground. */
  readonly left_m: number
  readonly top_m: number
  readonly step_m: number
  /** `value[row * columns + column]` [°C]; NaN where there is air. */
  readonly value: Float64Array
}

/**
 * Samples a nodal field on a raster, bilinear within the cells.
 *
 * @param frame the part of the section to show [m]
 * @param step_m spacing of the raster, more than 0
 */
export function fieldGrid(
  mesh: SectionMesh,
  field: Float64Array,
  frame: {
    readonly left_m: number
    readonly right_m: number
    readonly top_m: number
    readonly bottom_m: number
  },
  step_m: number,
): FieldGrid {
  if (!(step_m > 0)) throw new RangeError(`step_m must be more than 0, got ${step_m}`)
  const columns = Math.max(1, Math.round((frame.right_m - frame.left_m) / step_m))
  const rows = Math.max(1, Math.round((frame.top_m - frame.bottom_m) / step_m))
  const left_m = frame.left_m + step_m / 2
  const top_m = frame.top_m - step_m / 2
  const value = new Float64Array(columns * rows).fill(NaN)
  for (let j = 0; j < rows; j++)
    for (let i = 0; i < columns; i++) {
      const found = locate(mesh, left_m + i * step_m, top_m - j * step_m)
      if (found)
        value[j * columns + i] = found.node.reduce((sum, node, n) => sum + found.weight[n] * field[node], 0)
    }
  return { columns, rows, left_m, top_m, step_m, value }
}
