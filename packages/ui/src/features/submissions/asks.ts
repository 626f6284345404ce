import { actNames, type ActName } from '../../strings/reviews'
import type { ChallengePreset } from '../reviews/challengeForm'
import type { Saying } from '../reviews/challenges'
import type { ConditionActName } from '../reviews/conditions'

/** The question that a submission's page is asking. */
export type Asked =
  | { kind: 'act'; act: ActName }
  | { kind: 'challenge'; preset: ChallengePreset }
  | { kind: 'say'; challengeId: string; saying: Saying }
  | { kind: 'condition'; conditionId: string; act: ConditionActName }
  | { kind: 'reinstate' }

/** What can be said in a challenge by coming to an address: from a signature, or with a proposal to answer by. */
const addressed = /^(answer|correct)\.([0-9a-f-]{36})$/

/** A question that ends in a signature, as the address carries it over a fresh sign-in; undefined for others. */
export function writeAsked(asked: Asked): string | undefined {
  if (asked.kind === 'act') return asked.act
  if (asked.kind === 'reinstate') return 'reinstate'
  return asked.kind === 'say' && addressed.test(`${asked.saying}.${asked.challengeId}`)
    ? `${asked.saying}.${asked.challengeId}`
    : undefined
}

/** The question that an address carries; undefined where it carries none. */
export function readAsked(text: string): Asked | undefined {
  const act = actNames.find((name) => name === text)
  if (act) return { kind: 'act', act }
  if (text === 'reinstate') return { kind: 'reinstate' }
  const [, saying, challengeId] = addressed.exec(text) ?? []
  return challengeId
    ? { kind: 'say', challengeId, saying: saying === 'answer' ? 'answer' : 'correct' }
    : undefined
}
