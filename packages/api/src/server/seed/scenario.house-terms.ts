import type { Clause } from '@evenrule/metrology'
import type { Terms } from '../../contract/terms'
import { calibration, design, equivalence, resolution, standardTerms, zeroTest } from './scenario.clauses'
import type { OrganisationKey } from './scenario.organisations'

export interface DemoHouseTerms {
  customer: OrganisationKey
  daysAgo: number
  clauses: Clause[]
  terms?: Partial<Terms>
  words: string
  /** A draft is not published. */
  published: boolean
  /** Suppliers to whom it is offered, so many days ago. */
  offered?: { daysAgo: number; to: OrganisationKey[]; effectiveDaysAgo: number; comment: string }
}

/** What the two customers offer by default: several versions, a draft, and one offered. */
export const houseTerms: DemoHouseTerms[] = [
  {
    customer: 'brackwell',
    daysAgo: 350,
    clauses: [design(10), calibration, zeroTest(0.05)],
    words: 'What we have asked of every supplier so far.',
    published: true,
  },
  {
    customer: 'brackwell',
    daysAgo: 145,
    clauses: standardTerms,
    words: 'Equivalence instead of the zero-difference test, which rewarded few readings and a worse gauge.',
    published: true,
  },
  {
    customer: 'brackwell',
    daysAgo: 9,
    clauses: standardTerms,
    terms: {
      validityMonths: 24,
      calibrationOverdue: 'on-hold',
      outOfLimits: 'suspended',
      moved: 'suspended',
    },
    words: 'Says how long an acceptance holds, and that a gauge that was moved is shown again.',
    published: true,
    offered: {
      daysAgo: 7,
      to: ['osmere'],
      effectiveDaysAgo: -30,
      comment: 'The clauses you have signed already; new is how long an acceptance holds.',
    },
  },
  {
    customer: 'brackwell',
    daysAgo: 2,
    clauses: [design(30, 3), resolution, calibration, equivalence(0.08)],
    terms: { validityMonths: 24 },
    words: 'For the next model year; not yet discussed with purchasing.',
    published: false,
  },
  {
    customer: 'norvane',
    daysAgo: 100,
    clauses: [design(25, 2), resolution, calibration, equivalence(0.1)],
    terms: { validityMonths: 12, readingsTakerMaySign: false },
    words: 'Our terms for machined and formed parts.',
    published: true,
  },
]
