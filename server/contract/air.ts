import { z } from 'zod'
import { byHour, clock, months, roomTemperature } from './quantities.ts'

const changes = z.number().min(0).max(60).meta({ unit: '1/h' })

/** What leaks in: a fixed rate, or a leakage area with stack and wind (ASHRAE Fundamentals, basic model). */
export const infiltration = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('fixed'), changes_h: changes }),
  z.strictObject({
    kind: z.literal('leakage'),
    /** Effective leakage area at 4 Pa. */
    area_cm2: z.number().min(0).max(20000).meta({ unit: 'cm²' }),
    /** (L/s)²/(cm⁴ K); the default is that of one storey. */
    stack: z.number().min(0).max(0.01).default(0.000145),
    /** (L/s)²/(cm⁴ (m/s)²); the default is one storey with some shelter. */
    wind: z.number().min(0).max(0.01).default(0.000174),
  }),
])

export const freshAir = z.strictObject({
  flow_Ls: byHour(z.number().min(0).max(2000).meta({ unit: 'L/s' })),
  /** Share of its heat that is recovered. */
  recovery: z.number().min(0).max(0.95).default(0),
})

/** Extra air by rule, to cool the mass. */
export const flush = z.strictObject({
  changes_h: changes.positive(),
  from_h: clock.default(20),
  to_h: clock.default(7),
  months: months.default([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]),
  /** Opens when the room is warmer than this … */
  above_C: roomTemperature.default(24),
  /** … and warmer than outdoors by at least this. */
  byAtLeast_K: z.number().min(0).max(30).default(2).meta({ unit: 'K' }),
})

export const air = z.strictObject({
  infiltration: infiltration.default({ kind: 'fixed', changes_h: 0.3 }),
  fresh: freshAir.optional(),
  flush: flush.optional(),
})
