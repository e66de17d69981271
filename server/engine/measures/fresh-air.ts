import { HOURS } from '../climate/climate-year.ts'
import { monthlyMeans } from './months.ts'

/** What the published minimums ask of a dwelling. */
export interface Dwelling {
  readonly people: number
  readonly bedrooms: number
  readonly floorArea_m2: number
  readonly volume_m3: number
}

export interface FreshAirRule {
  readonly name: string
  readonly source: string
  readonly provenance: 'looked up' | 'from memory'
  /** Least outdoor air for the whole dwelling [m³/s]. */
  readonly least_m3s: (dwelling: Dwelling) => number
}

/** Cubic feet per minute in m³/s. */
const CFM = 0.3048 ** 3 / 60
const SQUARE_FOOT = 0.3048 ** 2

/** Published minimums, by edition, since they differ. */
export const FRESH_AIR_RULES: readonly FreshAirRule[] = [
  {
    name: '0.35 air changes an hour, at least 15 cfm a person',
    source: 'ASHRAE Standard 62-1989 for dwellings, as repeated by the US EPA',
    provenance: 'looked up',
    least_m3s: ({ people, volume_m3 }) => Math.max((0.35 * volume_m3) / 3600, 15 * CFM * people),
  },
  {
    name: '7.5 cfm a person (bedrooms + 1) and 1 cfm per 100 ft²',
    source: 'ANSI/ASHRAE Standard 62.2, editions before 2013',
    provenance: 'looked up',
    least_m3s: ({ bedrooms, floorArea_m2 }) =>
      (7.5 * (bedrooms + 1) + (0.01 * floorArea_m2) / SQUARE_FOOT) * CFM,
  },
  {
    name: '7.5 cfm a person (bedrooms + 1) and 3 cfm per 100 ft²',
    source: 'ANSI/ASHRAE Standard 62.2-2013 and later',
    provenance: 'from memory',
    least_m3s: ({ bedrooms, floorArea_m2 }) =>
      (7.5 * (bedrooms + 1) + (0.03 * floorArea_m2) / SQUARE_FOOT) * CFM,
  },
  {
    name: '7 L/s a person',
    source: 'EN 16798-1:2019, annex B, category II',
    provenance: 'from memory',
    least_m3s: ({ people }) => 0.007 * people,
  },
]

export interface FreshAirMeasures {
  /** Outdoor air per person, monthly means [L/s], and the least hour of the year. */
  readonly perPerson_Ls: number[]
  readonly leastHour_Ls: number
  /** Air changes an hour, monthly means. */
  readonly changes_h: number[]
  readonly rules: {
    readonly name: string
    readonly source: string
    readonly provenance: FreshAirRule['provenance']
    /** For the whole dwelling [L/s]. */
    readonly least_Ls: number
    /** Hours of the year with less. */
    readonly below_h: number
    /** Months (1 to 12) whose mean is less. */
    readonly monthsBelow: number[]
  }[]
}

/**
 * Outdoor air per person against published minimums.
 *
 * @param outdoorAir_m3s infiltration, ventilation and flush together, 8,760 values
 * @throws RangeError for a dwelling without people
 */
export function freshAir(outdoorAir_m3s: ArrayLike<number>, dwelling: Dwelling): FreshAirMeasures {
  const { people, volume_m3 } = dwelling
  if (!(people > 0)) throw new RangeError(`fresh air: people must be more than 0, got ${people}`)
  const month_m3s = monthlyMeans(outdoorAir_m3s)
  let least = Infinity
  for (let hour = 0; hour < HOURS; hour++) least = Math.min(least, outdoorAir_m3s[hour])
  return {
    perPerson_Ls: month_m3s.map((flow) => (1000 * flow) / people),
    leastHour_Ls: (1000 * least) / people,
    changes_h: month_m3s.map((flow) => (3600 * flow) / volume_m3),
    rules: FRESH_AIR_RULES.map(({ name, source, provenance, least_m3s }) => {
      const needed = least_m3s(dwelling)
      let below_h = 0
      for (let hour = 0; hour < HOURS; hour++) if (outdoorAir_m3s[hour] < needed) below_h++
      const monthsBelow = month_m3s.flatMap((flow, m) => (flow < needed ? [m + 1] : []))
      return { name, source, provenance, least_Ls: 1000 * needed, below_h, monthsBelow }
    }),
  }
}
