import type { coverageWords } from '../strings/states'

export type CoverageState = keyof typeof coverageWords

/** One characteristic of a part on the coverage rule. */
export interface CoverageTick {
  /** Its number on the drawing. */
  number: number
  /** "Ø 24.000 ±0.025, bore" */
  label: string
  state: CoverageState
  /** The day on which it runs out, as a calendar date; for ticks that run out. */
  runsOutOn?: string | null
}
