import { z } from 'zod'
import { film } from './quantities.ts'

const inside = z.strictObject({ convective_Wm2K: film, radiative_Wm2K: film })
const outside = z.strictObject({
  /** Convection and radiation together. */
  combined_Wm2K: film,
  /** Radiative part for a black surface. */
  radiative_Wm2K: film,
})

/** Surface coefficients set by hand; those left out are the usual ones. */
export const films = z.strictObject({
  wall: inside.optional(),
  floor: inside.optional(),
  ceiling: inside.optional(),
  mass: inside.optional(),
  glassInside: inside.optional(),
  outside: outside.optional(),
  ground: outside.optional(),
  glassOutside: outside.optional(),
})
export type Films = z.infer<typeof films>
