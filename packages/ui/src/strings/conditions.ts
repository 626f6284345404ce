import type { Side } from '@evenrule/api/contract'
import type { FollowUp } from '@evenrule/api/contract/conditions'
import type { ConditionState } from '@evenrule/api/contract/moves/condition'
import { formatDate } from '../format'
import type { Parties } from './submissions'

export const followUpWords: Record<FollowUp, string> = {
  'new-study': 'A new study',
  document: 'A document',
  action: 'Something done',
  other: 'Something else',
}

export const conditionWords = {
  heading: 'What must still follow?',
  numbered: (number: number) => `Condition ${number}`,
  words: 'What must follow',
  wordsHint: 'Such as “Repeat the study with 30 readings on the new fixture”.',
  dueOn: 'Until when',
  followUp: 'What shows it',
  owner: 'Who owes it',
  owners: (parties: Parties): Record<Side, string> => ({
    supplier: parties.supplier,
    customer: parties.customer,
  }),
  add: 'Add a condition',
  remove: 'Take out',
  sayWhat: 'Say what must follow.',
  sayWhen: 'Choose the day by which it must follow.',
  dueInPast: 'Choose a day from today on.',
  chooseFollowUp: 'Choose what shows that it is fulfilled.',
  lapses:
    'A condition that is not confirmed by the end of its day makes the acceptance lapse until you confirm it.',
  states: {
    open: 'open',
    reported: 'reported done',
    confirmed: 'confirmed',
  } satisfies Record<ConditionState, string>,
  overdue: 'not confirmed in time',
  owes: (who: string, day: string) => `${who} owes it until ${formatDate(day)}`,
  confirmedOn: (day: string) => `confirmed on ${formatDate(day)}`,
  all: (count: number) =>
    count === 1 ? 'The condition is confirmed.' : `All ${count} conditions are confirmed.`,
  lapsed: (numbers: string, count: number) =>
    `${numbers} ${count === 1 ? 'was' : 'were'} not confirmed in time: the acceptance has lapsed.`,
  reportMoves: {
    report: 'reported it done',
    confirm: 'confirmed it',
    return: 'did not take it for fulfilled',
  },
} as const

export const conditionActs = {
  report: {
    act: 'Report it done',
    title: 'Report the condition done',
    text: (parties: Parties) => `${parties.customer} is told and confirms it.`,
    field: 'What was done',
    submit: 'Report it done',
    missing: 'Say what was done.',
  },
  confirm: {
    act: 'Confirm it is fulfilled',
    title: 'Confirm that it is fulfilled?',
    text: () => 'The condition is settled for good, and both sides see it.',
    field: 'Closing words',
    submit: 'Confirm it is fulfilled',
    missing: '',
  },
  return: {
    act: 'Not fulfilled yet',
    title: 'Not fulfilled yet?',
    text: () => 'The condition is open again; its day stays.',
    field: 'What is missing',
    submit: 'Not fulfilled yet',
    missing: 'Say what is missing.',
  },
} as const
