import { readFile, stat } from 'node:fs/promises'
import type { Library } from '#contract/library.ts'
import type { Option } from '#contract/option.ts'
import { OptionError } from '#contract/option-error.ts'
import { LARGEST_OPTION_BYTES, readOptionText } from '#contract/read-option.ts'
import { UsageError } from './arguments.ts'

/**
 * Reads an option from its file; a file that is too large is refused unread.
 *
 * @throws UsageError for a file that cannot be read, OptionError, its message led by the file's name, for what is in it
 */
export async function readOptionFile(path: string, library: Library): Promise<Option> {
  const facts = await stat(path).catch((error: NodeJS.ErrnoException) => {
    throw new UsageError(
      error.code === 'ENOENT'
        ? `${path}: there is no such file.`
        : `${path}: cannot be read (${error.code}).`,
    )
  })
  if (!facts.isFile()) throw new UsageError(`${path}: is not a file.`)
  if (facts.size > LARGEST_OPTION_BYTES)
    throw new UsageError(
      `${path}: has ${Math.ceil(facts.size / 1024 / 1024)} MB; an option has at most ${LARGEST_OPTION_BYTES / 1024 / 1024} MB. Is it the right file?`,
    )
  const bytes = await readFile(path).catch((error: NodeJS.ErrnoException) => {
    throw new UsageError(`${path}: cannot be read (${error.code}).`)
  })
  try {
    return readOptionText(decoded(bytes, path), library)
  } catch (error) {
    if (!(error instanceof OptionError)) throw error
    const { issues } = error
    const count = issues.length === 1 ? '1 thing is' : `${issues.length} things are`
    error.message = [
      `${path}: ${count} wrong.`,
      ...issues.map(({ pointer, detail }) => `  ${pointer}: ${detail}`),
    ].join('\n')
    throw error
  }
}

function decoded(bytes: Uint8Array, path: string): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  } catch {
    throw new UsageError(`${path}: is not text in UTF-8, so it cannot be an option.`)
  }
}
