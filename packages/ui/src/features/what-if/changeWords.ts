import type { Clause } from '@evenrule/metrology'
import { decimalPlaces, formatLimits, formatNumber, type Unit } from '../../format'
import { describeClause } from '../../strings/clauses'
import { whatIfWords as words } from '../../strings/whatIf'
import { writeNumbers } from '../results/readingNumbers'
import type { WhatIfQuote } from './quote'

type Changed = WhatIfQuote['changed']

/** A number as it was entered: every place it has, and no more. */
const exact = (value: number, unit?: Unit): string =>
  formatNumber(value, { unit, digits: decimalPlaces(value) })

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
