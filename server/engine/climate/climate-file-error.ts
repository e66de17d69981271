/** A climate file cannot be used. The message says what is wrong, where, and what to do. */
export class ClimateFileError extends RangeError {
  /** Line of the file, counted from 1; null when the file as a whole is meant. */
  readonly line: number | null

  constructor(line: number | null, message: string) {
    super(line === null ? message : `line ${line}: ${message}`)
    this.name = 'ClimateFileError'
    this.line = line
  }
}
