import { errorFigures } from '#engine/measures/errors.ts'
import { check, type CheckGroup } from './check.ts'

/** Error figures of measured against simulated series. */
export const calibrationChecks: CheckGroup = {
  topic: 'Error figures',
  run: (inputs) => {
    const rows = inputs.published('guideline14-sample.csv')
    const measured = rows.map((row) => Number(row.measured))
    const simulated = rows.map((row) => Number(row.simulated))
    const source = 'ASHRAE Guideline 14-2014 and 2002, section 5 ((n - p) from memory)'
    const sample = ([1, 0] as const).flatMap((p) => {
      const found = errorFigures(measured, simulated, p)
      const figures = [
        ['NMBE', found.nmbe_pct, p === 1 ? -1.1157 : -1.0227],
        ['CV(RMSE)', found.cvRmse_pct, p === 1 ? 3.8788 : 3.7137],
      ] as const
      return figures.map(([name, computed, expected]) =>
        check({
          id: `CAL-02/p${p}/${name}`,
          title: `${name} of a sample of twelve months, p = ${p}`,
          source,
          provenance: 'derived',
          unit: '%',
          expected,
          tolerance: 1e-4,
          computed: computed ?? NaN,
          note: 'Measured minus simulated.',
        }),
      )
    })
    // Four months, all 5 % of the mean too low: by hand NMBE = 4 · 5 / (3 · 100), CV = √(4 · 25 / 3) / 100.
    const low = errorFigures([100, 100, 100, 100], [95, 95, 95, 95], 1)
    const byHand = [
      ['NMBE', low.nmbe_pct, 20 / 3],
      ['CV(RMSE)', low.cvRmse_pct, Math.sqrt(100 / 3)],
    ] as const
    return [
      ...byHand.map(([name, computed, expected]) =>
        check({
          id: `CAL-01/${name}`,
          title: `${name} of four months that are simulated 5 % low, by hand`,
          source,
          provenance: 'derived',
          unit: '%',
          expected,
          tolerance: 1e-9,
          computed: computed ?? NaN,
          note: 'Positive when the simulation is too low.',
        }),
      ),
      ...sample,
    ]
  },
}
