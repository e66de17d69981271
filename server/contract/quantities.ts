import { z } from 'zod'

/** Small building blocks of the schemas: ids, texts and quantities with limits that have a reason. */

/** A short name for reference: lower case letters, digits, `_` and `-`. */
export const id = z
  .string()
  .regex(/^[a-z0-9][a-z0-9_-]{0,59}$/, 'must be lower case letters, digits, _ or -, at most 60')

export const title = z.string().trim().min(1).max(120)
export const prose = z.string().trim().max(2000)

/** A length that cannot be zero, as large as a house and its garden. */
export const length = z.number().positive().max(100).meta({ unit: 'm' })

/** A length that may be zero. */
export const distance = z.number().min(0).max(100).meta({ unit: 'm' })

/** A layer of less than a tenth of a millimetre does nothing that the model could see. */
export const thickness = z.number().min(0.0001).max(10).meta({ unit: 'm' })

/** Direction, clockwise from north. */
export const azimuth = z.number().min(0).lt(360).meta({ unit: '°' })

/** 0 lies flat, 90 stands upright. */
export const tilt = z.number().min(0).max(90).meta({ unit: '°' })

/** 0 to 1. */
export const share = z.number().min(0).max(1)

/** Temperatures that people live in or set a thermostat to. */
export const roomTemperature = z.number().min(-10).max(50).meta({ unit: '°C' })

/** A surface coefficient; more than 1,000 is contact. */
export const film = z.number().min(0.1).max(1000).meta({ unit: 'W/(m² K)' })

/** Clock time in local standard time. */
export const clock = z.number().min(0).max(24).meta({ unit: 'h' })

export const month = z.number().int().min(1).max(12)

/** Months of the year, 1 to 12, each once. */
export const months = z
  .array(month)
  .min(1)
  .max(12)
  .refine((list) => new Set(list).size === list.length, 'must name each month once')

export const ALL_MONTHS: readonly number[] = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]

/** One value for the whole day, or one for each hour of the day from midnight on. */
export const byHour = <T extends z.ZodType>(value: T) => z.union([value, z.array(value).length(24)])

/** One value for the whole year, or one for each month from January on. */
export const byMonth = <T extends z.ZodType>(value: T) => z.union([value, z.array(value).length(12)])
