import { parseArgs } from 'node:util'
import type { Check } from '../server/evidence/check.ts'
import { evidenceGroups } from '../server/evidence/index.ts'
import { evidenceInputs } from '../server/evidence/inputs.ts'

const usage = `npm run -s evidence -- [--json] [--topic NAME]
Runs every published check: what, source, expected, tolerance, computed, holds or not.
Ends with code 1 if a hard check does not hold.`

const { values } = parseArgs({
  options: { json: { type: 'boolean' }, topic: { type: 'string' }, help: { type: 'boolean' } },
})
if (values.help) {
  console.log(usage)
  process.exit(0)
}

const all: Check[] = []
const leftOut: string[] = []
const wanted = values.topic?.toLowerCase()
for (const group of evidenceGroups) {
  if (wanted && !group.topic.toLowerCase().includes(wanted)) continue
  const result = group.run(evidenceInputs)
  const checks = 'leftOut' in result ? [] : result
  if ('leftOut' in result) leftOut.push(`${group.topic}: left out, ${result.leftOut}`)
  all.push(...checks)
  if (values.json) continue
  console.log(`\n${group.topic}`)
  if ('leftOut' in result) console.log(`  left out: ${result.leftOut}`)
  for (const check of checks) console.log(line(check))
}

const failed = all.filter((check) => !check.holds && check.weight === 'hard')
const parted = all.filter((check) => !check.holds && check.weight === 'soft')
if (values.json) {
  console.log(JSON.stringify(all, null, 2))
  for (const reason of leftOut) console.error(reason)
} else {
  const held = all.length - failed.length - parted.length
  console.log(
    `\n${all.length} checks: ${held} hold, ${failed.length} do not, ${parted.length} soft ones part from the published value`,
  )
}
process.exitCode = failed.length > 0 ? 1 : 0

function line(check: Check): string {
  const mark = check.holds ? 'holds ' : check.weight === 'hard' ? 'FAILS ' : 'parts '
  const expected =
    typeof check.expected === 'number'
      ? short(check.expected)
      : `${short(check.expected[0])} to ${short(check.expected[1])}`
  const figures = `expected ${expected} ± ${short(check.tolerance)} ${check.unit}, computed ${short(check.computed)}`
  const soft = check.weight === 'soft' ? ', soft' : ''
  const note = check.note ? `\n         ${check.note}` : ''
  return `  ${mark} ${check.id}  ${check.title}\n         ${figures}  [${check.source}; ${check.provenance}${soft}]${note}`
}

/** Five significant digits, without a tail of zeros. */
function short(value: number): string {
  return Number.isFinite(value) ? String(Number(value.toPrecision(5))) : String(value)
}
