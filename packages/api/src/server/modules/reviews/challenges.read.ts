import type { Challenge } from '../../../contract/reviews'
import type { ChallengeRow, MessageRow } from './challenges.repository'

/** Challenges with what was said under each. */
export const challengeAnswers = (
  rows: readonly ChallengeRow[],
  messages: readonly MessageRow[],
  nameOf: (userId: string | null) => string | null,
): Challenge[] =>
  rows.map(({ id, number, clauseKey, reasonKind, state, openedAt, closedAt, closedBy, rowVersion }) => ({
    ...{ id, number, clauseKey, reasonKind, state, openedAt, closedAt, rowVersion },
    closedBy: nameOf(closedBy),
    messages: messages
      .filter(({ challengeId }) => challengeId === id)
      .map((message) => ({
        ...{ id: message.id, side: message.side, name: nameOf(message.userId) },
        ...{ text: message.text, createdAt: message.createdAt },
      })),
  }))
