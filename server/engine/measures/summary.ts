import type { ClimateYear } from '../climate/climate-year.ts'
import type { YearTrace } from '../year/year-trace.ts'
import type { HouseModel } from '../zone/house-model.ts'
import { backupHeat, plantUse, type BackupHeat } from './backup-heat.ts'
import { carryOver, type CarryOver } from './carry-over.ts'
import { comfort, type ComfortMeasures } from './comfort.ts'
import { damp, type DampMeasures } from './damp.ts'
import { extremes, type ExtremeMeasures } from './extremes.ts'
import type { Firewood, Fuel } from './firewood.ts'
import { freshAir, type FreshAirMeasures } from './fresh-air.ts'
import { lags, type LagLine } from './lag.ts'
import { ledger, type YearLedger } from './ledger.ts'
import { massDepths, type MassDepth } from './mass-depth.ts'
import { monthlyMeans } from './months.ts'
import { swing, type SwingMeasures } from './swing.ts'

/** Everything the measures want to know beyond trace and climate. */
export interface MeasureSettings {
  /** The house that was simulated, for lengths, volume, windows and layers. */
  readonly model: HouseModel
  readonly people: number
  readonly bedrooms: number
  /** Vapour set free by hour of the day, 24 values [kg/h]. */
  readonly vapour_kgh: readonly number[]
  /** Moisture held by air, things and faces as a multiple of the air alone; 1 for none. */
  readonly vapourBuffer: number
  /** The fixed comfort range. */
  readonly comfort: { readonly low_C: number; readonly high_C: number }
  /** Limits for which hours and days in a row are counted. */
  readonly limits: { readonly below_C: readonly number[]; readonly above_C: readonly number[] }
  readonly fuel: Fuel
  readonly stoveEfficiency: number
  /** Whether the year's end joins its beginning: true for the repeating year, false for a charging year. */
  readonly repeats: boolean
}

/** All measures of one year, plain data. Monthly lists have 12 values, January first. */
export interface YearMeasures {
  readonly months: {
    /** Monthly means of the operative temperature, the outdoor air [°C], and the global radiation [W/m²]. */
    readonly operative_C: number[]
    readonly outdoor_C: number[]
    readonly global_Wm2: number[]
  }
  readonly swing: SwingMeasures
  readonly extremes: ExtremeMeasures
  readonly comfort: ComfortMeasures
  readonly lags: LagLine[]
  readonly ledger: YearLedger
  readonly carryOver: CarryOver | null
  readonly heating: BackupHeat & { readonly firewood: Firewood }
  readonly cooling: BackupHeat
  readonly damp: DampMeasures
  readonly freshAir: FreshAirMeasures
  readonly massDepths: MassDepth[]
}

/**
 * Measures one simulated year. Pure; the answer has no typed arrays and survives JSON.
 *
 * @throws RangeError for settings out of range, naming them
 */
export function measureYear(trace: YearTrace, climate: ClimateYear, settings: MeasureSettings): YearMeasures {
  const { room, elements, windows } = settings.model
  if (settings.vapour_kgh.length !== 24)
    throw new RangeError(`measures: vapour_kgh needs 24 values, got ${settings.vapour_kgh.length}`)
  const order = { firstHour: trace.firstHour, repeats: settings.repeats }
  const length_m = Object.fromEntries(
    elements.filter(({ spec }) => spec.kind === 'section').map(({ name, size }) => [name, size]),
  )
  const shell = new Set(
    elements
      .filter(
        ({ spec, links }) => spec.kind === 'layers' && Object.values(links).some(({ to }) => to !== 'room'),
      )
      .map(({ name }) => name),
  )
  const { fuel, stoveEfficiency } = settings
  return {
    months: {
      operative_C: monthlyMeans(trace.operative_C),
      outdoor_C: monthlyMeans(climate.outdoor_C),
      global_Wm2: monthlyMeans(climate.global_Wm2),
    },
    swing: swing(trace.operative_C),
    extremes: extremes(trace.operative_C, settings.limits, order),
    comfort: comfort(trace.operative_C, climate.outdoor_C, settings.comfort),
    lags: lags(trace, climate),
    ledger: ledger(trace),
    carryOver: carryOver(trace, { length_m, shell, fuel, stoveEfficiency }),
    heating: backupHeat(trace.heating_W, fuel, stoveEfficiency),
    cooling: plantUse(trace.cooling_W),
    damp: damp(
      trace,
      climate,
      { vapour_kgh: settings.vapour_kgh, volume_m3: room.volume_m3, buffer: settings.vapourBuffer },
      windows.map(({ name, glazing }) => ({ name, u_Wm2K: glazing.u_Wm2K })),
    ),
    freshAir: freshAir(trace.outdoorAir_m3s, {
      people: settings.people,
      bedrooms: settings.bedrooms,
      floorArea_m2: room.floorArea_m2,
      volume_m3: room.volume_m3,
    }),
    massDepths: massDepths(settings.model),
  }
}
