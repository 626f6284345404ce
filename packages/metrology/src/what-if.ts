import { evaluate as evaluateNow } from './evaluate'
import type { Clause, ClauseInput, ClauseOutput, ErrorOutput, Tolerance } from './types'

/** What a what-if changes of a clause's input; what is not named stays as it is. */
export interface WhatIfChange {
  /** Zero-based places of readings that are left out. */
  leftOut?: readonly number[]
  /** Another reference value and tolerance, in the characteristic's unit. */
  referenceValue?: number
  tolerance?: Tolerance
  clause?: Clause
}

/**
 * The input of a clause with something supposed instead; the stored one is untouched. Without a reading left there is no
 * study. A supposed reference value keeps the uncertainty of the standard.
 */
export function whatIfInput(stored: ClauseInput, change: WhatIfChange): ClauseInput {
  const { leftOut = [], referenceValue, tolerance, clause } = change
  const left = new Set(leftOut)
  const readings = stored.data?.readings.filter((_, place) => !left.has(place)) ?? []
  return {
    ...stored,
    ...(clause && { clause }),
    ...(tolerance && { tolerance }),
    ...(stored.data && {
      data:
        readings.length === 0
          ? null
          : {
              ...stored.data,
              readings,
              reference: {
                ...stored.data.reference,
                ...(referenceValue !== undefined && { value: referenceValue }),
              },
            },
    }),
  }
}

/** A what-if and what it comes to: an argument, never a verdict to be stored. */
export interface WhatIf {
  input: ClauseInput
  output: ClauseOutput | ErrorOutput
}

/** Evaluates a what-if, by default with this engine; `compute` takes the entry of a released one. */
export function whatIf(
  stored: ClauseInput,
  change: WhatIfChange,
  compute: (input: ClauseInput) => ClauseOutput | ErrorOutput = evaluateNow,
): WhatIf {
  const input = whatIfInput(stored, change)
  return { input, output: compute(input) }
}
