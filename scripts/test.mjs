// Type-check, lint, format check and every test; the last line is `tests: N passed, N failed`.
// Plain Node, so that a fresh clone needs nothing but Node.js and npm. Arguments go to Vitest.
import { spawnSync } from 'node:child_process'
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { installPackages, root } from './install-packages.mjs'

installPackages()
const filter = process.argv.slice(2)
const bin = (name) => path.join(root, 'node_modules', '.bin', name)
const run = (title, command, args) => {
  process.stdout.write(`\n— ${title}\n`)
  return (
    spawnSync(command, args, { cwd: root, stdio: 'inherit', shell: process.platform === 'win32' }).status ===
    0
  )
}

let passed = 0
let failed = 0
const count = (ok) => (ok ? passed++ : failed++)
if (filter.length === 0) {
  count(run('types', bin('tsc'), ['--noEmit']))
  count(
    run('types of the engine, without Node and DOM', bin('tsc'), [
      '--noEmit',
      '-p',
      'server/engine/tsconfig.json',
    ]),
  )
  count(run('lint', bin('eslint'), ['.', '--max-warnings', '0']))
  count(run('format', bin('prettier'), ['--check', '.', '--log-level', 'warn']))
}

const folder = mkdtempSync(path.join(tmpdir(), 'loamkeep-tests-'))
const report = path.join(folder, 'report.json')
const green = run('tests', bin('vitest'), [
  'run',
  '--reporter=default',
  '--reporter=json',
  `--outputFile.json=${report}`,
  ...filter,
])
if (existsSync(report)) {
  const result = JSON.parse(readFileSync(report, 'utf8'))
  passed += result.numPassedTests
  failed += result.numFailedTests
  // A file that cannot be loaded has no failed test of its own.
  failed += result.testResults.filter(
    (file) => file.status === 'failed' && file.assertionResults.length === 0,
  ).length
}
if (!green && failed === 0) failed = 1
rmSync(folder, { recursive: true, force: true })
process.stdout.write(`\ntests: ${passed} passed, ${failed} failed\n`)
process.exit(failed === 0 ? 0 : 1)
