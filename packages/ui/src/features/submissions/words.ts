import { describeStanding } from '../../strings/standings'
import {
  advisoryWords,
  standingWords,
  submissionWords,
  termsWords,
  unresolvedAsked,
  type Parties,
} from '../../strings/submissions'
import { taskWords } from '../../strings/tasks'
import { inSentence } from '../common'
import { characteristicText } from '../parts/tolerance'
import { overallAnswer } from '../results'
import type { Content, ReadSubmission } from './reading'

/** The question of a submission: "Is bore gauge BG-14 fit for bore Ø 24.000 ±0.025 mm?" */
export const questionOf = ({ task, characteristic }: Content): string =>
  taskWords.question(
    `${inSentence(task.gaugeName)} ${task.gaugeCode}`,
    inSentence(characteristicText(characteristic)),
  )

/** The quiet line under the answer: which submission, part and partner. */
export function metaOf({ submission, content }: ReadSubmission, parties: Parties): string {
  const { characteristic, part } = content
  const partner = parties.side === 'supplier' ? parties.customer : parties.supplier
  return [
    submissionWords.breadcrumb(submission.number),
    partner,
    `${taskWords.revision(characteristic.partNumber, characteristic.revision)}, ${part.name}`,
  ].join(' · ')
}

/** One sentence or two, the first in bold. */
export interface Sentence {
  strong: string
  rest: string
}

const ended = ['accepted', 'accepted-with-conditions', 'refused', 'withdrawn', 'superseded']

/** Whether all that is left to answer is whether a challenge stays unresolved. */
const onlyUnresolved = (challenges: ReadSubmission['submission']['challenges']): boolean =>
  challenges.some(({ state }) => state === 'unresolved-proposed') &&
  !challenges.some(({ state }) => state === 'open')

/**
 * The answer in words: what was shown and where it stands; of a submission that has ended, its end first. An
 * acceptance that does not stand any more says that before all else.
 */
export function answerOf({ submission, content, results }: ReadSubmission, parties: Parties): Sentence[] {
  const { decisive, rest } = overallAnswer(results)
  const { state, ageDays, decidedAt, challenges } = submission
  const [strong, then] =
    state === 'challenged' && onlyUnresolved(challenges)
      ? unresolvedAsked(parties, ageDays)
      : standingWords[state](parties, ageDays, decidedAt)
  const shown =
    content.criteria === 'none'
      ? {
          strong: advisoryWords.answer,
          rest: ended.includes(submission.state)
            ? advisoryWords.answerEnded
            : advisoryWords.answerRest(parties),
        }
      : { strong: decisive, rest }
  const stands = { strong, rest: then }
  const { standing } = submission
  if (standing && standing.state !== 'stands') return [describeStanding(standing, parties.customer), stands]
  return ended.includes(submission.state) ? [stands, shown] : [shown, stands]
}

/** The terms frozen with a submission, as sentences. */
export function termsText(terms: Content['terms']): string {
  const events = ['outOfLimits', 'repaired', 'moved', 'changed'] as const
  const named = (effect: 'suspended' | 'stays') =>
    events.filter((event) => terms[event] === effect).map((event) => termsWords.events[event])
  const [suspended, stays] = [named('suspended'), named('stays')]
  return [
    termsWords.validity(terms.validityMonths),
    termsWords.overdue[terms.calibrationOverdue],
    suspended.length ? termsWords.suspended(suspended) : '',
    stays.length ? termsWords.stays(stays) : '',
    termsWords.taker[terms.readingsTakerMaySign ? 'yes' : 'no'],
  ]
    .filter(Boolean)
    .join(' ')
}
