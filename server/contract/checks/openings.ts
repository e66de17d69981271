import type { Opening } from '../opening.ts'
import type { Option } from '../option.ts'
import type { Side } from '../side.ts'
import type { Report } from './check-option.ts'

/** Openings lie inside their wall, beside each other and above the soil. */
export function checkOpenings(option: Option, report: Report): void {
  option.sides.forEach((side, i) => {
    const height_m = side.height_m ?? option.room.height_m
    const at = (...path: PropertyKey[]) => ['sides', i, 'openings', ...path]
    const before = { count: 0 }
    const tell: Report = (path, detail) => {
      before.count++
      report(path, detail)
    }
    side.openings.forEach((opening, k) => {
      fitsWall(opening, side.length_m, height_m, (name, detail) => tell(at(k, name), detail))
      aboveSoil(opening, side, option.floor.level_m, (detail) => tell(at(k, 'sill_m'), detail))
      if (opening.kind === 'window') loses(opening, option, (name, detail) => tell(at(k, name), detail))
    })
    if (before.count > 0) return
    const area_m2 = side.openings.reduce((sum, { width_m, height_m }) => sum + width_m * height_m, 0)
    if (area_m2 > side.length_m * height_m + 1e-9)
      report(
        at(),
        `The openings have ${short(area_m2)} m² together, the wall of "${side.name}" has ${short(side.length_m * height_m)} m². Make them smaller.`,
      )
    else besideEachOther(side, (k, name, detail) => report(at(k, name), detail))
  })
}

function fitsWall(
  { name, width_m, height_m, sill_m, fromLeft_m }: Opening,
  length_m: number,
  wall_m: number,
  tell: (name: string, detail: string) => void,
): void {
  if (width_m > length_m + 1e-9)
    tell('width_m', `"${name}" is ${width_m} m wide, its wall only ${length_m} m long. Make it narrower.`)
  else if (fromLeft_m !== undefined && fromLeft_m + width_m > length_m + 1e-9)
    tell(
      'fromLeft_m',
      `"${name}" ends ${short(fromLeft_m + width_m)} m from the left, beyond the end of its wall at ${length_m} m. Move it, or make it narrower.`,
    )
  if (sill_m + height_m > wall_m + 1e-9)
    tell(
      'height_m',
      `"${name}" reaches ${short(sill_m + height_m)} m above the floor (sill ${sill_m} m, height ${height_m} m), its wall only ${wall_m} m. Lower it, or raise the wall.`,
    )
}

function aboveSoil({ name, sill_m }: Opening, side: Side, level_m: number, tell: (detail: string) => void) {
  const soil_m = (side.berm?.height_m ?? 0) - level_m
  if (sill_m >= soil_m - 1e-9) return
  const what = side.berm ? 'the berm against it' : 'the level ground outside'
  const help = side.berm
    ? 'Raise the sill, lower the berm, or make two sides of this one: one bermed, one with the opening.'
    : 'Raise the sill or the floor.'
  tell(
    `"${name}" begins ${sill_m} m above the floor, but ${what} reaches ${short(soil_m)} m above it. ${help}`,
  )
}

/** A massless window cannot pass more than its inner film does. */
function loses(
  opening: Extract<Opening, { kind: 'window' }>,
  option: Option,
  tell: (name: string, detail: string) => void,
) {
  const given = option.films.glassInside
  if (!given) return
  const film = given.convective_Wm2K + given.radiative_Wm2K
  if (opening.frameShare > 0 && opening.frameU_Wm2K >= film)
    tell(
      'frameU_Wm2K',
      `A frame of ${opening.frameU_Wm2K} W/m²K cannot lose more than the inner film of ${short(film)} W/m²K passes.`,
    )
}

function besideEachOther(side: Side, tell: (k: number, name: string, detail: string) => void): void {
  const { openings } = side
  openings.forEach((one, k) => {
    const sameHeight = openings.filter((other) =>
      overlap(one.sill_m, one.height_m, other.sill_m, other.height_m),
    )
    const needed = sameHeight.reduce((sum, { width_m }) => sum + width_m, 0)
    const clash = openings
      .slice(0, k)
      .find(
        (other) =>
          sameHeight.includes(other) &&
          one.fromLeft_m !== undefined &&
          other.fromLeft_m !== undefined &&
          overlap(one.fromLeft_m, one.width_m, other.fromLeft_m, other.width_m),
      )
    if (clash)
      tell(k, 'fromLeft_m', `"${one.name}" overlaps "${clash.name}". Move one of them, or make it narrower.`)
    else if (sameHeight.indexOf(one) === sameHeight.length - 1 && needed > side.length_m + 1e-9 && k > 0)
      tell(
        k,
        'width_m',
        `The openings at this height are ${short(needed)} m wide together, the wall of "${side.name}" is ${side.length_m} m long. Make them narrower or fewer.`,
      )
  })
}

function overlap(a: number, width: number, b: number, otherWidth: number): boolean {
  return a < b + otherWidth - 1e-9 && b < a + width - 1e-9
}

const short = (value: number) => String(Number(value.toFixed(2)))
