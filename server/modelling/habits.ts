import type { Option } from '#contract/option.ts'
import type { Plant } from '#contract/plant.ts'
import type { HouseModel, PlantModel } from '#engine/zone/house-model.ts'

/** Power of a plant without limit: the 1,000 kW of test specifications [W]. */
const UNLIMITED_W = 1e6

/** One value for all hours, or 24 of them, as 24. */
export function hourly<T>(value: T | readonly T[]): T[] {
  return Array.isArray(value) ? [...(value as readonly T[])] : new Array<T>(24).fill(value as T)
}

/** Heat of people and appliances by hour of the day [W]. */
export function gains({ use }: Option): HouseModel['gains'] {
  const atHome = hourly(use.atHome)
  const heat_W = hourly(use.appliances_W).map(
    (power_W, hour) => power_W + use.people * atHome[hour] * use.perPerson_W,
  )
  return {
    convective_W: heat_W.map((power_W) => power_W * (1 - use.radiativeShare)),
    radiative_W: heat_W.map((power_W) => power_W * use.radiativeShare),
  }
}

/** Water vapour set free by hour of the day [kg/h]. */
export function vapour({ use }: Option): number[] {
  const vapour_kgh = hourly(use.atHome).map((share) => (use.people * share * use.perPerson_gh) / 1000)
  for (const { kg_day, from_h, to_h } of use.moisture) {
    const open = Array.from({ length: 24 }, (_, hour) => part(hour, from_h, to_h))
    const total = open.reduce((sum, share) => sum + share, 0)
    // From and to alike: all day long.
    open.forEach((share, hour) => (vapour_kgh[hour] += total > 0 ? (kg_day * share) / total : kg_day / 24))
  }
  return vapour_kgh
}

/** How much of an hour lies between two clock times that may pass midnight. */
function part(hour: number, from_h: number, to_h: number): number {
  const within = (from: number, to: number) => Math.max(0, Math.min(hour + 1, to) - Math.max(hour, from))
  return from_h <= to_h ? within(from_h, to_h) : within(from_h, 24) + within(0, to_h)
}

export function plantModel(plant: Plant | undefined): PlantModel | null {
  if (!plant) return null
  const { set_C, months, power_W, convectiveShare, senses } = plant
  return { set_C: hourly(set_C), months, power_W: power_W ?? UNLIMITED_W, convectiveShare, senses }
}

/** Reflectance of the ground for each month of the year. */
export function groundReflectance({ site }: Option): number[] {
  const { groundReflectance: given, snow } = site
  return Array.from({ length: 12 }, (_, m) => {
    if (snow?.months.includes(m + 1)) return snow.reflectance
    return typeof given === 'number' ? given : given[m]
  })
}
