import { z } from 'zod'
import { azimuth, film, id, length, share, tilt, title } from './quantities.ts'

/** The one room zone. What is left out follows from the sides. */
export const room = z.strictObject({
  height_m: length.max(10),
  floorArea_m2: z.number().positive().max(2000).optional().meta({ unit: 'm²' }),
  volume_m3: z.number().positive().max(20000).optional().meta({ unit: 'm³' }),
  /** From the sunny side to the wall across the room. */
  depth_m: length.optional(),
  /** Capacity of air and light furniture as a multiple of the air alone. */
  airCapacityFactor: z.number().min(1).max(50).default(5),
})

export const floor = z.strictObject({
  /** Id of an assembly, layers from below to the room. */
  assembly: id,
  /** Upper face above the level ground outside, negative when dug in. */
  level_m: z.number().min(-4).max(2).default(0).meta({ unit: 'm' }),
  insideAbsorptance: share.default(0.7),
  /** The ground, or for tests a constant temperature. */
  below: z
    .discriminatedUnion('kind', [
      z.strictObject({ kind: z.literal('ground') }),
      z.strictObject({
        kind: z.literal('constant temperature'),
        temperature_C: z.number().min(-40).max(60),
        /** 1,000 is contact. */
        film_Wm2K: film.default(1000),
      }),
    ])
    .default({ kind: 'ground' }),
})

export const roof = z.strictObject({
  /** Id of an assembly, layers from above to the room; a living roof begins with its soil. */
  assembly: id,
  tilt_deg: tilt.max(75).default(0),
  faces_deg: azimuth.default(180),
  /** By default the floor area over the cosine of the tilt. */
  area_m2: z.number().positive().max(4000).optional().meta({ unit: 'm²' }),
  solarAbsorptance: share.default(0.6),
  emittance: share.default(0.9),
  /** Id of a cover for an earth-covered or living roof: its absorptance, emittance and evaporation are used. */
  cover: id.optional(),
  /** Of the ceiling. */
  insideAbsorptance: share.default(0.4),
})

/** A wall inside the room, both faces in it. */
export const partition = z.strictObject({
  name: title,
  /** Of one face. */
  area_m2: z.number().positive().max(2000).meta({ unit: 'm²' }),
  assembly: id,
  insideAbsorptance: share.default(0.5),
})

/** Containers of water, well mixed. */
export const water = z.strictObject({
  name: title,
  litres: z.number().positive().max(200000).meta({ unit: 'L' }),
  /** That the room sees. */
  surface_m2: z.number().positive().max(1000).meta({ unit: 'm²' }),
  insideAbsorptance: share.default(0.8),
})
