import { noTerms, type agreements } from '@evenrule/api/contract'
import type { Clause } from '@evenrule/metrology'

/** Agreements made up for tests. */
export const zeroTest: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }
export const equivalence: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
}
export const resolution = (share: number): Clause => ({
  type: 'resolution-share',
  parameters: { share, base: 'tolerance' },
})
export const design = (readings: number): Clause => ({
  type: 'design-minimum',
  parameters: { readings, registeredBeforehand: true },
})

export const round = (
  number: number,
  clauses: Clause[],
  more: Partial<agreements.AgreementRound> = {},
): agreements.AgreementRound => ({
  id: `round-${number}`,
  number,
  side: number % 2 ? 'customer' : 'supplier',
  state: 'sent',
  clauses,
  terms: noTerms,
  effectiveOn: '2027-01-01',
  answersRound: number > 1 ? number - 1 : null,
  withdrawnClauses: [],
  houseTerms: null,
  caseOf: null,
  comment: '',
  by: 'A person',
  createdAt: '2026-12-01T08:00:00Z',
  savedAt: '2026-12-01T08:00:00Z',
  sentAt: '2026-12-01T08:00:00Z',
  rowVersion: 1,
  warnings: [],
  flags: [],
  ...more,
})

export const version = (
  id: string,
  state: agreements.AgreementVersion['state'],
  rounds: agreements.AgreementRound[],
  more: Partial<agreements.AgreementVersion> = {},
): agreements.AgreementVersion => ({
  id,
  number: 1,
  state,
  begunBy: 'customer',
  effectiveOn: null,
  text: null,
  sha256: null,
  createdAt: '2026-12-01T08:00:00Z',
  agreedAt: null,
  signedAt: null,
  withdrawnAt: null,
  withdrawnBy: null,
  withdrawnReason: null,
  caseOf: null,
  rowVersion: 1,
  waitsOn: [],
  moves: [],
  hindrances: [],
  rounds,
  comments: [],
  acceptance: null,
  signatures: [],
  ...more,
})

export const agreement = (
  versions: agreements.AgreementVersion[],
  more: Partial<agreements.Agreement> = {},
): agreements.Agreement => ({
  id: 'agreement',
  number: 2,
  relationshipId: 'relationship',
  scope: {
    kind: 'part',
    partId: 'part',
    partNumber: '7741-220',
    partName: 'Housing',
    characteristicId: null,
    characteristicNumber: null,
    characteristicName: null,
    revision: null,
  },
  supplier: { id: 's', name: 'Tarnfield' },
  customer: { id: 'c', name: 'Brackwell' },
  timeZone: 'Europe/Vienna',
  today: '2026-12-01',
  inForce: null,
  mayBegin: false,
  versions,
  characteristics: [],
  characteristicsTotal: 0,
  ...more,
})
