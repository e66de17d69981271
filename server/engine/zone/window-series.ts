import { HOURS, type ClimateYear } from '../climate/climate-year.ts'
import { windowSun } from '../solar/window-sun.ts'
import type { RoomFace } from './running-element.ts'
import { hourWithin, monthOfHour } from '../climate/calendar.ts'
import type { Drives } from './drives.ts'
import type { HouseModel, WindowModel } from './house-model.ts'
import { sunSharing } from './sun-sharing.ts'

/**
 * All windows together as the hour loop needs them. A massless window with inner film G = G_a + G_r
 * (shares a, r) and loss U: heat into it is U (a T_air + r T_radiant - T_eq) - inward sun.
 */
export interface WindowSeries {
  /** Room matrix parts, by hour [W/K]. */
  readonly aa: Float64Array
  readonly ar: Float64Array
  readonly rr: Float64Array
  /** Right-hand sides, by hour [W]. */
  readonly onAir_W: Float64Array
  readonly onRadiant_W: Float64Array
  /** Σ U a, Σ U r [W/K] and Σ U T_eq [W], for the ledger. */
  readonly lossAir_WK: Float64Array
  readonly lossRadiant_WK: Float64Array
  readonly lossOutdoor_W: Float64Array
  /** Sun that stays in the room, by hour [W]. */
  readonly sun_W: Float64Array
  readonly each: readonly { readonly name: string; readonly flow_W: Float64Array }[]
}

/** Also adds each window's sun to the faces' `sun_W`. */
export function windowSeries(
  model: HouseModel,
  climate: ClimateYear,
  drives: Drives,
  faces: readonly RoomFace[],
): WindowSeries {
  const series = () => new Float64Array(HOURS)
  const out = {
    aa: series(),
    ar: series(),
    rr: series(),
    onAir_W: series(),
    onRadiant_W: series(),
    lossAir_WK: series(),
    lossRadiant_WK: series(),
    lossOutdoor_W: series(),
    sun_W: series(),
  }
  const surfaces = faces.map((face) => face.surface)
  const glassArea_m2 = sum(model.windows, glassArea)
  const glassLoss_m2 = sum(model.windows, (window) => glassArea(window) * window.glazing.diffuseTransmittance)
  const shares = new Map<number, ReturnType<typeof sunSharing>>()
  const each = model.windows.map((window) => {
    const faces_deg = window.exposure.faces_deg
    let share = shares.get(faces_deg)
    if (!share) shares.set(faces_deg, (share = sunSharing(surfaces, faces_deg, glassArea_m2, glassLoss_m2)))
    const flow_W = addSun(model, climate, drives, window, faces, share, out)
    addLoss(climate, drives, window, out)
    return { name: window.name, flow_W }
  })
  return { ...out, each }
}

const glassArea = (window: WindowModel) => window.area_m2 * (1 - window.frameShare)
const sum = <T>(items: readonly T[], value: (item: T) => number) =>
  items.reduce((total, item) => total + value(item), 0)

function addSun(
  model: HouseModel,
  climate: ClimateYear,
  drives: Drives,
  window: WindowModel,
  faces: readonly RoomFace[],
  share: ReturnType<typeof sunSharing>,
  out: { onAir_W: Float64Array; onRadiant_W: Float64Array; sun_W: Float64Array },
): Float64Array {
  const sun = windowSun(
    climate,
    drives.sun,
    window,
    model.groundReflectance,
    model.horizon_deg,
    model.room.depth_m,
  )
  const film = window.convective_Wm2K + window.radiative_Wm2K
  const a = window.convective_Wm2K / film
  const flow_W = new Float64Array(HOURS)
  for (let hour = 0; hour < HOURS; hour++) {
    const beam = sun.transmittedBeam_W[hour]
    const diffuse = sun.transmittedDiffuse_W[hour]
    const inward = sun.inward_W[hour]
    if (beam === 0 && diffuse === 0 && inward === 0) continue
    flow_W[hour] = beam + diffuse + inward
    const onFloor = beam * sun.floorShare[hour]
    const onWall = beam - onFloor
    for (let k = 0; k < faces.length; k++) {
      const absorbed = onFloor * share.floorBeam[k] + onWall * share.wallBeam[k] + diffuse * share.diffuse[k]
      faces[k].sun_W[hour] += absorbed
      out.sun_W[hour] += absorbed
    }
    out.onAir_W[hour] += a * inward
    out.onRadiant_W[hour] += (1 - a) * inward
    out.sun_W[hour] += inward
  }
  return flow_W
}

function addLoss(
  climate: ClimateYear,
  drives: Drives,
  window: WindowModel,
  out: Omit<WindowSeries, 'each' | 'sun_W'>,
): void {
  const film = window.convective_Wm2K + window.radiative_Wm2K
  const a = window.convective_Wm2K / film
  const r = window.radiative_Wm2K / film
  const film_WK = film * window.area_m2
  const open_Wm2K = (1 - window.frameShare) * window.glazing.u_Wm2K + window.frameShare * window.frameU_Wm2K
  if (!(open_Wm2K < film))
    throw new RangeError(
      `${window.name}: its U-value ${open_Wm2K.toFixed(2)} W/m²K must be less than its inner film of ${film.toFixed(2)} W/m²K.`,
    )
  const open_WK = open_Wm2K * window.area_m2
  const { shutter } = window
  const shut_WK = shutter ? window.area_m2 / (1 / open_Wm2K + shutter.resistance_m2KW) : open_WK
  const { linear_C } = drives.shaded(window.exposure)
  for (let hour = 0; hour < HOURS; hour++) {
    const isShut =
      shutter !== null &&
      drives.sun.altitude_deg[hour] <= 0 &&
      hourWithin(hour % 24, shutter.from_h, shutter.to_h) &&
      shutter.months.includes(monthOfHour(hour) + 1)
    const loss_WK = isShut ? shut_WK : open_WK
    const outdoor_W = loss_WK * 0.5 * (linear_C[hour === 0 ? HOURS - 1 : hour - 1] + linear_C[hour])
    out.aa[hour] += film_WK * a * r + a * a * loss_WK
    out.ar[hour] += a * r * (loss_WK - film_WK)
    out.rr[hour] += film_WK * a * r + r * r * loss_WK
    out.onAir_W[hour] += a * outdoor_W
    out.onRadiant_W[hour] += r * outdoor_W
    out.lossAir_WK[hour] += a * loss_WK
    out.lossRadiant_WK[hour] += r * loss_WK
    out.lossOutdoor_W[hour] += outdoor_W
  }
}
