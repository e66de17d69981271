import { check, type Check, type CheckGroup } from './check.ts'
import { readSoilStations } from './parts/soil-stations.ts'
import { meanSize, stationErrors, worstSize, type StationError } from './parts/station-errors.ts'

const STATIONS = 'measured/uscrn-2020-daily-30-stations.csv.gz'

/** The conduction model against thermometers in real soil. */
export const measuredSoilChecks: CheckGroup = {
  topic: 'Measured soil',
  run: (inputs) => {
    const stations = inputs.shared(STATIONS)
    if (stations === null)
      return { leftOut: 'the measurements lie in the shared folder beside the project, which is not here' }
    return stationChecks(stationErrors(readSoilStations(stations)))
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
