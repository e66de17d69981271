import { expect, test } from 'vitest'
import { calibrationChecks } from '../../../server/evidence/calibration.checks.ts'
import { comfortChecks } from '../../../server/evidence/comfort.checks.ts'
import { evidenceInputs } from '../../../server/evidence/inputs.ts'
import { massDepthChecks } from '../../../server/evidence/mass-depth.checks.ts'
import { moistAirChecks } from '../../../server/evidence/moist-air.checks.ts'
import type { Check, CheckGroup } from '../../../server/evidence/check.ts'

const rows = [comfortChecks, moistAirChecks, calibrationChecks, massDepthChecks].flatMap(
  (group: CheckGroup) => {
    const found = group.run(evidenceInputs)
    if ('leftOut' in found) throw new Error(`${group.topic}: ${found.leftOut}`)
    return found as Check[]
  },
)

test('every published check of comfort, moist air, error figures and useful mass holds', () => {
  const failing = rows
    .filter((row) => !row.holds)
    .map((row) => `${row.id}: ${row.computed}, not ${row.expected}`)
  expect(failing).toEqual([])
})

test('no row of those topics was skipped, and no id is given twice', () => {
  expect(rows.length).toBeGreaterThanOrEqual(85)
  expect(new Set(rows.map((row) => row.id)).size).toBe(rows.length)
})
