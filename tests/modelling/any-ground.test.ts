import fc from 'fast-check'
import { expect, test } from 'vitest'
import { OptionError } from '#contract/option-error.ts'
import type { OptionInput } from '#contract/option.ts'
import { readOption } from '#contract/read-option.ts'
import { quadArea } from '#engine/conduction/section-probes.ts'
import { sectionSystem } from '#engine/conduction/section.ts'
import { toHouse } from '#modelling/to-house.ts'
import { loadLibrary } from '../../server/libraries/library.ts'
import { plainOption } from '../contract/plain-option.ts'

const library = loadLibrary()
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const layersOf = (material: string, thickest_m: number) =>
  fc
    .array(between(0.001, thickest_m), { minLength: 1, maxLength: 3 })
    .map((list) => list.map((thickness_m) => ({ material, thickness_m })))

const ground = fc.record({
  level_m: between(-2, 1),
  height_m: between(1.8, 4),
  berm: fc.option(
    fc.record({ height_m: between(0.05, 4), crest_m: between(0.1, 5), runPerRise: between(0.5, 8) }),
  ),
  buried: fc.option(fc.record({ layers: layersOf('eps', 0.2), reach_m: between(0.2, 9) })),
  cover: fc.option(
    fc.record({ layers: layersOf('loam', 0.3), reach_m: fc.option(between(0.3, 12), { nil: undefined }) }),
  ),
  skirt: fc.option(
    fc.record({ thickness_m: between(0.01, 0.2), top_m: between(-1, 2), bottom_m: between(-2, 1) }),
  ),
  footing: fc.option(between(0.1, 2)),
  wall: layersOf('adobe', 0.4),
  floor: layersOf('concrete_medium', 0.2),
})

test('whatever ground the contract lets through, the engine can mesh, without a cell turned inside out', () => {
  let taken = 0
  fc.assert(
    fc.property(ground, ({ level_m, height_m, berm, buried, cover, skirt, footing, wall, floor }) => {
      const option: OptionInput = plainOption()
      option.room.height_m = height_m
      option.assemblies[0].layers = wall
      option.assemblies[1].layers = floor
      option.floor.level_m = level_m
      option.sides[2].openings = []
      option.sides[0] = {
        name: 'North',
        length_m: 10,
        faces_deg: 0,
        wall: 'wall',
        ...(berm && { berm }),
        ...(buried && (berm ? { umbrella: buried } : { wing: buried })),
        ...(cover && { cover: { surface: 'mulch', ...cover } }),
        ...(skirt && { skirt: { material: 'eps', ...skirt } }),
        ...(footing && { footing: { material: 'concrete_dense', depth_m: footing } }),
      }
      let read
      try {
        read = readOption(option, library)
      } catch (error) {
        if (error instanceof OptionError) return
        throw error
      }
      taken++
      for (const { spec } of toHouse(read, library, 'damp').elements) {
        if (spec.kind !== 'section') continue
        const { mesh, system } = sectionSystem(spec)
        for (let cell = 0; cell < mesh.substance.length; cell++)
          expect(quadArea(mesh, cell)).toBeGreaterThan(0)
        expect(system.capacity_JK.every((capacity) => capacity > 0)).toBe(true)
      }
    }),
    { seed: 3, numRuns: 300 },
  )
  expect(taken).toBeGreaterThan(40)
})
