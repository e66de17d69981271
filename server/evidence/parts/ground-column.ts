import { firstHarmonic } from '#engine/climate/harmonic.ts'
import { undisturbedGround } from '#engine/climate/ground.ts'
import { hourStep } from '#engine/conduction/hour-step.ts'
import { layerCells, layersSystem } from '#engine/conduction/layers.ts'
import { reduce } from '#engine/conduction/reduce.ts'
import type { DeepSoil } from './deep-soil.ts'

const DEEP_M = 30
/** So large that the face of the column has the measured temperature [W/(m² K)]. */
const HELD_FILM = 1e5
/** With one capacity for all, conductivity alone stands for diffusivity [J/(m³ K)]. */
const HEAT_JM3K = 2e6

export interface ColumnRun {
  /** Computed temperatures at the depths of the measurements below the first, hour by hour [°C]. */
  readonly soil_C: readonly Float64Array[]
  readonly nodes: number
  readonly modes: number
}

/**
 * A column of uniform soil, 30 m deep and closed below, whose top has the temperature measured at the
 * first depth; reduced and stepped by the hour as everything that conducts. It starts from the undisturbed
 * wave that fits the top's first four years.
 */
export function runColumn(measured: DeepSoil, diffusivity_m2s: number): ColumnRun {
  const [top_C] = measured.soil_C
  const depth_m = measured.depth_m.slice(1).map((depth) => depth - measured.depth_m[0])
  const soil = {
    name: 'soil',
    thickness_m: DEEP_M,
    conductivity_WmK: diffusivity_m2s * HEAT_JM3K,
    volumetricHeat_Jm3K: HEAT_JM3K,
  }
  const system = layersSystem(
    { kind: 'layers', layers: [soil], outsideFilm_Wm2K: 0, insideFilm_Wm2K: HELD_FILM },
    { probes: depth_m.map((depth) => ({ name: `${depth}`, depth_m: depth })) },
  )
  // Depth of every node below the top; node 0 lies deepest.
  const nodeDepth_m = new Float64Array(system.capacity_JK.length)
  let depth = DEEP_M
  layerCells([soil], 1, false).forEach((cell, i) => {
    nodeDepth_m[i] = depth
    depth -= cell.thickness_m
  })
  const start_C = undisturbedGround(startWave(measured, diffusivity_m2s), nodeDepth_m.map(Math.abs), 0)
  const reduced = reduce(system, { extraFields: [start_C] })
  const { modes, basis, capacity_JK, probeGain } = reduced
  const { decay, gain0, gain1 } = hourStep(reduced, 3600)
  const state = new Float64Array(modes)
  for (let node = 0; node < start_C.length; node++)
    for (let k = 0; k < modes; k++) state[k] += basis[node * modes + k] * capacity_JK[node] * start_C[node]
  const soil_C = depth_m.map(() => new Float64Array(measured.hours))
  for (let hour = 0; hour < measured.hours; hour++) {
    const before_C = top_C[Math.max(0, hour - 1)]
    if (hour > 0)
      for (let k = 0; k < modes; k++)
        state[k] = decay[k] * state[k] + gain0[k] * before_C + gain1[k] * top_C[hour]
    for (let p = 0; p < depth_m.length; p++) {
      let value = 0
      for (let k = 0; k < modes; k++) value += probeGain[p * modes + k] * state[k]
      soil_C[p][hour] = value
    }
  }
  return { soil_C, nodes: start_C.length, modes }
}

/** The yearly wave of the top over four whole years, in time from the first record. */
function startWave(measured: DeepSoil, diffusivity_m2s: number) {
  const YEARS = 4
  const year = new Float64Array(8760)
  for (let hour = 0; hour < 8760 * YEARS; hour++) year[hour % 8760] += measured.soil_C[0][hour] / YEARS
  const { mean: mean_C, amplitude: amplitude_K, coldest_s } = firstHarmonic(year, 3600, 0)
  return { mean_C, amplitude_K, coldest_s, diffusivity_m2s }
}

/** Error of one series in a span of hours that a rule picks [K]. */
export interface SeriesError {
  readonly bias_K: number
  readonly rmse_K: number
}

export function seriesError(
  computed_C: Float64Array,
  measured_C: Float64Array,
  from: number,
  to: number,
  counts: (hour: number) => boolean = () => true,
): SeriesError {
  let sum = 0
  let squares = 0
  let n = 0
  for (let hour = from; hour < to; hour++) {
    if (!counts(hour)) continue
    const error = computed_C[hour] - measured_C[hour]
    sum += error
    squares += error * error
    n++
  }
  return { bias_K: sum / n, rmse_K: Math.sqrt(squares / n) }
}

/** Largest size of the error in the counted hours [K]. */
export function worstError(
  computed_C: Float64Array,
  measured_C: Float64Array,
  from: number,
  to: number,
  counts: (hour: number) => boolean,
): number {
  let worst = 0
  for (let hour = from; hour < to; hour++)
    if (counts(hour)) worst = Math.max(worst, Math.abs(computed_C[hour] - measured_C[hour]))
  return worst
}

/** Diffusivity with the least mean square error at all depths in a span of hours, by golden section [m²/s]. */
export function fitColumn(measured: DeepSoil, from: number, to: number): number {
  const error = (diffusivity_m2s: number) => {
    const { soil_C } = runColumn(measured, diffusivity_m2s)
    return soil_C.reduce(
      (sum, series, i) => sum + seriesError(series, measured.soil_C[i + 1], from, to).rmse_K ** 2,
      0,
    )
  }
  const golden = (Math.sqrt(5) - 1) / 2
  let [low, high] = [1e-7, 1e-6]
  let [a, b] = [high - golden * (high - low), low + golden * (high - low)]
  let [errorA, errorB] = [error(a), error(b)]
  while (high - low > 2e-9) {
    if (errorA < errorB) {
      ;[high, b, errorB] = [b, a, errorA]
      a = high - golden * (high - low)
      errorA = error(a)
    } else {
      ;[low, a, errorA] = [a, b, errorB]
      b = low + golden * (high - low)
      errorB = error(b)
    }
  }
  return 0.5 * (low + high)
}
