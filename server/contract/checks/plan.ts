import type { Option } from '../option.ts'
import { floorArea, planOf } from '../plan.ts'
import type { Report } from './check-option.ts'

/** Sides enclose the floor; room and roof suit them. */
export function checkPlan(option: Option, report: Report): void {
  const { room, roof, sides } = option
  sides.forEach(({ name }, i) => {
    if (sides.findIndex((side) => side.name === name) < i)
      report(['sides', i, 'name'], `"${name}" is given twice; choose another name.`)
  })
  const plan = planOf(sides)
  if (plan.gap_m > 0.02 * plan.perimeter_m + 0.05) {
    report(
      ['sides'],
      `The sides do not close around a floor: going round them one ends ${metres(plan.gap_m)} from the start. ` +
        `Check length_m and faces_deg of each side; what faces one way must be met by as much facing the other way.`,
    )
    return
  }
  const given = room.floorArea_m2
  const fits = (area: number) => given === undefined || Math.abs(given - area) <= 0.05 * area
  if (!fits(plan.orderedArea_m2) && !fits(plan.convexArea_m2))
    report(
      ['room', 'floorArea_m2'],
      `The sides enclose ${square(plan.orderedArea_m2)}, not the ${square(given!)} given here. ` +
        `Correct the sides, or leave floorArea_m2 out.`,
    )
  const area = floorArea(option)
  if (area < 1) {
    report(['sides'], `The sides enclose a floor of ${square(area)}; a room needs at least 1 m².`)
    return
  }
  const usual = area * room.height_m
  const volume = room.volume_m3
  if (volume !== undefined && (volume < 0.4 * usual || volume > 3 * usual))
    report(
      ['room', 'volume_m3'],
      `A floor of ${square(area)} and a height of ${metres(room.height_m)} make about ${usual.toFixed(0)} m³; ` +
        `${volume} m³ does not fit. Correct it, or leave it out.`,
    )
  if (roof.area_m2 !== undefined && (roof.area_m2 < 0.9 * area || roof.area_m2 > 4 * area))
    report(
      ['roof', 'area_m2'],
      `A roof of ${roof.area_m2} m² does not fit a floor of ${square(area)}. Correct it, or leave it out.`,
    )
}

const metres = (value: number) => `${Number(value.toFixed(2))} m`
const square = (value: number) => `${Number(value.toFixed(1))} m²`
