import { challengeMove, isUnsettled } from '../../../contract/moves/challenge'
import type { BodyOf } from '../../../contract/define'
import {
  missingOf,
  sameTarget,
  type answerChallenge,
  type Challenge,
  type openChallenge,
  type proposeUnresolved,
} from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { invalidInput } from '../../errors'
import { selectVersionsOfCase } from '../agreements/agreements.case.repository'
import { newestContent } from '../submissions/submissions.correction.service'
import { openForMove } from '../submissions/submissions.move.service'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { concludeChallenge, recordChallenge } from './challenges.follow.service'
import {
  closing,
  moveChallenge,
  openForAnswer,
  permittedChallengeMove,
  sayUnder,
  type Brought,
  type Said,
} from './challenges.move.service'
import {
  insertChallenge,
  selectChallenges,
  selectMessages,
  updateChallenge,
  type ChallengeRow,
} from './challenges.repository'
import { todayOf } from './reviews.read.service'

/** Challenges one named thing in a submission. */
export async function challenge(
  tenant: Tenant,
  id: string,
  { expectedVersion, target, reasonKind, dueOn, ...said }: BodyOf<typeof openChallenge>,
): Promise<Challenge> {
  const submission = await openForMove(tenant, id, expectedVersion)
  const before = await selectChallenges(tenant, submission)
  const isThere = before.some((each) => isUnsettled(each.state) && sameTarget(each.target, target))
  const move = permittedChallengeMove(tenant, 'open', submission, null, {
    'target-not-under-challenge': !isThere,
    'words-given': said.text !== '',
  })
  const { frozen, content } = await newestContent(tenant, submission)
  const missing = missingOf(target, content)
  if (missing)
    throw invalidInput([{ path: `body.target.${missing}`, message: 'Choose something of this submission.' }])
  if (dueOn < (await todayOf(tenant, submission)))
    throw invalidInput([{ path: 'body.dueOn', message: 'This day is over. Enter today or a later day.' }])
  const opened = await insertChallenge(tenant, submission, {
    ...{ number: before.length + 1, target, reasonKind, dueOn },
    ...{ revision: frozen.revision, state: move.to },
  })
  const data = await sayUnder(tenant, submission, opened, {
    name: 'open',
    said: { expectedVersion, ...said },
  })
  if (move.name !== 'open') throw new Error('Another move than the one asked for.')
  return concludeChallenge(tenant, submission, opened, move, {
    text: said.text,
    data: { target, reasonKind, dueOn, revision: frozen.revision, ...data },
  })
}

/** The supplier answers an open challenge: in words, by files, by a revision there is, or by another criterion. */
export async function answer(
  tenant: Tenant,
  id: string,
  challengeId: string,
  { kind, versionId, ...said }: BodyOf<typeof answerChallenge>,
): Promise<Challenge> {
  const opened = await openForAnswer(tenant, id, challengeId, said.expectedVersion)
  const pointing =
    kind === 'correction'
      ? await newerRevision(tenant, opened)
      : kind === 'criterion'
        ? await proposalOf(tenant, opened, versionId)
        : {}
  return moveChallenge(tenant, opened, 'answer', said, {
    facts: { 'files-given': kind !== 'evidence' || said.fileIds.length > 0 },
    message: { answerKind: kind, ...pointing },
    change: { answeredAt: tenant.now },
    data: { answerKind: kind, ...pointing },
  })
}

interface Opened {
  submission: SubmissionRow
  row: ChallengeRow
}

async function newerRevision(tenant: Tenant, { submission, row }: Opened): Promise<{ revision: number }> {
  const { frozen } = await newestContent(tenant, submission)
  if (frozen.revision > row.revision) return { revision: frozen.revision }
  throw invalidInput([
    {
      path: 'body.kind',
      message: 'No corrected revision was signed since the challenge. Sign the correction first.',
    },
  ])
}

