import { dayInWords } from '../../calendar'
import type { Spoken } from './challenges.follow.service'

interface Said {
  subject: string
  body: string[]
}

/** What messages about the review of a submission say; `words` is what a person wrote. */
export const reviewMessages = {
  accepted: (words: string) => ({ subject: 'Accepted', body: [words] }),
  acceptedWithConditions: (conditions: string, dueOn: string, words: string) => ({
    subject: 'Accepted with conditions',
    body: [`What must follow until ${dayInWords(dueOn)}:`, conditions, words],
  }),
  refused: (words: string) => ({ subject: 'Refused', body: ['The reason given:', words] }),
  secondPersonAsked: () => ({
    subject: 'Waits for a second person',
    body: ['On a safety-class characteristic somebody else must confirm the acceptance, or send it back.'],
  }),
  sentBack: (words: string) => ({
    subject: 'Acceptance not confirmed',
    body: ['The review goes on. The reason given:', words],
  }),
}

/** What messages about a challenge say, by the move that was made. */
export const challengeMessages: Record<Spoken, (words: string) => Said> = {
  open: (words) => ({ subject: 'Result challenged', body: [words, 'Answer it in words.'] }),
  answer: (words) => ({ subject: 'Challenge answered', body: [words] }),
  reply: (words) => ({ subject: 'Answer does not settle the challenge', body: [words] }),
  settle: (words) => ({ subject: 'Challenge settled', body: [words] }),
  withdraw: (words) => ({ subject: 'Challenge withdrawn', body: [words] }),
}
