import { repeatingYear } from '../../server/engine/year/repeating-year.ts'
import { assemble } from '../../server/engine/zone/assemble.ts'
import type { ElementCache } from '../../server/engine/zone/element-cache.ts'
import { benchHouse, withGlass } from './house.ts'

const MB = 1024 * 1024

/**
 * Memory of this process, which must have been started with --expose-gc and do nothing else.
 *
 * @param runs how many runs in a row, each with other glass
 */
export async function measureMemory(runs: number) {
  const { model, climate, sun } = await benchHouse()
  const cache: ElementCache = new Map()
  const run = (i: number) =>
    repeatingYear(assemble(withGlass(model, 0.7 + (0.6 * i) / runs), climate, cache, sun))
  run(0)
  const peakOfOne_MB = process.resourceUsage().maxRSS / 1024
  const held = () => {
    // Buffers of typed arrays are let go in the collection after that of their views.
    globalThis.gc?.()
    globalThis.gc?.()
    const { heapUsed, external, arrayBuffers } = process.memoryUsage()
    return (heapUsed + Math.max(external, arrayBuffers)) / MB
  }
  for (let i = 0; i < 20 && i < runs; i++) run(i)
  const early_MB = held()
  const earlyResident_MB = process.memoryUsage().rss / MB
  for (let i = 20; i < runs; i++) run(i)
  return {
    peak_of_one_run_MB: peakOfOne_MB,
    runs,
    held_after_20_runs_MB: early_MB,
    held_after_all_runs_MB: held(),
    resident_after_20_runs_MB: earlyResident_MB,
    resident_after_all_runs_MB: process.memoryUsage().rss / MB,
  }
}
