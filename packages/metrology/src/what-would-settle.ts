import { clauseDescriptor, parseClause } from './clauses'
import { given } from './input/common'
import { spreadAtLeast } from './rules/capability-index'
import type { Characteristic, ClauseInput, ClauseOutput, ReasonCode, Rule, SettleCode, Truth } from './types'

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
  'reference-uncertainty-unknown': 'standard-uncertainty',
  'margin-undefined': 'margin-undefined',
  'no-tolerance-width': 'margin-undefined',
  'no-process-spread': 'margin-undefined',
  'no-document': 'document',
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
  const assumed = given('referenceStandardUncertainty', study?.reference.standardUncertainty ?? undefined)
  const rule = descriptor.rule?.(clause, characteristicOf(input), assumed) ?? null
  if (!descriptor.readingsNeeded || !study?.standardDeviation || study.bias === null || !rule) {
    return none('not-an-equivalence')
  }
  const truth = { bias: study.bias, standardDeviation: study.standardDeviation }
  const beyond = beyondLimit(rule, truth)
  if (beyond) return none(beyond)
  const needed = descriptor.readingsNeeded(clause, characteristicOf(input), truth, wantedChance, assumed)
  return needed.readings === null
    ? none(rule.type === 'index' ? 'index-too-near-least' : 'estimate-too-near-margin')
    : { reason: 'more-readings', readings: needed.readings, chance: needed.chance }
}

/** Where the estimates themselves do not meet the clause, more readings would rather show that it falls short. */
function beyondLimit(rule: Rule, { bias, standardDeviation }: Truth): SettleCode | null {
  if (rule.type === 'index')
    return standardDeviation >= spreadAtLeast(rule, bias) ? 'index-below-least' : null
  return 'margin' in rule && Math.abs(bias) >= rule.margin ? 'estimate-beyond-margin' : null
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
