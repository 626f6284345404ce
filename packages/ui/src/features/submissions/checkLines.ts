import type { Difference, SubmissionCheck } from '@evenrule/api/contract/submission-check'
import { describeClause } from '../../strings/clauses'
import { recomputeWords as words } from '../../strings/proofs'
import { sectionWords } from '../../strings/submissions'
import type { ReadSubmission } from './reading'

/** One thing that was checked, as a line of the answer. */
export interface CheckLine {
  key: string
  label: string
  equal: boolean
  /** It could not be computed, so it neither agrees nor differs. */
  untold?: boolean
  /** Hashes; null where there is none to show. */
  stored: string | null
  recomputed: string | null
  problem?: string
  difference?: Difference
  engine?: { version: string; sha256: string }
}

/** A check of a submission as lines: the text, its signatures, the readings, and every clause. */
export function checkLines(
  check: SubmissionCheck,
  { results, advisory }: Pick<ReadSubmission, 'results' | 'advisory'>,
): CheckLine[] {
  const nameOf = (clauseKey: string) => {
    const result = [...results, ...advisory].find((each) => each.clauseKey === clauseKey)
    return result ? describeClause(result.clause, result.input) : clauseKey
  }
  return [
    { key: 'text', label: words.theText, ...check.text },
    ...check.signatures.map(({ meaning, equal }, at) => ({
      key: `signature-${at}`,
      label: `${words.signature}: ${meaningOf(meaning)}`,
      equal,
      stored: null,
      recomputed: null,
    })),
    ...(check.corrects ? [{ key: 'corrects', label: words.previousText, ...check.corrects }] : []),
    ...check.data.map(({ study, ...each }) => ({
      key: `data-${study}`,
      label: words.readingsOf(study),
      ...each,
    })),
    ...check.clauses.map((clause) => ({
      key: `clause-${clause.clauseKey}`,
      label: nameOf(clause.clauseKey),
      equal: clause.equal,
      untold: clause.problem === 'engine-unavailable',
      stored: clause.outputSha256,
      recomputed: clause.recomputedSha256,
      ...(clause.problem ? { problem: words.problems[clause.problem] } : {}),
      ...(clause.difference ? { difference: shortened(clause.difference) } : {}),
      engine: { version: words.engineIs(clause.engineVersion), sha256: clause.engineSha256 },
    })),
  ]
}

/** What a check says as a whole. */
export type CheckOutcome = 'equal' | 'differs' | 'unchecked'
export function outcomeOf(lines: readonly CheckLine[]): CheckOutcome {
  const open = lines.filter(({ equal }) => !equal)
  if (!open.length) return 'equal'
  return open.every(({ untold }) => untold) ? 'unchecked' : 'differs'
}

const meaningOf = (meaning: string): string =>
  meaning in sectionWords.meanings
    ? sectionWords.meanings[meaning as keyof typeof sectionWords.meanings]
    : meaning

const longest = 160
const short = (text: string | null): string | null =>
  text !== null && text.length > longest ? `${text.slice(0, longest)} …` : text

/** Where the whole text differs, its beginning is enough to see that. */
const shortened = ({ path, stored, recomputed }: Difference): Difference => ({
  path,
  stored: short(stored),
  recomputed: short(recomputed),
})
