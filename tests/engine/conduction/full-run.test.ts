import { expect, test } from 'vitest'
import { fullStepper, reducedStepper, type SteppedElement } from '#engine/conduction/full-run.ts'
import { layersSystem } from '#engine/conduction/layers.ts'
import { reduce } from '#engine/conduction/reduce.ts'
import { earthWall, layer, soilBlock } from './make-systems.ts'

/** Lives some hours; mean flow of each hour from each group. */
function live(element: SteppedElement, hours: number, input: (group: number, hour: number) => number) {
  const { groups, response0, response1 } = element
  const history = new Float64Array(groups)
  return Array.from({ length: hours }, (_, hour) => {
    const u0 = Float64Array.from({ length: groups }, (_, g) => input(g, hour))
    const u1 = Float64Array.from({ length: groups }, (_, g) => input(g, hour + 1))
    element.startHour(history)
    const flow = Float64Array.from({ length: groups }, (_, g) => {
      let sum = history[g]
      for (let h = 0; h < groups; h++)
        sum += response0[g * groups + h] * u0[h] + response1[g * groups + h] * u1[h]
      return sum
    })
    element.finishHour(u0, u1)
    return flow
  })
}

const swing = (group: number, hour: number) => 10 + 8 * Math.sin((2 * Math.PI * hour) / 24 + group)

for (const scheme of ['crank-nicolson', 'tr-bdf2'] as const) {
  test(`${scheme}: what flows in hour by hour is what all nodes hold more, to rounding`, () => {
    const element = fullStepper(soilBlock(), { scheme })
    element.setUniform(5)
    const before = element.stored_J()
    const flows = live(element, 200, swing)
    const sum = flows.reduce((total, flow) => total + flow.reduce((s, value) => s + value, 0), 0)
    const moved = flows.reduce((total, flow) => total + flow.reduce((s, value) => s + Math.abs(value), 0), 0)
    expect(Math.abs(element.stored_J() - before - 3600 * sum)).toBeLessThan(1e-11 * 3600 * moved)
  })

  test(`${scheme}: halving the steps quarters the distance to exact steps (second order)`, () => {
    const system = layersSystem({
      kind: 'layers',
      layers: [layer(0.1, 0.6, 1.6e6)],
      outsideFilm_Wm2K: 10,
      insideFilm_Wm2K: 8,
    })
    const exact = live(reducedStepper(reduce(system)), 96, swing)
    const error = (substeps: number) => {
      const flows = live(fullStepper(system, { scheme, substeps }), 96, swing)
      return Math.max(...flows.slice(72).map((flow, i) => Math.abs(flow[1] - exact[72 + i][1])))
    }
    expect(error(8) / error(16)).toBeGreaterThan(3.3)
    expect(error(8) / error(16)).toBeLessThan(4.7)
  })
}

test('after a jump Crank-Nicolson rings on a fine surface cell where TR-BDF2 does not (L-stability)', () => {
  const skin = layersSystem(
    { kind: 'layers', layers: [layer(0.1, 2, 1.5e6)], outsideFilm_Wm2K: 500, insideFilm_Wm2K: 500 },
    { refinement: 8 },
  )
  const jump = (group: number) => (group === 0 ? 1 : 0)
  // The slab has a time constant of 13 minutes: after seven hours exact flows differ by 1e-12 of the jump.
  const stillMoving = (scheme: 'crank-nicolson' | 'tr-bdf2') => {
    const flows = live(fullStepper(skin, { scheme, substeps: 1 }), 9, jump).map((flow) => flow[0])
    return Math.abs(flows[8] - flows[7]) / flows[8]
  }
  expect(stillMoving('crank-nicolson')).toBeGreaterThan(0.05)
  expect(stillMoving('tr-bdf2')).toBeLessThan(0.001)
})

test('modes and all nodes answer alike hour by hour, from a start field as well', () => {
  const system = soilBlock()
  const start_C = Float64Array.from(system.capacity_JK, (_, node) => 12 + 3 * Math.cos(node / 40))
  const full = fullStepper(system, { scheme: 'tr-bdf2', substeps: 4, start_C })
  const few = reducedStepper(reduce(system, { extraFields: [start_C] }), start_C)
  expect(few.stored_J() / full.stored_J()).toBeCloseTo(1, 10)
  const [a, b] = [live(full, 500, swing), live(few, 500, swing)]
  const films = reduce(system).conductance_WK
  a.forEach((flow, hour) =>
    flow.forEach((value, g) => expect(Math.abs(value - b[hour][g]) / films[g]).toBeLessThan(0.05)),
  )
  expect(few.probe(0)).toBeCloseTo(full.probe(0), 1)
})

test('a uniform temperature is at rest', () => {
  for (const element of [fullStepper(earthWall()), reducedStepper(reduce(earthWall()))]) {
    element.setUniform(21)
    for (const flow of live(element, 5, () => 21)) flow.forEach((value) => expect(value).toBeCloseTo(0, 8))
  }
})
