import { HOURS } from './climate-year.ts'
import { dailyMeans } from './day-values.ts'
import { magnusPressure } from './humidity.ts'
import { betweenNoons, DAY_MONTHS, monthCurve, monthMeans } from './month-curve.ts'
import type { MonthlyNormals } from './normals.ts'
import type { Seeded } from './seeded.ts'

/**
 * Hourly dew point: a smooth yearly curve, daily departures that follow the temperature (fully in humid
 * months, a fifth in dry ones) and fall with clearness by 10 K for each 1 of the index, a persistent rest,
 * never above the air. Regression on four US stations; derived from data. Monthly means are the normals'
 * as far as the air stays above the dew point.
 */
export function generateDewPoint(
  normals: MonthlyNormals,
  outdoor_C: Float64Array,
  anomaly_K: Float64Array,
  clearness: Float64Array,
  random: Seeded,
): Float64Array {
  const season_C = monthCurve(normals.dewPoint_C)
  const clear = monthMeans(clearness)
  const raw = new Float64Array(365)
  let state = random.normal()
  for (let day = 0; day < 365; day++) {
    const month = DAY_MONTHS[day]
    const humidity = magnusPressure(normals.dewPoint_C[month]) / magnusPressure(normals.mean_C[month])
    const follow = Math.min(1, Math.max(0.2, 0.3 + (humidity - 0.5) / 0.3))
    state = 0.5 * state + Math.sqrt(0.75) * random.normal()
    const rest_K = (1.5 + 1.8 * (1 - follow)) * state
    raw[day] = follow * anomaly_K[day] - 10 * (clearness[day] - clear[month]) + rest_K
  }
  const drift = monthCurve(monthMeans(raw))
  const daily_C = season_C.map((value, day) => value + raw[day] - drift[day])
  let dewPoint_C: Float64Array = new Float64Array(HOURS)
  // hours capped by the air lower the month; lift the others a little
  for (let round = 0; round < 8; round++) {
    dewPoint_C = outdoor_C.map((air_C, i) => Math.min(air_C, betweenNoons(daily_C, i + 1)))
    const reached = monthMeans(dailyMeans(dewPoint_C))
    const lift = monthCurve(reached.map((value, month) => normals.dewPoint_C[month] - value))
    for (let day = 0; day < 365; day++) daily_C[day] += Math.min(3, Math.max(-3, lift[day]))
  }
  return dewPoint_C
}

/**
 * Hourly wind speed: Rayleigh distribution (Weibull with shape 2) as the length of a vector of two
 * persistent normal parts, stronger by day than by night, scaled to the monthly means.
 */
export function generateWind(normals: MonthlyNormals, random: Seeded): Float64Array {
  // speed correlates with itself about as the square of its parts: 0.7 to 0.83 in four US stations
  const keep = 0.88
  const fresh = Math.sqrt(1 - keep * keep)
  let north = random.normal()
  let east = random.normal()
  const wind_ms = Float64Array.from({ length: HOURS }, (_, i) => {
    north = keep * north + fresh * random.normal()
    east = keep * east + fresh * random.normal()
    // highest at 15:00, 0.8 to 1.25 of the mean in the same stations
    return Math.hypot(north, east) * (1 + 0.2 * Math.cos((2 * Math.PI * (i + 1 - 15)) / 24))
  })
  const reached = monthMeans(dailyMeans(wind_ms))
  return wind_ms.map((value, i) => {
    const month = DAY_MONTHS[Math.floor(i / 24)]
    return (value * normals.wind_ms[month]) / reached[month]
  })
}

/**
 * Hourly station pressure: monthly curve and persistent departures of 6 hPa at 40 degrees and beyond, less
 * towards the equator and with height (5 to 8 hPa in four US stations).
 */
export function generatePressure(normals: MonthlyNormals, random: Seeded): Float64Array {
  const season_Pa = monthCurve(normals.pressure_Pa)
  const share = Math.min(1, Math.abs(normals.place.latitude_deg) / 40)
  const raw = new Float64Array(365)
  let state = random.normal()
  for (let day = 0; day < 365; day++) {
    state = 0.7 * state + Math.sqrt(1 - 0.49) * random.normal()
    raw[day] = 600 * share * state * (season_Pa[day] / 101325)
  }
  const drift = monthCurve(monthMeans(raw))
  const daily_Pa = season_Pa.map((value, day) => value + raw[day] - drift[day])
  return Float64Array.from({ length: HOURS }, (_, i) => betweenNoons(daily_Pa, i + 1))
}
