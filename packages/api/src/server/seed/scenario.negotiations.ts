import type { DemoAgreement } from './scenario.agreements'
import { design, doesNotApply, equivalence, resolution, within } from './scenario.clauses'

/** A narrower agreement that takes a clause of the wider one away. */
export const takenAway: DemoAgreement = {
  supplier: 'tarnfield',
  customer: 'brackwell',
  part: '7741-220',
  characteristic: 5,
  versions: [
    {
      effectiveDaysAgo: 3,
      steps: [
        {
          daysAgo: 20,
          side: 'supplier',
          act: 'propose',
          clauses: [
            doesNotApply(
              'resolution/share',
              'The shoulder is checked with the customer’s own stop gauge, which shows no digits.',
            ),
          ],
          terms: { readingsTakerMaySign: true },
          comment: 'There is nothing to resolve on a stop gauge.',
        },
        { daysAgo: 17, side: 'customer', act: 'accept' },
        { daysAgo: 16, side: 'customer', act: 'sign' },
        { daysAgo: 15, side: 'supplier', act: 'sign' },
      ],
    },
  ],
}

/** Four rounds with comments, a clause taken out and another accepted: it waits for the customer. */
export const longNegotiation: DemoAgreement = {
  supplier: 'velloy',
  customer: 'brackwell',
  part: '9022-005',
  characteristic: 2,
  versions: [
    {
      effectiveDaysAgo: -40,
      steps: [
        {
          daysAgo: 30,
          side: 'supplier',
          act: 'propose',
          clauses: [design(30), resolution, within(0.1, 'mm')],
          terms: { validityMonths: 36 },
          comment: 'A spring has no sharp end: a tenth of a millimetre is what the length means.',
        },
        {
          daysAgo: 27,
          side: 'customer',
          act: 'comment',
          about: 'bias/mean',
          text: 'That is a twelfth of the tolerance. Our house terms say a tenth; why not those?',
        },
        {
          daysAgo: 25,
          side: 'customer',
          act: 'answer',
          clauses: [design(30), resolution, equivalence(0.1)],
          terms: { validityMonths: 12, repaired: 'suspended' },
          comment: 'The share of tolerance as everywhere, and a year.',
        },
        {
          daysAgo: 22,
          side: 'supplier',
          act: 'answer',
          clauses: [design(25), resolution, equivalence(0.1)],
          terms: { validityMonths: 24, repaired: 'suspended' },
          comment: 'Two years, and 25 readings: the chance to show it is the same within a point.',
        },
        {
          daysAgo: 19,
          side: 'supplier',
          act: 'take-out',
          about: ['resolution/share'],
          words: 'The agreement for all part numbers says the same already.',
        },
        {
          daysAgo: 14,
          side: 'customer',
          act: 'mark',
          about: ['bias/mean', 'resolution/share', 'effective-on'],
        },
        {
          daysAgo: 13,
          side: 'customer',
          act: 'comment',
          about: 'terms',
          text: 'We look at the two years with our approver next week.',
        },
      ],
    },
  ],
}
