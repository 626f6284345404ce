import type { Spoken } from './challenges.follow.service'

interface Said {
  subject: string
  body: string[]
}

/** What messages about the review of a submission say; `words` is what a person wrote. */
export const reviewMessages = {
  accepted: (words: string) => ({ subject: 'It is accepted', body: [words] }),
  acceptedWithConditions: (conditions: string, dueOn: string, words: string) => ({
    subject: 'It is accepted with conditions',
    body: [`What must follow until ${dueOn}:`, conditions, words],
  }),
  refused: (words: string) => ({ subject: 'It is refused', body: ['The reason given:', words] }),
  secondPersonAsked: () => ({
    subject: 'A second person is asked for',
    body: ['On a safety-class characteristic somebody else must confirm the acceptance, or send it back.'],
  }),
  sentBack: (words: string) => ({
    subject: 'The acceptance was not confirmed',
    body: ['The review goes on. The reason given:', words],
  }),
}

/** What messages about a challenge say, by the move that was made. */
export const challengeMessages: Record<Spoken, (words: string) => Said> = {
  open: (words) => ({ subject: 'A result is challenged', body: [words, 'Answer it in words.'] }),
  answer: (words) => ({ subject: 'A challenge is answered', body: [words] }),
  reply: (words) => ({ subject: 'The answer did not settle a challenge', body: [words] }),
  settle: (words) => ({ subject: 'The answer settles a challenge', body: [words] }),
  withdraw: (words) => ({ subject: 'A challenge is withdrawn', body: [words] }),
}
