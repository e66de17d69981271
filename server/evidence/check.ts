/** Where an expected value was seen. */
export type Provenance = 'looked up' | 'derived' | 'from memory' | 'common practice'

/** One line of the evidence: a published value beside the computed one. */
export interface Check {
  /** Case and value, for example `GND-02/3m/amplitude`. */
  readonly id: string
  readonly title: string
  /** Author or standard, year, equation, table or example. */
  readonly source: string
  readonly provenance: Provenance
  readonly unit: string
  /** A value, or a published range from low to high. */
  readonly expected: number | readonly [low: number, high: number]
  /** Allowed distance from the expected value, or beyond the range, in `unit`. */
  readonly tolerance: number
  readonly computed: number
  readonly holds: boolean
  /** A hard check fails the run; a soft one is shown with its deviation. */
  readonly weight: 'hard' | 'soft'
  /** Why the tolerance is what it is, or what a deviation comes from. */
  readonly note?: string
}

/** Fills in whether a check holds. A value that is not a number never does. */
export function check(row: Omit<Check, 'holds' | 'weight'> & { readonly weight?: 'hard' | 'soft' }): Check {
  const [low, high] = typeof row.expected === 'number' ? [row.expected, row.expected] : row.expected
  const holds = row.computed >= low - row.tolerance && row.computed <= high + row.tolerance
  return { weight: 'hard', ...row, holds }
}

/** What the checks may read; everything else they compute. */
export interface EvidenceInputs {
  /** Rows of a file in data/published/, lines that start with # left out, by column name. */
  readonly published: (file: string) => readonly Readonly<Record<string, string>>[]
  /** A file of the project's data/ folder, as text. */
  readonly data: (file: string) => string
  /** A file of the shared folder with real climate years and measurements, unpacked, as text; null when that folder is missing. */
  readonly shared: (file: string) => string | null
}

/** A topic of the evidence. A group that needs a missing file answers with the reason instead of its checks. */
export interface CheckGroup {
  readonly topic: string
  readonly run: (inputs: EvidenceInputs) => readonly Check[] | { readonly leftOut: string }
}