async function proposalOf(
  tenant: Tenant,
  { submission, row }: Opened,
  versionId: string | null,
): Promise<{ agreementId: string; versionId: string }> {
  const versions = await selectVersionsOfCase(tenant, submission.relationshipId, row.id)
  const found = versions.find((each) => each.versionId === versionId && each.proposedBy === tenant.side)
  if (found) return { agreementId: found.agreementId, versionId: found.versionId }
  throw invalidInput([
    {
      path: 'body.versionId',
      message: 'Propose the other criterion first, with this challenge as its case, then answer by it.',
    },
  ])
}

/** The customer replies to an answer that does not settle it. */
export const reply = async (
  tenant: Tenant,
  id: string,
  challengeId: string,
  said: Said,
): Promise<Challenge> =>
  moveChallenge(tenant, await openForAnswer(tenant, id, challengeId, said.expectedVersion), 'reply', said)

/** The answer settles the challenge: by correction where the last one was that, else by evidence. */
export async function settle(
  tenant: Tenant,
  id: string,
  challengeId: string,
  said: Said,
): Promise<Challenge> {
  const opened = await openForAnswer(tenant, id, challengeId, said.expectedVersion)
  const messages = await selectMessages(tenant, opened.submission, [challengeId])
  const last = messages.findLast(({ answerKind }) => answerKind !== null)
  const corrected = last?.answerKind === 'correction'
  return moveChallenge(tenant, opened, 'settle', said, {
    facts: { corrected, 'not-corrected': !corrected },
    data: { by: corrected ? 'correction' : 'evidence' },
  })
}

/** The customer withdraws the challenge. */
export const withdraw = async (
  tenant: Tenant,
  id: string,
  challengeId: string,
  said: Said,
): Promise<Challenge> =>
  moveChallenge(tenant, await openForAnswer(tenant, id, challengeId, said.expectedVersion), 'withdraw', said)

/** The customer's approver proposes to leave it unresolved, or to a laboratory. */
export async function proposeToLeave(
  tenant: Tenant,
  id: string,
  challengeId: string,
  { laboratory, ...said }: BodyOf<typeof proposeUnresolved>,
): Promise<Challenge> {
  const opened = await openForAnswer(tenant, id, challengeId, said.expectedVersion)
  return moveChallenge(tenant, opened, 'propose-unresolved', said, {
    change: { laboratory },
    data: laboratory === null ? {} : { laboratory },
  })
}

/** The supplier's approver agrees to leave it unresolved. */
export const agreeToLeave = (tenant: Tenant, id: string, challengeId: string, said: Said) =>
  answerProposal(tenant, id, challengeId, 'agree-unresolved', said)

/** The supplier's approver does not agree: the challenge stands as answered. */
export const declineToLeave = (tenant: Tenant, id: string, challengeId: string, said: Said) =>
  answerProposal(tenant, id, challengeId, 'decline-unresolved', said, { change: { laboratory: null } })

async function answerProposal(
  tenant: Tenant,
  id: string,
  challengeId: string,
  name: 'agree-unresolved' | 'decline-unresolved',
  said: Said,
  { change }: Pick<Brought, 'change'> = {},
): Promise<Challenge> {
  const opened = await openForAnswer(tenant, id, challengeId, said.expectedVersion)
  // The supplier has spoken, even where it never answered the challenge itself.
  return moveChallenge(tenant, opened, name, said, {
    change: { ...change, answeredAt: opened.row.answeredAt ?? tenant.now },
  })
}

/** Challenges whose answers did not settle them when the submission was refused. */
export async function leaveUnresolved(tenant: Tenant, refused: SubmissionRow): Promise<void> {
  for (const row of await selectChallenges(tenant, refused)) {
    const move = challengeMove('leave-unresolved', row.state)
    if (!move) continue
    const left = await updateChallenge(tenant, row, { state: move.to, ...closing(tenant, move) })
    recordChallenge(tenant, refused, left, move)
  }
}
