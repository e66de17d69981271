import {
  fullStepper,
  reducedStepper,
  type FullRunOptions,
  type SteppedElement,
} from '#engine/conduction/full-run.ts'
import { layersSystem, type LayersOptions } from '#engine/conduction/layers.ts'
import { reduce } from '#engine/conduction/reduce.ts'
import type { Layer } from '#engine/conduction/specs.ts'
import type { ThermalSystem } from '#engine/conduction/thermal-system.ts'

/** Film that stands for a given surface temperature: 1e-6 m² K/W lies between [W/(m² K)]. */
export const FIXED = 1e6

/** Layers behind two films, 0 for an adiabatic outside, with probes by depth from the inner face. */
export function chain(
  layers: readonly Omit<Layer, 'name'>[],
  films: { readonly outside: number; readonly inside: number },
  probes_m: readonly number[] = [],
  options: LayersOptions = {},
): ThermalSystem {
  return layersSystem(
    {
      kind: 'layers',
      layers: layers.map((layer, i) => ({ ...layer, name: `layer ${i}` })),
      outsideFilm_Wm2K: films.outside,
      insideFilm_Wm2K: films.inside,
    },
    { ...options, probes: probes_m.map((depth_m) => ({ name: `${depth_m} m`, depth_m })) },
  )
}

/**
 * Ground of one substance below a surface, 30 m deep over an adiabatic bottom, with a node at each probe.
 * The surface is the inside of the chain.
 */
export function deepGround(
  conductivity_WmK: number,
  volumetricHeat_Jm3K: number,
  film: number,
  probes_m: readonly number[],
): ThermalSystem {
  const cuts = [30, ...probes_m.filter((depth) => depth > 0).sort((a, b) => b - a), 0]
  const layers = cuts
    .slice(1)
    .map((to, i) => ({ thickness_m: cuts[i] - to, conductivity_WmK, volumetricHeat_Jm3K }))
  return chain(layers, { outside: 0, inside: film }, probes_m, { refinement: 3 })
}

/** What an element did: hourly mean flow in from each group, each probe at the end of each hour. */
export interface Driven {
  readonly flow: Float64Array[]
  readonly probe: Float64Array[]
  /** Largest share by which an hour's flows miss what the store gained. */
  readonly residual: number
}

/** Drives an element for some hours; input(group, time_s) is taken at the ends of each hour, linear between. */
export function drive(
  element: SteppedElement,
  hours: number,
  probes: number,
  input: (group: number, time_s: number) => number,
): Driven {
  const { groups, response0, response1 } = element
  const flow = Array.from({ length: groups }, () => new Float64Array(hours))
  const probe = Array.from({ length: probes }, () => new Float64Array(hours))
  const history = new Float64Array(groups)
  const at = (hour: number) => Float64Array.from({ length: groups }, (_, g) => input(g, hour * 3600))
  let u0 = at(0)
  let stored = element.stored_J()
  let missed = 0
  let throughput = 0
  for (let hour = 0; hour < hours; hour++) {
    const u1 = at(hour + 1)
    element.startHour(history)
    let sum = 0
    for (let g = 0; g < groups; g++) {
      let value = history[g]
      for (let h = 0; h < groups; h++)
        value += response0[g * groups + h] * u0[h] + response1[g * groups + h] * u1[h]
      flow[g][hour] = value
      sum += value
      throughput = Math.max(throughput, Math.abs(value))
    }
    element.finishHour(u0, u1)
    const now = element.stored_J()
    missed = Math.max(missed, Math.abs(now - stored - 3600 * sum))
    stored = now
    for (let p = 0; p < probes; p++) probe[p][hour] = element.probe(p)
    u0 = u1
  }
  return { flow, probe, residual: missed / (3600 * throughput) }
}

/** The modes of a system as the house uses them, or closer where small values deep inside are asked for. */
export function modes(
  system: ThermalSystem,
  { start_C, tolerance }: { start_C?: Float64Array; tolerance?: number } = {},
): SteppedElement {
  return reducedStepper(reduce(system, { extraFields: start_C ? [start_C] : [], tolerance }), start_C)
}

export function allNodes(system: ThermalSystem, options: FullRunOptions = {}): SteppedElement {
  return fullStepper(system, options)
}

/**
 * Amplitude and phase of a sine in the last full periods of hourly values.
 *
 * @param middle_h where value i stands in time: i + middle_h hours (0.5 for means, 1 for values at the end)
 * @returns late_h: by how much it is behind sin(2π t / period), within half a period either way
 */
export function sineOf(
  values: Float64Array,
  period_h: number,
  middle_h: number,
): { amplitude: number; late_h: number } {
  let sine = 0
  let cosine = 0
  const from = values.length - period_h
  for (let i = from; i < values.length; i++) {
    const angle = (2 * Math.PI * (i + middle_h)) / period_h
    sine += (2 / period_h) * values[i] * Math.sin(angle)
    cosine += (2 / period_h) * values[i] * Math.cos(angle)
  }
  return {
    amplitude: Math.hypot(sine, cosine),
    late_h: (-Math.atan2(cosine, sine) * period_h) / (2 * Math.PI),
  }
}
