import type { RoomSurface } from './house-model.ts'

/**
 * How the sun that has come through one window is shared among the surfaces of the room.
 *
 * The beam meets floor or walls first; the diffuse light meets all surfaces by area. What they do not
 * absorb goes once to all surfaces that they see, by area; what is left after that is scattered evenly
 * and absorbed by area and absorptance. Some leaves again through the glass.
 */
export interface SunSharing {
  /** Share absorbed by each surface of a beam that lands on the floor. */
  readonly floorBeam: Float64Array
  /** … of a beam that lands on the walls away from the window. */
  readonly wallBeam: Float64Array
  /** … of diffuse light. */
  readonly diffuse: Float64Array
}

/**
 * @param surfaces   surfaces of the room; a floor must be among them
 * @param faces_deg  direction the window faces [deg clockwise from north]
 * @param glassArea_m2  all glass of the room [m²]
 * @param glassLoss_m2  glass area times its diffuse transmittance, all windows [m²]
 */
export function sunSharing(
  surfaces: readonly RoomSurface[],
  faces_deg: number,
  glassArea_m2: number,
  glassLoss_m2: number,
): SunSharing {
  const first = (meets: (surface: RoomSurface) => boolean) => {
    const weight = surfaces.map((surface) => (meets(surface) ? surface.area_m2 : 0))
    const total = weight.reduce((sum, area) => sum + area, 0)
    return total > 0 ? weight.map((area) => area / total) : null
  }
  const isFloor = (surface: RoomSurface) => surface.part === 'floor'
  const isAcross = (surface: RoomSurface) =>
    surface.part === 'mass' ||
    (surface.part === 'wall' && surface.faces_deg !== null && angleBetween(surface.faces_deg, faces_deg) > 45)
  const everywhere = first(() => true)
  if (!everywhere) throw new RangeError('The room has no surface that sun could fall on.')
  const floor = first(isFloor) ?? everywhere
  const across = first(isAcross) ?? floor
  const absorbing = surfaces.map((surface) => surface.area_m2 * surface.solarAbsorptance)
  const sink = absorbing.reduce((sum, area) => sum + area, glassLoss_m2)

  const absorb = (met: readonly number[]) => {
    const taken = Float64Array.from(met, (share, k) => share * surfaces[k].solarAbsorptance)
    let left = 0
    met.forEach((share, from) => {
      const scattered = share * (1 - surfaces[from].solarAbsorptance)
      if (scattered === 0) return
      // A plane does not see itself: the first bounce goes to all others, by area.
      const seen = surfaces.map((surface) => (inOnePlane(surface, surfaces[from]) ? 0 : surface.area_m2))
      const view = seen.reduce((sum, one) => sum + one, glassArea_m2)
      if (view === 0) {
        left += scattered
        return
      }
      let lost = (scattered * glassLoss_m2) / view
      seen.forEach((one, k) => {
        const absorbed = (scattered * one * surfaces[k].solarAbsorptance) / view
        taken[k] += absorbed
        lost += absorbed
      })
      left += scattered - lost
    })
    return taken.map((share, k) => share + (sink > 0 ? (left * absorbing[k]) / sink : 0))
  }
  return { floorBeam: absorb(floor), wallBeam: absorb(across), diffuse: absorb(everywhere) }
}

function inOnePlane(a: RoomSurface, b: RoomSurface): boolean {
  if (a === b) return true
  return (
    a.part === b.part &&
    (a.part === 'floor' || a.part === 'ceiling' || (a.part === 'wall' && a.faces_deg === b.faces_deg))
  )
}

/** Smallest angle between two directions [deg], 0 to 180. */
export function angleBetween(a_deg: number, b_deg: number): number {
  const turn = Math.abs((((a_deg - b_deg) % 360) + 360) % 360)
  return turn > 180 ? 360 - turn : turn
}
