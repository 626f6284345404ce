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

const agreementsOf = async (api: Client, params: Params, { submission }: ReadSubmission) =>
  (
    await api.call(agreements.listAgreements, {
      params,
      query: { relationshipId: submission.relationshipId, size: 100 },
    })
  ).items

/** The agreement in which another criterion is to be proposed because of a challenge; undefined where there is none. */
export const agreementFor = async (
  api: Client,
  params: Params,
  challenge: Challenge,
  read: ReadSubmission,
): Promise<string | undefined> => {
  const numbers = agreementsConcerned(challenge, read)
  const items = await agreementsOf(api, params, read)
  return items.find(({ number }) => number !== null && numbers.includes(number))?.id
}

/** Whether criteria for a scope can be about what was submitted. */
const concerns = (
  { kind, partId, characteristicId }: agreements.AgreementRow['scope'],
  { submission }: ReadSubmission,
): boolean =>
  kind === 'relationship' ||
  (kind === 'part' && partId === submission.partId) ||
  characteristicId === submission.characteristicId

/** Proposals that name a challenge as their case and were sent, to answer it with; for whatever scope. */
export async function proposalsFor(
  api: Client,
  params: Params,
  challenge: Challenge,
  read: ReadSubmission,
): Promise<{ value: string; label: string; hint: string }[]> {
  const items = await agreementsOf(api, params, read)
  const found = await Promise.all(
    items
      .filter(({ scope }) => concerns(scope, read))
      .map(({ id }) => api.call(agreements.readAgreement, { params: { ...params, agreementId: id } })),
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
