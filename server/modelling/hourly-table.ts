import type { SoilState } from '#contract/soil.ts'
import type { ClimateYear } from '#engine/climate/climate-year.ts'
import { dateOfHour } from '#engine/measures/months.ts'
import type { YearTrace } from '#engine/year/year-trace.ts'

/**
 * The hours of the repeating year as comma-separated text, SI units in the names of the columns. Flows
 * are means of the hour, temperatures too, but for those of the ground, which stand at its end.
 *
 * @param guess the soil state whose faces, probes and flows are written; the room is there for all states
 */
export function* hourlyRows(
  traces: ReadonlyMap<SoilState, YearTrace>,
  guess: SoilState,
  climate: ClimateYear,
): Generator<string> {
  const own = traces.get(guess) ?? [...traces.values()][0]
  const columns: [name: string, values: Float64Array, digits: number][] = [
    ['outdoor_C', climate.outdoor_C, 2],
    ['global_Wm2', climate.global_Wm2, 0],
    ...[...traces].map(([state, trace]): [string, Float64Array, number] => [
      traces.size > 1 ? `operative_${state}_C` : 'operative_C',
      trace.operative_C,
      3,
    ]),
    ['air_C', own.air_C, 3],
    ['radiant_C', own.radiant_C, 3],
    ['heating_W', own.heating_W, 1],
    ['cooling_W', own.cooling_W, 1],
    ['sun_W', own.solar_W, 1],
    ['gains_W', own.gains_W, 1],
    ['windows_W', own.windows_W, 1],
    ['infiltration_W', own.infiltration_W, 1],
    ['ventilation_W', own.ventilation_W, 1],
    ['flush_W', own.flush_W, 1],
    ...own.surfaces.flatMap(({ name, temperature_C, flow_W }): [string, Float64Array, number][] => [
      [`${name}, face_C`, temperature_C, 3],
      [`${name}, flow_W`, flow_W, 1],
    ]),
    ...own.probes
      .filter(({ name }) => !name.startsWith('heat:'))
      .map(({ name, element, value }): [string, Float64Array, number] => [`${element}: ${name}_C`, value, 3]),
  ]
  yield ['month', 'day', 'hour', ...columns.map(([name]) => quoted(name))].join(',')
  for (let i = 0; i < own.air_C.length; i++) {
    const { month, day, hour } = dateOfHour(i)
    const values = columns.map(([, series, digits]) => String(Number(series[i].toFixed(digits))))
    yield [month, day, hour, ...values].join(',')
  }
}

function quoted(name: string): string {
  return /[",\n]/.test(name) ? `"${name.replace(/"/g, '""')}"` : name
}
