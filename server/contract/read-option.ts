import { checkOption } from './checks/check-option.ts'
import { issueTexts } from './issue-text.ts'
import type { Library } from './library.ts'
import { option, type Option } from './option.ts'
import { OptionError, pointerTo, type Issue } from './option-error.ts'

/** An honest option has a few thousand bytes. */
export const LARGEST_OPTION_BYTES = 5 * 1024 * 1024

/** So many faults are told at once; a file with more of them is probably something else. */
const MOST_ISSUES = 50

/**
 * Checks a document wholly and fills in what it leaves out.
 *
 * @param json    what JSON.parse gave
 * @param library what its ids may refer to
 * @throws OptionError with all faults found, each with a pointer into the document
 */
export function readOption(json: unknown, library: Library): Option {
  const parsed = option.safeParse(json)
  const issues: Issue[] = []
  const told = new Set<string>()
  const report = (path: readonly PropertyKey[], detail: string) => {
    const pointer = pointerTo(path)
    if (told.has(pointer) || issues.length >= MOST_ISSUES) return
    told.add(pointer)
    issues.push({ pointer, detail })
  }
  if (parsed.success) checkOption(parsed.data, library, report)
  else
    for (const issue of parsed.error.issues)
      for (const { path, detail } of issueTexts(issue, json)) report(path, detail)
  if (issues.length > 0) throw new OptionError(issues)
  return (parsed as { data: Option }).data
}

/**
 * The same from the text of a file.
 *
 * @throws OptionError also for text that is not JSON
 */
export function readOptionText(text: string, library: Library): Option {
  let json: unknown
  try {
    json = JSON.parse(text.replace(/^\uFEFF/, ''))
  } catch (error) {
    throw new OptionError([
      { pointer: '#', detail: `This is not JSON: ${(error as Error).message.replaceAll(/\s+/g, ' ')}` },
    ])
  }
  return readOption(json, library)
}
