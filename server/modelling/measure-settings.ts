import type { Library } from '#contract/library.ts'
import type { Option } from '#contract/option.ts'
import { CORD_M3, type Fuel } from '#engine/measures/firewood.ts'
import type { MeasureSettings } from '#engine/measures/summary.ts'
import type { HouseModel } from '#engine/zone/house-model.ts'
import { vapour } from './habits.ts'

const BTU_MJ = 1055.06e-6
/** Beside the limits of the comfort range, which come first [°C]. */
const BELOW_C = [10, 15, 18]
const ABOVE_C = [26, 28, 30]

/** What the measures of a year want to know of an option. */
export function measureSettings(option: Option, library: Library, model: HouseModel): MeasureSettings {
  const { use, comfort } = option
  return {
    model,
    // An empty test cell is measured as if one person looked in; its sentences leave people out.
    people: use.people > 0 ? use.people : 1,
    bedrooms: use.bedrooms,
    vapour_kgh: vapour(option),
    vapourBuffer: use.vapourBuffer,
    comfort,
    limits: {
      below_C: [comfort.low_C, ...BELOW_C.filter((limit) => limit !== comfort.low_C)],
      above_C: [comfort.high_C, ...ABOVE_C.filter((limit) => limit !== comfort.high_C)],
    },
    fuel: fuelOf(library, use.wood),
    stoveEfficiency: library.stoves.get(use.stove)!.efficiency.typical,
    repeats: true,
  }
}

function fuelOf(library: Library, id: string): Fuel {
  const wood = library.woods.get(id)!
  return {
    name: wood.name,
    netHeat_MJkg: wood.netHeat_MJkg.typical,
    stackedHeat_MJm3: (wood.cordHeat_MBtu.typical * 1e6 * BTU_MJ) / CORD_M3,
  }
}
