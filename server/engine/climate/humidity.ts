/**
 * Saturation vapour pressure over water [Pa], Magnus form with the constants of the WMO Guide No. 8:
 * 611.2 exp(17.62 t / (243.12 + t)), t in °C, -45 to 60 (from memory).
 */
export function magnusPressure(temperature_C: number): number {
  return 611.2 * Math.exp((17.62 * temperature_C) / (243.12 + temperature_C))
}

/** Dew point [°C] of a vapour pressure [Pa] above 0; the inverse of `magnusPressure`. */
export function magnusDewPoint(vapour_Pa: number): number {
  const x = Math.log(vapour_Pa / 611.2)
  return (243.12 * x) / (17.62 - x)
}

/** Dew point [°C] from air temperature [°C] and relative humidity [%]; below 1 % counts as 1 %. */
export function dewPointFromHumidity(temperature_C: number, humidity_pct: number): number {
  const vapour_Pa = (Math.min(100, Math.max(1, humidity_pct)) / 100) * magnusPressure(temperature_C)
  return magnusDewPoint(vapour_Pa)
}

/** Pressure of the international standard atmosphere [Pa] at a height [m], up to 11 km. */
export function standardPressure(elevation_m: number): number {
  return 101325 * (1 - 2.25577e-5 * elevation_m) ** 5.25588
}
