import type { Library } from '../library.ts'
import type { Option } from '../option.ts'
import { checkGround } from './ground.ts'
import { checkHabits } from './habits.ts'
import { checkOpenings } from './openings.ts'
import { checkPlan } from './plan.ts'
import { checkReferences } from './references.ts'

/** Tells what is wrong at a place of the option. */
export type Report = (path: readonly PropertyKey[], detail: string) => void

/** All that one value alone cannot show: how the parts of an option fit together. */
export function checkOption(option: Option, library: Library, report: Report): void {
  checkReferences(option, library, report)
  checkPlan(option, report)
  checkOpenings(option, report)
  checkGround(option, library, report)
  checkHabits(option, report)
}
