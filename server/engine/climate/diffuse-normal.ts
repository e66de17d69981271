import { beamOf } from './beam.ts'
import { MONTH_DAYS, MONTH_STARTS } from './calendar.ts'
import type { SunHours } from './solar-day.ts'

/**
 * Raises the diffuse share of every hour of a month to one power, so that the month has its diffuse normal.
 * Overcast hours (share 1) stay overcast, the order of hours stays; shares keep above 4 %.
 */
export function closeDiffuse(
  wanted_kWhm2day: readonly number[],
  sun: SunHours,
  global_Wm2: Float64Array,
  beam_Wm2: Float64Array,
  diffuse_Wm2: Float64Array,
): void {
  for (let month = 0; month < 12; month++) {
    const from = MONTH_STARTS[month] * 24
    const to = MONTH_STARTS[month + 1] * 24
    const wanted_Wh = wanted_kWhm2day[month] * MONTH_DAYS[month] * 1000
    const at = (i: number, power: number): number => {
      const share = global_Wm2[i] > 0 ? diffuse_Wm2[i] / global_Wm2[i] : 1
      return global_Wm2[i] * Math.max(Math.min(share, 0.04), share ** power)
    }
    let low = 0.2
    let high = 4
    for (let step = 0; step < 40; step++) {
      const power = (low + high) / 2
      let sum_Wh = 0
      for (let i = from; i < to; i++) sum_Wh += at(i, power)
      if (sum_Wh > wanted_Wh) low = power
      else high = power
    }
    for (let i = from; i < to; i++) {
      diffuse_Wm2[i] = at(i, low)
      beam_Wm2[i] = beamOf(global_Wm2[i] - diffuse_Wm2[i], {
        outside_Wm2: sun.outside_Wm2[i],
        cosZenith: sun.cosZenith[i],
        sunlit: sun.sunlit[i],
      })
    }
  }
}
