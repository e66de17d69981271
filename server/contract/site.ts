import { z } from 'zod'
import { byMonth, id, months, share } from './quantities.ts'

/** What surrounds the house. */
export const site = z.strictObject({
  /** Id of a cover: what lies on the level ground where a side does not say. */
  ground: id.default('grass'),
  /** How much sun the ground throws back, for the year or by month. */
  groundReflectance: byMonth(share).default(0.2),
  /** Months with snow on the ground. */
  snow: z.strictObject({ months, reflectance: share.default(0.6) }).optional(),
  /** Altitude of the horizon in degrees, evenly spaced clockwise from north; left out where it is free. */
  horizon_deg: z.array(z.number().min(0).max(80)).min(4).max(360).optional(),
})
