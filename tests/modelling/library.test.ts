import { expect, test } from 'vitest'
import { readOption } from '#contract/read-option.ts'
import { SOIL_STATES } from '#contract/soil.ts'
import { loadLibrary } from '../../server/libraries/library.ts'
import { plainOption } from '../contract/plain-option.ts'

const library = loadLibrary()

test('materials, soils, covers, glazings and fuels are read, each row with a source', () => {
  expect(library.materials.size).toBeGreaterThan(80)
  expect(library.soils.size).toBeGreaterThanOrEqual(5)
  expect(library.covers.size).toBeGreaterThanOrEqual(5)
  expect(library.glazings.size).toBeGreaterThanOrEqual(4)
  for (const { id, source } of library.materials.values()) expect(source, id).toMatch(/\w{3}/)
})

test('more water makes a soil conduct better and hold more heat', () => {
  for (const soil of library.soils.values()) {
    const [dry, damp, wet] = SOIL_STATES.map((state) => soil[state])
    const heat = (state: typeof dry) => state.density_kgm3.typical * state.specificHeat_JkgK.typical
    expect(dry.conductivity_WmK.typical, soil.id).toBeLessThan(damp.conductivity_WmK.typical)
    expect(damp.conductivity_WmK.typical, soil.id).toBeLessThan(wet.conductivity_WmK.typical)
    expect(heat(dry), soil.id).toBeLessThanOrEqual(heat(damp))
    expect(heat(damp), soil.id).toBeLessThan(heat(wet))
  }
})

test('buried board conducts better than the same board in a catalogue', () => {
  const k = (id: string) => library.materials.get(id)!.conductivity_WmK.typical
  expect(k('xps_buried_aged')).toBeGreaterThan(k('xps'))
  expect(k('eps_buried_aged')).toBeGreaterThan(k('eps'))
  expect(k('eps_buried_code2')).toBeGreaterThan(k('eps'))
})

test('the usual layer of each cover is a material or a soil', () => {
  for (const { id, layer } of library.covers.values())
    if (layer)
      expect(library.materials.has(layer.material) || library.soils.has(layer.material), id).toBe(true)
})

test('no id is a material and a soil at once, since layers may name either', () => {
  expect([...library.soils.keys()].filter((id) => library.materials.has(id))).toEqual([])
})

test('every glazing of the library may stand in a window', () => {
  for (const id of library.glazings.keys()) {
    const option = plainOption()
    option.sides[2].openings![0] = { ...option.sides[2].openings![0], glazing: id } as never
    expect(readOption(option, library).sides[2].openings[0]).toMatchObject({ glazing: id })
  }
})
