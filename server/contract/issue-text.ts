import type { z } from 'zod'

type ZodIssue = z.core.$ZodIssue

/** The value at a path of a document; undefined where the path leads nowhere. */
export function valueAt(document: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>(
    (value, step) =>
      typeof value === 'object' && value !== null && Object.hasOwn(value, step)
        ? (value as Record<PropertyKey, unknown>)[step]
        : undefined,
    document,
  )
}

/** A value as a reader recognises it, short. */
export function shown(value: unknown): string {
  if (typeof value === 'number') return String(value)
  if (value === undefined) return 'nothing'
  if (typeof value === 'string') return value.length > 60 ? `"${value.slice(0, 57)}…"` : `"${value}"`
  if (Array.isArray(value))
    return value.length === 1 ? 'a list of 1 entry' : `a list of ${value.length} entries`
  return typeof value === 'object' && value !== null ? 'an object' : String(value)
}

/** What is wrong with one value, told to its writer. Unions tell of the branch that is nearest. */
export function issueTexts(
  issue: ZodIssue,
  document: unknown,
): { readonly path: readonly PropertyKey[]; readonly detail: string }[] {
  const value = valueAt(document, issue.path)
  const at = (detail: string) => [{ path: issue.path, detail }]
  const sent = `you sent ${shown(value)}`
  switch (issue.code) {
    case 'unrecognized_keys':
      return issue.keys.map((key) => ({
        path: [...issue.path, key],
        detail: `There is no such name here. Check its spelling, or leave it out.`,
      }))
    case 'invalid_type':
      if (value === undefined) return at(`Is missing: give ${kind(issue.expected)}.`)
      return at(`Must be ${kind(issue.expected)}; ${sent}.`)
    case 'too_small':
      return at(
        issue.origin === 'number' || issue.origin === 'int'
          ? `Must be ${issue.inclusive ? 'at least' : 'more than'} ${issue.minimum}; ${sent}.`
          : issue.origin === 'string'
            ? `Must not be empty.`
            : `Needs ${issue.exact ? 'exactly' : 'at least'} ${entries(issue.minimum)}; ${sent}.`,
      )
    case 'too_big':
      return at(
        issue.origin === 'number' || issue.origin === 'int'
          ? `Must be ${issue.inclusive ? 'at most' : 'less than'} ${issue.maximum}; ${sent}.`
          : issue.origin === 'string'
            ? `Must have at most ${issue.maximum} characters; yours has ${String(value).length}.`
            : `May have ${issue.exact ? 'exactly' : 'at most'} ${entries(issue.maximum)}; ${sent}.`,
      )
    case 'invalid_value':
      return at(
        value === undefined
          ? `Is missing: give ${oneOf(issue.values)}.`
          : `Must be ${oneOf(issue.values)}; ${sent}.`,
      )
    case 'invalid_format':
      return at(`This id ${idRule}; ${sent}.`)
    case 'invalid_union':
      return unionTexts(issue, document, value)
    case 'custom':
      return at(`This ${issue.message}; ${sent}.`)
    default:
      return at(`Cannot be used; ${sent}.`)
  }
}

const idRule = 'must be lower case letters, digits, _ or -, at most 60'

function unionTexts(issue: Extract<ZodIssue, { code: 'invalid_union' }>, document: unknown, value: unknown) {
  const branches = issue.errors
  if (branches.length === 0) {
    const options = (issue as { options?: unknown[] }).options ?? []
    const detail =
      value === undefined
        ? `Is missing: give ${oneOf(options)}.`
        : `Must be ${oneOf(options)}; you sent ${shown(value)}.`
    return [{ path: issue.path, detail }]
  }
  // A list was meant for the branch of lists, a number for the other one.
  const deeper = Array.isArray(value)
    ? branches.find((errors) => !errors.some((error) => error.path.length === 0 && wantsOther(error)))
    : undefined
  const chosen = deeper ?? branches.find((errors) => errors.every((error) => error.code !== 'invalid_type'))
  if (chosen)
    return chosen.flatMap((error) =>
      issueTexts({ ...error, path: [...issue.path, ...error.path] } as ZodIssue, document),
    )
  const length = branches
    .flat()
    .find((error) => error.code === 'too_small' && 'exact' in error && error.exact)
  const list = length && 'minimum' in length ? `, or a list of ${length.minimum}` : ', or a list'
  return [
    {
      path: issue.path,
      detail:
        value === undefined
          ? `Is missing: give one number${list}.`
          : `Must be one number${list}; you sent ${shown(value)}.`,
    },
  ]
}

function wantsOther(error: ZodIssue): boolean {
  return error.code === 'invalid_type' && error.expected !== 'array'
}

function kind(expected: string): string {
  const names: Record<string, string> = {
    number: 'a number',
    int: 'a whole number',
    string: 'text in quotes',
    array: 'a list in [ ]',
    object: 'an object in { }',
    boolean: 'true or false',
  }
  return names[expected] ?? expected
}

function entries(count: number | bigint): string {
  return Number(count) === 1 ? '1 entry' : `${count} entries`
}

function oneOf(values: readonly unknown[]): string {
  const texts = values.map((value) => (typeof value === 'string' ? `"${value}"` : String(value)))
  return texts.length === 1 ? texts[0] : `${texts.slice(0, -1).join(', ')} or ${texts.at(-1)}`
}
