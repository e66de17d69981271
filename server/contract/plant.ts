import { z } from 'zod'
import { byHour, months, roomTemperature, share } from './quantities.ts'

/** Backup heat, or cooling for tests: it holds the set temperature as far as its power goes. */
export const plant = z.strictObject({
  /** By hour; null where it is off. */
  set_C: byHour(roomTemperature.nullable()),
  months: months.default([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]),
  /** Left out: as much as it takes. */
  power_W: z.number().positive().max(1e6).optional().meta({ unit: 'W' }),
  /** Given straight to the air; the rest goes to the surfaces. */
  convectiveShare: share.default(0.5),
  /** What the thermostat feels. */
  senses: z.enum(['air', 'operative']).default('operative'),
})
export type Plant = z.infer<typeof plant>
