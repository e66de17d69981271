import type { LayerInput } from '../assembly.ts'
import type { Library } from '../library.ts'
import type { Option } from '../option.ts'
import { floorArea, planOf } from '../plan.ts'
import type { Side } from '../side.ts'
import type { Report } from './check-option.ts'

/** A berm must leave this much of its wall free, or it is a berm over the roof. */
export const WALL_ABOVE_BERM_M = 0.1

/** What lies against and under the house can be built. */
export function checkGround(option: Option, library: Library, report: Report): void {
  const { floor } = option
  if (floor.below.kind === 'ground' && !option.soil)
    report(
      ['soil'],
      'Is missing: a floor on the ground needs a soil. Give its id and your guess of its state.',
    )
  const floor_m = thicknessOf(option, floor.assembly)
  const half_m = floorArea(option) / planOf(option.sides).perimeter_m
  option.sides.forEach((side, i) => {
    const tell: Report = (path, detail) => report(['sides', i, ...path], detail)
    if (floor.below.kind !== 'ground') {
      for (const name of ['berm', 'umbrella', 'wing', 'cover', 'skirt', 'footing', 'probes'] as const)
        if (side[name])
          tell(
            [name],
            `The floor stands on a constant temperature, so there is no ground here. Leave it out.`,
          )
      return
    }
    const top_m = floor.level_m + (side.height_m ?? option.room.height_m)
    if (top_m < 0.2)
      tell(
        ['height_m'],
        `The wall ends ${short(top_m)} m above the level ground outside; it must stand at least 0.2 m out of it. Raise the wall or the floor.`,
      )
    bermAgainstWall(side, top_m, tell)
    buriedInsulation(side, coverThickness(side, library), tell)
    const wall_m = thicknessOf(option, side.wall)
    underground(side, floor_m - floor.level_m, tell)
    probes(side, { wall_m, half_m, floor_m }, tell)
  })
}

/** Thickness of an assembly [m]; 0 for an unknown one, which is told elsewhere. */
function thicknessOf(option: Option, id: string): number {
  return sum(option.assemblies.find((assembly) => assembly.id === id)?.layers ?? [])
}

function bermAgainstWall(side: Side, top_m: number, tell: Report): void {
  const { berm } = side
  if (!berm || berm.height_m <= top_m - WALL_ABOVE_BERM_M + 1e-9) return
  tell(
    ['berm', 'height_m'],
    `The berm is ${berm.height_m} m high, its wall ends ${short(top_m)} m above the level ground. ` +
      `Keep the berm at least ${WALL_ABOVE_BERM_M} m lower than the wall.`,
  )
}

function buriedInsulation(side: Side, cover_m: number, tell: Report): void {
  const { berm, umbrella, wing, cover } = side
  if (umbrella && !berm)
    tell(
      ['umbrella'],
      'An umbrella lies on a berm, and this side has none. Add a berm, or take a wing for board in level ground.',
    )
  if (wing && berm)
    tell(['wing'], 'A wing lies in level ground, and this side has a berm. Take an umbrella instead.')
  const buried = umbrella ?? wing
  const buried_m = sum(buried?.layers ?? [])
  if (buried_m > 1)
    tell(
      [umbrella ? 'umbrella' : 'wing', 'layers'],
      `The layers are ${short(buried_m)} m thick together; more than 1 m is not insulation any more.`,
    )
  else if (berm && cover_m + buried_m > 0.8 * berm.height_m + 1e-9)
    tell(
      cover ? ['cover', 'layers'] : ['umbrella', 'layers'],
      `Cover and umbrella are ${short(cover_m + buried_m)} m thick together, the berm is ${berm.height_m} m high. They may take up at most 0.8 of it.`,
    )
  else if (cover_m > 1.5)
    tell(['cover', 'layers'], `The cover is ${short(cover_m)} m deep; the model goes to 1.5 m.`)
}

function coverThickness(side: Side, library: Library): number {
  if (!side.cover) return 0
  if (side.cover.layers) return sum(side.cover.layers)
  return library.covers.get(side.cover.surface)?.layer?.thickness_m ?? 0
}

function underground(side: Side, floorUnderside_m: number, tell: Report): void {
  const { berm, skirt, footing } = side
  if (footing && footing.depth_m < floorUnderside_m + 0.05 - 1e-9)
    tell(
      ['footing', 'depth_m'],
      `The footing ends ${footing.depth_m} m below the level ground, the floor's layers ${short(floorUnderside_m)} m below it. Make it at least 0.05 m deeper than the floor.`,
    )
  if (!skirt) return
  const soil_m = berm?.height_m ?? 0
  if (berm && skirt.thickness_m >= berm.crest_m)
    tell(
      ['skirt', 'thickness_m'],
      `The skirt is ${skirt.thickness_m} m thick, the berm's crest only ${berm.crest_m} m wide. Make it thinner.`,
    )
  if (skirt.bottom_m >= skirt.top_m - 0.05)
    tell(
      ['skirt', 'bottom_m'],
      `The skirt goes from ${skirt.top_m} m down to ${skirt.bottom_m} m; its bottom must be at least 0.05 m below its top.`,
    )
  else if (skirt.top_m > soil_m + 1e-9)
    tell(
      ['skirt', 'top_m'],
      `The skirt begins ${skirt.top_m} m above the level ground, the soil reaches ${soil_m} m. A skirt lies in the soil: put insulation above it into the wall.`,
    )
}

function probes(
  side: Side,
  sizes: { readonly wall_m: number; readonly half_m: number; readonly floor_m: number },
  tell: Report,
): void {
  const names = side.probes?.map(({ name }) => name) ?? []
  side.probes?.forEach(({ name, fromWall_m }, k) => {
    if (names.indexOf(name) < k) tell(['probes', k, 'name'], `"${name}" is given twice; choose another name.`)
    if (fromWall_m >= 0) return
    const { wall_m, half_m } = sizes
    if (-fromWall_m >= wall_m && -fromWall_m <= wall_m + half_m + 1e-9) return
    tell(
      ['probes', k, 'fromWall_m'],
      `${fromWall_m} m is not below the floor, which lies from ${short(-wall_m)} to ${short(-wall_m - half_m)} m here.`,
    )
  })
}

const sum = (layers: readonly LayerInput[]) => layers.reduce((total, layer) => total + layer.thickness_m, 0)
const short = (value: number) => String(Number(value.toFixed(2)))
