import type { StandingState } from './standing'

/**
 * How far the proof of a measuring task has come, or of all active tasks of a characteristic together; worst
 * first. A characteristic is as far as the worst of its tasks.
 */
export const proofStates = [
  'no-task',
  'missing',
  'refused',
  'reopened',
  'expired',
  'lapsed',
  'suspended',
  'challenged',
  'on-hold',
  'waiting',
  'accepted-with-conditions',
  'accepted',
] as const
export type ProofState = (typeof proofStates)[number]

const ofSubmission: Partial<Record<string, ProofState>> = {
  submitted: 'waiting',
  answered: 'waiting',
  'awaiting-second-person': 'waiting',
  'awaiting-other-side': 'waiting',
  challenged: 'challenged',
  refused: 'refused',
  accepted: 'accepted',
  'accepted-with-conditions': 'accepted-with-conditions',
}

/** A submission as far as its proof goes: its state, and for an accepted one how it stands today. */
export interface ProofOfSubmission {
  state: string
  standing: StandingState | null
  /** Its last day, where that is near. */
  runsOutOn?: string | null
}

/**
 * The proof of one task from its submissions, the newest first. An acceptance that stands counts until it is
 * superseded, whatever comes after it; otherwise the newest submission counts, an acceptance by what stopped it, and
 * drafts and withdrawn ones do not.
 */
export function proofOfTask(submissions: readonly ProofOfSubmission[]): ProofState {
  const states = submissions.map(proofOfSubmission).filter((state) => state !== undefined)
  return states.find(isAccepted) ?? states[0] ?? 'missing'
}

/**
 * The day on which a task’s accepted proof runs out, where that is soon; null where it is not, or where an acceptance
 * that stands longer covers it too.
 */
export function runsOutOfTask(submissions: readonly ProofOfSubmission[]): string | null {
  const days = submissions
    .filter((each) => isAccepted(proofOfSubmission(each) ?? 'missing'))
    .map(({ runsOutOn }) => runsOutOn ?? null)
  return days.includes(null) ? null : (days.toSorted().at(-1) ?? null)
}

const proofOfSubmission = ({ state, standing }: ProofOfSubmission): ProofState | undefined => {
  const proof = ofSubmission[state]
  return proof && isAccepted(proof) && standing !== null && standing !== 'stands' ? standing : proof
}

/** Whether accepted proof that stands covers it, with conditions or without. */
export const isAccepted = (proof: ProofState): boolean =>
  proof === 'accepted' || proof === 'accepted-with-conditions'

/** The proof of a characteristic from that of its active tasks. */
export const proofOfCharacteristic = (tasks: readonly ProofState[]): ProofState =>
  tasks.reduce<ProofState | null>(
    (worst, each) =>
      worst === null || proofStates.indexOf(each) < proofStates.indexOf(worst) ? each : worst,
    null,
  ) ?? 'no-task'
