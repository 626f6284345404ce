import { allows, type Role, type Side } from '../../../contract/access'
import { chooseMove } from '../../../contract/moves/define'
import {
  movesNamed,
  type SubmissionMove,
  type SubmissionPrecondition,
  type SubmissionState,
} from '../../../contract/moves/submission'
import { hindranceSchema, type Hindrance } from '../../../contract/submissions'
import type { SubmissionFacts } from './submissions.move.service'

/** Conditions that a person should know of before trying; what comes with the request itself is none of them. */
const codes: Partial<Record<SubmissionPrecondition, Hindrance['code']>> = {
  'task-in-use': 'task-archived',
  'something-to-judge': 'nothing-to-judge',
  'criteria-agreed': 'needs-approver',
  'did-not-take-readings': 'took-the-readings',
  'another-person': 'same-person',
  'no-challenge-open': 'challenge-open',
  'challenges-settled': 'challenge-unsettled',
  'no-newer-accepted': 'newer-accepted',
}

/** Why moves that state and role allow are still not this person's to make. */
export function hindrancesOf(
  { side: here, roles }: { side: Side; roles: readonly Role[] },
  state: SubmissionState,
  facts: SubmissionFacts,
): Hindrance[] {
  const given: SubmissionFacts = { ...facts, 'as-seen': true, 'reason-given': true }
  return hindranceSchema.shape.move.options.flatMap((move) => {
    const candidates = movesNamed(move, state).filter(
      ({ side, permission }) => side === here && allows(permission, side, roles),
    )
    const { lacking } = chooseMove<SubmissionPrecondition, SubmissionMove>(candidates, given)
    return lacking.flatMap((each) => {
      const code = codes[each]
      return code ? [{ move, code }] : []
    })
  })
}
