import { HOURS, type ClimateYear } from '../climate/climate-year.ts'
import type { YearTrace } from '../year/year-trace.ts'
import { indoorVapour, type VapourSources } from './indoor-vapour.ts'
import { dewPointIso13788, saturationPressureIso13788, vapourPressureOfDewPoint } from './moist-air.ts'
import { MONTH_OF_HOUR, monthlyMeans } from './months.ts'

/** Monthly mean humidity at a surface above which mould may grow (ISO 13788, 5.2). */
export const MOULD_HUMIDITY = 0.8

/** Lowest surface temperature [°C] at which a vapour pressure gives no more than a humidity (ISO 13788, 5.3). */
export function minimumSurface(vapour_Pa: number, humidity = MOULD_HUMIDITY): number {
  return dewPointIso13788(vapour_Pa / humidity)
}

/**
 * Temperature factor fRsi = (θsi - θe) / (θi - θe) (ISO 13788, 3.1); null where indoors and outdoors
 * are less than 5 K apart, since it means nothing there.
 */
export function temperatureFactor(surface_C: number, indoor_C: number, outdoor_C: number): number | null {
  const difference_K = indoor_C - outdoor_C
  return difference_K < 5 ? null : (surface_C - outdoor_C) / difference_K
}

/** Hours of each month, 12 values. */
export interface DampHours {
  /** Face at or below the dew point of the air. */
  readonly condensation_h: number[]
  /** Humidity at the face above 80 %. */
  readonly over80_h: number[]
  /** Monthly mean vapour pressure over saturation at the monthly mean face temperature; 0.8 = 80 %. */
  readonly humidity: number[]
}

export interface DampSurface {
  readonly name: string
  /** Element of the house; the window itself for glass. */
  readonly element: string
  readonly part: 'floor' | 'wall' | 'ceiling' | 'mass' | 'glass'
  /** With the sources and the air flow of the run. */
  readonly closed: DampHours
  /** With windows wide open: the air at the face carries the outdoor vapour; the face is as cool as in the run. */
  readonly aired: DampHours
  /** Temperature factor from monthly means, and the least one that keeps 80 %; null where indoors is less than 5 K warmer. */
  readonly fRsi: (number | null)[]
  readonly fRsiMin: (number | null)[]
  /** Months (1 to 12) that miss the criterion: 80 % at a face, 100 % at glass. */
  readonly flaggedClosed: number[]
  readonly flaggedAired: number[]
}

export interface DampMeasures {
  readonly indoor: {
    /** Monthly means: vapour pressure [Pa], humidity of the room air (0 to 1), dew point [°C]. */
    readonly vapour_Pa: number[]
    readonly humidity: number[]
    readonly dewPoint_C: number[]
    /** Hours of the year with room air above 70 %. */
    readonly over70_h: number
  }
  readonly outdoorDewPoint_C: number[]
  readonly surfaces: DampSurface[]
  /** Months (1 to 12) in which some face misses its criterion, with the names of those faces. */
  readonly flagged: { readonly month: number; readonly closed: string[]; readonly aired: string[] }[]
  /** The opaque face and month nearest to, or furthest beyond, the limit. */
  readonly worst: {
    readonly surface: string
    readonly month: number
    readonly humidity: number
    readonly when: 'closed' | 'aired'
  } | null
}

/** An opening whose inner face is found from its U-value. */
export interface GlassFace {
  readonly name: string
  readonly u_Wm2K: number
}

/** Inner surface resistance for glass (ISO 13788, 4.4.1) [m² K/W]. */
const GLASS_RSI = 0.13

/**
 * Damp at every face of the room: hours of condensation, hours above 80 %, and the monthly mean
 * criterion of ISO 13788:2012 (clause 5, from memory), for the house as it was run ("closed") and with
 * outdoor air at its faces ("aired": will it sweat in a humid summer?).
 *
 * @param glass windows by name; face = air - U · 0.13 · (air - outdoor), shutters left out
 */
