import { standingWords, submissionWords, type Parties } from '../../strings/submissions'
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

/** The answer in words: what was shown and where it stands; of a submission that has ended, its end first. */
export function answerOf({ submission, results }: ReadSubmission, parties: Parties): Sentence[] {
  const { decisive, rest } = overallAnswer(results)
  const [strong, then] = standingWords[submission.state](parties, submission.ageDays, submission.decidedAt)
  const shown = { strong: decisive, rest }
  const stands = { strong, rest: then }
  return ended.includes(submission.state) ? [stands, shown] : [shown, stands]
}
