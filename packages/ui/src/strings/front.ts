import type { front } from '@evenrule/api/contract'
import { formatCount } from '../format'

const numerals = [
  'Nothing',
  'One',
  'Two',
  'Three',
  'Four',
  'Five',
  'Six',
  'Seven',
  'Eight',
  'Nine',
  'Ten',
  'Eleven',
  'Twelve',
]
const days = (count: number): string => (count === 0 ? 'today' : formatCount(count, 'day'))

export const frontWords = {
  supplier: {
    question: (total: number) =>
      total === 0
        ? 'Nothing waits on us'
        : `${numerals[total] ?? total} ${total === 1 ? 'thing waits' : 'things wait'} on us`,
    coverage: 'How much of what we supply stands on accepted proof',
    nothing:
      'Proof you are asked for, studies to take, submissions to sign, challenges and proposals to answer appear here.',
  },
  customer: {
    question: (total: number) =>
      total === 0
        ? 'Nothing waits for our decision'
        : `${numerals[total] ?? total} ${total === 1 ? 'thing waits' : 'things wait'} for a decision`,
    coverage: 'How much of what we buy stands on accepted proof',
    nothing: 'Submissions to decide on, proposals to answer and criteria to sign appear here.',
  },
  overdue: (count: number) =>
    count === 0 ? '' : count === 1 ? 'One is overdue.' : `${numerals[count] ?? count} are overdue.`,
  dueOn: 'Due',
  asked: 'named in the request',
  oldest: (age: number) => `The oldest has waited ${age === 0 ? 'since today' : formatCount(age, 'day')}.`,
  safety: (count: number) =>
    count === 0
      ? ''
      : `${count === 1 ? 'One concerns' : `${numerals[count] ?? count} concern`} a safety characteristic.`,
  waitingCaption: 'What waits: what is overdue first, then the longest',
  age: 'Waiting',
  days,
  what: 'What',
  partner: { supplier: 'Customer', customer: 'Supplier' },
  characteristic: 'Characteristic',
  result: 'Result',
  extent: 'Extent',
  ofClauses: (met: number, total: number) => `${met} of ${formatCount(total, 'clause')}`,
  safetyClass: 'safety',
  all: (part: string) => `${part}, all characteristics`,
  everything: 'the whole relationship',
  act: {
    decide: 'Decide',
    'confirm-as-second-person': 'Confirm as second person',
    'answer-challenge': 'Answer the challenge',
    'agree-unresolved': 'Agree to leave it unresolved',
    'agree-one-off': 'Agree to the one-off acceptance',
    'report-condition': 'Fulfil the condition',
    'confirm-condition': 'Confirm the condition',
    'answer-request': 'Prove what is asked for',
    'sign-submission': 'Sign the submission',
    'finish-submission': 'Finish the draft',
    'sign-criteria': 'Sign criteria',
    'answer-proposal': 'Answer the proposal',
    'finish-proposal': 'Finish the proposal',
    'take-readings': 'Take the readings',
    'confirm-characteristics': 'Confirm characteristics',
  } satisfies Record<front.WaitingAct, string>,
  request: (number: string | null) => `request ${number ?? ''}`,
  condition: (number: string | null, gauge: string) => `no. ${number ?? ''} of ${gauge}`,
  agreement: (number: string | null) => (number === null ? '' : `agreement ${number}`),
  study: (code: string, gauge: string) =>
    code.includes(gauge) ? `study ${code}` : `study ${code}, ${gauge}`,
  counted: {
    'answer-request': (count: number) => formatCount(count, 'measuring task'),
    'take-readings': (count: number) => formatCount(count, 'reading'),
    'confirm-characteristics': (count: number) => formatCount(count, 'characteristic'),
    'answer-proposal': (count: number) => formatCount(count, 'clause'),
    'finish-proposal': (count: number) => formatCount(count, 'clause'),
    'sign-criteria': (count: number) => formatCount(count, 'clause'),
  } as Partial<Record<front.WaitingAct, (count: number) => string>>,
  requests: 'Which proof we asked for and do not have yet',
  allRequests: (open: number) => `All ${open} open`,
  part: 'Part',
  characteristics: 'Characteristics',
  covered: 'Covered',
  coveredOf: (covered: number, total: number) => `${covered} of ${total}`,
  coverageCaption: 'Coverage by part',
  noCharacteristics: 'none entered yet',
} as const

interface Step {
  title: string
  text: string
  /** Page below the organisation. */
  to: string
  label: string
}

/** What an organisation without any part does first. */
export const firstSteps: Record<'supplier' | 'customer', { title: string; text: string; steps: Step[] }> = {
  supplier: {
    title: 'Begin here',
    text: 'Proof begins with a part that a customer buys and a gauge that measures it.',
    steps: [
      {
        title: 'See your customers',
        text: 'A customer has to invite you, and you to accept, before anything else can be entered.',
        to: 'relationships',
        label: 'Open customers',
      },
      {
        title: 'Enter a part number and its characteristics',
        text: 'Nominal, limits, unit and class as on the drawing. Your customer confirms them.',
        to: 'parts',
        label: 'Open parts',
      },
      {
        title: 'Register gauges and reference standards',
        text: 'With resolution, calibration and certificate. Then say which gauge measures which characteristic.',
        to: 'gauges',
        label: 'Open gauges',
      },
      {
        title: 'Agree on the criteria',
        text: 'Propose clauses, or answer those of your customer, before the first reading is taken.',
        to: 'agreements',
        label: 'Open agreements',
      },
    ],
  },
  customer: {
    title: 'Begin here',
    text: 'Suppliers can prove their measuring systems once they know what you buy and what you ask.',
    steps: [
      {
        title: 'See your suppliers',
        text: 'Invite them by e-mail: only those who work with you here can send you proof.',
        to: 'relationships',
        label: 'Open suppliers',
      },
      {
        title: 'Enter a part number and its characteristics',
        text: 'Nominal, limits, unit and class as on the drawing, or confirm what a supplier entered.',
        to: 'parts',
        label: 'Open parts',
      },
      {
        title: 'Propose criteria',
        text: 'For a supplier, a part number or one characteristic. You see what each clause rewards before you sign.',
        to: 'agreements',
        label: 'Open agreements',
      },
    ],
  },
}

export const relationshipWords = {
  question: { supplier: 'Who are our customers?', customer: 'Who are our suppliers?' },
  answer: {
    supplier: (total: number) => `We supply ${formatCount(total, 'customer')} here.`,
    customer: (total: number) => `${formatCount(total, 'supplier')} can send us proof here.`,
  },
  caption: { supplier: 'Customers', customer: 'Suppliers' },
  search: 'Search name',
  name: 'Name',
  number: { supplier: 'Our number there', customer: 'Supplier number' },
  timeZone: 'Days are judged in',
  since: 'Since',
  parts: 'Parts',
  agreements: 'Agreements',
  submissions: 'Submissions',
  record: 'Record',
  links: 'Open',
  emptyTitle: { supplier: 'No customer yet', customer: 'No supplier yet' },
  emptyText: {
    supplier:
      'A customer invites you by e-mail. Have the invitation sent to an admin of yours; once it is accepted, the customer is listed here.',
    customer: 'An admin invites a supplier by e-mail; once it has accepted, it is listed here.',
  },
} as const
