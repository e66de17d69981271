/**
 * Soil by formula: what the library's rows are drawn from and held against, and a way to a soil that is
 * not in it. Dry density ρ in kg/m³; water w in per cent of the dry mass; S the share of the pores that is
 * filled. Kersten's formulas miss measurements by up to 25 %.
 */

/** Btu in/(h ft² °F) in W/(m K). */
const BTU_INCH = 0.1442279
/** Kersten's 0.01 for each lb/ft³, for each kg/m³. */
const PER_DENSITY = 0.01 / 16.018463

/** Conductivity of unfrozen clay and silt [W/(m K)], w 7 % or more (Kersten 1949, from memory). */
export function kerstenClay(water_percent: number, density_kgm3: number): number {
  if (!(water_percent >= 7)) throw new RangeError(`water_percent must be at least 7, got ${water_percent}`)
  return BTU_INCH * (0.9 * Math.log10(water_percent) - 0.2) * 10 ** (PER_DENSITY * density_kgm3)
}

/** Conductivity of unfrozen sand [W/(m K)], w 1 % or more (Kersten 1949, from memory). */
export function kerstenSand(water_percent: number, density_kgm3: number): number {
  if (!(water_percent >= 1)) throw new RangeError(`water_percent must be at least 1, got ${water_percent}`)
  return BTU_INCH * (0.7 * Math.log10(water_percent) + 0.4) * 10 ** (PER_DENSITY * density_kgm3)
}

/** Density of soil particles [kg/m³]. */
const PARTICLE_KGM3 = 2700

/**
 * Conductivity of unfrozen soil after Johansen (1975, from memory): between dry and saturated by the
 * Kersten number, log S + 1 for fine and 0.7 log S + 1 for coarse soil.
 *
 * @param quartz share of the solids, 0 to 1
 * @throws RangeError for a saturation outside 0 to 1 or a density that leaves no pores
 */
export function johansen(
  saturation: number,
  density_kgm3: number,
  quartz: number,
  grain: 'fine' | 'coarse',
): number {
  if (!(saturation >= 0 && saturation <= 1))
    throw new RangeError(`saturation must be 0 to 1, got ${saturation}`)
  const pores = 1 - density_kgm3 / PARTICLE_KGM3
  if (!(pores > 0 && pores < 1)) throw new RangeError(`density_kgm3 ${density_kgm3} leaves no pores`)
  const dry = (0.135 * density_kgm3 + 64.7) / (PARTICLE_KGM3 - 0.947 * density_kgm3)
  const other = quartz <= 0.2 ? 3 : 2
  const solids = 7.7 ** quartz * other ** (1 - quartz)
  const saturated = solids ** (1 - pores) * 0.57 ** pores
  const kersten = (grain === 'fine' ? 1 : 0.7) * Math.log10(saturation) + 1
  return dry + (saturated - dry) * Math.max(0, kersten)
}

/** Volumetric heat of unfrozen soil [J/(m³ K)]: solids 840 J/(kg K), water 4187. */
export function volumetricHeat(water_percent: number, density_kgm3: number): number {
  return density_kgm3 * (840 + 41.87 * water_percent)
}
