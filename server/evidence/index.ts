import type { CheckGroup } from './check.ts'
import { measuredSoilChecks } from './measured-soil.checks.ts'

/** Every topic of the evidence, in the order in which it is shown. */
export const evidenceGroups: readonly CheckGroup[] = [measuredSoilChecks]
