import { z } from 'zod'
import { id, prose, share, title } from './quantities.ts'

/** Eleven steps of ten degrees would end at 100: these are 0, 10, … 90°. */
const byAngle = z.array(share).length(10)

/** Glass of the designer's own, by angle of incidence 0, 10, … 90°. */
export const ownGlazing = z.strictObject({
  id,
  name: title,
  /** Air to air with standard films, without frame. */
  u_Wm2K: z.number().min(0.2).max(7).meta({ unit: 'W/(m² K)' }),
  transmittance: byAngle,
  /** Total solar energy transmittance: transmitted and inward-flowing. */
  solarFactor: byAngle,
  diffuseTransmittance: share,
  diffuseSolarFactor: share,
  source: prose.optional(),
})
export type OwnGlazing = z.infer<typeof ownGlazing>

/** What the library must know of a glazing; its file may say more. */
export const libraryGlazing = z.looseObject({
  ...ownGlazing.omit({ source: true }).shape,
  source: prose,
})
export type LibraryGlazing = z.infer<typeof libraryGlazing>
