import { HOURS } from '../climate/climate-year.ts'
import { DAYS, MONTH_OF_HOUR, dailyMeans } from './months.ts'

/** What a category allows around the comfort temperature [K]. */
export interface AdaptiveModel {
  readonly name: string
  readonly source: string
  /** Comfort temperature = slope · running mean + offset_C. */
  readonly slope: number
  readonly offset_C: number
  /** Running means for which the model holds [°C]. */
  readonly valid_C: readonly [lowest: number, highest: number]
  readonly categories: readonly {
    readonly name: string
    readonly below_K: number
    readonly above_K: number
  }[]
}

/** EN 16798-1:2019, annex B.2.2, buildings without mechanical cooling (from memory). */
export const EN_16798: AdaptiveModel = {
  name: 'EN 16798-1 adaptive',
  source: 'EN 16798-1:2019, B.2.2 (from memory)',
  slope: 0.33,
  offset_C: 18.8,
  valid_C: [10, 30],
  categories: [
    { name: 'I', below_K: 3, above_K: 2 },
    { name: 'II', below_K: 4, above_K: 3 },
    { name: 'III', below_K: 5, above_K: 4 },
  ],
}

/** ANSI/ASHRAE Standard 55, section 5.4, occupant-controlled naturally conditioned spaces (from memory). */
export const ASHRAE_55: AdaptiveModel = {
  name: 'ASHRAE 55 adaptive',
  source: 'ANSI/ASHRAE Standard 55-2017, 5.4 (from memory)',
  slope: 0.31,
  offset_C: 17.8,
  valid_C: [10, 33.5],
  categories: [
    { name: '90 %', below_K: 2.5, above_K: 2.5 },
    { name: '80 %', below_K: 3.5, above_K: 3.5 },
  ],
}

/** Comfort temperature [°C] at a running mean; null outside the limits of validity. */
export function comfortTemperature(model: AdaptiveModel, runningMean_C: number): number | null {
  const [lowest, highest] = model.valid_C
  if (!(runningMean_C >= lowest && runningMean_C <= highest)) return null
  return model.slope * runningMean_C + model.offset_C
}

/** Next running mean, (1 - α) · yesterday's daily mean + α · yesterday's running mean (EN 16798-1, B.2). */
export function nextRunningMean(dailyMean_C: number, runningMean_C: number, alpha = 0.8): number {
  return (1 - alpha) * dailyMean_C + alpha * runningMean_C
}

/**
 * Running mean from seven known days (EN 16798-1:2019, B.2, approximate form):
 * (T₁ + 0.8 T₂ + 0.6 T₃ + 0.5 T₄ + 0.4 T₅ + 0.3 T₆ + 0.2 T₇) / 3.8
 *
 * @param days_C daily means, yesterday first, 7 values
 */
export function sevenDayRunningMean(days_C: readonly number[]): number {
  const weights = [1, 0.8, 0.6, 0.5, 0.4, 0.3, 0.2]
  return weights.reduce((sum, weight, i) => sum + weight * days_C[i], 0) / 3.8
}

/**
 * Exponentially weighted running mean of the outdoor daily means for each day of a year that repeats
 * itself: today's value knows yesterday and earlier, 1 January knows December.
 *
 * @returns 365 values [°C]
 */
export function runningMeans(outdoor_C: ArrayLike<number>, alpha = 0.8): Float64Array {
  const daily = dailyMeans(outdoor_C)
  const means = new Float64Array(DAYS)
  let running = daily[DAYS - 1]
  // Twice around: after one year the start value weighs 0.8^365.
  for (let day = 0; day < 2 * DAYS; day++) {
    running = nextRunningMean(daily[(day + DAYS - 1) % DAYS], running, alpha)
    means[day % DAYS] = running
  }
  return means
}

/** Operative temperature at air speeds below 0.2 m/s: the mean of air and radiant (ISO 7726; ASHRAE 55). */
export function operativeTemperature(air_C: number, radiant_C: number): number {
  return (air_C + radiant_C) / 2
}

/** Time outside a comfort range, by month (12 values) and for the year. */
export interface ComfortCount {
  readonly name: string
  readonly source: string
  /** Hours in which the range is defined. */
  readonly hours: number
  readonly below_h: number
  readonly above_h: number
  readonly below_Kh: number
  readonly above_Kh: number
  readonly month: {
    readonly hours: number[]
    readonly below_h: number[]
    readonly above_h: number[]
    readonly below_Kh: number[]
    readonly above_Kh: number[]
  }
}

/**
 * Hours and degree-hours outside a range that may change by day. A range that moves has null on days
 * without one (an adaptive model outside its limits of validity): those hours are not counted at all,
 * so judge cold months by a fixed range.
 *
 * @param operative_C 8,760 values
 * @param range       by day of the year, [lowest, highest] or null
 */
export function countComfort(
  name: string,
  source: string,
  operative_C: ArrayLike<number>,
  range: (day: number) => readonly [low_C: number, high_C: number] | null,
): ComfortCount {
  const zeros = () => new Array<number>(12).fill(0)
  const month = { hours: zeros(), below_h: zeros(), above_h: zeros(), below_Kh: zeros(), above_Kh: zeros() }
  for (let day = 0; day < DAYS; day++) {
    const limits = range(day)
    if (!limits) continue
    const [low_C, high_C] = limits
    const m = MONTH_OF_HOUR[day * 24]
    month.hours[m] += 24
    for (let hour = day * 24; hour < Math.min(day * 24 + 24, HOURS); hour++) {
      const below_K = low_C - operative_C[hour]
      const above_K = operative_C[hour] - high_C
      if (below_K > 0) {
        month.below_h[m]++
        month.below_Kh[m] += below_K
      }
      if (above_K > 0) {
        month.above_h[m]++
        month.above_Kh[m] += above_K
      }
    }
  }
  const total = (values: number[]) => values.reduce((a, b) => a + b, 0)
  return {
    name,
    source,
    hours: total(month.hours),
    below_h: total(month.below_h),
    above_h: total(month.above_h),
    below_Kh: total(month.below_Kh),
    above_Kh: total(month.above_Kh),
    month,
  }
}

export interface ComfortMeasures {
  readonly fixed: ComfortCount
  /** Each category of each adaptive model. */
  readonly adaptive: ComfortCount[]
}

/**
 * Time outside a fixed range and outside every category of the adaptive models.
 *
 * @param operative_C 8,760 values
 * @param outdoor_C   8,760 values of the climate year
 */
export function comfort(
  operative_C: ArrayLike<number>,
  outdoor_C: ArrayLike<number>,
  fixed: { readonly low_C: number; readonly high_C: number },
): ComfortMeasures {
  const running = runningMeans(outdoor_C)
  const adaptive = [EN_16798, ASHRAE_55].flatMap((model) =>
    model.categories.map((category) =>
      countComfort(`${model.name}, ${category.name}`, model.source, operative_C, (day) => {
        const middle = comfortTemperature(model, running[day])
        return middle === null ? null : [middle - category.below_K, middle + category.above_K]
      }),
    ),
  )
  const range = [fixed.low_C, fixed.high_C] as const
  return {
    fixed: countComfort(`${fixed.low_C} to ${fixed.high_C} °C`, 'as set', operative_C, () => range),
    adaptive,
  }
}
