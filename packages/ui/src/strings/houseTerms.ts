import type { houseTerms } from '@evenrule/api/contract'
import { capital, countWord, formatCount, joinWords } from '../format'
import { several } from './agreements'

export const houseTermsNames = {
  heading: 'House terms',
  version: (number: number | null) => (number === null ? 'Draft' : `House terms ${number}`),
} as const

/** The list of house terms. */
export const houseTermsListWords = {
  question: {
    customer: 'Which terms do we offer our suppliers?',
    supplier: 'Which terms do our customers offer?',
  },
  offered: (number: number, day: string) => `House terms ${number} are offered since ${day}.`,
  noneOffered: 'No house terms are published yet.',
  draft: 'A draft of the next ones is not published.',
  supplierSome: (count: number) =>
    `${several(count, 'customer')} ${count === 1 ? 'offers' : 'offer'} house terms.`,
  supplierNone: 'None of our customers has published house terms.',
  binds: 'They bind nobody until both sides have signed them.',
  begin: 'Begin a draft',
  goOn: 'Go on with the draft',
  caption: 'House terms',
  search: 'Search words or customer',
  name: 'House terms',
  customer: 'Customer',
  standing: 'Standing',
  clauses: 'Clauses',
  words: 'Why they are so',
  published: 'Published',
  current: 'offered now',
  earlier: 'earlier',
  isDraft: 'not published',
  show: 'Show',
  shows: { all: 'all versions', current: 'offered now' },
  count: (count: number) => formatCount(count, 'clause'),
  emptyTitle: 'No house terms yet',
  emptyText:
    'House terms are the clauses you offer by default. Every supplier of yours can read them and begin a proposal from them; they bind nobody until both sides sign.',
  emptySupplier: 'As soon as a customer publishes house terms, they stand here.',
} as const

/** One version of house terms. */
export const houseTermsWords = {
  question: (number: number | null, customer: string | null) =>
    number === null
      ? 'Which terms do we want to offer next?'
      : customer === null
        ? `What do our house terms ${number} ask for?`
        : `What do house terms ${number} of ${customer} ask for?`,
  answer: (clauses: number, terms: number) =>
    `${capital(
      joinWords([
        ...(clauses ? [`${countWord(clauses)} ${clauses === 1 ? 'clause' : 'clauses'}`] : []),
        ...(terms ? [`${countWord(terms)} ${terms === 1 ? 'term' : 'terms'}`] : []),
      ]),
    )}.`,
  nothing: 'Nothing is in them yet.',
  current: 'They are offered now.',
  earlier: 'Later ones have taken their place; agreements begun from these stay as they are.',
  draft: 'Our draft, not published.',
  draftRest: 'No supplier sees it.',
  published: (day: string, by: string | null) => `Published ${day}${by ? ` by ${by}` : ''}`,
  hash: 'SHA-256',
  clauses: 'Clauses',
  clausesCaption: 'Clauses of these house terms',
  termsCaption: 'Terms of these house terms',
  about: 'About',
  clause: 'Clause',
  what: 'What it asks for',
  value: 'Says',
  noClauses: 'No clause is in them.',
  words: 'Why they are so',
  wordsHint: 'Suppliers read it with the terms.',
  save: 'Save draft',
  saved: 'Draft saved.',
  publish: 'Publish',
  publishTitle: 'Publish these house terms?',
  publishText:
    'Every supplier of yours can read them from then on. They cannot be changed, only followed by later ones, and they bind nobody by themselves.',
  saveFirst: 'Save the draft before you publish it.',
  saysNothing: 'Add a clause or a term before you publish.',
  discard: 'Discard the draft',
  discardTitle: 'Discard this draft?',
  discardText: 'No supplier has seen it. It cannot be brought back.',
  next: 'Begin a draft from these',
  offer: 'Offer to suppliers',
  propose: 'Begin a proposal from these',
} as const

/** Offering published house terms to chosen suppliers. */
export const offerWords = {
  title: (number: number) => `Offer house terms ${number} to suppliers`,
  text: 'Each supplier gets them as a proposal of ours for all parts. An approver of each side signs.',
  suppliers: 'Suppliers',
  suppliersMissing: 'Choose at least one supplier.',
  all: 'Choose all',
  none: 'There is no supplier yet.',
  effectiveOn: 'First day in force',
  effectiveOnMissing: 'Choose the first day in force.',
  comment: 'Comment to the suppliers',
  act: 'Send the proposals',
  offered: (count: number) => `${several(count, 'proposal')} ${count === 1 ? 'is' : 'are'} sent.`,
  open: (name: string) => `Open the negotiation with ${name}`,
  refusedHeading: 'Not sent',
} as const

export const offerRefusalWords: Record<(typeof houseTerms.offerRefusals)[number], string> = {
  'negotiation-open': 'a proposal for all parts is under negotiation already',
  'draft-exists': 'our side has a draft for all parts already; send or discard it first',
  'clauses-cannot-be-agreed': 'a clause can be computed for none of its characteristics',
  'not-found': 'there is no relationship any more',
}
