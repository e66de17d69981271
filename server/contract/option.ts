import { z } from 'zod'
import { air } from './air.ts'
import { assembly } from './assembly.ts'
import { ownCover } from './cover.ts'
import { films } from './films.ts'
import { ownGlazing } from './glazing.ts'
import { ownMaterial } from './material.ts'
import { plant } from './plant.ts'
import { id, prose, title } from './quantities.ts'
import { floor, partition, roof, room, water } from './room.ts'
import { side } from './side.ts'
import { site } from './site.ts'
import { ownSoil, soilChoice } from './soil.ts'
import { comfort, use } from './use.ts'

/**
 * One complete design of a house. Lengths in metres, temperatures in °C; azimuths clockwise from north;
 * layers from outside to inside. Names that are not known here are errors, so that a slip of the pen
 * cannot silently become a default.
 */
export const option = z.strictObject({
  /** The format of this document. */
  loamkeep: z.literal(1),
  name: title,
  /** Where it stands, in words. */
  place: title.optional(),
  story: prose.optional(),
  /** A built-in climate that suits the place, when none is given on the way. */
  climate: id.optional(),
  site: site.default({ ground: 'grass', groundReflectance: 0.2 }),
  /** May be left out where nothing touches the ground. */
  soil: soilChoice.optional(),
  room,
  assemblies: z.array(assembly).min(1).max(60),
  /** In order around the house, clockwise seen from above. */
  sides: z.array(side).min(3).max(32),
  floor,
  roof,
  partitions: z.array(partition).max(30).default([]),
  water: z.array(water).max(20).default([]),
  air: air.default({ infiltration: { kind: 'fixed', changes_h: 0.3 } }),
  use: use.prefault({}),
  comfort: comfort.prefault({}),
  heating: plant.optional(),
  cooling: plant.optional(),
  films: films.default({}),
  /** Own rows beside the libraries; an id of a library may not be used again. */
  materials: z.array(ownMaterial).max(100).default([]),
  soils: z.array(ownSoil).max(20).default([]),
  covers: z.array(ownCover).max(20).default([]),
  glazings: z.array(ownGlazing).max(20).default([]),
})

/** As the engine room reads it: defaults filled in. */
export type Option = z.infer<typeof option>
/** As a designer writes it. */
export type OptionInput = z.input<typeof option>
