import type { AgreementVersionState } from '@evenrule/api/contract'

/** States as people read them. Codes are those of the state tables; derived ones (in force, expired) are among them. */

export const agreementStateWords: Record<AgreementVersionState, string> = {
  draft: 'our draft',
  proposed: 'proposed',
  countered: 'answered with changes',
  agreed: 'agreed, waits for signatures',
  signed: 'signed, not yet in force',
  'in-force': 'in force',
  superseded: 'superseded',
  withdrawn: 'withdrawn',
  lapsed: 'lapsed',
}

export const studyStateWords = {
  registered: 'registered',
  collecting: 'collecting',
  computed: 'computed',
  abandoned: 'abandoned',
} as const

export const submissionStateWords = {
  draft: 'draft',
  'for-signature': 'for signature',
  submitted: 'submitted',
  challenged: 'challenged',
  answered: 'answered',
  'awaiting-second-person': 'waits for a second person',
  'awaiting-other-side': 'waits for the supplier’s approver',
  accepted: 'accepted',
  'accepted-with-conditions': 'accepted with conditions',
  refused: 'refused',
  withdrawn: 'withdrawn',
  superseded: 'superseded',
  'on-hold': 'on hold',
  suspended: 'suspended',
  expired: 'expired',
} as const

export const challengeStateWords = {
  open: 'open',
  answered: 'answered',
  'unresolved-proposed': 'proposed to be left unresolved',
  'resolved-by-evidence': 'resolved by evidence',
  'resolved-by-correction': 'resolved by correction',
  withdrawn: 'withdrawn',
  unresolved: 'unresolved',
} as const

/** Class of a characteristic. */
export const classWords = { ordinary: 'ordinary', significant: 'significant', safety: 'safety' } as const

/** How far a characteristic is covered by accepted proof; names the ticks of the coverage rule. */
export const coverageWords = {
  accepted: 'accepted',
  conditional: 'accepted with conditions',
  'running-out': 'acceptance runs out soon',
  stopped: 'acceptance on hold or suspended',
  challenged: 'challenged',
  ended: 'acceptance ended',
  missing: 'no accepted proof',
} as const
