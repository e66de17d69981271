import { HOUR_S, HOURS, type ClimateYear } from '../climate/climate-year.ts'
import { firstHarmonic, type Harmonic } from '../climate/harmonic.ts'
import type { YearTrace } from '../year/year-trace.ts'
import { dateOfHour, type DayDate } from './months.ts'

/** The first annual harmonic of one series beside those of outdoor air and sun. */
export interface LagLine {
  readonly name: string
  readonly kind: 'outdoor' | 'sun' | 'room' | 'surface' | 'probe'
  /** °C, W/m² for the sun. */
  readonly mean: number
  /** Half the yearly swing of the harmonic [K, W/m² for the sun]. */
  readonly amplitude: number
  /** Days when the harmonic is highest and lowest; they mean little where the amplitude is nothing. */
  readonly warmest: DayDate
  readonly coldest: DayDate
  /** Days later than the outdoor air; negative when earlier. */
  readonly behindAir_d: number
  /** Amplitude over that of the outdoor air. */
  readonly damping: number
  /** Days later than the global horizontal radiation; negative when earlier. */
  readonly behindSun_d: number
  /** Amplitude over that of the radiation [K per W/m²]. */
  readonly perSun: number
}

const YEAR_S = HOURS * HOUR_S

/**
 * How long one harmonic comes after another, in days: positive when it is later. Taken from a
 * quarter year early to three quarters late, since what follows a cause through soil may be half a
 * year late, while a room that the low sun heats may lead the air by some weeks.
 *
 * @returns -91.25 <= days < 273.75
 */
export function lagBehind(series: Harmonic, reference: Harmonic): number {
  const late_s = (((series.warmest_s - reference.warmest_s) % YEAR_S) + YEAR_S) % YEAR_S
  return (late_s >= 0.75 * YEAR_S ? late_s - YEAR_S : late_s) / 86400
}

/**
 * Lag and damping of the room's operative temperature, every face and every temperature probe. Heat
 * probes (names that begin with `heat:`) are left out.
 */
export function lags(trace: YearTrace, climate: ClimateYear): LagLine[] {
  const air = firstHarmonic(climate.outdoor_C)
  // Radiation, room and faces are means of the hour: they stand at its middle.
  const sun = firstHarmonic(climate.global_Wm2, HOUR_S, HOUR_S / 2)
  const line = (name: string, kind: LagLine['kind'], found: Harmonic): LagLine => ({
    name,
    kind,
    mean: found.mean,
    amplitude: found.amplitude,
    warmest: dayOf(found.warmest_s),
    coldest: dayOf(found.coldest_s),
    behindAir_d: lagBehind(found, air),
    damping: found.amplitude / air.amplitude,
    behindSun_d: lagBehind(found, sun),
    perSun: found.amplitude / sun.amplitude,
  })
  return [
    line('outdoor air', 'outdoor', air),
    line('global horizontal radiation', 'sun', sun),
    line('room', 'room', firstHarmonic(trace.operative_C, HOUR_S, HOUR_S / 2)),
    ...trace.surfaces.map((s) => line(s.name, 'surface', firstHarmonic(s.temperature_C, HOUR_S, HOUR_S / 2))),
    ...trace.probes
      .filter((probe) => !probe.name.startsWith('heat:'))
      .map((probe) => line(`${probe.element}: ${probe.name}`, 'probe', firstHarmonic(probe.value))),
  ]
}

function dayOf(time_s: number): DayDate {
  const { month, day } = dateOfHour(Math.min(HOURS - 1, Math.floor(time_s / HOUR_S)))
  return { month, day }
}
