import { expect, test } from 'vitest'
import { hourStep, phis } from '#engine/conduction/hour-step.ts'
import { reduce } from '#engine/conduction/reduce.ts'
import { earthWall, seeded, soilBlock } from './make-systems.ts'

/** ∫₀¹ e^{-z(1-s)} sⁿ ds / n! by Gauss-Legendre, three points on each of many graded intervals. */
function phiByQuadrature(n: number, z: number): number {
  const points = [-Math.sqrt(0.6), 0, Math.sqrt(0.6)]
  const weights = [5 / 9, 8 / 9, 5 / 9]
  // Cells shrink towards s = 1, where the exponential lives.
  const edge = (i: number) => 1 - (1 - i / 4000) ** 6
  let sum = 0
  for (let i = 0; i < 4000; i++) {
    const [a, b] = [edge(i), edge(i + 1)]
    points.forEach((point, p) => {
      const s = 0.5 * (a + b + (b - a) * point)
      sum += 0.5 * (b - a) * weights[p] * Math.exp(-z * (1 - s)) * s ** n
    })
  }
  return n === 2 ? sum / 2 : sum
}

for (const z of [1e-8, 1e-4, 0.02, 0.5, 0.999999, 1, 1.000001, 3, 40, 1000, 1e6])
  test(`φ1, φ2 and φ3 at ${z} agree with their integrals`, () => {
    const [e, ...phi] = phis(z)
    expect(Math.abs(e - Math.exp(-z))).toBeLessThan(2e-16)
    phi.forEach((value, n) => expect(Math.abs(value / phiByQuadrature(n, z) - 1)).toBeLessThan(1e-10))
  })

for (const [name, system] of [
  ['a wall with a massless layer', earthWall()],
  ['a block of soil', soilBlock()],
] as const) {
  const element = reduce(system)
  const { modes, groups, decay, gain0, gain1, meanState, response0, response1 } = hourStep(element)
  const step = (m: Float64Array, u0: Float64Array, u1: Float64Array) => {
    const flow = new Float64Array(groups)
    for (let g = 0; g < groups; g++) {
      for (let k = 0; k < modes; k++) flow[g] -= meanState[k * groups + g] * m[k]
      for (let h = 0; h < groups; h++)
        flow[g] += response0[g * groups + h] * u0[h] + response1[g * groups + h] * u1[h]
    }
    const next = m.map((value, k) => {
      let end = decay[k] * value
      for (let h = 0; h < groups; h++) end += gain0[k * groups + h] * u0[h] + gain1[k * groups + h] * u1[h]
      return end
    })
    return { flow, next }
  }

  test(`${name}: what flows in over an hour is what it holds more, to rounding`, () => {
    const random = seeded(11)
    for (let trial = 0; trial < 20; trial++) {
      const [u0, u1] = [0, 0].map(() => Float64Array.from({ length: groups }, () => 40 * random() - 10))
      const m = Float64Array.from(element.content, (content) => content * (20 * random() - 5))
      const { flow, next } = step(m, u0, u1)
      const gained = next.reduce((sum, value, k) => sum + element.content[k] * (value - m[k]), 0)
      const throughput = 3600 * flow.reduce((sum, value) => sum + Math.abs(value), 0)
      expect(Math.abs(gained - 3600 * flow.reduce((sum, value) => sum + value, 0))).toBeLessThan(
        1e-11 * throughput,
      )
    }
  })

  test(`${name}: as warm as all that surrounds it, it stays at rest`, () => {
    const u = new Float64Array(groups).fill(17)
    const { flow, next } = step(
      element.content.map((content) => 17 * content),
      u,
      u,
    )
    flow.forEach((value, g) => expect(Math.abs(value) / element.conductance_WK[g]).toBeLessThan(1e-10))
    next.forEach((value, k) => expect(value).toBeCloseTo(17 * element.content[k], 6))
  })
}

test('throws RangeError for a step that is not more than 0', () => {
  expect(() => hourStep(reduce(earthWall()), 0)).toThrow('step_s')
})
