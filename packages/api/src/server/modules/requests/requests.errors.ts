import type { RequestPrecondition, RequestState } from '../../../contract/moves/request'
import { invalidInput, wrongState, type FieldError, type ProblemError } from '../../errors'

/** States as a sentence names them. */
const stateWords: Record<RequestState, string> = {
  open: 'open',
  answered: 'answered',
  closed: 'closed',
  withdrawn: 'withdrawn',
}

export const wrongRequestState = (state: RequestState): ProblemError =>
  wrongState('request', stateWords[state])

export const dayOver: FieldError = {
  path: 'body.dueOn',
  message: 'Enter today or a later day; this one is over.',
}

/** What to say where a condition of the asker's moves does not hold. */
export const refusals = {
  'day-to-come': () => invalidInput([dayOver]),
  'reason-given': () => invalidInput([{ path: 'body.reason', message: 'Say why.' }]),
} satisfies Partial<Record<RequestPrecondition, () => ProblemError>>
