import { z } from 'zod'
import { id, prose, title } from './quantities.ts'

/** Rigid foam has 0.02, copper 400 W/(m K). */
export const conductivity = z.number().min(0.005).max(500).meta({ unit: 'W/(m K)' })
/** 0 stands for a layer without mass. */
export const density = z.number().min(0).max(12000).meta({ unit: 'kg/m³' })
export const specificHeat = z.number().min(0).max(5000).meta({ unit: 'J/(kg K)' })

/** A material of the designer's own, beside the library. */
export const ownMaterial = z.strictObject({
  id,
  name: title,
  conductivity_WmK: conductivity,
  density_kgm3: density,
  specificHeat_JkgK: specificHeat,
  source: prose.optional(),
})
export type OwnMaterial = z.infer<typeof ownMaterial>

/** What is known of a property: the value to use, and how far off it may be. */
export const range = (value: z.ZodNumber) =>
  z
    .strictObject({ low: value, typical: value, high: value })
    .refine(({ low, typical, high }) => low <= typical && typical <= high, 'must rise from low to high')

export const provenance = z.enum(['looked up', 'derived', 'from memory', 'common practice'])

/** A row of data/materials.json. */
export const libraryMaterial = z.strictObject({
  id,
  name: title,
  group: z.enum([
    'earth',
    'masonry',
    'concrete',
    'timber',
    'insulation',
    'buried insulation',
    'plaster',
    'loose',
    'stone',
    'sheet',
    'water and ice',
    'soil',
    'test',
  ]),
  conductivity_WmK: range(conductivity),
  density_kgm3: range(density),
  specificHeat_JkgK: range(specificHeat),
  source: prose,
  provenance,
  note: prose.optional(),
})
export type LibraryMaterial = z.infer<typeof libraryMaterial>
