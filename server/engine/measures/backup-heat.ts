import { HOURS } from '../climate/climate-year.ts'
import { firewood, type Firewood, type Fuel } from './firewood.ts'
import { dateOfHour, monthlySums, sum, type HourDate } from './months.ts'

export interface BackupHeat {
  readonly month_kWh: number[]
  readonly year_kWh: number
  /** Hours in which it ran. */
  readonly hours: number
  /** Its strongest hour; null when it never ran. */
  readonly peak: (HourDate & { readonly power_W: number }) | null
}

/** Heat, or cold, that a plant gave, by month and with its strongest hour. */
export function plantUse(power_W: ArrayLike<number>): BackupHeat {
  const month_kWh = monthlySums(power_W).map((Wh) => Wh / 1000)
  let strongest = 0
  let hours = 0
  for (let hour = 0; hour < HOURS; hour++) {
    if (power_W[hour] > 0) hours++
    if (power_W[hour] > power_W[strongest]) strongest = hour
  }
  const peak = hours === 0 ? null : { ...dateOfHour(strongest), power_W: power_W[strongest] }
  return { month_kWh, year_kWh: sum(month_kWh), hours, peak }
}

/** The same, with the wood that would give it. */
export function backupHeat(
  heating_W: ArrayLike<number>,
  fuel: Fuel,
  efficiency: number,
): BackupHeat & { readonly firewood: Firewood } {
  const use = plantUse(heating_W)
  return { ...use, firewood: firewood(use.year_kWh, fuel, efficiency) }
}
