/**
 * How far the proof of a measuring task has come, or of all active tasks of a characteristic together; worst
 * first. A characteristic is as far as the worst of its tasks.
 */
export const proofStates = [
  'no-task',
  'missing',
  'refused',
  'challenged',
  'waiting',
  'accepted-with-conditions',
  'accepted',
] as const
export type ProofState = (typeof proofStates)[number]

const ofSubmission: Partial<Record<string, ProofState>> = {
  submitted: 'waiting',
  answered: 'waiting',
  'awaiting-second-person': 'waiting',
  challenged: 'challenged',
  refused: 'refused',
  accepted: 'accepted',
  'accepted-with-conditions': 'accepted-with-conditions',
}

/**
 * The proof of one task from the states of its submissions, the newest first. An acceptance stands until it is
 * superseded, whatever comes after it; otherwise the newest submission counts, and drafts and withdrawn ones
 * do not.
 */
export function proofOfTask(submissionStates: readonly string[]): ProofState {
  const states = submissionStates.map((state) => ofSubmission[state]).filter((state) => state !== undefined)
  return states.find((state) => state.startsWith('accepted')) ?? states[0] ?? 'missing'
}

/** The proof of a characteristic from that of its active tasks. */
export const proofOfCharacteristic = (tasks: readonly ProofState[]): ProofState =>
  tasks.reduce<ProofState | null>(
    (worst, each) =>
      worst === null || proofStates.indexOf(each) < proofStates.indexOf(worst) ? each : worst,
    null,
  ) ?? 'no-task'
