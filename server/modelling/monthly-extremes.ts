import { MONTH_OF_HOUR } from '#engine/measures/months.ts'

/** Lowest and highest hour of each month, 12 values each [°C]. */
export interface MonthlyExtremes {
  readonly low_C: number[]
  readonly high_C: number[]
}

/** @param values_C 8,760 hourly values */
export function monthlyExtremes(values_C: ArrayLike<number>): MonthlyExtremes {
  const low_C = new Array<number>(12).fill(Infinity)
  const high_C = new Array<number>(12).fill(-Infinity)
  for (let hour = 0; hour < values_C.length; hour++) {
    const month = MONTH_OF_HOUR[hour]
    low_C[month] = Math.min(low_C[month], values_C[hour])
    high_C[month] = Math.max(high_C[month], values_C[hour])
  }
  return { low_C, high_C }
}
