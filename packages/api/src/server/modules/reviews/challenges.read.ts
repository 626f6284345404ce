import { waitsOnSupplier } from '../../../contract/moves/challenge'
import type { Challenge } from '../../../contract/reviews'
import type { ChallengeRow, MessageRow } from './challenges.repository'
import { attachmentsOf } from './review-files.read'
import type { ReviewFileRow } from './review-files.repository'

type NameOf = (userId: string | null) => string | null

/** Challenges with what was said under each, and its files. */
export const challengeAnswers = (
  rows: readonly ChallengeRow[],
  messages: readonly MessageRow[],
  files: readonly ReviewFileRow[],
  nameOf: NameOf,
  today: string,
): Challenge[] =>
  rows.map((row) => {
    const { id, number, target, reasonKind, revision, dueOn, state } = row
    const { openedAt, laboratory, closedAt, rowVersion } = row
    return {
      ...{ id, number, target, reasonKind, revision, dueOn, state },
      ...{ openedAt, laboratory, closedAt, rowVersion },
      overdue: waitsOnSupplier(state) && dueOn < today,
      openedBy: nameOf(row.openedBy),
      closedBy: nameOf(row.closedBy),
      messages: messages
        .filter(({ challengeId }) => challengeId === id)
        .map((message) => asMessage(message, files, nameOf)),
    }
  })

function asMessage(
  message: MessageRow,
  files: readonly ReviewFileRow[],
  nameOf: NameOf,
): Challenge['messages'][number] {
  const { id, side, move, answerKind, text, revision, agreementId, versionId, whatIf, createdAt } = message
  return {
    ...{ id, side, move, answerKind, text, revision, whatIf, createdAt },
    name: nameOf(message.userId),
    files: attachmentsOf(files.filter(({ messageId }) => messageId === id)),
    proposal: agreementId && versionId ? { agreementId, versionId } : null,
  }
}
