import fc from 'fast-check'
import { expect, test } from 'vitest'
import { bandTimes, choleskyFactor } from '#engine/conduction/band-matrix.ts'
import {
  fieldGrid,
  fieldOfHour,
  temperatureField,
  undisturbedField,
  weeklyFields,
} from '#engine/conduction/field.ts'
import { reduce } from '#engine/conduction/reduce.ts'
import { sectionSystem } from '#engine/conduction/section.ts'
import { locate, quadArea } from '#engine/conduction/section-probes.ts'
import { surfaceHeight, wallOuterFace } from '#engine/conduction/section-geometry.ts'
import type { SectionSpec } from '#engine/conduction/specs.ts'
import { BERMED_SECTION } from '../../../server/evidence/parts/bermed-section.ts'

const board = BERMED_SECTION.umbrella!.layers[0]
const level: SectionSpec = { ...BERMED_SECTION, berm: null, cover: null, umbrella: null, wallTop_m: 0.4 }

const areaOf = (spec: SectionSpec, name: string) => {
  const { mesh } = sectionSystem(spec)
  let area = 0
  mesh.substance.forEach((kind, cell) => {
    if (mesh.substances[kind].name === name) area += quadArea(mesh, cell)
  })
  return area
}

test('a sloped umbrella is one unbroken board: its area is thickness times length along the surface', () => {
  const { berm, umbrella } = BERMED_SECTION
  const { crest_m, height_m, run } = berm!
  const onSlope_m = height_m * run
  const flat_m = umbrella!.reach_m - onSlope_m
  const along_m = flat_m + Math.hypot(onSlope_m, height_m)
  expect(crest_m + onSlope_m).toBeLessThan(umbrella!.reach_m)
  const area = areaOf(BERMED_SECTION, 'board')
  // The mitres at crest and toe share their columns, so a few hundredths of a board are off.
  expect(Math.abs(area / (board.thickness_m * along_m) - 1)).toBeLessThan(0.01)
})

test('every column under the umbrella holds its whole thickness in adjoining cells', () => {
  const { mesh } = sectionSystem(BERMED_SECTION)
  const outer_m = wallOuterFace(BERMED_SECTION)
  const rowsOf = new Map<number, number[]>()
  mesh.substance.forEach((kind, cell) => {
    if (mesh.substances[kind].name !== 'board') return
    const column = mesh.place[2 * cell]
    rowsOf.set(column, [...(rowsOf.get(column) ?? []), mesh.place[2 * cell + 1]])
  })
  const covered = [...mesh.columns].filter((x) => x >= outer_m - 1e-9 && x < outer_m + 6 - 1e-9).length
  expect(rowsOf.size).toBe(covered)
  const [first] = rowsOf.values()
  for (const rows of rowsOf.values()) expect(rows).toEqual(first)
})

test('wall, floor and berm have the areas of their outlines', () => {
  const { wallTop_m, halfFloor_m, floor, wall } = BERMED_SECTION
  expect(areaOf(BERMED_SECTION, 'floor')).toBeCloseTo(halfFloor_m * floor[0].thickness_m, 9)
  expect(areaOf(BERMED_SECTION, 'wall')).toBeCloseTo((wallTop_m + 0.15) * wall[0].thickness_m, 9)
})

test('groups come in the documented order, with films times their lengths', () => {
  const { system } = sectionSystem(BERMED_SECTION)
  expect(system.boundaries.map(({ name }) => name)).toEqual([
    'floor',
    'wall-inside',
    'wall-outside',
    'level',
    'slope',
  ])
  const total = (name: string) =>
    system.boundaries
      .find((group) => group.name === name)!
      .conductance_WK.reduce((sum, value) => sum + value, 0)
  const { films, halfFloor_m, wallTop_m, berm } = BERMED_SECTION
  expect(total('floor')).toBeCloseTo(films.floor * halfFloor_m, 9)
  expect(total('wall-inside')).toBeCloseTo(films.wallInside * wallTop_m, 9)
  expect(total('wall-outside')).toBeCloseTo(films.wallOutside * (wallTop_m - berm!.height_m), 9)
  expect(total('slope')).toBeCloseTo(films.ground * Math.hypot(berm!.height_m, berm!.height_m * berm!.run), 9)
})

