import { compareTerms, type agreements, type Terms } from '@evenrule/api/contract'
import { describeClause, describeTerms, subjectWords } from '../../strings/clauses'
import { clauseFieldWords, describeParameter, type FieldWords } from '../../strings/fields'
import { roundsWords as words } from '../../strings/agreementActs'
import { describeTerm, termLabels, termWords } from '../../strings/terms'
import { compareClauses, type ClauseDifference } from './differences'

function sentencesOf(row: ClauseDifference): string[] {
  const { before, after } = row
  if (row.change === 'added' && after) return [words.added(describeClause(after))]
  if (row.change === 'removed' && before) return [words.removed(describeClause(before))]
  if (row.change === 'same' || !before || !after) return []
  if (row.parameters.length === 0)
    return [words.replaced(subjectWords[row.subject], describeTerms(before), describeTerms(after))]
  return row.parameters.map(({ field, before: old, after: now }) =>
    words.parameter(
      subjectWords[row.subject],
      (clauseFieldWords[after.type] as Record<string, FieldWords>)[field.name]?.label ?? field.name,
      describeParameter(field, old),
      describeParameter(field, now),
    ),
  )
}

type Compared = Pick<agreements.AgreementRound, 'clauses' | 'terms' | 'effectiveOn'>

const termSentences = (before: Terms, after: Terms): string[] =>
  compareTerms(before, after)
    .filter(({ change }) => change !== 'same')
    .map(({ field, before: old, after: now }) =>
      words.parameter(
        termWords.heading,
        termLabels[field],
        describeTerm(field, old),
        describeTerm(field, now),
      ),
    )

/** What a round changes of the one before, a sentence each; what it holds, for the first. */
export function changeSentences(before: Compared | undefined, round: Compared): string[] {
  if (!before) return [words.first(round.clauses.length, round.effectiveOn)]
  const changes = [
    ...compareClauses(before.clauses, round.clauses).flatMap(sentencesOf),
    ...termSentences(before.terms, round.terms),
  ]
  return [
    ...(changes.length ? changes : [words.noChange]),
    ...(before.effectiveOn === round.effectiveOn ? [] : [words.day(before.effectiveOn, round.effectiveOn)]),
  ]
}
