import { HOURS, type ClimateYear } from '#engine/climate/climate-year.ts'
import { planeIrradiance } from '#engine/solar/plane.ts'
import type { SunYear } from '#engine/solar/sun.ts'

export interface OneSun {
  readonly altitude_deg: number
  readonly azimuth_deg: number
  readonly beam_Wm2: number
  readonly diffuse_Wm2: number
  readonly global_Wm2: number
  readonly extraterrestrial_Wm2: number
}

/** Sun on a plane under one and the same sky at every hour [W/m²]. */
export function planeUnder(sky: OneSun, tilt_deg: number, faces_deg: number, groundReflectance: number) {
  const all = (value: number) => new Float64Array(HOURS).fill(value)
  const climate: ClimateYear = {
    place: { name: 'Sky', latitude_deg: 40, longitude_deg: 0, elevation_m: 0, timeZone_h: 0 },
    source: 'one sky at every hour',
    outdoor_C: all(10),
    dewPoint_C: all(0),
    wind_ms: all(0),
    pressure_Pa: all(101325),
    global_Wm2: all(sky.global_Wm2),
    beam_Wm2: all(sky.beam_Wm2),
    diffuse_Wm2: all(sky.diffuse_Wm2),
    sky_C: all(0),
  }
  const sun: SunYear = {
    altitude_deg: all(sky.altitude_deg),
    azimuth_deg: all(sky.azimuth_deg),
    sunlit: all(1),
    extraterrestrial_Wm2: all(sky.extraterrestrial_Wm2),
  }
  const plane = planeIrradiance(
    climate,
    sun,
    { tilt_deg, faces_deg },
    Array<number>(12).fill(groundReflectance),
    [],
  )
  return { beam: plane.beam_Wm2[12], sky: plane.sky_Wm2[12], ground: plane.ground_Wm2[12] }
}
