import { daysBetween } from '../../format'
import { waitingWords as words } from '../../strings/challenges'
import { whoseOf, type Parties } from '../../strings/submissions'
import type { ReadSubmission } from './reading'

/** One thing of a submission that waits for somebody, with the day by which it should be done. */
export interface Waiting {
  key: string
  /** Where on the page it stands. */
  at: string
  what: string
  waits: string
  dueOn: string | null
  due: { text: string; over: boolean } | null
  ours: boolean
}

/** "due 14 Dec 2026, 3 days left", by the server's calendar day. */
export function dueText(dueOn: string, today: string): { text: string; over: boolean } {
  const left = daysBetween(today, dueOn) ?? 0
  return { text: words.due(dueOn, words.daysLeft(left)), over: left < 0 }
}

/** The conditions of the acceptance that counts, final or waiting for somebody. */
export const conditionsOf = ({ submission }: Pick<ReadSubmission, 'submission'>) =>
  submission.decisions.find(({ state, conditions }) => state !== 'withdrawn' && conditions.length > 0)
    ?.conditions ?? []

/** What waits for whom beside the decision itself, what is due first at the top. */
export function waitingOf(read: ReadSubmission, parties: Parties): Waiting[] {
  const { submission } = read
  const whose = (side: 'supplier' | 'customer') => whoseOf(parties, side)
  const line = (
    rest: Pick<Waiting, 'key' | 'at' | 'what' | 'waits' | 'dueOn'> & { side: 'supplier' | 'customer' },
  ): Waiting => {
    const { side, ...shown } = rest
    return {
      ...shown,
      due: shown.dueOn === null ? null : dueText(shown.dueOn, submission.today),
      ours: parties.side === side,
    }
  }
  const challenges = submission.challenges.flatMap(({ id, number, state, dueOn }) => {
    const shown = { key: id, at: `challenge-${number}`, what: words.challenge(number) }
    if (state === 'open')
      return [line({ ...shown, side: 'supplier', waits: words.answerOf(whose('supplier')), dueOn })]
    if (state === 'answered')
      return [line({ ...shown, side: 'customer', waits: words.wordOf(whose('customer')), dueOn: null })]
    return state === 'unresolved-proposed'
      ? [line({ ...shown, side: 'supplier', waits: words.approverOf(whose('supplier')), dueOn: null })]
      : []
  })
  const accepted = submission.state === 'accepted-with-conditions'
  const conditions = (accepted ? conditionsOf(read) : []).flatMap(({ id, number, state, owner, dueOn }) => {
    const shown = { key: id, at: `condition-${number}`, what: words.condition(number), dueOn }
    if (state === 'open') return [line({ ...shown, side: owner, waits: words.reportOf(whose(owner)) })]
    return state === 'reported'
      ? [line({ ...shown, side: 'customer', waits: words.confirmationOf(whose('customer')) })]
      : []
  })
  return [...challenges, ...conditions].sort((a, b) => (a.dueOn ?? '9999').localeCompare(b.dueOn ?? '9999'))
}
