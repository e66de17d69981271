import { z } from 'zod'
import { berm, cover, footing, probe, skirt, umbrella, wing } from './berm.ts'
import { opening } from './opening.ts'
import { azimuth, id, length, share, title } from './quantities.ts'

/** One façade of the house, with what is outside it at ground level: level grade, or a berm. */
export const side = z.strictObject({
  name: title,
  /** Inside length. */
  length_m: length.max(60),
  /** Direction that it faces, clockwise from north. */
  faces_deg: azimuth,
  /** Above the floor; by default the height of the room. */
  height_m: length.max(10).optional(),
  /** Id of an assembly. */
  wall: id,
  solarAbsorptance: share.default(0.6),
  emittance: share.default(0.9),
  /** Of the face in the room. */
  insideAbsorptance: share.default(0.5),
  openings: z.array(opening).max(40).default([]),
  berm: berm.optional(),
  umbrella: umbrella.optional(),
  wing: wing.optional(),
  cover: cover.optional(),
  skirt: skirt.optional(),
  footing: footing.optional(),
  /** By default 1, 2 and 4 m from the wall in a berm, and 1 and 3 m below the floor. */
  probes: z.array(probe).max(12).optional(),
})
export type Side = z.infer<typeof side>
