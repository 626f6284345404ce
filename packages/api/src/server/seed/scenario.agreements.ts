import type { Clause } from '@evenrule/metrology'
import type { Side } from '../../contract/access'
import type { Terms } from '../../contract/terms'
import {
  calibration,
  design,
  equivalence,
  indices,
  resolution,
  standardTerms,
  within,
  withUncertainty,
  zeroTest,
} from './scenario.clauses'
import { longNegotiation, takenAway } from './scenario.negotiations'
import type { OrganisationKey } from './scenario.organisations'

/** One act in a negotiation: when (days before the seeding), whose, and what. */
export type DemoStep =
  | {
      daysAgo: number
      side: Side
      act: 'propose' | 'answer'
      clauses: Clause[]
      terms?: Partial<Terms>
      comment: string
      send?: false
      /** The customer's house terms from which it is begun, by their number. */
      houseTerms?: number
    }
  /** About a clause of the standing round by its key, the terms or the date. */
  | { daysAgo: number; side: Side; act: 'comment'; about: string; text: string }
  | { daysAgo: number; side: Side; act: 'mark'; about: string[] }
  | { daysAgo: number; side: Side; act: 'take-out'; about: string[]; words: string }
  | { daysAgo: number; side: Side; act: 'accept' | 'sign' }
  | { daysAgo: number; side: Side; act: 'withdraw'; reason: string }

export interface DemoVersion {
  /** First day in force, days before the seeding; negative where it is still to come. */
  effectiveDaysAgo: number
  steps: DemoStep[]
}

export interface DemoAgreement {
  supplier: OrganisationKey
  customer: OrganisationKey
  part?: string
  /** Number on the drawing. */
  characteristic?: number
  versions: DemoVersion[]
}

/** Proposed by the customer, accepted and signed by both. */
export const signedAt = (
  daysAgo: number,
  clauses: Clause[],
  comment: string,
  terms: Partial<Terms> = {},
): DemoVersion => ({
  effectiveDaysAgo: daysAgo - 10,
  steps: [
    { daysAgo: daysAgo + 6, side: 'customer', act: 'propose', clauses, terms, comment },
    { daysAgo: daysAgo + 3, side: 'supplier', act: 'accept' },
    { daysAgo: daysAgo + 2, side: 'customer', act: 'sign' },
    { daysAgo: daysAgo + 1, side: 'supplier', act: 'sign' },
  ],
})

