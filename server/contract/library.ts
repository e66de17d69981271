import type { LibraryCover } from './cover.ts'
import type { LibraryGlazing } from './glazing.ts'
import type { LibraryMaterial } from './material.ts'
import type { LibrarySoil } from './soil.ts'
import { z } from 'zod'
import { range } from './material.ts'
import { id, title } from './quantities.ts'

const shareRange = range(z.number().min(0).max(1))

/** data/fuels.json: woods and stoves, to tell heat as firewood. */
export const fuelLibrary = z.looseObject({
  woods: z.array(
    z.looseObject({
      id,
      name: title,
      netHeat_MJkg: range(z.number().positive()),
      /** Million British thermal units in a stacked cord. */
      cordHeat_MBtu: range(z.number().positive()),
    }),
  ),
  stoves: z.array(z.looseObject({ id, name: title, efficiency: shareRange })),
})
export type FuelLibrary = z.infer<typeof fuelLibrary>

/** What an option may refer to, by id. */
export interface Library {
  readonly materials: ReadonlyMap<string, LibraryMaterial>
  readonly soils: ReadonlyMap<string, LibrarySoil>
  readonly covers: ReadonlyMap<string, LibraryCover>
  readonly glazings: ReadonlyMap<string, LibraryGlazing>
  readonly woods: ReadonlyMap<string, FuelLibrary['woods'][number]>
  readonly stoves: ReadonlyMap<string, FuelLibrary['stoves'][number]>
}
