import { daysLater, waveBelow } from './parts/soil-wave.ts'
import { check, type CheckGroup } from './check.ts'

const DAY_S = 86400

/** The undisturbed ground against fitted waves of four measured years. */
export const soilWaveChecks: CheckGroup = {
  topic: 'Yearly wave by depth in measured soil',
  run: (inputs) => {
    const rows = inputs.published('fargo-soil-waves.csv')
    const waveAt = (depth_m: number) => {
      const row = rows.find((one) => Number(one.depth_m) === depth_m)
      if (!row) throw new RangeError(`fargo-soil-waves.csv has no row for ${depth_m} m.`)
      const coldest_s = Number(row.coldest_day) * DAY_S
      return {
        mean: 7.8,
        amplitude: Number(row.amplitude_K),
        coldest_s,
        warmest_s: coldest_s + 182.5 * DAY_S,
      }
    }
    const source =
      'Fargo, North Dakota, hourly soil temperature 2014 to 2018, first harmonic; T. Kusuda and P. R. Achenbach 1965'
    const note =
      'Anchored at 50 cm with one diffusivity, 3.6e-7 m²/s. Tolerance: a thermometer 2 cm off its depth and a soil whose diffusivity changes by a tenth below 50 cm make 0.3 K and 3 days at 2 m.'
    return [1, 1.5, 2].flatMap((depth_m) => {
      const measured = waveAt(depth_m)
      const computed = waveBelow(waveAt(0.5), 0.5, depth_m, 3.6e-7)
      const place = `${depth_m * 100} cm`
      return [
        check({
          id: `FARGO-WAVE/${place}/amplitude`,
          title: `Amplitude of the year at ${place}, carried down from 50 cm`,
          source,
          provenance: 'derived',
          unit: 'K',
          expected: measured.amplitude,
          tolerance: 0.5,
          computed: computed.amplitude,
          note,
        }),
        check({
          id: `FARGO-WAVE/${place}/coldest`,
          title: `Day on which ${place} is coldest, carried down from 50 cm`,
          source,
          provenance: 'derived',
          unit: 'd',
          expected: measured.coldest_s / DAY_S,
          tolerance: 3,
          computed: measured.coldest_s / DAY_S + daysLater(computed, measured),
          note,
        }),
      ]
    })
  },
}
