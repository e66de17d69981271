/** Specific heat of moist room air [J/(kg K)]. */
export const AIR_HEAT_JKGK = 1006

/**
 * Density of air at 20 °C at an elevation: 1.2041 kg/m³ times the pressure ratio of the international
 * standard atmosphere, (1 - 2.25577e-5 z)^5.2559 (ICAO Doc 7488).
 *
 * @param elevation_m above sea level, -500 to 6000 [m]
 * @returns kg/m³
 */
export function airDensity(elevation_m: number): number {
  return 1.2041 * (1 - 2.25577e-5 * elevation_m) ** 5.2559
}

/**
 * Air through the leaks of a house, driven by stack and wind:  Q = A √(Cs |ΔT| + Cw v²)
 *
 * with the effective leakage area A in cm², Cs in (L/s)²/(cm⁴ K), Cw in (L/s)²/(cm⁴ (m/s)²).
 * Source: ASHRAE Handbook Fundamentals, residential infiltration, basic model (after Sherman and
 * Grimsrud 1980), from memory.
 *
 * @returns m³/s
 */
export function leakageFlow(
  area_cm2: number,
  stack: number,
  wind: number,
  difference_K: number,
  wind_ms: number,
): number {
  return (area_cm2 / 1000) * Math.sqrt(stack * Math.abs(difference_K) + wind * wind_ms * wind_ms)
}
