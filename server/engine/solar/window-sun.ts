import { MONTH_DAYS } from '../climate/calendar.ts'
import { HOURS, type ClimateYear } from '../climate/climate-year.ts'
import type { WindowModel } from '../zone/house-model.ts'
import { atIncidence } from './at-incidence.ts'
import { planeIrradiance, type PlaneIrradiance } from './plane.ts'
import { floorShare } from './lit-floor.ts'
import { finShare, profileAngle, sideAngle, skyShare, sunlitShare } from './shading.ts'
import type { SunYear } from './sun.ts'

const RAD = Math.PI / 180

/** Sun through the glass of one window, by hour [W]. */
export interface WindowSun {
  readonly transmittedBeam_W: Float64Array
  readonly transmittedDiffuse_W: Float64Array
  /** Absorbed in the glass and flowing into the room. */
  readonly inward_W: Float64Array
  /** Share of the transmitted beam that lands on the floor, not on the wall across. */
  readonly floorShare: Float64Array
}

/**
 * Sun through a window: beam and circumsolar light at their angle of incidence and behind overhang and fins,
 * light of sky and ground as diffuse light, less what they take of either, the frame and a seasonal shade.
 *
 * @param roomDepth_m from the window to the wall across, for where the beam lands
 * @param plane radiation on the window's plane, where it is known already
 */
export function windowSun(
  climate: ClimateYear,
  sun: SunYear,
  window: WindowModel,
  groundReflectance: readonly number[],
  horizon_deg: readonly number[],
  roomDepth_m: number,
  plane: PlaneIrradiance = planeIrradiance(climate, sun, window.exposure, groundReflectance, horizon_deg),
): WindowSun {
  const out = {
    transmittedBeam_W: new Float64Array(HOURS),
    transmittedDiffuse_W: new Float64Array(HOURS),
    inward_W: new Float64Array(HOURS),
    floorShare: new Float64Array(HOURS),
  }
  const { glazing, exposure } = window
  const glass_m2 = window.area_m2 * (1 - window.frameShare)
  const { tilt_deg, faces_deg } = exposure
  const sky = skyShare(window, tilt_deg)
  const ground = finShare(window)
  let hour = 0
  for (let month = 0; month < 12; month++) {
    const passes = window.shade?.months.includes(month + 1) ? window.shade.passes : 1
    for (const end = hour + 24 * MONTH_DAYS[month]; hour < end; hour++) {
      const diffuse_W = (plane.sky_Wm2[hour] * sky + plane.ground_Wm2[hour] * ground) * glass_m2 * passes
      out.transmittedDiffuse_W[hour] = diffuse_W * glazing.diffuseTransmittance
      out.inward_W[hour] = diffuse_W * (glazing.diffuseSolarFactor - glazing.diffuseTransmittance)
      const beam = plane.beam_Wm2[hour]
      if (beam <= 0) continue
      const cosine = plane.incidence[hour]
      const incidence_deg = Math.acos(Math.min(1, cosine)) / RAD
      const side_deg = sideAngle(sun.azimuth_deg[hour], faces_deg)
      const altitude_deg = sun.altitude_deg[hour]
      const beam_W = beam * glass_m2 * passes * sunlitShare(window, altitude_deg, side_deg, tilt_deg)
      const transmittance = atIncidence(glazing.transmittance, incidence_deg)
      out.transmittedBeam_W[hour] = beam_W * transmittance
      out.inward_W[hour] +=
        beam_W * Math.max(0, atIncidence(glazing.solarFactor, incidence_deg) - transmittance)
      const profile_deg = profileAngle(altitude_deg, side_deg)
      out.floorShare[hour] = floorShare(window, profile_deg, roomDepth_m, tilt_deg)
    }
  }
  return out
}
