import type { messages } from '@evenrule/api/contract'
import { formatCount } from '../format'

/** What a message is about. */
export const messageKindWords: Record<messages.MessageKind, string> = {
  agreement: 'Agreement',
  request: 'Request',
  submission: 'Submission',
  challenge: 'Challenge',
  decision: 'Decision',
  standing: 'Standing',
  invitation: 'Invitation',
  reminder: 'Reminder',
}

/** What mail of each kind tells. */
export const messageKindHints: Record<messages.MessageKind, string> = {
  agreement: 'Proposals, answers and signatures on criteria.',
  request: 'Proof asked for by a date, moved, withdrawn or answered.',
  submission: 'Proof that waits for a signature or a decision, or was withdrawn.',
  challenge: 'Objections to a named result, and their answers.',
  decision: 'Proof accepted, accepted with conditions or refused.',
  standing: 'Accepted proof that does not stand any more, or stands again.',
  invitation: 'Members and suppliers who have accepted an invitation.',
  reminder: 'Days that come near or are over: requests, challenges, conditions, calibrations, agreements.',
}

export const messageWords = {
  question: 'What have I been told?',
  answerUnread: (count: number) => `${formatCount(count, 'message')} not read yet.`,
  answerRead: 'You have read every message.',
  caption: 'Messages',
  search: 'Search messages',
  subject: 'Message',
  kind: 'About',
  createdAt: 'When',
  read: 'Read',
  show: 'Show',
  all: 'all',
  unread: 'not read',
  every: 'everything',
  markRead: 'Mark as read',
  markAll: 'Mark all as read',
  chooseMail: 'Choose mail',
  mailTitle: 'Which messages come by mail?',
  mailTo: (email: string) =>
    `Mail goes to ${email}, the address of your sign-in. Your choice holds in every organisation you belong to; in the app you find every message all the same.`,
  saveMail: 'Save the choice',
  emptyTitle: 'No message yet',
  emptyText:
    'When the other side, or a colleague, does something that waits for you, you read it here and by mail.',
} as const
