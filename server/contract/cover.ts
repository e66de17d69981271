import { z } from 'zod'
import { provenance, range } from './material.ts'
import { id, prose, share, thickness, title } from './quantities.ts'

const emittance = z.number().min(0.02).max(1)

/** A cover of the designer's own: how the ground looks at sun and sky. */
export const ownCover = z.strictObject({
  id,
  name: title,
  solarAbsorptance: share,
  emittance,
  /** Share of the absorbed sun that leaves again as water vapour. */
  evaporativeShare: share,
})
export type OwnCover = z.infer<typeof ownCover>

/** A row of data/covers.json. */
export const libraryCover = z.strictObject({
  id,
  name: title,
  solarAbsorptance: range(z.number().min(0).max(1)),
  emittance: range(emittance),
  evaporativeShare: range(z.number().min(0).max(1)),
  /** The layer that it usually is, when a design does not say; null for a bare surface. */
  layer: z.strictObject({ material: id, thickness_m: thickness }).nullable(),
  source: prose,
  provenance,
  note: prose.optional(),
})
export type LibraryCover = z.infer<typeof libraryCover>
