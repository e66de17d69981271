import { parseArgs } from 'node:util'

const USAGE = `npm run -s simulate -- OPTION.json [--climate FILE-OR-NAME] [--years N --from MONTH]
    [--out result.json] [--hourly hours.csv] [--units si|us]

Simulates the year of one option of a house for dry, damp and wet soil.
  --climate  a .csv or .csv.gz file of hours, or the name of a built-in climate; by default the option's own
  --years    also the first N years after building (1 to 30), finished at the start of
  --from     this month, 1 to 12 or its name; by default October
  --out      writes the whole result as JSON
  --hourly   writes the hours of the year as CSV
  --units    si or us, for what is printed; files are in SI units`

const MONTHS = 'january february march april may june july august september october november december'.split(
  ' ',
)

/** The command line cannot be used. */
export class UsageError extends Error {}

export interface Request {
  readonly optionFile: string
  readonly climate: string | undefined
  readonly charging: { readonly month: number; readonly years: number } | null
  readonly out: string | undefined
  readonly hourly: string | undefined
  readonly units: 'si' | 'us'
}

/** @throws UsageError with what is wrong and, where it helps, the usage */
export function readArguments(args: readonly string[]): Request | { readonly help: string } {
  const { values, positionals } = parsed(args)
  if (values.help) return { help: USAGE }
  if (positionals.length !== 1)
    throw new UsageError(
      positionals.length === 0
        ? `Which option? Give its file.\n\n${USAGE}`
        : `Give one option file; you gave ${positionals.length}: ${positionals.join(', ')}.`,
    )
  const { units = 'si', climate, out, hourly } = values
  if (units !== 'si' && units !== 'us') throw new UsageError(`--units must be si or us; you gave "${units}".`)
  for (const [name, value] of Object.entries({ climate, out, hourly }))
    if (value === '') throw new UsageError(`--${name} needs a value.`)
  if (out !== undefined && out === hourly)
    throw new UsageError('--out and --hourly must be two different files.')
  return { optionFile: positionals[0], climate, charging: charging(values), out, hourly, units }
}

function parsed(args: readonly string[]) {
  try {
    return parseArgs({
      args: [...args],
      allowPositionals: true,
      options: {
        climate: { type: 'string' },
        years: { type: 'string' },
        from: { type: 'string' },
        out: { type: 'string' },
        hourly: { type: 'string' },
        units: { type: 'string' },
        help: { type: 'boolean', short: 'h' },
      },
    })
  } catch (error) {
    throw new UsageError(`${(error as Error).message}\n\n${USAGE}`)
  }
}

function charging({ years, from }: { years?: string; from?: string }): Request['charging'] {
  if (years === undefined && from === undefined) return null
  if (years === undefined) throw new UsageError('--from says when the house is finished; add --years N.')
  const count = /^\d{1,3}$/.test(years) ? Number(years) : NaN
  if (!(count >= 1 && count <= 30))
    throw new UsageError(`--years must be a whole number from 1 to 30; you gave "${years}".`)
  return { years: count, month: from === undefined ? 10 : monthOf(from) }
}

function monthOf(text: string): number {
  const word = text.trim().toLowerCase()
  const named = MONTHS.findIndex((name) => name === word || (word.length >= 3 && name.startsWith(word)))
  const month = named >= 0 ? named + 1 : /^\d{1,2}$/.test(word) ? Number(word) : NaN
  if (!(month >= 1 && month <= 12))
    throw new UsageError(`--from must be a month, 1 to 12 or its name; you gave "${text}".`)
  return month
}
