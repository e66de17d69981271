import { ClimateFileError } from '#engine/climate/climate-file-error.ts'
import { loadClimate } from '../server/climates/library.ts'
import { loadLibrary } from '../server/libraries/library.ts'
import { OptionError } from '#contract/option-error.ts'
import { answers } from '#modelling/answers.ts'
import { hourlyRows } from '#modelling/hourly-table.ts'
import { optionResult } from '#modelling/option-result.ts'
import { resultTables } from '#modelling/result-tables.ts'
import { siUnits, usUnits } from '#modelling/units.ts'
import { readArguments, UsageError } from './simulate/arguments.ts'
import { readOptionFile } from './simulate/option-file.ts'
import { checkTargets, writeWhole } from './simulate/whole-files.ts'

/** Errors that are about what was handed in; each has a message of its own that says where. */
const isInputFault = (error: unknown): error is Error =>
  error instanceof UsageError ||
  error instanceof OptionError ||
  error instanceof ClimateFileError ||
  error instanceof RangeError

try {
  await main(process.argv.slice(2))
} catch (error) {
  if (!isInputFault(error)) {
    process.stderr.write(`simulate stopped on a fault of its own: ${(error as Error)?.stack ?? error}\n`)
    process.exitCode = 1
  } else {
    process.stderr.write(`${error.message}\n`)
    process.exitCode = 2
  }
}

async function main(args: readonly string[]): Promise<void> {
  const request = readArguments(args)
  if ('help' in request) {
    process.stdout.write(`${request.help}\n`)
    return
  }
  const { optionFile, out, hourly, charging } = request
  const targets = [out, hourly].filter((path) => path !== undefined)
  await checkTargets(targets)
  const library = loadLibrary()
  const option = await readOptionFile(optionFile, library)
  const name = request.climate ?? option.climate
  if (name === undefined)
    throw new UsageError('Which climate? The option names none: add --climate with a file or a name.')
  const climate = await loadClimate(name)
  const units = request.units === 'us' ? await usUnits() : siUnits

  const { result, traces } = optionResult(option, library, climate, { charging })
  const said = answers(result, option, units)

  await writeWhole([
    ...(out === undefined
      ? []
      : [
          {
            path: out,
            parts: [`${JSON.stringify({ ...result, answers: answers(result, option, siUnits) })}\n`],
          },
        ]),
    ...(hourly === undefined
      ? []
      : [{ path: hourly, parts: lines(hourlyRows(traces, result.guess, climate)) }]),
  ])
  const place = result.option.place ? `, ${result.option.place}` : ''
  const told = [
    `${result.option.name}${place}`,
    `Climate: ${climate.place.name}. ${climate.source}`,
    ...(result.hasGround ? [`Told for ${result.guess} soil, the state you expect.`] : []),
    '',
    ...said.filter(({ kind }) => kind === 'answer').map(({ text }) => text),
    '',
    ...said.filter(({ kind }) => kind === 'caution').map(({ text }) => `Caution. ${text}`),
    '',
    ...resultTables(result, units),
    '',
    'One room; heat conduction only in soil, without moving water or freezing; soil the same all year.',
    'Computed figures are estimates: read dry, damp and wet together.',
    ...targets.map((path) => `Written: ${path}`),
  ]
  process.stdout.write(`${told.join('\n')}\n`)
}

function* lines(rows: Iterable<string>): Generator<string> {
  for (const row of rows) yield `${row}\n`
}
