import type { Clause } from '@evenrule/metrology'
import { decimalPlaces, formatLimits, formatNumber, type Unit } from '../../format'
import { describeClause } from '../../strings/clauses'
import { whatIfWords as words } from '../../strings/whatIf'
import { writeNumbers } from '../results/readingNumbers'
import type { WhatIfQuote } from './quote'

type Changed = WhatIfQuote['changed']

/** Two numbers with every place that either of them has, and no more. */
function exact(before: number, after: number, unit: Unit): [string, string] {
  const digits = Math.max(decimalPlaces(before), decimalPlaces(after))
  return [formatNumber(before, { unit, digits }), formatNumber(after, { unit, digits })]
}

const limits = (ends: { lower: number | null; upper: number | null }, unit: Unit): string => {
  const places = [ends.lower, ends.upper].map((end) => (end === null ? 0 : decimalPlaces(end)))
  return ends.lower === null && ends.upper === null
    ? words.noLimits
    : formatLimits(ends, { unit, digits: Math.max(...places) })
}

/** What a what-if changes, one line for each change. */
export function changeLines(changed: Changed, unit: string): string[] {
  const { leftOut, referenceValue, tolerance, clauses } = changed
  const named = (clause: Clause) => describeClause(clause)
  return [
    ...(leftOut.length ? [words.change.leftOut(writeNumbers(leftOut), leftOut.length)] : []),
    ...(referenceValue
      ? [words.change.reference(...exact(referenceValue.before, referenceValue.after, unit))]
      : []),
    ...(tolerance
      ? [words.change.limits(limits(tolerance.before, unit), limits(tolerance.after, unit))]
      : []),
    ...clauses.map(({ before, after }) => words.change.clause(named(before), named(after))),
  ]
}