test('a usual section has 1,500 to 3,500 cells, none thinner than 2 mm, and reaches 15 m down and 20 m out', () => {
  for (const spec of [BERMED_SECTION, level]) {
    const { mesh, system } = sectionSystem(spec)
    expect(mesh.substance.length).toBeGreaterThan(1500)
    expect(mesh.substance.length).toBeLessThan(3500)
    expect(system.conductance_WK.halfWidth).toBeLessThanOrEqual(60)
    for (const lines of [mesh.columns, mesh.rows]) {
      const sizes = Array.from(lines.subarray(1), (line, i) => Math.abs(line - lines[i]))
      expect(Math.min(...sizes)).toBeGreaterThan(0.002)
    }
    const [last] = mesh.columns.slice(-1)
    expect(last).toBeGreaterThan(wallOuterFace(spec) + 20 - 1e-9)
    expect(mesh.rows[mesh.rows.length - 1]).toBe(-15)
  }
})

const sections = fc
  .record({
    height_m: fc.double({ min: 0.4, max: 3, noNaN: true }),
    crest_m: fc.double({ min: 0.3, max: 3, noNaN: true }),
    run: fc.double({ min: 0.5, max: 4, noNaN: true }),
    reach_m: fc.double({ min: 0.3, max: 9, noNaN: true }),
    board_m: fc.double({ min: 0.02, max: 0.3, noNaN: true }),
    floorLevel_m: fc.double({ min: -0.8, max: 0.3, noNaN: true }),
    hasUmbrella: fc.boolean(),
  })
  .map(({ height_m, crest_m, run, reach_m, board_m, floorLevel_m, hasUmbrella }): SectionSpec => ({
    ...BERMED_SECTION,
    floorLevel_m,
    footing: null,
    wallTop_m: Math.max(height_m, floorLevel_m) + 0.3,
    berm: { ...BERMED_SECTION.berm!, height_m, crest_m, run },
    umbrella: hasUmbrella ? { layers: [{ ...board, thickness_m: board_m }], reach_m } : null,
    cover: { layers: [{ ...BERMED_SECTION.cover!.layers[0], thickness_m: 0.1 }], reach_m },
  }))

test('any berm and umbrella: no cell is turned over, the system is positive definite, a uniform field is at rest', () => {
  fc.assert(
    fc.property(sections, (spec) => {
      const { system, mesh } = sectionSystem(spec)
      for (let cell = 0; cell < mesh.substance.length; cell++) expect(quadArea(mesh, cell)).toBeGreaterThan(0)
      expect(system.capacity_JK.every((capacity) => capacity > 0)).toBe(true)
      choleskyFactor(system.conductance_WK)
      const rest = bandTimes(system.conductance_WK, new Float64Array(system.capacity_JK.length).fill(1))
      for (const { node, conductance_WK } of system.boundaries)
        node.forEach((at, i) => (rest[at] -= conductance_WK[i]))
      expect(rest.every((value) => Math.abs(value) < 1e-8)).toBe(true)
    }),
    { numRuns: 25 },
  )
})

test('soil beyond the tip of the umbrella is the soil of the berm above level ground, natural soil below it', () => {
  const spec = {
    ...BERMED_SECTION,
    berm: { ...BERMED_SECTION.berm!, soil: { ...BERMED_SECTION.soil, name: 'fill' } },
    umbrella: { layers: [board], reach_m: 1.5 },
    cover: null,
  }
  const { mesh } = sectionSystem(spec)
  mesh.substance.forEach((kind, cell) => {
    const corners = Array.from(mesh.corner.subarray(4 * cell, 4 * cell + 4))
    const z = corners.reduce((sum, node) => sum + mesh.z_m[node] / 4, 0)
    const x = corners.reduce((sum, node) => sum + mesh.x_m[node] / 4, 0)
    if (x > wallOuterFace(spec) + 1.5) expect(mesh.substances[kind].name).toBe(z > 0 ? 'fill' : 'damp loam')
  })
})

