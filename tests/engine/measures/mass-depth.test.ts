import { expect, test } from 'vitest'
import { size } from '#engine/conduction/complex.ts'
import { massDepth, massDepths } from '#engine/measures/mass-depth.ts'
import { penetrationDepth, periodicField } from '#engine/conduction/periodic-depth.ts'
import { adobe, makeModel } from './make-trace.ts'

const DAY_S = 86400
const concrete = { name: 'concrete', conductivity_WmK: 1.8, volumetricHeat_Jm3K: 2.4e6 }
const gypsum = { name: 'gypsum', conductivity_WmK: 0.16, volumetricHeat_Jm3K: 0.798e6 }
const adiabatic = { kind: 'film', film_Wm2K: 0 } as const

test('penetration depth of a day: concrete 0.1436, adobe 0.1016 m (ISO 13786)', () => {
  expect(penetrationDepth(concrete, DAY_S)).toBeCloseTo(0.1436, 4)
  expect(penetrationDepth(adobe, DAY_S)).toBeCloseTo(0.1016, 4)
})

test('over an adiabatic back the day holds the diurnal heat capacity (Balcomb et al. 1984), Wh/m²K to 1e-3', () => {
  const thickness_mm = [12.5, 50, 80, 100, 150, 200, 300]
  const rows = [
    [concrete, [8.33, 33.18, 51.81, 62.3, 76.44, 76.01, 68.77]],
    [adobe, [5.56, 21.83, 31.98, 35.51, 35.36, 32.8, 31.75]],
    [gypsum, [2.77, 10.44, 13.21, 13.15, 11.9, 11.57, 11.64]],
  ] as const
  for (const [material, expected] of rows)
    thickness_mm.forEach((mm, i) => {
      const field = periodicField([{ ...material, thickness_m: mm / 1000 }], adiabatic, DAY_S)
      const held = size(field.held(mm / 1000)) / 3600
      expect(Math.abs(held / expected[i] - 1)).toBeLessThan(1e-3)
    })
})

test('in endless adobe the day falls to 1/e and turns by one radian each 0.1016 m (Carslaw and Jaeger 1959, 2.6)', () => {
  const field = periodicField([{ ...adobe, thickness_m: 5 }], { kind: 'endless' }, DAY_S)
  const depth = penetrationDepth(adobe, DAY_S)
  const found = field.temperature(2 * depth)
  expect(size(found)).toBeCloseTo(Math.exp(-2), 9)
  expect(Math.atan2(found[1], found[0])).toBeCloseTo(-2, 9)
})

test('cutting one wall into three layers of itself changes nothing', () => {
  const whole = periodicField([adobe], { kind: 'film', film_Wm2K: 20 }, DAY_S)
  const cut = [0.05, 0.1, 0.15].map((thickness_m) => ({ ...adobe, thickness_m }))
  const parts = periodicField(cut, { kind: 'film', film_Wm2K: 20 }, DAY_S)
  for (const depth of [0, 0.04, 0.06, 0.2, 0.29]) {
    expect(parts.temperature(depth)[0]).toBeCloseTo(whole.temperature(depth)[0], 9)
    expect(parts.flow(depth)[1]).toBeCloseTo(whole.flow(depth)[1], 9)
  }
})

test('temperature and flow are continuous from layer to layer, and the face swings by 1 K', () => {
  const layers = [{ ...gypsum, thickness_m: 0.02 }, { ...concrete, thickness_m: 0.2 }, adobe]
  const field = periodicField(layers, { kind: 'film', film_Wm2K: 15 }, DAY_S)
  expect(field.temperature(0)).toEqual([expect.closeTo(1, 9), expect.closeTo(0, 9)])
  for (const joint of [0.02, 0.22]) {
    const [a, b] = [joint - 1e-9, joint + 1e-9]
    expect(field.temperature(a)[0]).toBeCloseTo(field.temperature(b)[0], 6)
    expect(field.flow(a)[0]).toBeCloseTo(field.flow(b)[0], 4)
    expect(field.flow(a)[1]).toBeCloseTo(field.flow(b)[1], 4)
  }
  const end = field.thickness_m
  expect(field.flow(end)[0]).toBeCloseTo(15 * field.temperature(end)[0], 9)
})

test('a partition with the room on both sides holds what two halves with adiabatic backs hold', () => {
  const both = periodicField([{ ...adobe, thickness_m: 0.24 }], { kind: 'alike' }, DAY_S)
  const half = periodicField([{ ...adobe, thickness_m: 0.12 }], adiabatic, DAY_S)
  expect(size(both.held(0.24))).toBeCloseTo(2 * size(half.held(0.12)), 3)
  expect(both.temperature(0.24)).toEqual([expect.closeTo(1, 9), expect.closeTo(0, 9)])
  expect(size(both.flow(0.12))).toBeCloseTo(0, 9)
})

test('the year reaches √365 times as deep as the day in endless soil', () => {
  const soil = { name: 'clay', conductivity_WmK: 1.5, volumetricHeat_Jm3K: 3e6, thickness_m: 200 }
  const found = massDepth('soil', 'soil', [soil], { kind: 'endless' }, 0)
  expect(found.year.depth90_m / found.day.depth90_m).toBeCloseTo(Math.sqrt(365), 0)
})

test('90 % of the day in endless adobe lie within 1.102 penetration depths, where |1 - exp(-(1 + i) x)| = 0.9', () => {
  const found = massDepth('adobe', 'adobe', [{ ...adobe, thickness_m: 2 }], { kind: 'endless' }, 2)
  expect(found.day.depth90_m).toBeCloseTo(1.102 * penetrationDepth(adobe, DAY_S), 2)
  expect(Math.abs(found.day.depth90_m - 0.112)).toBeLessThan(0.0011) // steps of 1 mm
})

test('common practice: about the first 100 mm of an adobe wall serve the day, the soil behind serves the year', () => {
  const wall = massDepths(makeModel()).find(({ name }) => name === 'ground: wall')!
  expect(wall.day.depth90_m).toBeGreaterThan(0.08)
  expect(wall.day.depth90_m).toBeLessThan(0.15)
  expect(wall.year.depth90_m).toBeGreaterThan(1)
  const [first, ...rest] = wall.slices
  expect(first.day_Whm2K).toBeCloseTo(((1.6e6 * 0.01) / 3600) * Math.exp(-0.5 / 10.16), 2) // the middle of the first centimetre
  expect(rest.at(-1)!.day_Whm2K).toBeLessThan(1e-6)
  expect(wall.slices.at(-1)!.dayUpTo_Whm2K).toBeCloseTo(wall.day.held_Whm2K, 9)
  expect(wall.construction_m).toBeCloseTo(0.3, 9)
})

test('a house answers with floor, wall, roof and partition; water has no depth', () => {
  const model = makeModel()
  const water = {
    name: 'water',
    spec: { kind: 'lumped', capacity_JK: 1e6, conductance_WK: 10 },
    size: 1,
    links: {},
  }
  const found = massDepths({ ...model, elements: [...model.elements, water as never] })
  expect(found.map(({ name }) => name)).toEqual(['ground: floor', 'ground: wall', 'roof', 'partition'])
})

test('throws RangeError that names the layer without thickness', () => {
  expect(() => periodicField([{ ...adobe, thickness_m: 0 }], adiabatic, DAY_S)).toThrow(/adobe/)
  expect(() => periodicField([], adiabatic, DAY_S)).toThrow(RangeError)
})
