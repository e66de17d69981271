import type { CheckGroup } from './check.ts'

/** Every topic of the evidence, in the order in which it is shown. */
export const evidenceGroups: readonly CheckGroup[] = []
