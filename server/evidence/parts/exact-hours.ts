import { expm, matrix } from 'mathjs'
import type { ThermalSystem } from '#engine/conduction/thermal-system.ts'
import type { Driven } from './drive-layers.ts'

const HOUR_S = 3600

/**
 * A small system hour by hour by the matrix exponential, written from its equations with a general-purpose
 * routine: no modes, no φ functions. Unknowns are the nodes, what has flowed in from each group, the inputs
 * and their rates, so that inputs linear within the hour are exact.
 */
export function exactHours(
  system: ThermalSystem,
  hours: number,
  input: (group: number, time_s: number) => number,
): Pick<Driven, 'flow' | 'probe'> {
  const { capacity_JK, conductance_WK, boundaries, probes } = system
  const nodes = capacity_JK.length
  const groups = boundaries.length
  const size = nodes + 3 * groups
  const rate = Array.from({ length: size }, () => new Array<number>(size).fill(0))
  const { halfWidth, data } = conductance_WK
  for (let i = 0; i < nodes; i++)
    for (let j = Math.max(0, i - halfWidth); j <= i; j++) {
      const value = -data[i * (halfWidth + 1) + j - i + halfWidth]
      rate[i][j] = value / capacity_JK[i]
      rate[j][i] = value / capacity_JK[j]
    }
  boundaries.forEach(({ node, conductance_WK: film }, g) => {
    const heat = nodes + g
    const own = nodes + groups + g
    node.forEach((n, i) => {
      rate[n][own] += film[i] / capacity_JK[n]
      rate[heat][own] += film[i]
      rate[heat][n] -= film[i]
    })
    rate[own][own + groups] = 1
  })
  const map = expm(matrix(rate.map((row) => row.map((value) => value * HOUR_S)))).toArray() as number[][]

  let state = new Float64Array(nodes)
  const flow = boundaries.map(() => new Float64Array(hours))
  const probe = probes.map(() => new Float64Array(hours))
  for (let hour = 0; hour < hours; hour++) {
    const whole = new Float64Array(size)
    whole.set(state)
    for (let g = 0; g < groups; g++) {
      const [start, end] = [input(g, hour * HOUR_S), input(g, (hour + 1) * HOUR_S)]
      whole[nodes + groups + g] = start
      whole[nodes + 2 * groups + g] = (end - start) / HOUR_S
    }
    const next = map.map((row) => row.reduce((sum, value, i) => sum + value * whole[i], 0))
    state = Float64Array.from(next.slice(0, nodes))
    for (let g = 0; g < groups; g++) flow[g][hour] = next[nodes + g] / HOUR_S
    probes.forEach(({ node, weight }, p) => {
      probe[p][hour] = node.reduce((sum, n, i) => sum + weight[i] * state[n], 0)
    })
  }
  return { flow, probe }
}
