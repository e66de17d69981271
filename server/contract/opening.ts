import { z } from 'zod'
import { clock, distance, id, length, months, share, title } from './quantities.ts'

const place = {
  name: title,
  width_m: length,
  height_m: length,
  /** Left edge from the left end of the side, seen from outside; left out where it does not matter. */
  fromLeft_m: distance.optional(),
}

/** Projects over the opening. */
const overhang = z.strictObject({
  depth_m: distance,
  /** Above the head of the opening. */
  rise_m: distance.default(0),
  /** Beyond the opening on each side. */
  extra_m: distance.default(0),
})

const fins = z.strictObject({
  depth_m: distance,
  /** Between jamb and fin. */
  gap_m: distance.default(0),
})

/** Closed at night between these hours, only while the sun is down. */
const shutter = z.strictObject({
  resistance_m2KW: z.number().positive().max(10).meta({ unit: 'm² K/W' }),
  from_h: clock.default(17),
  to_h: clock.default(8),
  months: months.default([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]),
})

/** Cloth, blind or leaves: what still passes, and when. */
const shade = z.strictObject({
  passes: share,
  months,
})

export const windowOpening = z.strictObject({
  kind: z.literal('window'),
  ...place,
  /** Lower edge above the floor. */
  sill_m: distance,
  glazing: id,
  /** Share of the opening that is frame. */
  frameShare: z.number().min(0).max(0.9).default(0.2),
  frameU_Wm2K: z.number().min(0.3).max(7).default(1.8).meta({ unit: 'W/(m² K)' }),
  /** 90 is upright glass. */
  tilt_deg: z.number().min(30).max(90).default(90).meta({ unit: '°' }),
  overhang: overhang.optional(),
  fins: fins.optional(),
  shutter: shutter.optional(),
  shade: shade.optional(),
})

export const doorOpening = z.strictObject({
  kind: z.literal('door'),
  ...place,
  sill_m: distance.default(0),
  u_Wm2K: z.number().min(0.2).max(7).meta({ unit: 'W/(m² K)' }),
})

/** A window, or an opaque door; a glass door is a window. */
export const opening = z.discriminatedUnion('kind', [windowOpening, doorOpening])
export type Opening = z.infer<typeof opening>
export type WindowOpening = z.infer<typeof windowOpening>
