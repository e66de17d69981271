import { execFile } from 'node:child_process'
import { createHash } from 'node:crypto'
import {
  mkdtempSync,
  openSync,
  closeSync,
  ftruncateSync,
  readFileSync,
  readdirSync,
  rmSync,
  writeFileSync,
} from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { readArguments, UsageError } from '../../scripts/simulate/arguments.ts'
import { readOptionFile } from '../../scripts/simulate/option-file.ts'
import { checkTargets, writeWhole } from '../../scripts/simulate/whole-files.ts'
import { loadLibrary } from '../../server/libraries/library.ts'
import { plainOption } from '../contract/plain-option.ts'

const root = fileURLToPath(new URL('../../', import.meta.url))
let folder: string

beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'loamkeep-simulate-'))
})
afterAll(() => rmSync(folder, { recursive: true, force: true }))

interface Ended {
  readonly code: number
  readonly stdout: string
  readonly stderr: string
}

function simulate(...args: string[]): Promise<Ended> {
  return new Promise((resolve) => {
    const command = ['--import', 'tsx', path.join(root, 'scripts/simulate.ts'), ...args]
    execFile(process.execPath, command, { cwd: root, maxBuffer: 1 << 24 }, (error, stdout, stderr) =>
      resolve({ code: error ? Number(error.code) : 0, stdout, stderr }),
    )
  })
}

function file(name: string, text: string): string {
  const target = path.join(folder, name)
  writeFileSync(target, text)
  return target
}

const cell = path.join(root, 'data/examples/cricket-box.json')

/** Runs with both files asked for, and tells that neither they nor anything else was written. */
async function refused(...args: string[]): Promise<string> {
  const before = readdirSync(folder)
  const out = path.join(folder, 'result.json')
  const ended = await simulate(...args, '--out', out, '--hourly', path.join(folder, 'hours.csv'))
  expect(ended.code).toBe(2)
  expect(ended.stdout).toBe('')
  expect(ended.stderr).not.toMatch(/\n\s+at /)
  expect(readdirSync(folder)).toEqual(before)
  return ended.stderr
}

