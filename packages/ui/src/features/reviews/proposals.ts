import { agreements } from '@evenrule/api/contract'
import { clausesConcerned } from '@evenrule/api/contract/challenge-targets'
import type { Client } from '../../session/client'
import { sectionWords } from '../../strings/submissions'
import { agreementStateWords } from '../../strings/states'
import type { ReadSubmission } from '../submissions/reading'
import type { Challenge } from './challenges'

type Params = { organisationId: string }

/** Numbers of the agreements whose clauses a challenge concerns; all of the submission's where it concerns none. */
export function agreementsConcerned(
  { target }: Pick<Challenge, 'target'>,
  { content }: ReadSubmission,
): number[] {
  const keys = clausesConcerned(target, content)
  const concerned = content.clauses.filter(({ clauseKey }) => keys.includes(clauseKey))
  const numbers = (concerned.length ? concerned : content.clauses).map(
    ({ agreementNumber }) => agreementNumber,
  )
  return [...new Set(numbers)]
}

/** The agreements of a relationship by their numbers, which both sides use; the frozen text names no other. */
async function agreementIds(
  api: Client,
  params: Params,
  numbers: readonly number[],
  { submission }: ReadSubmission,
): Promise<string[]> {
  const { items } = await api.call(agreements.listAgreements, {
    params,
    query: { relationshipId: submission.relationshipId, size: 100 },
  })
  return items.filter(({ number }) => number !== null && numbers.includes(number)).map(({ id }) => id)
}

/** The agreement in which another criterion is to be proposed because of a challenge; undefined where there is none. */
export const agreementFor = async (
  api: Client,
  params: Params,
  challenge: Challenge,
  read: ReadSubmission,
): Promise<string | undefined> =>
  (await agreementIds(api, params, agreementsConcerned(challenge, read), read)).at(0)

/** Proposals that name a challenge as their case and were sent, to answer it with. */
export async function proposalsFor(
  api: Client,
  params: Params,
  challenge: Challenge,
  read: ReadSubmission,
): Promise<{ value: string; label: string; hint: string }[]> {
  const numbers = [...new Set(read.content.clauses.map(({ agreementNumber }) => agreementNumber))]
  const ids = await agreementIds(api, params, numbers, read)
  const found = await Promise.all(
    ids.map((agreementId) => api.call(agreements.readAgreement, { params: { ...params, agreementId } })),
  )
  return found.flatMap((agreement) =>
    agreement.versions
      .filter(({ caseOf, state }) => caseOf?.challengeId === challenge.id && state !== 'draft')
      .map(({ id, number, state }) => ({
        value: id,
        label: sectionWords.agreement(agreement.number ?? 0, number ?? 0),
        hint: agreementStateWords[state],
      })),
  )
}
