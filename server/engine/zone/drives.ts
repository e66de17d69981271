import type { ClimateYear } from '../climate/climate-year.ts'
import { planeIrradiance } from '../solar/plane.ts'
import { sunOfYear, type SunYear } from '../solar/sun.ts'
import { drivenTemperature, type Driven, type PlaneSun } from './driven.ts'
import type { Exposure, HouseModel } from './house-model.ts'

/** Outdoor series of one house, each computed once however many planes share it. */
export interface Drives {
  readonly sun: SunYear
  readonly of: (exposure: Exposure) => Driven
  /** Without sun: for glass. */
  readonly shaded: (exposure: Exposure) => Driven
}

/** @param sun the sun over the site; by default where it really stands */
export function outdoorDrives(
  model: HouseModel,
  climate: ClimateYear,
  sun: SunYear = sunOfYear(climate.place),
): Drives {
  const planes = new Map<string, PlaneSun>()
  const driven = new Map<string, Driven>()
  const once = <T>(store: Map<string, T>, key: string, make: () => T): T => {
    const known = store.get(key)
    if (known !== undefined) return known
    const made = make()
    store.set(key, made)
    return made
  }
  const plane = (exposure: Exposure) => {
    const faces_deg = exposure.tilt_deg === 0 ? 0 : exposure.faces_deg
    return once(planes, `${exposure.tilt_deg} ${faces_deg}`, () =>
      planeIrradiance(
        climate,
        sun,
        { tilt_deg: exposure.tilt_deg, faces_deg },
        model.groundReflectance,
        model.horizon_deg,
      ),
    )
  }
  return {
    sun,
    of: (exposure) =>
      once(driven, JSON.stringify(exposure), () => drivenTemperature(climate, exposure, plane(exposure))),
    shaded: (exposure) =>
      once(driven, `shaded ${JSON.stringify(exposure)}`, () => drivenTemperature(climate, exposure, null)),
  }
}
