import { z } from 'zod'
import { id, thickness, title } from './quantities.ts'

/** One layer. `material` is the id of a material, or of a soil, which then follows the soil state. */
export const layer = z.strictObject({
  material: id,
  thickness_m: thickness,
})
export type LayerInput = z.infer<typeof layer>

export const layers = z.array(layer).min(1).max(24)

/** Layers from outside to inside; of a floor from below to the room, of a roof from above to the room. */
export const assembly = z.strictObject({
  id,
  name: title.optional(),
  layers,
})
export type Assembly = z.infer<typeof assembly>
