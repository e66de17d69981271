import { J_PER_KWH } from './months.ts'

/** A stacked cord, 128 ft³ [m³]; a stere is 1 m³ stacked. */
export const CORD_M3 = 128 * 0.3048 ** 3

/** Heat of one kind of wood, air-dry. */
export interface Fuel {
  readonly name: string
  /** Net heat value as burnt, with its moisture [MJ/kg]. */
  readonly netHeat_MJkg: number
  /** Net heat of a stacked cubic metre [MJ/m³]. */
  readonly stackedHeat_MJm3: number
}

export interface Firewood {
  readonly heat_kWh: number
  readonly mass_kg: number
  readonly steres: number
  readonly cords: number
}

/**
 * Wood to burn for some heat in the room: heat / (efficiency · heat value).
 *
 * @param heat_kWh   heat given to the room, not negative
 * @param efficiency of the stove, more than 0 to 1
 * @throws RangeError for an efficiency or a heat value out of range
 */
export function firewood(heat_kWh: number, fuel: Fuel, efficiency: number): Firewood {
  if (!(efficiency > 0 && efficiency <= 1))
    throw new RangeError(`firewood: efficiency must be more than 0 and at most 1, got ${efficiency}`)
  if (!(fuel.netHeat_MJkg > 0 && fuel.stackedHeat_MJm3 > 0))
    throw new RangeError(`firewood: heat values of ${fuel.name} must be more than 0`)
  const burnt_MJ = (heat_kWh * J_PER_KWH) / 1e6 / efficiency
  const steres = burnt_MJ / fuel.stackedHeat_MJm3
  return { heat_kWh, mass_kg: burnt_MJ / fuel.netHeat_MJkg, steres, cords: steres / CORD_M3 }
}

/**
 * Net heat value of wood from that of its dry matter and its moisture (share of the wet mass):
 * q = q₀ (1 - w) - 2.443 w  [MJ/kg], 2.443 being the heat of evaporation at 25 °C
 * (EN ISO 18125, at constant pressure, from memory).
 */
export function netHeatOfWood(dry_MJkg: number, moisture: number): number {
  return dry_MJkg * (1 - moisture) - 2.443 * moisture
}
