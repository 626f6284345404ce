import { reviews } from '@evenrule/api/contract'
import type { Client } from '../../session/client'
import type { Saying } from './challenges'

/** What is said in one dialog; answering and correcting have dialogs of their own. */
export type Said = Exclude<Saying, 'answer' | 'correct'>

interface SaidValues {
  text: string
  laboratory: string
  fileIds: string[]
}
type Params = { organisationId: string; submissionId: string; challengeId: string }

interface Say {
  /** It takes words. */
  words: boolean
  files?: boolean
  laboratory?: boolean
  send(api: Client, params: Params, expectedVersion: number, values: SaidValues): Promise<reviews.Challenge>
}

/** How each is sent. */
export const says: Record<Said, Say> = {
  reply: {
    words: true,
    files: true,
    send: (api, params, expectedVersion, { text, fileIds }) =>
      api.call(reviews.replyToAnswer, { params, body: { expectedVersion, text, fileIds } }),
  },
  settle: {
    words: false,
    send: (api, params, expectedVersion, { text }) =>
      api.call(reviews.settleChallenge, { params, body: { expectedVersion, text } }),
  },
  withdraw: {
    words: false,
    send: (api, params, expectedVersion, { text }) =>
      api.call(reviews.withdrawChallenge, { params, body: { expectedVersion, text } }),
  },
  'propose-unresolved': {
    words: true,
    laboratory: true,
    send: (api, params, expectedVersion, { text, laboratory }) =>
      api.call(reviews.proposeUnresolved, {
        params,
        body: { expectedVersion, text, laboratory: laboratory.trim() || null },
      }),
  },
  'agree-unresolved': {
    words: false,
    send: (api, params, expectedVersion, { text }) =>
      api.call(reviews.agreeUnresolved, { params, body: { expectedVersion, text } }),
  },
  'decline-unresolved': {
    words: true,
    send: (api, params, expectedVersion, { text }) =>
      api.call(reviews.declineUnresolved, { params, body: { expectedVersion, text } }),
  },
}
