import type { RunningHouse } from '../../server/engine/zone/assemble.ts'

/** Wall time of one call [ms]. */
export function once(work: () => unknown): number {
  const start = performance.now()
  work()
  return performance.now() - start
}

/** Median of several timings after one that warms up. */
export function median(times: number, timing: (i: number) => number): number {
  timing(-1)
  const sorted = Array.from({ length: times }, (_, i) => timing(i)).sort((a, b) => a - b)
  return sorted[Math.floor(times / 2)]
}

/** Multiply-adds that the hour loop cannot do without: every mode once into each room flow, once through each input and its own decay. */
export function multiplyAdds(house: RunningHouse): number {
  return house.elements.reduce(
    (sum, element) => sum + element.modes * (element.room.length + element.columns + 1),
    0,
  )
}

const LENGTH = 1024
const a = Float64Array.from({ length: LENGTH }, (_, i) => Math.sin(i))
const b = Float64Array.from({ length: LENGTH }, (_, i) => Math.cos(i))
let kept = 0

/** Time of a plain dot product of that many multiply-adds [ms]. */
export function timeDot(count: number): number {
  const start = performance.now()
  kept += dot(Math.round(count / LENGTH))
  return performance.now() - start
}

function dot(repeats: number): number {
  let total = 0
  for (let r = 0; r < repeats; r++) {
    let sum = 0
    for (let i = 0; i < a.length; i++) sum += a[i] * b[i]
    total += sum
  }
  return total
}

/** Keeps the dot products from being optimised away. */
export const checksum = () => kept
