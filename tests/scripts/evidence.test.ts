import { spawnSync } from 'node:child_process'
import { fileURLToPath } from 'node:url'
import { expect, test } from 'vitest'
import { check } from '../../server/evidence/check.ts'

const root = fileURLToPath(new URL('../..', import.meta.url))

test('evidence --json prints an array of checks with all their fields, and ends with 0 when the hard ones hold', () => {
  const done = spawnSync(
    process.execPath,
    ['--import', 'tsx', 'scripts/evidence.ts', '--json', '--topic', 'error figures'],
    { cwd: root, encoding: 'utf8' },
  )
  expect(done.status).toBe(0)
  const rows = JSON.parse(done.stdout) as Record<string, unknown>[]
  expect(rows.length).toBeGreaterThan(3)
  const fields = ['id', 'title', 'source', 'provenance', 'unit', 'expected', 'tolerance', 'computed', 'holds']
  for (const row of rows) for (const field of fields) expect(row).toHaveProperty(field)
})

const row = {
  id: 'X',
  title: 'x',
  source: 'x',
  provenance: 'derived',
  unit: 'K',
  tolerance: 0.5,
} as const

test('a check holds within its tolerance of a value or a range, and never for what is no number', () => {
  expect(check({ ...row, expected: 3, computed: 3.5 }).holds).toBe(true)
  expect(check({ ...row, expected: 3, computed: 3.51 }).holds).toBe(false)
  expect(check({ ...row, expected: [1, 2], computed: 0.5 }).holds).toBe(true)
  expect(check({ ...row, expected: [1, 2], computed: 2.6 }).holds).toBe(false)
  expect(check({ ...row, expected: 3, computed: NaN }).holds).toBe(false)
})
