import type { RequestState, RequestTaskState, requests } from '@evenrule/api/contract'
import { formatCount, formatDate } from '../format'

export const occasionWords: Record<requests.RequestOccasion, string> = {
  'new-part': 'new part',
  change: 'change',
  yearly: 'yearly',
  complaint: 'complaint',
  other: 'other',
}

export const requestStateWords: Record<RequestState, string> = {
  open: 'Open',
  answered: 'Answered, to be decided',
  closed: 'Closed, all accepted',
  withdrawn: 'Withdrawn',
}

export const requestTaskWords: Record<RequestTaskState, string> = {
  open: 'No answer yet',
  refused: 'Refused, asked for again',
  answered: 'Answered, to be decided',
  accepted: 'Accepted',
}

/** How far a day is: "in 6 days", "today", "3 days overdue". */
export function daysLeftText(days: number): string {
  if (days < 0) return `${formatCount(-days, 'day')} overdue`
  return days === 0 ? 'today' : `in ${formatCount(days, 'day')}`
}

const tasks = (count: number): string => formatCount(count, 'measuring task')
const are = (count: number): string => (count === 1 ? 'is' : 'are')
const have = (count: number): string => (count === 1 ? 'has' : 'have')

export const requestWords = {
  question: {
    supplier: 'Which proof are we asked for?',
    customer: 'Which proof have we asked for?',
  },
  listAnswer: (open: number, overdue: number): [strong: string, rest: string] => [
    open === 0 ? 'No request is open.' : `${formatCount(open, 'request')} ${are(open)} open`,
    open === 0 ? '' : overdue === 0 ? ', none of them overdue.' : `, ${overdue} of them overdue.`,
  ],
  caption: 'Requests for proof',
  search: 'Search number, part, gauge, words',
  state: 'State',
  due: 'Due',
  dueChoices: { overdue: 'overdue', soon: 'within 30 days' },
  partner: { supplier: 'Customer', customer: 'Supplier' },
  request: 'Request',
  number: (number: number) => `Request ${number}`,
  owed: 'Without an answer',
  owedOf: (owed: number, all: number) => `${owed} of ${tasks(all)}`,
  occasion: 'Occasion',
  askedAt: 'Asked on',
  askFor: 'Ask for proof',
  emptyTitle: 'No request yet',
  emptyText: {
    supplier: 'When a customer asks for proof of a measuring task by a day, it stands here.',
    customer: 'Ask a supplier for proof of named measuring tasks by a day; here you see how far it has come.',
  },
  noneOpenTitle: 'No request is open',
  noneOpenText: 'Those that are answered, closed or withdrawn are left out.',
  showAll: 'Show all requests',

  oneQuestion: {
    supplier: (partner: string, dueOn: string) =>
      `Have we proved to ${partner} what is due by ${formatDate(dueOn)}?`,
    customer: (partner: string, dueOn: string) =>
      `Has ${partner} proved what we asked for by ${formatDate(dueOn)}?`,
  },
  oneAnswer: {
    open: (owed: number, all: number): string => {
      if (all === 1) return 'Not yet: the measuring task has no answer.'
      return owed === all
        ? `Not yet: none of the ${tasks(all)} has an answer.`
        : `Not yet: ${owed} of ${tasks(all)} ${have(owed)} no answer.`
    },
    answered: (answered: number): string =>
      `Everything is answered; ${answered} ${answered === 1 ? 'waits' : 'wait'} for the decision.`,
    closed: (all: number): string =>
      all === 1 ? 'Yes: it is accepted.' : `Yes: all ${tasks(all)} are accepted.`,
    withdrawn: 'It asks for no answer any more.',
  },
  days: {
    over: (days: number) => `It is ${formatCount(-days, 'day')} overdue.`,
    left: (days: number) =>
      days === 0 ? 'Today is the last day.' : `${formatCount(days, 'day')} ${are(days)} left.`,
  },
  meta: (number: number, occasion: string, askedAt: string, by: string | null) =>
    `Request ${number} · occasion: ${occasion} · asked on ${formatDate(askedAt)}${by ? ` by ${by}` : ''}`,
  withdrawnBy: (at: string, by: string | null, reason: string) =>
    `Withdrawn on ${formatDate(at)}${by ? ` by ${by}` : ''}: “${reason}”`,
  words: { supplier: 'What the customer says', customer: 'What we said' },
  tasks: 'Measuring tasks asked for',
  task: 'Characteristic',
  gauge: 'Gauge',
  answer: 'Answer',
  proof: 'Proof today',
  next: 'Next step',
  submission: (number: number) => `Submission ${number}`,
  toTask: 'Open the task',
  ended: 'ended by the supplier',
  plan: 'Plan a study',
  toStudy: (code: string) => `Go on with study ${code}`,
  prepare: 'Prepare the submission',
  toDraft: 'Go on with the submission',
  record: 'Record of this request',

  withdraw: 'Withdraw the request',
  withdrawTitle: 'Withdraw this request?',
  withdrawText:
    'The supplier is told, and nothing has to be answered any more. Both sides keep it with the reason.',
  moveDate: 'Move the date',
  moveTitle: 'By when instead?',
  newDate: 'New date',
  reason: 'Reason',
  reasonHint: 'The supplier reads it.',
  reasonMissing: 'Say why.',
  dateMissing: 'Enter a day.',
} as const

export const askWords = {
  question: 'What do we want proof of, and by when?',
  answer:
    'The supplier is told at once, and reminded a week and a day before. A signed submission of a task answers it.',
  supplier: 'Supplier',
  supplierMissing: 'Choose the supplier.',
  supplierPlaceholder: 'Search supplier',
  noSupplier: 'No supplier of this name',
  dueOn: 'Due by',
  dueHint: 'A day in the calendar of this relationship.',
  dueMissing: 'Enter the day by which you want it.',
  occasion: 'Occasion',
  occasionMissing: 'Choose the occasion.',
  words: 'What the supplier should know',
  wordsHint: 'May stay empty.',
  tasks: 'Measuring tasks',
  tasksHint: (most: number) => `Choose up to ${most}. Those without accepted proof come first.`,
  tasksMissing: 'Choose at least one measuring task.',
  chosen: (count: number) => (count === 0 ? 'None chosen yet.' : `${tasks(count)} chosen:`),
  remove: 'leave out',
  leaveOut: (label: string) => `Leave out ${label}`,
  choose: 'Choose',
  chooseTask: (label: string) => `Ask for ${label}`,
  caption: 'Measuring tasks of this supplier',
  search: 'Search part, characteristic, gauge',
  proof: 'Proof',
  proofChoices: { missing: 'not accepted', accepted: 'accepted' },
  class: 'Class',
  characteristic: 'Characteristic',
  gauge: 'Gauge',
  asked: 'Asked for already',
  askedIn: (numbers: readonly number[]) =>
    `in request${numbers.length === 1 ? '' : 's'} ${numbers.join(', ')}`,
  notAsked: 'no',
  emptyTitle: 'No measuring task yet',
  emptyText:
    'This supplier has named no gauge for any characteristic. Measuring tasks are entered by the supplier.',
  chooseSupplierFirst: 'Choose the supplier first; then its measuring tasks appear here.',
} as const
