import type { ChallengeTarget, ChallengeTargetKind } from '@evenrule/api/contract/challenge-targets'
import { describeClause } from '../../strings/clauses'
import { challengeWords as words } from '../../strings/challenges'
import { sectionWords } from '../../strings/submissions'
import { verdictWords } from '../../strings/verdicts'
import type { ReadSubmission } from '../submissions/reading'

/** What is known of a challenge before its dialog opens. */
export interface ChallengePreset {
  kind?: ChallengeTargetKind
  clauseKey?: string
  study?: string
  readings?: readonly number[]
  /** Canonical text of a what-if that goes with it. */
  whatIf?: string
}

/** A target as a form holds it: every field, whatever the kind. */
export interface TargetDraft {
  kind: ChallengeTargetKind | ''
  clauseKey: string
  study: string
  readings: number[]
}

/** The only study is chosen already. */
export const emptyTarget = (preset: ChallengePreset, { content }: ReadSubmission): TargetDraft => ({
  kind: preset.kind ?? '',
  clauseKey: preset.clauseKey ?? '',
  study: preset.study ?? (content.studies.length === 1 ? (content.studies[0]?.code ?? '') : ''),
  readings: [...(preset.readings ?? [])],
})

/** What is missing of a target, by the path of its field. */
export function missingIn({ kind, clauseKey, study, readings }: TargetDraft): Record<string, string> {
  if (!kind) return { 'target.kind': words.chooseTarget }
  if (kind === 'clause' || kind === 'calculation')
    return clauseKey ? {} : { 'target.clauseKey': words.chooseClause }
  if (!study) return { 'target.study': words.chooseStudy }
  return kind === 'readings' && !readings.length ? { 'target.readings': words.chooseReadings } : {}
}

/** The target as the contract takes it; only of a draft in which nothing is missing. */
export function targetOf({ kind, clauseKey, study, readings }: TargetDraft): ChallengeTarget {
  switch (kind) {
    case 'readings':
      return { kind, study, readings }
    case 'standard':
    case 'set-up':
      return { kind, study }
    case 'calculation':
      return { kind, clauseKey }
    default:
      return { kind: 'clause', clauseKey }
  }
}

/** The clauses and studies of a submission, to choose from. */
export function choicesOf({ content, results, advisory }: ReadSubmission) {
  return {
    clauses: [...results, ...advisory].map(({ clauseKey, clause, input, output }) => ({
      value: clauseKey,
      label: describeClause(clause, input),
      hint: verdictWords[output.verdict],
    })),
    studies: content.studies.map(({ code, data }) => ({
      value: code,
      label: sectionWords.readings(code),
      hint: sectionWords.dataText(data.readings.length, data.revision),
    })),
  }
}
