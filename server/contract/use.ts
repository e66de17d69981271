import { z } from 'zod'
import { byHour, clock, id, share, title } from './quantities.ts'

const power = z.number().min(0).max(100000).meta({ unit: 'W' })

/** How people live in the house. */
export const use = z.strictObject({
  people: z.number().min(0).max(100).default(2),
  bedrooms: z.number().int().min(0).max(30).default(1),
  /** Share of the people at home, by hour. */
  atHome: byHour(share).default(0.7),
  /** Sensible heat of one person. */
  perPerson_W: power.max(300).default(70),
  /** Water vapour of one person at home; 40 to 60 g/h at rest and light work. */
  perPerson_gh: z.number().min(0).max(500).default(50).meta({ unit: 'g/h' }),
  appliances_W: byHour(power).default(100),
  /** Share of people's and appliances' heat that is radiant. */
  radiativeShare: share.default(0.5),
  /** Cooking, washing, drying, plants: vapour set free each day, spread over some hours. */
  moisture: z
    .array(
      z.strictObject({
        name: title,
        kg_day: z.number().min(0).max(100).meta({ unit: 'kg' }),
        from_h: clock.default(0),
        to_h: clock.default(24),
      }),
    )
    .max(20)
    .default([{ name: 'Cooking and washing', kg_day: 2, from_h: 7, to_h: 21 }]),
  /** Vapour that faces and things take up, as a multiple of what the air holds. */
  vapourBuffer: z.number().min(1).max(1000).default(10),
  /** Ids of a wood and a stove, to tell heat as firewood. */
  wood: id.default('hardwood_dry'),
  stove: id.default('stove'),
})

/** The fixed comfort range. */
export const comfort = z.strictObject({
  low_C: z.number().min(0).max(35).default(18),
  high_C: z.number().min(5).max(45).default(27),
})
