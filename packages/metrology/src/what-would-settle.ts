import { clauseDescriptor, parseClause } from './clauses'
import type { Characteristic, ClauseInput, ClauseOutput, ReasonCode, SettleCode } from './types'

/** What would likely turn "not shown" into a verdict. */
export interface Settling {
  reason: SettleCode
  /** The least total number of readings, where more of them would likely do. */
  readings: number | null
  /** The chance to meet the clause with that many, if bias and spread stay as estimated. */
  chance: number | null
}

const wantedChance = 0.9

/** Remedies that are not a number of readings, by the reason of the verdict. */
const otherRemedies: Partial<Record<ReasonCode, SettleCode>> = {
  'no-study': 'no-study',
  'one-reading': 'one-reading',
  'zero-spread': 'finer-resolution',
  'reference-uncertainty-too-large': 'better-standard',
  'margin-undefined': 'margin-undefined',
}

/**
 * For a clause that is not shown: the least total number of readings that would show it with a chance of 90 % if bias
 * and spread stay as estimated, or why no number would.
 */
export function whatWouldSettle(input: ClauseInput, output: ClauseOutput): Settling {
  const none = (reason: SettleCode): Settling => ({ reason, readings: null, chance: null })
  if (output.verdict !== 'not-shown') return none('settled')
  const remedy = otherRemedies[output.reason.code]
  if (remedy) return none(remedy)
  const clause = parseClause(input.clause)
  const { study } = output
  const descriptor = clauseDescriptor(clause)
  const rule = descriptor.rule?.(clause, characteristicOf(input)) ?? null
  if (!descriptor.readingsNeeded || !study?.standardDeviation || study.bias === null || !rule) {
    return none('not-an-equivalence')
  }
  if ('margin' in rule && Math.abs(study.bias) >= rule.margin) return none('estimate-beyond-margin')
  const truth = { bias: study.bias, standardDeviation: study.standardDeviation }
  const needed = descriptor.readingsNeeded(clause, characteristicOf(input), truth, wantedChance)
  return needed.readings === null
    ? none('estimate-too-near-margin')
    : { reason: 'more-readings', readings: needed.readings, chance: needed.chance }
}

function characteristicOf({
  unit,
  tolerance,
  processStandardDeviation,
  resolution,
}: ClauseInput): Characteristic {
  return {
    unit,
    ...(tolerance && { tolerance }),
    ...(processStandardDeviation !== undefined && { processStandardDeviation }),
    ...(resolution !== undefined && { resolution }),
  }
}
