import { loadLibrary } from '../libraries/library.ts'
import { check, type Check, type CheckGroup } from './check.ts'
import { readDeepSoil, type DeepSoil } from './parts/deep-soil.ts'
import { fitColumn, runColumn, seriesError, worstError } from './parts/ground-column.ts'
import { readSoilStations } from './parts/soil-stations.ts'
import { daysLater, waveOfDays } from './parts/soil-wave.ts'
import { meanSize, stationErrors, worstSize, type StationError } from './parts/station-errors.ts'
import { waveFromWeather, weatherOfDays } from './parts/surface-balance.ts'

const STATIONS = 'measured/uscrn-2020-daily-30-stations.csv.gz'
const FARGO = 'measured/fargo-deep-soil-2014-2018.csv.gz'

/** The conduction model against thermometers in real soil. */
export const measuredSoilChecks: CheckGroup = {
  topic: 'Measured soil',
  run: (inputs) => {
    const stations = inputs.shared(STATIONS)
    const fargo = inputs.shared(FARGO)
    if (stations === null || fargo === null)
      return { leftOut: 'the measurements lie in the shared folder beside the project, which is not here' }
    const errors = stationErrors(readSoilStations(stations))
    return [...stationChecks(errors), ...surfaceChecks(errors), ...fargoChecks(readDeepSoil(fargo))]
  },
}

function stationChecks(all: readonly StationError[]): Check[] {
  const warm = all.filter((one) => one.isWarm)
  const frozen = all.filter((one) => !one.isWarm)
  return [
    ...stationRows('warm', `${warm.length} stations without frost in the soil or lasting snow`, warm),
    ...stationRows('frozen', `${frozen.length} stations with frozen soil or lasting snow`, frozen),
  ]
}

const STATION_NOTE =
  'First harmonic of daily means, 29 February left out; one diffusivity for each station fitted from 5 to 50 cm. ' +
  'Tolerance: soil twice as conductive below 50 cm makes 7 % of the amplitude (0.6 K) and 4 days; a year that ends warmer than it began 0.3 K and 2 days; half of that on average.'

function stationRows(id: string, who: string, errors: readonly StationError[]): Check[] {
  const amplitude = errors.map((one) => one.amplitude_K)
  const delay = errors.map((one) => one.delay_d)
  const row = (name: string, title: string, unit: string, tolerance: number, computed: number) =>
    check({
      id: `USCRN/${id}/${name}`,
      title: `${title}, ${who}`,
      source: 'U.S. Climate Reference Network, daily soil temperature 2020 (NOAA)',
      provenance: 'looked up',
      unit,
      expected: 0,
      tolerance,
      computed,
      weight: 'soft',
      note: STATION_NOTE,
    })
  return [
    row('amplitude-mean', 'Amplitude of the year at 100 cm: mean error', 'K', 0.5, meanSize(amplitude)),
    row('amplitude-worst', 'Amplitude of the year at 100 cm: worst error', 'K', 0.9, worstSize(amplitude)),
    row('delay-mean', 'Delay of the year at 100 cm: mean error', 'd', 3, meanSize(delay)),
    row('delay-worst', 'Delay of the year at 100 cm: worst error', 'd', 6, worstSize(delay)),
    row(
      'mean',
      'Yearly mean at 100 cm against that at 5 cm, alike at all depths in the model: mean difference',
      'K',
      0.5,
      meanSize(errors.map((one) => one.mean_K)),
    ),
  ]
}

/** Below this much rain and snow a year the ground counts as dry grass, otherwise as green [mm]. */
const STEPPE_MM = 400
const SOIL = { name: 'soil', conductivity_WmK: 1, volumetricHeat_Jm3K: 2e6 }

/** The wave at 5 cm from air, sun and sky alone, against the thermometers there. */
function surfaceChecks(all: readonly StationError[]): Check[] {
  const { covers } = loadLibrary()
  const errors = all
    .filter(({ station }) => station.humidity_pct !== null)
    .map(({ station, isWarm }) => {
      const cover = covers.get(station.rain_mm < STEPPE_MM ? 'dry_grass' : 'grass')
      if (!cover) throw new RangeError('There is no grass among the covers.')
      const measured = waveOfDays(station.soil_C[0])
      const computed = waveFromWeather(weatherOfDays(station), cover, SOIL, 0.05)
      return {
        isWarm,
        mean_K: computed.mean - measured.mean,
        amplitude_K: computed.amplitude - measured.amplitude,
        delay_d: daysLater(computed, measured),
      }
    })
  const warm = errors.filter((one) => one.isWarm)
  const frozen = errors.filter((one) => !one.isWarm)
  const note =
    'Daily means suffice, for the balance is linear. Covers with their typical properties: dry grass below 400 mm of rain, grass above. ' +
    'Tolerance: the span of the share of sun that evaporates moves the mean by 1.2 K and the amplitude by 0.6 K. Green leaves shade and evaporate most in summer, which one share for all the year leaves out.'
  const row = (name: string, title: string, unit: string, tolerance: number, computed: number) =>
    check({
      id: `USCRN/surface/${name}`,
      title,
      source: 'U.S. Climate Reference Network, daily air, sun, humidity and soil at 5 cm, 2020 (NOAA)',
      provenance: 'looked up',
      unit,
      expected: 0,
      tolerance,
      computed,
      weight: 'soft',
      note,
    })
  const without = `${warm.length} stations without frost or snow`
  return [
    row(
      'mean',
      `Yearly mean at 5 cm from air, sun and sky: mean error, ${without}`,
      'K',
      1.2,
      meanSize(warm.map((one) => one.mean_K)),
    ),
    row(
      'mean-worst',
      `Yearly mean at 5 cm from air, sun and sky: worst error, ${without}`,
      'K',
      2.4,
      worstSize(warm.map((one) => one.mean_K)),
    ),
    row(
      'amplitude',
      `Amplitude of the year at 5 cm from air, sun and sky: mean error, ${without}`,
      'K',
      0.6,
      meanSize(warm.map((one) => one.amplitude_K)),
    ),
    row(
      'delay',
      `Day of the coldest at 5 cm from air, sun and sky: mean error, ${without}`,
      'd',
      3,
      meanSize(warm.map((one) => one.delay_d)),
    ),
    row(
      'amplitude-snow',
      `Amplitude of the year at 5 cm from air, sun and sky: mean error under snow and frost, ${frozen.length} stations`,
      'K',
      0.6,
      meanSize(frozen.map((one) => one.amplitude_K)),
    ),
  ]
}

