import type { DemoEnd } from './scenario.studies'

/** What happens to a submission, by how far it comes; each act a day or more after the one before. */
export type Deed =
  | 'prepare'
  | 'send'
  | 'sign'
  | 'withdraw'
  | 'challenge'
  | 'answer'
  | 'answer-by-criterion'
  | 'correct-readings'
  | 'sign-correction'
  | 'settle'
  | 'propose-unresolved'
  | 'refuse'
  | 'accept'
  | 'accept-with-conditions'
  | 'accept-with-short-condition'
  | 'accept-as-approver'
  | 'confirm'
  | 'agree-one-off'
  | 'report-condition'
  | 'confirm-condition'

const signed: Deed[] = ['prepare', 'send', 'sign']
const corrected: Deed[] = [...signed, 'challenge', 'correct-readings', 'sign-correction']

/** What happens for each end; `confirm` only on characteristics of class safety. */
export const deedsOf: Partial<Record<DemoEnd, Deed[]>> = {
  draft: ['prepare'],
  'for-signature': ['prepare', 'send'],
  submitted: signed,
  withdrawn: [...signed, 'withdraw'],
  challenged: [...signed, 'challenge'],
  answered: [...signed, 'challenge', 'answer'],
  'answered-by-criterion': [...signed, 'challenge', 'answer-by-criterion'],
  'answered-by-correction': corrected,
  'unresolved-proposed': [...signed, 'challenge', 'answer', 'propose-unresolved'],
  refused: [...signed, 'refuse'],
  'awaiting-second-person': [...signed, 'accept'],
  accepted: [...signed, 'accept', 'confirm'],
  'accepted-after-challenge': [...signed, 'challenge', 'answer', 'settle', 'accept', 'confirm'],
  'accepted-after-correction': [...corrected, 'settle', 'accept', 'confirm'],
  'accepted-with-conditions': [
    ...signed,
    ...(['accept-with-conditions', 'confirm', 'report-condition', 'confirm-condition'] as const),
  ],
  'conditions-lapsed': [...signed, 'accept-with-short-condition', 'confirm'],
  'one-off-proposed': [...signed, 'accept-as-approver'],
  'one-off-accepted': [...signed, 'accept-as-approver', 'agree-one-off'],
}
