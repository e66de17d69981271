import { expect, test } from 'vitest'
import type { OptionInput } from '#contract/option.ts'
import { readOption } from '#contract/read-option.ts'
import type { LayersSpec, SectionSpec } from '#engine/conduction/specs.ts'
import type { HouseElement, HouseModel } from '#engine/zone/house-model.ts'
import { halves } from '#modelling/inside-mass.ts'
import { toHouse } from '#modelling/to-house.ts'
import { loadLibrary } from '../../server/libraries/library.ts'
import { plainOption } from '../contract/plain-option.ts'

const library = loadLibrary()

function house(change: (option: OptionInput) => void = () => {}, state: 'dry' | 'damp' | 'wet' = 'damp') {
  const option: OptionInput = plainOption()
  change(option)
  return toHouse(readOption(option, library), library, state)
}

const element = (model: HouseModel, name: string): HouseElement =>
  model.elements.find((one) => one.name === name)!
const section = (model: HouseModel, side: string) => element(model, `${side}: ground`).spec as SectionSpec

function areas(model: HouseModel, part: 'floor' | 'wall'): number {
  let sum = 0
  for (const { links } of model.elements)
    for (const link of Object.values(links))
      if (link.to === 'room' && link.surface.part === part) sum += link.surface.area_m2
  return sum
}

test('the floor strips of all sides add up to the floor (half widths of A / P, ISO 13370 B’ halved)', () => {
  const model = house()
  expect(model.room.floorArea_m2).toBeCloseTo(60, 9)
  expect(areas(model, 'floor')).toBeCloseTo(60, 9)
  expect(section(model, 'North').halfFloor_m).toBeCloseTo(60 / 32, 9)
})

test('sections, free walls and openings add up to the walls', () => {
  const model = house()
  expect(areas(model, 'wall')).toBeCloseTo(32 * 2.5 - 3 * 1.5 - 0.9 * 2, 9)
})

test('every face of the room has the film that its element has, per unit of size', () => {
  for (const { spec, size, links, name } of house().elements)
    for (const [group, link] of Object.entries(links)) {
      if (link.to !== 'room') continue
      const film = link.surface.convective_Wm2K + link.surface.radiative_Wm2K
      if (spec.kind === 'layers') {
        expect(spec.insideFilm_Wm2K, name).toBeCloseTo(film, 9)
        expect(size, name).toBeCloseTo(link.surface.area_m2, 9)
      } else if (spec.kind === 'section') {
        const width = group === 'floor' ? spec.halfFloor_m : spec.wallTop_m - spec.floorLevel_m
        expect(link.surface.area_m2, name).toBeCloseTo(size * width, 9)
        expect(group === 'floor' ? spec.films.floor : spec.films.wallInside).toBeCloseTo(film, 9)
      }
    }
})

test('a bermed side carries its wall 0.3 m above the berm, a level one 0.4 m above the floor', () => {
  const model = house()
  expect(section(model, 'North').wallTop_m).toBeCloseTo(1.8, 9)
  expect(section(model, 'East').wallTop_m).toBeCloseTo(0.4, 9)
  const raised = house((option) => {
    option.floor = { assembly: 'floor', level_m: 0.3 }
  })
  expect(section(raised, 'East').wallTop_m).toBeCloseTo(0.7, 9)
})

test('glass from floor to ceiling leaves its section the wall that is left', () => {
  const model = house((option) => {
    option.sides[2].openings = [
      {
        kind: 'window',
        name: 'All',
        width_m: 9.6,
        height_m: 2.4,
        sill_m: 0,
        glazing: 'glass',
        frameShare: 0.1,
      },
    ]
  })
  const left_m2 = 25 - 9.6 * 2.4
  expect(section(model, 'South').wallTop_m).toBeCloseTo(left_m2 / 10, 9)
  expect(element(model, 'South: wall')).toBeUndefined()
})

test('sides that are built alike have equal specs, so that one reduction serves both', () => {
  const model = house()
  expect(JSON.stringify(section(model, 'East'))).toBe(JSON.stringify(section(model, 'West')))
  expect(JSON.stringify(section(model, 'East'))).not.toBe(JSON.stringify(section(model, 'North')))
})

test('the soil state changes ground and berm; a cover above the umbrella is never dry', () => {
  const dry = section(house(undefined, 'dry'), 'North')
  const wet = section(house(undefined, 'wet'), 'North')
  const loam = library.soils.get('loam')!
  expect(dry.soil.conductivity_WmK).toBe(loam.dry.conductivity_WmK.typical)
  expect(dry.berm?.soil).toEqual(dry.soil)
  expect(dry.cover?.layers[0].conductivity_WmK).toBe(loam.damp.conductivity_WmK.typical)
  expect(wet.cover?.layers[0].conductivity_WmK).toBe(loam.wet.conductivity_WmK.typical)
  expect(dry.soil.volumetricHeat_Jm3K).toBeCloseTo(
    loam.dry.density_kgm3.typical * loam.dry.specificHeat_JkgK.typical,
    6,
  )
})

