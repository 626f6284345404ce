import {
  compareTerms,
  noTerms,
  saysNothing,
  termFields,
  type ContentChange,
  type Terms,
} from '@evenrule/api/contract'
import type { Clause } from '@evenrule/metrology'
import { formatDate } from '../../format'
import { describeTerms as describeClauseTerms, subjectWords } from '../../strings/clauses'
import { clauseFieldWords, describeParameter, type FieldWords } from '../../strings/fields'
import { acceptanceWords } from '../../strings/rounds'
import { describeTerm, termLabels, termWords } from '../../strings/terms'
import { aboutClause, aboutFirstDay, aboutTerms, type About } from './acceptance'
import type { ClauseDifference, ParameterChange } from './differences'

/** One value that differs, named, before and after. */
export interface MarkedChange {
  label: string
  before: string
  after: string
}

/** One point of two proposals side by side: a clause, the terms, the first day. */
export interface PointRow {
  key: string
  about: About
  title: string
  /** Null where it is not there. */
  before: string | null
  after: string | null
  change: ContentChange
  /** What differs inside, value by value. */
  changes: MarkedChange[]
}

const fieldLabel = (clause: Clause, { field }: ParameterChange): string =>
  (clauseFieldWords[clause.type] as Record<string, FieldWords | undefined>)[field.name]?.label ?? field.name

/** A row of the comparison of clauses in words. */
export function clausePoint(row: ClauseDifference): PointRow {
  const { before, after } = row
  return {
    key: row.key,
    about: aboutClause(row.key),
    title: subjectWords[row.subject],
    before: before && describeClauseTerms(before),
    after: after && describeClauseTerms(after),
    change: row.change,
    changes: row.parameters.map((change) => ({
      label: fieldLabel(after ?? before!, change),
      before: describeParameter(change.field, change.before),
      after: describeParameter(change.field, change.after),
    })),
  }
}

/** What terms say, field by field; null where they say nothing. */
export const termsText = (terms: Terms): string | null =>
  saysNothing(terms)
    ? null
    : termFields
        .filter((field) => terms[field] !== null)
        .map((field) => `${termLabels[field]}: ${describeTerm(field, terms[field])}`)
        .join('; ')

/** The terms of two proposals as one point; undefined where neither says anything. */
export function termsPoint(before: Terms | null, after: Terms): PointRow | undefined {
  const old = before ?? noTerms
  if (saysNothing(old) && saysNothing(after)) return undefined
  const differing = compareTerms(old, after).filter(({ change }) => change !== 'same')
  const [was, is] = [termsText(old), termsText(after)]
  return {
    key: 'terms',
    about: aboutTerms,
    title: termWords.heading,
    before: was,
    after: is,
    change: differing.length === 0 ? 'same' : was === null ? 'added' : is === null ? 'removed' : 'changed',
    changes:
      was === null || is === null
        ? []
        : differing.map(({ field, before: from, after: to }) => ({
            label: termLabels[field],
            before: describeTerm(field, from),
            after: describeTerm(field, to),
          })),
  }
}

/** The first days of two proposals as one point. */
export const firstDayPoint = (before: string | null, after: string): PointRow => ({
  key: 'effective-on',
  about: aboutFirstDay,
  title: acceptanceWords.firstDay,
  before: before && formatDate(before),
  after: formatDate(after),
  change: before === null ? 'added' : before === after ? 'same' : 'changed',
  changes: [],
})