export function damp(
  trace: YearTrace,
  climate: ClimateYear,
  sources: VapourSources,
  glass: readonly GlassFace[] = [],
): DampMeasures {
  const closed_Pa = indoorVapour(trace.air_C, trace.outdoorAir_m3s, climate, sources, trace.firstHour)
  const aired_Pa = climate.dewPoint_C.map(vapourPressureOfDewPoint)
  const indoor_C = monthlyMeans(trace.air_C)
  const outdoor_C = monthlyMeans(climate.outdoor_C)
  const closedMean_Pa = monthlyMeans(closed_Pa)

  const faces = [
    ...trace.surfaces.map(({ name, element, part, temperature_C }) => ({
      name,
      element,
      part,
      temperature_C,
    })),
    ...glass.map(({ name, u_Wm2K }) => ({
      name,
      element: name,
      part: 'glass' as const,
      temperature_C: trace.air_C.map(
        (air_C, i) => air_C - u_Wm2K * GLASS_RSI * (air_C - climate.outdoor_C[i]),
      ),
    })),
  ]
  const surfaces = faces.map((face): DampSurface => {
    const mean_C = monthlyMeans(face.temperature_C)
    const limit = face.part === 'glass' ? 1 : MOULD_HUMIDITY
    const saturation_Pa = face.temperature_C.map(saturationPressureIso13788)
    const closed = dampHours(closed_Pa, saturation_Pa, mean_C)
    const aired = dampHours(aired_Pa, saturation_Pa, mean_C)
    return {
      name: face.name,
      element: face.element,
      part: face.part,
      closed,
      aired,
      fRsi: mean_C.map((surface_C, m) => temperatureFactor(surface_C, indoor_C[m], outdoor_C[m])),
      fRsiMin: closedMean_Pa.map((vapour_Pa, m) =>
        temperatureFactor(minimumSurface(vapour_Pa, limit), indoor_C[m], outdoor_C[m]),
      ),
      flaggedClosed: monthsAbove(closed.humidity, limit),
      flaggedAired: monthsAbove(aired.humidity, limit),
    }
  })

  let over70_h = 0
  const airHumidity = closed_Pa.map((vapour_Pa, i) => vapour_Pa / saturationPressureIso13788(trace.air_C[i]))
  for (let hour = 0; hour < HOURS; hour++) if (airHumidity[hour] > 0.7) over70_h++
  return {
    indoor: {
      vapour_Pa: closedMean_Pa,
      humidity: monthlyMeans(airHumidity),
      dewPoint_C: closedMean_Pa.map(dewPointIso13788),
      over70_h,
    },
    outdoorDewPoint_C: monthlyMeans(climate.dewPoint_C),
    surfaces,
    flagged: flaggedMonths(surfaces),
    worst: worstOf(surfaces),
  }
}

function dampHours(
  vapour_Pa: Float64Array,
  saturation_Pa: Float64Array,
  mean_C: readonly number[],
): DampHours {
  const condensation_h = new Array<number>(12).fill(0)
  const over80_h = new Array<number>(12).fill(0)
  for (let hour = 0; hour < HOURS; hour++) {
    const humidity = vapour_Pa[hour] / saturation_Pa[hour]
    if (humidity > MOULD_HUMIDITY) over80_h[MONTH_OF_HOUR[hour]]++
    if (humidity >= 1) condensation_h[MONTH_OF_HOUR[hour]]++
  }
  const humidity = monthlyMeans(vapour_Pa).map(
    (mean_Pa, m) => mean_Pa / saturationPressureIso13788(mean_C[m]),
  )
  return { condensation_h, over80_h, humidity }
}

function monthsAbove(humidity: readonly number[], limit: number): number[] {
  return humidity.flatMap((value, m) => (value > limit ? [m + 1] : []))
}

function worstOf(surfaces: readonly DampSurface[]): DampMeasures['worst'] {
  let worst: DampMeasures['worst'] = null
  for (const surface of surfaces) {
    if (surface.part === 'glass') continue
    for (const when of ['closed', 'aired'] as const)
      surface[when].humidity.forEach((humidity, m) => {
        if (worst === null || humidity > worst.humidity)
          worst = { surface: surface.name, month: m + 1, humidity, when }
      })
  }
  return worst
}

function flaggedMonths(surfaces: readonly DampSurface[]): DampMeasures['flagged'] {
  return Array.from({ length: 12 }, (_, m) => {
    const names = (when: 'flaggedClosed' | 'flaggedAired') =>
      surfaces.filter((surface) => surface[when].includes(m + 1)).map((surface) => surface.name)
    return { month: m + 1, closed: names('flaggedClosed'), aired: names('flaggedAired') }
  }).filter(({ closed, aired }) => closed.length + aired.length > 0)
}