test.each([
  ['halfFloor_m', { halfFloor_m: 0 }],
  ['wall[0].thickness_m', { wall: [{ ...board, thickness_m: -0.1 }] }],
  ['soil.conductivity_WmK', { soil: { ...BERMED_SECTION.soil, conductivity_WmK: NaN } }],
  ['berm.run', { berm: { ...BERMED_SECTION.berm!, run: 0.1 } }],
  ['wallTop_m', { wallTop_m: 1.5 }],
  ['skirt.top_m', { skirt: { substance: board, thickness_m: 0.05, top_m: 2.5, bottom_m: -0.5 } }],
  ['skirt.top_m', { skirt: { substance: board, thickness_m: 0.05, top_m: -1, bottom_m: -0.5 } }],
  ['footing.depth_m', { footing: { depth_m: 0.05, substance: board } }],
  ['extent.depth_m', { extent: { depth_m: 0.5, beyond_m: 20 } }],
  ['films.floor', { films: { ...BERMED_SECTION.films, floor: 0 } }],
] as const)('throws RangeError naming %s', (name, change) => {
  const spec = { ...BERMED_SECTION, ...change } as SectionSpec
  expect(() => sectionSystem(spec)).toThrow(RangeError)
  expect(() => sectionSystem(spec)).toThrow(name)
})

test('a place is found in its cell: a linear field is read back where it lies', () => {
  const { mesh } = sectionSystem(BERMED_SECTION)
  const outer_m = wallOuterFace(BERMED_SECTION)
  for (const [from_m, depth_m] of [
    [0.3, 0.1],
    [2.2, 1.3],
    [5.9, 4],
    [18, 9],
  ]) {
    const x = outer_m + from_m
    const z = surfaceHeight(BERMED_SECTION, from_m) - depth_m
    const found = locate(mesh, x, z)!
    const read = (values: Float64Array) =>
      found.node.reduce((sum, node, i) => sum + found.weight[i] * values[node], 0)
    expect(read(mesh.x_m)).toBeCloseTo(x, 9)
    expect(read(mesh.z_m)).toBeCloseTo(z, 9)
  }
  expect(locate(mesh, 1, 1)).toBeNull()
})

test('fields come from the modes: a start field returns, weeks are means, rasters leave air out', () => {
  const { system, mesh } = sectionSystem(level)
  const wave = { mean_C: 9, amplitude_K: 11, coldest_s: 20 * 86400, diffusivity_m2s: 1.2 / 2e6 }
  const start = undisturbedField(mesh, wave, 0)
  const unit = { ...wave, mean_C: 0, amplitude_K: 1, coldest_s: 0 }
  const quarter_s = (365 * 86400) / 4
  const reduced = reduce(system, {
    extraFields: [undisturbedField(mesh, unit, 0), undisturbedField(mesh, unit, quarter_s)],
  })
  const { modes, basis, capacity_JK } = reduced
  const state = new Float64Array(modes)
  start.forEach((value, node) => {
    for (let k = 0; k < modes; k++) state[k] += basis[node * modes + k] * capacity_JK[node] * value
  })
  const back = temperatureField(reduced, state)
  expect(back.every((value, node) => Math.abs(value - start[node]) < 1e-6)).toBe(true)

  const states = new Float64Array(8760 * modes)
  for (let hour = 0; hour < 8760; hour++)
    for (let k = 0; k < modes; k++) states[hour * modes + k] = state[k] * (hour < 168 ? 1 : 2)
  expect(fieldOfHour(reduced, states, 200)[5]).toBeCloseTo(2 * start[5], 6)
  const weeks = weeklyFields(reduced, states)
  expect(weeks).toHaveLength(52)
  expect(weeks[0][5]).toBeCloseTo(start[5], 6)
  expect(weeks[51][5]).toBeCloseTo(2 * start[5], 6)

  const grid = fieldGrid(mesh, start, { left_m: 0, right_m: 10, top_m: 1, bottom_m: -5 }, 0.5)
  expect([grid.columns, grid.rows]).toEqual([20, 12])
  expect(grid.value[0]).toBeNaN()
  const deep = grid.value[11 * grid.columns]
  expect(deep).toBeGreaterThan(Math.min(...start))
  expect(deep).toBeLessThan(Math.max(...start))
})
