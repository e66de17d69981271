import { describe, expect, test } from 'vitest'
import { evidenceGroups } from '../../server/evidence/index.ts'
import { evidenceInputs } from '../../server/evidence/inputs.ts'

for (const group of evidenceGroups) {
  describe(`evidence, ${group.topic}`, () => {
    const result = group.run(evidenceInputs)
    if ('leftOut' in result) {
      test(`left out: ${result.leftOut}`, () => expect(result.leftOut).not.toBe(''))
      return
    }
    test('has checks, each under an id of its own', () => {
      expect(result.length).toBeGreaterThan(0)
      expect(new Set(result.map((check) => check.id)).size).toBe(result.length)
    })
    for (const check of result.filter((one) => one.weight === 'hard')) {
      test(`${check.id}: ${check.title} (${check.source})`, () => {
        expect(
          check.holds,
          `expected ${check.expected} ± ${check.tolerance} ${check.unit}, computed ${check.computed}`,
        ).toBe(true)
      })
    }
    for (const check of result.filter((one) => one.weight === 'soft')) {
      test(`${check.id} is shown, soft: ${check.title} (${check.source})`, () => {
        expect(Number.isFinite(check.computed)).toBe(true)
      })
    }
  })
}
