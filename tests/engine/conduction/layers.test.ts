import { expect, test } from 'vitest'
import { bandTimes, choleskyFactor, choleskySolve } from '#engine/conduction/band-matrix.ts'
import { nodalAdmittance } from '#engine/conduction/admittance.ts'
import { layerCells, layersSystem } from '#engine/conduction/layers.ts'
import { lumpedSystem } from '#engine/conduction/lumped.ts'
import { periodicProperties } from '#engine/conduction/periodic.ts'
import { uValue } from '#engine/conduction/resistance.ts'
import { EARTH_WALL, earthWall, layer } from './make-systems.ts'

test('a uniform temperature equal to both inputs is at rest, and the nodes hold the heat of the layers', () => {
  const { conductance_WK, boundaries, capacity_JK } = earthWall()
  const rest = bandTimes(conductance_WK, new Float64Array(capacity_JK.length).fill(1))
  for (const { node, conductance_WK: film } of boundaries) rest[node[0]] -= film[0]
  rest.forEach((value) => expect(value).toBeCloseTo(0, 10))
  const heat = EARTH_WALL.layers.reduce((sum, one) => sum + one.thickness_m * one.volumetricHeat_Jm3K, 0)
  expect(capacity_JK.reduce((sum, value) => sum + value, 0) / heat).toBeCloseTo(1, 12)
})

test('steady heat through layers is 1 / (R_si + Σ d/λ + R_se) (ISO 6946), and the profile is piecewise linear', () => {
  const depth_m = [0, 0.15, 0.3, 0.37, 0.44]
  const system = earthWall({ probes: depth_m.map((depth) => ({ name: `${depth}`, depth_m: depth })) })
  const right = new Float64Array(system.capacity_JK.length)
  right[right.length - 1] = EARTH_WALL.insideFilm_Wm2K
  const field = choleskySolve(choleskyFactor(system.conductance_WK), right)
  const flow = EARTH_WALL.insideFilm_Wm2K * (1 - field[field.length - 1])
  expect(flow).toBeCloseTo(uValue(EARTH_WALL.layers, { inside: 1 / 8, outside: 1 / 20 }), 10)
  const drop = [0, 0.15 / 0.6, 0.3 / 0.6, 0.3 / 0.6 + 0.02 / 0.12 + 0.05 / 0.036]
  drop.push(0.3 / 0.6 + 0.02 / 0.12 + 0.1 / 0.036 + 0.02 / 0.8)
  system.probes.forEach(({ node, weight }, p) => {
    const value = node.reduce((sum, n, i) => sum + weight[i] * field[n], 0)
    expect(value).toBeCloseTo(1 - flow * (1 / 8 + drop[p]), 10)
  })
})

test('the outside group is left out when its film is 0', () => {
  const system = layersSystem({ ...EARTH_WALL, outsideFilm_Wm2K: 0 })
  expect(system.boundaries.map(({ name }) => name)).toEqual(['inside'])
  expect(earthWall().boundaries.map(({ name }) => name)).toEqual(['outside', 'inside'])
})

test('cells are fine at both faces, a massless layer is one cell, and refinement halves cells', () => {
  const cells = layerCells(EARTH_WALL.layers, 1, true)
  expect(cells.filter(({ volumetricHeat_Jm3K }) => volumetricHeat_Jm3K === 1200)).toHaveLength(1)
  expect(cells.at(-1)?.thickness_m).toBeLessThan(0.1016 / 12)
  expect(cells.length).toBeLessThan(40)
  const finer = layerCells([layer(0.3, 0.6, 1.6e6)], 2, true).length
  expect(finer / layerCells([layer(0.3, 0.6, 1.6e6)], 1, true).length).toBeCloseTo(2, 0)
})

test('halving the cells of an adobe wall quarters the error of its daily transmittance (ISO 13786)', () => {
  const wall = [layer(0.3, 0.6, 1.6e6)]
  const exact = periodicProperties(wall, { inside: 0.13, outside: 0.04 }).through.size
  const error = (refinement: number) => {
    const system = layersSystem(
      { kind: 'layers', layers: wall, outsideFilm_Wm2K: 25, insideFilm_Wm2K: 1 / 0.13 },
      { refinement },
    )
    const { re, im } = nodalAdmittance(system, (2 * Math.PI) / 86400)
    return Math.abs(Math.hypot(re[1], im[1]) / exact - 1)
  }
  expect(error(1)).toBeLessThan(0.01)
  expect(error(1) / error(2)).toBeGreaterThan(3)
  expect(error(1) / error(2)).toBeLessThan(5)
})

test('throws RangeError naming what is out of range', () => {
  const with_ = (change: object) => () =>
    layersSystem({ ...EARTH_WALL, layers: [{ ...EARTH_WALL.layers[0], ...change }] })
  expect(with_({ thickness_m: -0.1 })).toThrow('layers[0].thickness_m')
  expect(with_({ conductivity_WmK: NaN })).toThrow('layers[0].conductivity_WmK')
  expect(with_({ volumetricHeat_Jm3K: 0 })).toThrow('layers[0].volumetricHeat_Jm3K')
  expect(() => layersSystem({ ...EARTH_WALL, layers: [] })).toThrow('layers')
  expect(() => layersSystem({ ...EARTH_WALL, insideFilm_Wm2K: 0 })).toThrow('insideFilm_Wm2K')
  expect(() => layersSystem({ ...EARTH_WALL, outsideFilm_Wm2K: -1 })).toThrow('outsideFilm_Wm2K')
  expect(() => earthWall({ probes: [{ name: 'far', depth_m: 2 }] })).toThrow('probe far')
  expect(() => lumpedSystem({ kind: 'lumped', capacity_JK: 0, conductance_WK: 1 })).toThrow('capacity_JK')
  expect(() => lumpedSystem({ kind: 'lumped', capacity_JK: 1, conductance_WK: NaN })).toThrow(
    'conductance_WK',
  )
})
