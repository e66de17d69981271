import { readFileSync } from 'node:fs'
import { readOption } from '../../server/contract/read-option.ts'
import { loadClimate } from '../../server/climates/library.ts'
import { sunOfYear } from '../../server/engine/solar/sun.ts'
import type { HouseModel } from '../../server/engine/zone/house-model.ts'
import { loadLibrary } from '../../server/libraries/library.ts'
import { toHouse } from '../../server/modelling/to-house.ts'

const OPTION = new URL('../../data/examples/larch-hollow.json', import.meta.url)

/** The house that is measured: four sides, two bermed, in damp soil, in the climate it names. */
export async function benchHouse() {
  const library = loadLibrary()
  const option = readOption(JSON.parse(readFileSync(OPTION, 'utf8')), library)
  const climate = await loadClimate(option.climate!)
  return { model: toHouse(option, library, 'damp'), climate, sun: sunOfYear(climate.place) }
}

/** The same house with all windows larger or smaller by a factor; no section changes. */
export function withGlass(model: HouseModel, factor: number): HouseModel {
  const side = Math.sqrt(factor)
  return {
    ...model,
    windows: model.windows.map((window) => ({
      ...window,
      area_m2: window.area_m2 * factor,
      width_m: window.width_m * side,
      height_m: window.height_m * side,
    })),
  }
}