test('a cell’s year: sentences, a table of months, a JSON result and 8,760 hours; again in US units, the files are the same bytes', async () => {
  const out = path.join(folder, 'cell.json')
  const hourly = path.join(folder, 'cell.csv')
  const args = [cell, '--climate', 'denver', '--out', out, '--hourly', hourly]
  const first = await simulate(...args)
  expect(first.stderr).toBe('')
  expect(first.code).toBe(0)
  expect(first.stdout).toMatch(/The room falls to -?[\d.]+ °C on the coldest night \(\d+ \w+\)\./)
  expect(first.stdout).toMatch(/^ {2}January( +-?[\d.]+){5}$/m)
  const result = JSON.parse(readFileSync(out, 'utf8'))
  expect(result.states[0].free.measures.months.operative_C).toHaveLength(12)
  const rows = readFileSync(hourly, 'utf8').trimEnd().split('\n')
  expect(rows).toHaveLength(8761)
  expect(rows[0]).toMatch(/^month,day,hour,outdoor_C,global_Wm2,operative_C/)
  expect(new Set(rows.map((row) => row.match(/,(?=(?:[^"]*"[^"]*")*[^"]*$)/g)!.length)).size).toBe(1)
  expect(readdirSync(folder).filter((name) => name.endsWith('.part'))).toEqual([])

  const digest = (name: string) => createHash('sha256').update(readFileSync(name)).digest('hex')
  const before = [digest(out), digest(hourly)]
  const { stdout } = await simulate(...args, '--units', 'us')
  expect(stdout).toMatch(/The room falls to -?\d+ °F on the coldest night/)
  expect(stdout).not.toMatch(/°C/)
  expect([digest(out), digest(hourly)]).toEqual(before)
})

test('an option with faults is refused with the file, the path into it, the value and what to do', async () => {
  const option = plainOption()
  option.sides[0].berm = { height_m: 2.6, crest_m: 1, runPerRise: 2 }
  const target = file('high-berm.json', JSON.stringify(option))
  const message = await refused(target, '--climate', 'taos')
  expect(message).toBe(
    `${target}: 1 thing is wrong.\n  #/sides/0/berm/height_m: The berm is 2.6 m high, its wall ends 2.5 m above the level ground. Keep the berm at least 0.1 m lower than the wall.\n`,
  )
})

test('a file that is not JSON is refused', async () => {
  const message = await refused(file('text.json', '{ "loamkeep": 1, "name": NaN }'), '--climate', 'taos')
  expect(message).toMatch(/text\.json: 1 thing is wrong\.\n {2}#: This is not JSON: /)
})

test('a file of 200 MB is refused by its size, unread', async () => {
  const target = path.join(folder, 'large.json')
  const handle = openSync(target, 'w')
  ftruncateSync(handle, 200 * 1024 * 1024)
  closeSync(handle)
  expect(await refused(target, '--climate', 'taos')).toMatch(/has 200 MB; an option has at most 5 MB/)
})

test('bytes that are no text, a folder and a missing file are refused', async () => {
  const bytes = path.join(folder, 'bytes.json')
  writeFileSync(bytes, Buffer.from([0x7b, 0xff, 0xfe, 0x7d]))
  const library = loadLibrary()
  await expect(readOptionFile(bytes, library)).rejects.toThrow(/is not text in UTF-8/)
  await expect(readOptionFile(folder, library)).rejects.toThrow(/is not a file/)
  await expect(readOptionFile(path.join(folder, 'none.json'), library)).rejects.toThrow(
    /there is no such file/,
  )
})

test('a climate that is not known, or not a climate, is refused', async () => {
  expect(await refused(cell, '--climate', 'denvr')).toMatch(
    /no built-in climate 'denvr'.*Did you mean denver/,
  )
  expect(await refused(cell, '--climate', file('poem.csv', 'roses,are\nred,1\n'))).toMatch(/\S/)
})

test.each<[args: string[], says: RegExp]>([
  [[], /Which option/],
  [[cell, cell], /one option file; you gave 2/],
  [[cell, '--years', '0', '--from', '10'], /--years must be a whole number from 1 to 30; you gave "0"/],
  [[cell, '--years', '1e1'], /you gave "1e1"/],
  [[cell, '--years', '2', '--from', '13'], /--from must be a month.*"13"/],
  [[cell, '--from', 'May'], /add --years/],
  [[cell, '--units', 'imperial'], /--units must be si or us; you gave "imperial"/],
  [[cell, '--speed', '9'], /--speed/],
  [[cell, '--out', 'a', '--hourly', 'a'], /two different files/],
])('the command line %j is refused with what is wrong', (args, says) => {
  expect(() => readArguments(args)).toThrow(UsageError)
  expect(() => readArguments(args)).toThrow(says)
})

test('months are read by number and by name, long or short', () => {
  const month = (from: string) => {
    const request = readArguments([cell, '--years', '3', '--from', from])
    return 'charging' in request ? request.charging : null
  }
  expect(month('10')).toEqual({ years: 3, month: 10 })
  expect(month('October')).toEqual({ years: 3, month: 10 })
  expect(month('mar')).toEqual({ years: 3, month: 3 })
})

test('results that could not be written are refused before any work is done', async () => {
  const nowhere = path.join(folder, 'nowhere', 'r.json')
  await expect(checkTargets([nowhere])).rejects.toThrow(/there is no folder/)
  await expect(checkTargets([folder])).rejects.toThrow(/not a file that could be written/)
})

test('when the second file fails, the first is not there either', async () => {
  const first = path.join(folder, 'first.json')
  const failing = (function* () {
    yield 'some text'
    throw new RangeError('broken off')
  })()
  const files = [
    { path: first, parts: ['whole'] },
    { path: path.join(folder, 'second.csv'), parts: failing },
  ]
  const before = readdirSync(folder)
  await expect(writeWhole(files)).rejects.toThrow('broken off')
  expect(readdirSync(folder)).toEqual(before)
})
