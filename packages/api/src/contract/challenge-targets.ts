import { z } from 'zod'
import { line } from './common'
import type { SubmissionContent } from './submission-content'

/** Most readings that one challenge names. */
export const mostChallengedReadings = 1000

const study = line(100)
const clauseKey = line(200)
const readings = z
  .array(z.number().int().min(0).max(1_000_000))
  .min(1, 'Choose the readings.')
  .max(mostChallengedReadings, `Choose at most ${mostChallengedReadings} readings.`)
  .transform((places) => [...new Set(places)].sort((a, b) => a - b))

/** The one named thing that a challenge is about. Readings are zero-based places in the frozen readings. */
export const challengeTargetSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('clause'), clauseKey }),
  z.object({ kind: z.literal('readings'), study, readings }),
  z.object({ kind: z.literal('standard'), study }),
  z.object({ kind: z.literal('set-up'), study }),
  z.object({ kind: z.literal('calculation'), clauseKey }),
])
export type ChallengeTarget = z.output<typeof challengeTargetSchema>
export type ChallengeTargetKind = ChallengeTarget['kind']

/** What can be wrong with each kind of thing. */
export const reasonsOfTarget = {
  clause: ['verdict', 'too-few-readings', 'wrong-method', 'wrong-study', 'other'],
  readings: ['outlying', 'mistyped', 'wrong-unit', 'not-as-planned', 'other'],
  standard: ['value', 'uncertainty', 'calibration', 'unsuitable', 'other'],
  'set-up': ['fixture', 'surroundings', 'procedure', 'appraiser', 'other'],
  calculation: ['figure-differs', 'wrong-input', 'rounding', 'other'],
} as const satisfies Record<ChallengeTargetKind, readonly string[]>
export type ChallengeReason = (typeof reasonsOfTarget)[ChallengeTargetKind][number]

/** Every kind of reason once. */
export const challengeReasons = [...new Set(Object.values(reasonsOfTarget).flat())] as [
  ChallengeReason,
  ...ChallengeReason[],
]

export const isReasonOf = (kind: ChallengeTargetKind, reason: ChallengeReason): boolean =>
  (reasonsOfTarget[kind] as readonly ChallengeReason[]).includes(reason)

/** Whether two challenges would be about the same thing: the same clause or study, or readings they share. */
export function sameTarget(a: ChallengeTarget, b: ChallengeTarget): boolean {
  if (a.kind === 'readings' && b.kind === 'readings')
    return a.study === b.study && a.readings.some((place) => b.readings.includes(place))
  if (a.kind !== b.kind) return false
  return 'clauseKey' in a
    ? 'clauseKey' in b && a.clauseKey === b.clauseKey
    : 'study' in b && a.study === b.study
}

/** Keys of the clauses whose results rest on the challenged thing, in the order of the frozen text. */
export const clausesConcerned = (
  target: ChallengeTarget,
  { clauses, advisory }: Pick<SubmissionContent, 'clauses' | 'advisory'>,
): string[] =>
  [...clauses, ...advisory]
    .filter((each) =>
      'clauseKey' in target ? each.clauseKey === target.clauseKey : each.study === target.study,
    )
    .map((each) => each.clauseKey)

/** What of a target the frozen text does not have: the field to mend, or null where everything is there. */
export function missingOf(
  target: ChallengeTarget,
  { clauses, advisory, studies }: Pick<SubmissionContent, 'clauses' | 'advisory' | 'studies'>,
): 'clauseKey' | 'study' | 'readings' | null {
  if ('clauseKey' in target)
    return [...clauses, ...advisory].some((each) => each.clauseKey === target.clauseKey) ? null : 'clauseKey'
  const named = studies.find((each) => each.code === target.study)
  if (!named) return 'study'
  if (target.kind !== 'readings') return null
  return target.readings.every((place) => place < named.data.readings.length) ? null : 'readings'
}
