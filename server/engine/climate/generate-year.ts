import type { ClimateYear } from './climate-year.ts'
import { generateDewPoint, generatePressure, generateWind } from './generate-air.ts'
import { generateRadiation } from './generate-radiation.ts'
import { generateTemperature } from './generate-temperature.ts'
import { checkNormals, type MonthlyNormals } from './normals.ts'
import { seeded } from './seeded.ts'
import { hourlyCloud, skyTemperatures } from './sky.ts'
import { sunHours } from './solar-day.ts'

/**
 * An hourly year with the given monthly normals that varies like a real one. Same normals and seed give the
 * same year to the last bit.
 *
 * Mean temperature, global radiation, wind and pressure of each month are the normals'; the spread of days,
 * the share of beam, the persistence and the hours in between come from published distributions and from
 * regressions on US stations, as said at each function. No single day of it ever happened.
 *
 * @param normals twelve monthly values of each quantity
 * @param seed    whole number; another seed gives another year with the same months
 * @throws RangeError that names the value which cannot be
 */
export function generateYear(normals: MonthlyNormals, seed: number): ClimateYear {
  checkNormals(normals)
  const { place } = normals
  const sun = sunHours(place)
  // a stream for each quantity, so that a change to one leaves the others as they were
  const radiation = generateRadiation(normals, sun, seeded(seed * 8 + 1))
  const { clearness, fairness, global_Wm2, beam_Wm2, diffuse_Wm2 } = radiation
  const temperature = generateTemperature(normals, sun, clearness, fairness, seeded(seed * 8 + 2))
  const { outdoor_C, anomaly_K } = temperature
  const dewPoint_C = generateDewPoint(normals, outdoor_C, anomaly_K, clearness, seeded(seed * 8 + 3))
  const wind_ms = generateWind(normals, seeded(seed * 8 + 4))
  const pressure_Pa = generatePressure(normals, seeded(seed * 8 + 5))
  const cloud = hourlyCloud(global_Wm2, sun.outside_Wm2)
  const shares = normals.diffuse_kWhm2day === undefined ? ['beam share'] : []
  const estimated = ['hours and single days', ...shares, 'sky temperature', ...normals.estimated]
  return {
    place,
    source: `Generated from monthly normals (${normals.source}), seed ${seed}; estimated: ${estimated.join(', ')}`,
    outdoor_C,
    dewPoint_C,
    wind_ms,
    pressure_Pa,
    global_Wm2,
    beam_Wm2,
    diffuse_Wm2,
    sky_C: skyTemperatures({ outdoor_C, dewPoint_C, pressure_Pa, cloud }),
  }
}