/** Negotiations in every state there is: in force, superseded, agreed, proposed, countered, draft, withdrawn, lapsed. */
export const agreements: DemoAgreement[] = [
  {
    supplier: 'tarnfield',
    customer: 'brackwell',
    versions: [
      signedAt(330, [design(10), calibration, zeroTest(0.05)], 'As we have always asked.'),
      {
        effectiveDaysAgo: 300,
        steps: [
          {
            daysAgo: 316,
            side: 'supplier',
            act: 'propose',
            clauses: [design(20), calibration, equivalence(0.15)],
            comment:
              'The zero-difference test turns our best gauge down because it repeats so well. We propose equivalence within a margin.',
          },
          {
            daysAgo: 311,
            side: 'customer',
            act: 'answer',
            clauses: standardTerms,
            comment:
              'Agreed in substance. A tenth of the tolerance, 25 readings, and the resolution in writing.',
          },
          { daysAgo: 308, side: 'supplier', act: 'accept' },
          { daysAgo: 307, side: 'supplier', act: 'sign' },
          { daysAgo: 306, side: 'customer', act: 'sign' },
        ],
      },
    ],
  },
  {
    supplier: 'tarnfield',
    customer: 'brackwell',
    part: '7741-231',
    versions: [signedAt(200, [equivalence(0.05)], 'The spacer ring sets the play: half the usual margin.')],
  },
  {
    supplier: 'tarnfield',
    customer: 'brackwell',
    part: '7741-231',
    characteristic: 3,
    versions: [
      signedAt(
        190,
        [within(0.1, 'µm')],
        'Only an upper limit here, so the margin is a value of its own, in micrometres.',
      ),
    ],
  },
  {
    supplier: 'tarnfield',
    customer: 'brackwell',
    part: '7741-220',
    characteristic: 1,
    versions: [
      signedAt(
        85,
        [indices(1.33, 1), withUncertainty(0.1)],
        'The bore is fitted by class: spread and bias together, and the uncertainty of the ring counted in.',
      ),
    ],
  },
  {
    supplier: 'tarnfield',
    customer: 'brackwell',
    part: '7741-220',
    characteristic: 4,
    versions: [
      signedAt(
        150,
        [within(0.002, 'mm')],
        'Two micrometres, whatever the tolerance: the mating part needs it.',
      ),
      {
        effectiveDaysAgo: -20,
        steps: [
          {
            daysAgo: 4,
            side: 'supplier',
            act: 'propose',
            clauses: [within(0.005, 'mm')],
            comment: 'With the pins we have, five micrometres can be shown with 25 readings; two cannot.',
          },
        ],
      },
    ],
  },
  {
    supplier: 'tarnfield',
    customer: 'brackwell',
    part: '7750-018',
    versions: [
      {
        effectiveDaysAgo: -30,
        steps: [
          {
            daysAgo: 1,
            side: 'customer',
            act: 'propose',
            clauses: [design(30), equivalence(0.08)],
            comment: '',
            send: false,
          },
        ],
      },
    ],
  },
  {
    supplier: 'osmere',
    customer: 'brackwell',
    versions: [signedAt(280, standardTerms, 'The terms that all our suppliers of machined castings have.')],
  },
  {
    supplier: 'osmere',
    customer: 'brackwell',
    part: '3310-402',
    characteristic: 1,
    versions: [
      signedAt(270, [within(0.1, 'ml/min')], 'A leak rate has no lower limit: a twentieth of the limit.'),
    ],
  },
  {
    supplier: 'osmere',
    customer: 'brackwell',
    part: '3310-417',
    versions: [
      {
        effectiveDaysAgo: 25,
        steps: [
          {
            daysAgo: 60,
            side: 'customer',
            act: 'propose',
            clauses: [equivalence(0.08)],
            comment: 'The cover is sealed without a gasket from the new year on.',
          },
          { daysAgo: 52, side: 'supplier', act: 'accept' },
          { daysAgo: 50, side: 'customer', act: 'sign' },
        ],
      },
    ],
  },
  {
    supplier: 'velloy',
    customer: 'brackwell',
    versions: [
      signedAt(260, [design(15), calibration, equivalence(0.15)], ''),
      {
        effectiveDaysAgo: 120,
        steps: [
          {
            daysAgo: 140,
            side: 'customer',
            act: 'propose',
            clauses: standardTerms,
            houseTerms: 2,
            comment: 'The same terms for all suppliers from the third quarter on.',
          },
          { daysAgo: 135, side: 'supplier', act: 'accept' },
          { daysAgo: 134, side: 'supplier', act: 'sign' },
          { daysAgo: 133, side: 'customer', act: 'sign' },
        ],
      },
    ],
  },
  {
    supplier: 'velloy',
    customer: 'brackwell',
    part: '9022-011',
    versions: [
      {
        effectiveDaysAgo: 40,
        steps: [
          {
            daysAgo: 80,
            side: 'supplier',
            act: 'propose',
            clauses: [equivalence(0.2)],
            comment: 'A wider margin for the detent spring.',
          },
          {
            daysAgo: 76,
            side: 'supplier',
            act: 'withdraw',
            reason: 'The new tester shows a tenth without trouble.',
          },
        ],
      },
    ],
  },
  {
    supplier: 'tarnfield',
    customer: 'norvane',
    versions: [
      // Half a year: the oldest acceptances under it have run out, one is about to.
      signedAt(310, [design(10), calibration, zeroTest(0.05)], '', { validityMonths: 6 }),
      {
        effectiveDaysAgo: -25,
        steps: [
          {
            daysAgo: 18,
            side: 'supplier',
            act: 'propose',
            clauses: [design(25), resolution, calibration, equivalence(0.15)],
            comment:
              'The zero-difference test asks for fewer readings and a worse gauge. See what it rewards.',
          },
          {
            daysAgo: 11,
            side: 'customer',
            act: 'answer',
            clauses: [design(25, 2), resolution, calibration, equivalence(0.1)],
            terms: { validityMonths: 24, calibrationOverdue: 'on-hold' },
            comment: 'We see it. A tenth of the tolerance, and two attempts at most.',
          },
          {
            daysAgo: 6,
            side: 'supplier',
            act: 'comment',
            about: 'design/readings',
            text: 'Two attempts is one too few while the new pins are being run in. Could it be three until summer?',
          },
          {
            daysAgo: 5,
            side: 'supplier',
            act: 'mark',
            about: ['resolution/share', 'calibration/date', 'bias/mean'],
          },
          {
            daysAgo: 3,
            side: 'customer',
            act: 'comment',
            about: 'design/readings',
            text: 'Three for the shafts, two for everything else. Send us that.',
          },
        ],
      },
    ],
  },
  {
    supplier: 'velloy',
    customer: 'norvane',
    versions: [
      {
        effectiveDaysAgo: -14,
        steps: [
          {
            daysAgo: 6,
            side: 'supplier',
            act: 'propose',
            clauses: [design(20), calibration, equivalence(0.1)],
            comment: 'Our usual terms.',
          },
        ],
      },
    ],
  },
  {
    supplier: 'tarnfield',
    customer: 'osmere',
    versions: [
      {
        effectiveDaysAgo: -12,
        steps: [
          { daysAgo: 21, side: 'customer', act: 'propose', clauses: standardTerms, comment: '' },
          { daysAgo: 9, side: 'supplier', act: 'accept' },
          { daysAgo: 8, side: 'supplier', act: 'sign' },
        ],
      },
    ],
  },
  takenAway,
  longNegotiation,
]
