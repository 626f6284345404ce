import { isOwed, type RequestState, type requests, type Side } from '@evenrule/api/contract'
import { requestWords as words } from '../../strings/requests'
import { characteristicText } from '../parts/tolerance'
import { placeText } from '../tasks/place'

/** A measuring task chosen for a request, with the name it was chosen by. */
export interface ChosenTask {
  taskId: string
  label: string
}

type Task = Pick<
  requests.RequestTask,
  'partNumber' | 'revision' | 'characteristicName' | 'nominal' | 'lowerLimit' | 'upperLimit' | 'unit'
>

/** Part, revision and characteristic with its tolerance: "7741-220 C / Bore Ø 24.000 ±0.025 mm". */
export const taskText = (task: Task): string =>
  `${task.partNumber} ${task.revision} / ${characteristicText({ ...task, name: task.characteristicName })}`

/** Gauge with process step and site: "BG-14 Bore gauge, Hall 2". */
export const gaugeText = (
  task: Pick<requests.RequestTask, 'gaugeCode' | 'gaugeName' | 'site' | 'processStep'>,
): string => [`${task.gaugeCode} ${task.gaugeName}`, placeText(task)].filter(Boolean).join(', ')

/** What the page of a request answers: the decisive sentence, and what follows from the day. */
export function answerOf(request: requests.RequestRow): { strong: string; rest: string } {
  const { state, owed, tasks, answered, daysLeft } = request
  switch (state) {
    case 'open':
      return {
        strong: words.oneAnswer.open(owed, tasks),
        rest: daysLeft < 0 ? words.days.over(daysLeft) : words.days.left(daysLeft),
      }
    case 'answered':
      return { strong: words.oneAnswer.answered(answered), rest: '' }
    case 'closed':
      return { strong: words.oneAnswer.closed(tasks), rest: '' }
    case 'withdrawn':
      return { strong: words.oneAnswer.withdrawn, rest: '' }
  }
}

/** The supplier's next step towards an answer for a task; null where there is none, or it is the customer's turn. */
export type NextStep =
  | { kind: 'plan'; to: string }
  | { kind: 'study'; to: string; code: string }
  | { kind: 'draft'; to: string }
  | { kind: 'prepare' }

/** What the supplier does next for a task of an open request. */
export function nextStepOf(task: requests.RequestTask, state: RequestState, side: Side): NextStep | null {
  const { work, archived, taskId } = task
  if (side === 'customer' || !work || archived || state !== 'open') return null
  if (work.draft) return { kind: 'draft', to: `submissions/${work.draft.id}` }
  if (!isOwed(task.state)) return null
  if (!work.study) return { kind: 'plan', to: `studies/new?taskId=${taskId}` }
  const { id, code, state: studyState } = work.study
  return studyState === 'computed' ? { kind: 'prepare' } : { kind: 'study', to: `studies/${id}`, code }
}