test('a slope of 2 to 1, run to rise, lies at 26.6 degrees', () => {
  const { slope } = element(house(), 'North: ground').links
  expect(slope.to === 'outdoor' && slope.exposure.tilt_deg).toBeCloseTo(26.565, 3)
})

test('a layer without mass has the heat capacity of air', () => {
  const model = house((option) => {
    option.assemblies[2].layers[0].material = 'massless_insulation'
  })
  expect((element(model, 'Roof').spec as LayersSpec).layers[0].volumetricHeat_Jm3K).toBe(1200)
})

test('a floor over a constant temperature has no section, and its walls are whole', () => {
  const model = house((option) => {
    option.sides[0] = { name: 'North', length_m: 10, faces_deg: 0, wall: 'wall' }
    option.floor = { assembly: 'floor', below: { kind: 'constant temperature', temperature_C: 10 } }
  })
  expect(model.elements.some(({ spec }) => spec.kind === 'section')).toBe(false)
  expect(element(model, 'North: wall').size).toBeCloseTo(25, 9)
  expect(element(model, 'Floor').links.outside).toEqual({ to: 'constant', temperature_C: 10 })
})

test('an even partition is one half wall with twice its area, an uneven one two halves', () => {
  const even = house((option) => {
    option.partitions = [{ name: 'P', area_m2: 8, assembly: 'wall' }]
  })
  expect(element(even, 'P').size).toBe(16)
  expect((element(even, 'P').spec as LayersSpec).layers).toMatchObject([{ thickness_m: 0.175 }])
  expect((element(even, 'P').spec as LayersSpec).outsideFilm_Wm2K).toBe(0)
  const uneven = house((option) => {
    option.partitions = [{ name: 'P', area_m2: 8, assembly: 'roof' }]
  })
  expect(uneven.elements.filter(({ name }) => name.startsWith('P,')).map(({ size }) => size)).toEqual([8, 8])
})

test('halves keep the thickness on each side of the middle, from the middle to the face', () => {
  const layer = (name: string, thickness_m: number) => ({
    name,
    thickness_m,
    conductivity_WmK: 1,
    volumetricHeat_Jm3K: 1e6,
  })
  const [one, other] = halves([layer('a', 0.1), layer('b', 0.2), layer('c', 0.5)])
  expect(one.map(({ name, thickness_m }) => [name, thickness_m])).toEqual([
    ['c', 0.1],
    ['b', 0.2],
    ['a', 0.1],
  ])
  expect(other.map(({ name, thickness_m }) => [name, thickness_m])).toEqual([['c', 0.4]])
})

test('1,000 litres of water hold 4.19 MJ/K (ISO 10456, Table 3)', () => {
  const model = house((option) => {
    option.water = [{ name: 'Tank', litres: 1000, surface_m2: 5 }]
  })
  expect(element(model, 'Tank').spec).toMatchObject({ kind: 'lumped', capacity_JK: 4.19e6 })
})

test('heat of people and appliances is shared into convective and radiative parts', () => {
  const { gains } = house((option) => {
    option.use = { people: 2, atHome: 0.5, perPerson_W: 80, appliances_W: 120, radiativeShare: 0.6 }
  })
  expect(gains.convective_W).toEqual(new Array(24).fill(expect.closeTo(80, 9)))
  expect(gains.radiative_W).toEqual(new Array(24).fill(expect.closeTo(120, 9)))
})

test('months of snow have the reflectance of snow', () => {
  const model = house((option) => {
    option.site = { groundReflectance: 0.2, snow: { months: [1, 12], reflectance: 0.7 } }
  })
  expect(model.groundReflectance).toEqual([0.7, 0.2, 0.2, 0.2, 0.2, 0.2, 0.2, 0.2, 0.2, 0.2, 0.2, 0.7])
})

test('a wing is the same buried board in level ground', () => {
  const model = house((option) => {
    option.sides[1].wing = { layers: [{ material: 'eps', thickness_m: 0.1 }], reach_m: 1.2 }
  })
  expect(section(model, 'East').umbrella).toMatchObject({ reach_m: 1.2, layers: [{ thickness_m: 0.1 }] })
  expect(section(model, 'East').berm).toBeNull()
})
