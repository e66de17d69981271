/** Ratio of the molar masses of water and dry air (ASHRAE Handbook Fundamentals, chapter 1). */
const WATER_TO_AIR = 0.621945
/** Gas constant of dry air [J/(kg K)] (ASHRAE Handbook Fundamentals, chapter 1). */
const DRY_AIR_GAS_JKGK = 287.042

/**
 * Saturation pressure of water vapour over water, below 0 °C over ice.
 *
 * Source: R. W. Hyland and A. Wexler, ASHRAE Transactions 89(2A), 1983, the form of ASHRAE Handbook
 * Fundamentals, chapter 1, equations 5 and 6 (coefficients from memory); -100 to 200 °C.
 *
 * @returns Pa
 */
export function saturationPressure(temperature_C: number): number {
  const T = temperature_C + 273.15
  return temperature_C < 0
    ? Math.exp(
        -5.6745359e3 / T +
          6.3925247 +
          T * (-9.677843e-3 + T * (6.2215701e-7 + T * (2.0747825e-9 - T * 9.484024e-13))) +
          4.1635019 * Math.log(T),
      )
    : Math.exp(
        -5.8002206e3 / T +
          1.3914993 +
          T * (-4.8640239e-2 + T * (4.1764768e-5 - T * 1.4452093e-8)) +
          6.5459673 * Math.log(T),
      )
}

/**
 * Dew point (below 0 °C frost point) of a vapour pressure, the inverse of `saturationPressure` by
 * Newton's method in the logarithm of the pressure.
 *
 * @param vapour_Pa more than 0
 * @returns °C
 * @throws RangeError for a pressure that is not more than 0
 */
export function dewPoint(vapour_Pa: number): number {
  let temperature_C = dewPointIso13788(vapour_Pa)
  // The ISO form is within 0.1 K, so Newton needs two or three steps.
  for (let step = 0; step < 8; step++) {
    const slope =
      (Math.log(saturationPressure(temperature_C + 0.005)) -
        Math.log(saturationPressure(temperature_C - 0.005))) /
      0.01
    const change = Math.log(vapour_Pa / saturationPressure(temperature_C)) / slope
    temperature_C += change
    if (Math.abs(change) < 1e-9) break
  }
  return temperature_C
}

/**
 * Saturation pressure in the short form of ISO 13788:2012, annex E (E.7 and E.8, from memory):
 *
 *   610.5 exp(17.269 t / (237.3 + t)),  below 0 °C  610.5 exp(21.875 t / (265.5 + t))
 *
 * @returns Pa
 */
export function saturationPressureIso13788(temperature_C: number): number {
  return temperature_C < 0
    ? 610.5 * Math.exp((21.875 * temperature_C) / (265.5 + temperature_C))
    : 610.5 * Math.exp((17.269 * temperature_C) / (237.3 + temperature_C))
}

/**
 * Temperature at which a vapour pressure saturates, the exact inverse of `saturationPressureIso13788`
 * (ISO 13788:2012, E.9 and E.10, from memory).
 *
 * @returns °C
 * @throws RangeError for a pressure that is not more than 0
 */
export function dewPointIso13788(vapour_Pa: number): number {
  if (!(vapour_Pa > 0)) throw new RangeError(`dew point: vapour_Pa must be more than 0, got ${vapour_Pa}`)
  const x = Math.log(vapour_Pa / 610.5)
  return x < 0 ? (265.5 * x) / (21.875 - x) : (237.3 * x) / (17.269 - x)
}

/** Vapour pressure [Pa] of air whose dew point is known (ISO 13788 form). */
export function vapourPressureOfDewPoint(dewPoint_C: number): number {
  return saturationPressureIso13788(dewPoint_C)
}

/** Kilograms of vapour per kilogram of dry air, W = 0.621945 e / (p - e) (ASHRAE Fundamentals ch. 1, eq. 20). */
export function humidityRatio(vapour_Pa: number, pressure_Pa: number): number {
  return (WATER_TO_AIR * vapour_Pa) / (pressure_Pa - vapour_Pa)
}

/** Vapour pressure [Pa] of a humidity ratio, the inverse of `humidityRatio`. */
export function vapourPressureOfRatio(ratio: number, pressure_Pa: number): number {
  return (pressure_Pa * ratio) / (WATER_TO_AIR + ratio)
}

/**
 * Humidity ratio from dry-bulb and wet-bulb temperature above freezing (ASHRAE Handbook Fundamentals,
 * chapter 1, equation 33, from memory).
 *
 * @returns kg of vapour per kg of dry air
 */
export function humidityRatioOfWetBulb(dry_C: number, wet_C: number, pressure_Pa: number): number {
  const saturated = humidityRatio(saturationPressure(wet_C), pressure_Pa)
  return (
    ((2501 - 2.326 * wet_C) * saturated - 1.006 * (dry_C - wet_C)) / (2501 + 1.86 * dry_C - 4.186 * wet_C)
  )
}

/** Enthalpy of moist air [kJ per kg of dry air], 0 for dry air at 0 °C (ASHRAE Fundamentals ch. 1, eq. 30). */
export function moistAirEnthalpy(temperature_C: number, ratio: number): number {
  return 1.006 * temperature_C + ratio * (2501 + 1.86 * temperature_C)
}

/** Volume of moist air [m³ per kg of dry air] (ASHRAE Fundamentals ch. 1, eq. 26). */
export function moistAirVolume(temperature_C: number, ratio: number, pressure_Pa: number): number {
  return (DRY_AIR_GAS_JKGK * (temperature_C + 273.15) * (1 + ratio / WATER_TO_AIR)) / pressure_Pa
}

/** Density of moist air [kg/m³], vapour included. */
export function moistAirDensity(temperature_C: number, ratio: number, pressure_Pa: number): number {
  return (1 + ratio) / moistAirVolume(temperature_C, ratio, pressure_Pa)
}

/**
 * Pressure of the standard atmosphere, 101325 (1 - 2.25577e-5 z)^5.2559 (ASHRAE Fundamentals ch. 1,
 * eq. 3), -5,000 to 11,000 m.
 *
 * @returns Pa
 */
export function standardPressure(elevation_m: number): number {
  return 101325 * (1 - 2.25577e-5 * elevation_m) ** 5.2559
}