const YEAR_H = 8760
/** The years begin in October: the first settles the start, the second is fitted, the last two are judged. */
const FITTED_YEAR = [YEAR_H, 2 * YEAR_H] as const
const JUDGED_YEARS = [2 * YEAR_H, 4 * YEAR_H] as const

/** Measured soil at 5 cm drives a column of one diffusivity; all below is computed and compared. */
function fargoChecks(measured: DeepSoil): Check[] {
  const diffusivity_m2s = fitColumn(measured, ...FITTED_YEAR)
  const { soil_C } = runColumn(measured, diffusivity_m2s)
  const isSummer = (hour: number) => measured.month[hour] >= 5 && measured.month[hour] <= 10
  const isFrozen = (hour: number) => !isSummer(hour)
  const errors = (counts?: (hour: number) => boolean) =>
    soil_C.map((series, i) => seriesError(series, measured.soil_C[i + 1], ...JUDGED_YEARS, counts))
  const whole = errors()
  const summer = errors(isSummer)
  const frozen = errors(isFrozen)
  const overall = (some: typeof whole) =>
    Math.sqrt(some.reduce((sum, { rmse_K }) => sum + rmse_K ** 2, 0) / some.length)
  const bias = (some: typeof whole) => some.reduce((sum, { bias_K }) => sum + bias_K, 0) / some.length
  const at = (depth_m: number) => measured.depth_m.indexOf(depth_m) - 1
  const halfMetre = at(0.5)
  const worst = (counts: (hour: number) => boolean) =>
    worstError(soil_C[halfMetre], measured.soil_C[halfMetre + 1], ...JUDGED_YEARS, counts)
  const row = (
    name: string,
    title: string,
    expected: number | readonly [number, number],
    tolerance: number,
    computed: number,
    note?: string,
  ) =>
    check({
      id: `FARGO/${name}`,
      title,
      source: 'Fargo, North Dakota, hourly soil temperature, October 2016 to September 2018',
      provenance: 'looked up',
      unit: 'K',
      expected,
      tolerance,
      computed,
      weight: 'soft',
      note,
    })
  const usual =
    'One diffusivity, fitted on the year before; usual target for loggers: 1 to 1.5 K (common practice).'
  return [
    check({
      id: 'FARGO/diffusivity',
      title: 'Diffusivity that follows a year of hours best, all depths',
      source:
        'Fargo, North Dakota, yearly waves of four years: 5 to 50 cm by phase, below 45 cm by amplitude',
      provenance: 'derived',
      unit: '1e-7 m²/s',
      expected: [1.8, 3.9],
      tolerance: 0,
      computed: diffusivity_m2s * 1e7,
      weight: 'soft',
      note: 'October 2015 to September 2016. One number for a soil whose upper half metre follows more slowly than what lies below.',
    }),
    ...[0.1, 0.5, 1, 2.25].map((depth_m) =>
      row(
        `rmse-${Math.round(depth_m * 100)}cm`,
        `Root mean square error at ${Math.round(depth_m * 100)} cm, driven from 5 cm, two judged years`,
        [0, 1.5],
        0,
        whole[at(depth_m)].rmse_K,
        usual,
      ),
    ),
    row(
      'bias',
      'Mean error of all depths from 10 to 225 cm, two judged years',
      0,
      0.8,
      bias(whole),
      'Tolerance: the yearly mean falls by 0.5 K from 5 to 225 cm in the measurements, which steady conduction cannot do, and thermometers are good to 0.3 K.',
    ),
    row(
      'rmse-summer',
      'Root mean square error of all depths, May to October',
      [0, 1.5],
      0,
      overall(summer),
      usual,
    ),
    row(
      'rmse-frozen',
      'Root mean square error of all depths, November to April, when the soil freezes and thaws',
      [0, 1.5],
      0,
      overall(frozen),
      usual,
    ),
    row(
      'worst-summer',
      'Largest error of an hour at 50 cm, May to October',
      [0, 3],
      0,
      worst(isSummer),
      'Tolerance: twice the usual target. The worst hour is the first of May: the rest of the thaw.',
    ),
    row(
      'worst-frozen',
      'Largest error of an hour at 50 cm, November to April: what freezing and thawing cost at most',
      [0, 3],
      0,
      worst(isFrozen),
      'Tolerance: twice the usual target. Thawing soil stays at 0 °C for weeks in April; latent heat is outside the model.',
    ),
  ]
}
