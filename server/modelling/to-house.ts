import type { Library } from '#contract/library.ts'
import type { Option } from '#contract/option.ts'
import { floorArea } from '#contract/plan.ts'
import type { SoilState } from '#contract/soil.ts'
import type { HouseElement, HouseModel } from '#engine/zone/house-model.ts'
import { freeWall, roofElement, testFloor } from './envelope.ts'
import { groundSection } from './ground-section.ts'
import { gains, groundReflectance, hourly, plantModel } from './habits.ts'
import { insideMass } from './inside-mass.ts'
import { substancesOf } from './substances.ts'
import { surfaceFilms } from './surface-films.ts'
import { wallParts } from './wall-parts.ts'
import { doorLoss, windowModels } from './windows.ts'

/**
 * An option as the engine's house, in one soil state.
 *
 * Each side is one ground section as long as the side, with a strip of floor A / P wide, so that all
 * strips together make the floor; it carries the wall's foot up to a little above soil and floor. The
 * rest of the wall, without openings, is a layered element. Sides that are built alike have equal specs,
 * so that the engine reduces them once. A floor over a constant temperature has no section.
 *
 * @param option as readOption gave it
 * @throws RangeError for an id that is not known, which readOption would have told
 */
export function toHouse(option: Option, library: Library, soilState: SoilState): HouseModel {
  const substances = substancesOf(option, library, soilState)
  const films = surfaceFilms(option.films)
  const floor = testFloor(option, substances, films)
  const walls = option.sides.flatMap((side): HouseElement[] => {
    const wall = wallParts(side, option)
    const parts = floor ? [] : [groundSection(side, wall, { option, library, substances, films })]
    return wall.restArea_m2 > 0 ? [...parts, freeWall(side, wall, substances, films)] : parts
  })
  const { air, room, site } = option
  const area_m2 = floorArea(option)
  return {
    room: {
      floorArea_m2: area_m2,
      volume_m3: room.volume_m3 ?? area_m2 * room.height_m,
      depth_m: room.depth_m ?? roomDepth(option, area_m2),
      airCapacityFactor: room.airCapacityFactor,
    },
    elements: [
      ...(floor ? [floor] : []),
      ...walls,
      roofElement(option, library, substances, films),
      ...insideMass(option, substances, films),
    ],
    windows: windowModels(option, library, films),
    plainLoss_WK: doorLoss(option),
    groundReflectance: groundReflectance(option),
    horizon_deg: site.horizon_deg ?? [],
    infiltration: air.infiltration,
    ventilation: {
      fresh_m3s: hourly(air.fresh?.flow_Ls ?? 0).map((flow_Ls) => flow_Ls / 1000),
      recovery: air.fresh?.recovery ?? 0,
    },
    flush: air.flush ?? null,
    gains: gains(option),
    heating: plantModel(option.heating),
    cooling: plantModel(option.cooling),
  }
}

/** From the side with most glass to the wall across the room: the floor's area over that side's length [m]. */
function roomDepth(option: Option, area_m2: number): number {
  const glass = (side: Option['sides'][number]) =>
    side.openings.reduce(
      (sum, opening) => sum + (opening.kind === 'window' ? opening.width_m * opening.height_m : 0),
      0,
    )
  const sunny = option.sides.reduce((most, side) => (glass(side) > glass(most) ? side : most))
  return glass(sunny) > 0 ? area_m2 / sunny.length_m : Math.sqrt(area_m2)
}
