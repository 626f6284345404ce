import { allows } from '../../../contract/access'
import {
  challengeMovesNamed,
  isUnsettled,
  type ChallengeMove,
  type ChallengePrecondition,
} from '../../../contract/moves/challenge'
import { chooseMove, type Facts } from '../../../contract/moves/define'
import { openToChallenge } from '../../../contract/moves/submission'
import type { Challenge } from '../../../contract/reviews'
import { whatIfOf } from '../../../contract/what-if'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, invalidInput, notFound, wrongState, type ProblemError } from '../../errors'
import { ownFiles } from '../files/attachments.service'
import { selectTexts } from '../submissions/submissions.frozen.repository'
import { wrongSubmissionState } from '../submissions/submissions.errors'
import { lockedSubmission } from '../submissions/submissions.move.service'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { concludeChallenge, type Concluding, type Spoken } from './challenges.follow.service'
import {
  insertMessage,
  selectChallenges,
  updateChallenge,
  type ChallengeChange,
  type ChallengeRow,
  type NewMessage,
} from './challenges.repository'
import { insertReviewFiles } from './review-files.repository'
import { refusals } from './reviews.errors'

export type ChallengeFacts = Facts<ChallengePrecondition>
type SpokenMove = Extract<ChallengeMove, { name: Spoken }>

/** What somebody says under a challenge. */
export interface Said {
  expectedVersion: number
  text: string
  fileIds?: readonly string[]
  whatIf?: string | null
}

/** What a move brings beside the words. */
export interface Brought extends Pick<Concluding, 'data' | 'values'> {
  facts?: ChallengeFacts
  message?: Omit<NewMessage, 'move' | 'text' | 'whatIf'>
  change?: Omit<ChallengeChange, 'state'>
}

const stateWords: Record<ChallengeRow['state'], string> = {
  open: 'open',
  answered: 'answered',
  'unresolved-proposed': 'waiting for the supplier’s approver',
  'resolved-by-evidence': 'settled',
  'resolved-by-correction': 'settled',
  withdrawn: 'withdrawn',
  unresolved: 'left unresolved',
}

/** The row of the table that may be made here and now; refuses with the condition that does not hold. */
export function permittedChallengeMove(
  tenant: Tenant,
  name: ChallengeMove['name'],
  submission: SubmissionRow,
  state: ChallengeRow['state'] | null,
  facts: ChallengeFacts,
): ChallengeMove {
  const candidates = challengeMovesNamed(name, state).filter(
    ({ side, permission }) => side === tenant.side && allows(permission, side, tenant.roles),
  )
  if (candidates.length === 0 && state !== null) throw wrongState('challenge', stateWords[state])
  const under = openToChallenge.includes(submission.state)
  const { move, lacking } = chooseMove<ChallengePrecondition, ChallengeMove>(candidates, {
    ...facts,
    'submission-under-review': under,
  })
  if (move) return move
  if (!under) throw wrongSubmissionState(submission.state)
  const said: (() => ProblemError) | undefined = lacking
    .map((each) => refusals[each])
    .find((each) => each !== null)
  throw said?.() ?? wrongState('challenge', state === null ? 'not open' : stateWords[state])
}

/** A challenge of a submission that somebody saw in this version, both locked until the transaction ends. */
export async function openForAnswer(
  tenant: Tenant,
  id: string,
  challengeId: string,
  expectedVersion: number,
): Promise<{ submission: SubmissionRow; row: ChallengeRow }> {
  const submission = await lockedSubmission(tenant, id)
  const row = (await selectChallenges(tenant, submission)).find((each) => each.id === challengeId)
  if (!row) throw notFound('challenge')
  if (row.rowVersion !== expectedVersion) throw changedMeanwhile('challenge')
  return { submission, row }
}

/** Makes a move of a challenge with what was said, its files and what follows. */
export async function moveChallenge(
  tenant: Tenant,
  { submission, row }: { submission: SubmissionRow; row: ChallengeRow },
  name: Exclude<Spoken, 'open'>,
  said: Said,
  { facts = {}, message = {}, change = {}, ...brought }: Brought = {},
): Promise<Challenge> {
  const move = permittedChallengeMove(tenant, name, submission, row.state, {
    ...facts,
    'words-given': said.text !== '',
  })
  const moved = await updateChallenge(tenant, row, { ...change, ...closing(tenant, move), state: move.to })
  const data = await sayUnder(tenant, submission, moved, { name, said, message })
  return concludeChallenge(tenant, submission, moved, move as SpokenMove, {
    ...brought,
    text: said.text,
    data: { ...data, ...brought.data },
  })
}

/** Stores what was said with its files; returns what the event keeps of the files and the quoted what-if. */
export async function sayUnder(
  tenant: Tenant,
  submission: SubmissionRow,
  row: ChallengeRow,
  { name, said, message }: { name: Spoken; said: Said; message?: Brought['message'] },
): Promise<Record<string, unknown>> {
  const files = await ownFiles(tenant, said.fileIds ?? [])
  const whatIf = said.whatIf ?? null
  if (whatIf !== null) await refuseStrangeWhatIf(tenant, submission, whatIf)
  const { id: messageId } = await insertMessage(tenant, row, {
    ...message,
    move: name,
    text: said.text,
    whatIf,
  })
  await insertReviewFiles(tenant, submission, { messageId }, files)
  return files.length > 0 ? { files: files.map(({ sha256 }) => sha256) } : {}
}

/** A what-if is quoted of what was signed here, or it would argue about something else. */
async function refuseStrangeWhatIf(tenant: Tenant, submission: SubmissionRow, text: string): Promise<void> {
  const quoted = whatIfOf(text)?.submissionSha256
  if ((await selectTexts(tenant, submission)).some(({ sha256 }) => sha256 === quoted)) return
  throw invalidInput([
    { path: 'body.whatIf', message: 'This what-if was tried on another submission. Quote one of this.' },
  ])
}

/** Who closed it and when, where the move ends it. */
export const closing = (
  { userId, now }: Tenant,
  { to }: Pick<ChallengeMove, 'to'>,
): Pick<ChallengeChange, 'closedBy' | 'closedAt'> =>
  isUnsettled(to) ? {} : { closedBy: userId, closedAt: now }
