import { ClimateFileError } from './climate-file-error.ts'

/**
 * Cells of one line of comma-separated text. A cell in double quotes may hold the delimiter and doubled
 * quotes (RFC 4180); spaces around a cell are dropped. Line breaks inside quotes are not supported: no
 * climate file has them.
 */
export function csvCells(line: string, delimiter = ','): string[] {
  if (!line.includes('"')) return line.split(delimiter).map((cell) => cell.trim())
  const cells: string[] = []
  let cell = ''
  let isQuoted = false
  for (let i = 0; i < line.length; i++) {
    const letter = line[i]
    if (isQuoted) {
      if (letter !== '"') cell += letter
      else if (line[i + 1] === '"') cell += line[++i]
      else isQuoted = false
    } else if (letter === '"') isQuoted = true
    else if (letter === delimiter) {
      cells.push(cell.trim())
      cell = ''
    } else cell += letter
  }
  cells.push(cell.trim())
  return cells
}

/** A year of hours with room for a long head; more is refused before any cell is read. */
const MOST_LINES = 10_000

/**
 * Lines of a text, without byte order mark, carriage returns and empty lines at the end.
 *
 * @throws ClimateFileError for many more lines than a year has hours
 */
export function textLines(text: string): string[] {
  const lines = (text.charCodeAt(0) === 0xfeff ? text.slice(1) : text).split(/\r\n|\n|\r/)
  while (lines.length > 0 && /^[\s,;]*$/.test(lines[lines.length - 1])) lines.pop()
  if (lines.length > MOST_LINES) {
    throw new ClimateFileError(
      MOST_LINES + 1,
      `the file has ${lines.length} lines; a climate year has 8760 hours. Keep one year.`,
    )
  }
  return lines
}
