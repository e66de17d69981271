import { expect, test } from 'vitest'
import { generateYear } from '#engine/climate/generate-year.ts'
import { readTmy3 } from '#engine/climate/tmy3.ts'
import { normalsOf, yearStatistics } from '#engine/climate/year-statistics.ts'
import { climateChecks } from '../../../server/evidence/climate.checks.ts'
import { evidenceInputs } from '../../../server/evidence/inputs.ts'

const hasShared = evidenceInputs.shared('climate/tmy3-725650.csv.gz') !== null

test.each(climateChecks.map((group) => [group.topic, group] as const))(
  'every hard check of "%s" holds and none is skipped',
  (_, group) => {
    const rows = group.run(evidenceInputs)
    if ('leftOut' in rows) {
      expect(hasShared).toBe(false)
      return
    }
    expect(rows.length).toBeGreaterThan(1)
    expect(rows.filter(({ holds, weight }) => weight === 'hard' && !holds)).toEqual([])
    expect(new Set(rows.map(({ id }) => id)).size).toBe(rows.length)
  },
)

test.skipIf(!hasShared).each(['725650', '726580', '723650', '726930'])(
  'station %s: three seeds keep spread, beam share and persistence near the measured year',
  (number) => {
    const measured = readTmy3(evidenceInputs.shared(`climate/tmy3-${number}.csv.gz`) as string)
    const real = yearStatistics(measured)
    for (const seed of [2, 3, 4]) {
      const made = yearStatistics(generateYear({ ...normalsOf(measured), diffuse_kWhm2day: undefined }, seed))
      expect(Math.abs(made.spread_K / real.spread_K - 1)).toBeLessThan(0.2)
      expect(Math.abs(made.beamShare - real.beamShare)).toBeLessThan(0.05)
      expect(Math.abs(made.persistence - real.persistence)).toBeLessThan(0.15)
      expect(Math.abs(made.clearnessSpread / real.clearnessSpread - 1)).toBeLessThan(0.2)
    }
  },
)
