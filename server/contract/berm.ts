import { z } from 'zod'
import { layers } from './assembly.ts'
import { distance, id, length, thickness } from './quantities.ts'

/** Soil heaped against a side. */
export const berm = z.strictObject({
  /** Crest above the level ground outside. */
  height_m: length,
  /** Level top, from the wall's outer face outwards. */
  crest_m: length.min(0.1),
  /** Horizontal run for each metre of rise; steeper than 1 to 1 does not stay. */
  runPerRise: z.number().min(0.5).max(20),
  /** The soil it is made of; by default that of the site. */
  soil: id.optional(),
})
export type Berm = z.infer<typeof berm>

/** The buried insulating cover over berm and ground, from above downwards. */
export const umbrella = z.strictObject({
  layers,
  /** Horizontally, from the wall's outer face. */
  reach_m: length.max(30),
})

/** Horizontal insulation buried beside a footing in level ground, from above downwards. */
export const wing = z.strictObject({
  layers,
  reach_m: length.max(30),
})

/** What lies on top of berm and ground. */
export const cover = z.strictObject({
  /** Id of a cover: how the top looks at sun and sky. */
  surface: id,
  /** From the surface downwards, so that their sum is the depth of an umbrella; by default the cover's usual layer. */
  layers: layers.optional(),
  /** From the wall's outer face; by default as far as the umbrella, or the foot of the berm. */
  reach_m: length.max(60).optional(),
})

/** Vertical insulation outside wall and footing. Heights above level ground, negative below. */
export const skirt = z.strictObject({
  material: id,
  thickness_m: thickness.max(1),
  top_m: z.number().min(-5).max(6).meta({ unit: 'm' }),
  bottom_m: z.number().min(-5).max(6).meta({ unit: 'm' }),
})

/** Under the wall, as wide as the wall. */
export const footing = z.strictObject({
  material: id,
  /** Its underside below level ground. */
  depth_m: length.max(5),
})

/** A place in the ground whose temperature is followed. */
export const probe = z.strictObject({
  name: z.string().trim().min(1).max(60),
  /** From the wall's outer face outwards; negative below the floor. */
  fromWall_m: z.number().min(-30).max(60).meta({ unit: 'm' }),
  /** Below the surface there. */
  depth_m: distance.max(15),
})
