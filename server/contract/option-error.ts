/** One thing that is wrong in a document. */
export interface Issue {
  /** JSON pointer into the document, as a URI fragment: `#/sides/0/berm/height_m`. */
  readonly pointer: string
  /** What is wrong, the value that was sent, and what to do. */
  readonly detail: string
}

/** A document that is not an option. All that is wrong with it is told at once. */
export class OptionError extends Error {
  readonly issues: readonly Issue[]

  constructor(issues: readonly Issue[]) {
    super(issues.map(({ pointer, detail }) => `${pointer}: ${detail}`).join('\n'))
    this.name = 'OptionError'
    this.issues = issues
  }
}

/** RFC 6901 pointer of a path, as a URI fragment; a step that needs escaping is escaped. */
export function pointerTo(path: readonly PropertyKey[]): string {
  const steps = path.map((step) => encodeURI(String(step).replace(/~/g, '~0').replace(/\//g, '~1')))
  return steps.length === 0 ? '#' : `#/${steps.join('/')}`
}
