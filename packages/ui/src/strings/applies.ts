import type { agreements, Side } from '@evenrule/api/contract'
import { capital, countWord, formatCount, formatDate, joinWords } from '../format'
import { scopeText, several } from './agreements'

type WhyNot = agreements.WhyNot
type By = Extract<WhyNot, { code: 'wider-scope' }>['by']

const scopeIn: Record<agreements.ScopeKind, string> = {
  relationship: 'all parts',
  part: 'this part',
  characteristic: 'this characteristic',
}

const named = (agreement: number, version: number): string => `agreement ${agreement}, version ${version}`
const byText = ({ agreementNumber, versionNumber, scope }: By): string =>
  `${named(agreementNumber, versionNumber)}, for ${scopeIn[scope]}`

/** The page "what applies to this measuring task on this day, and why". */
export const appliesWords = {
  crumb: 'What applies',
  link: 'What applies to a measuring task, and why',
  questionOpen: 'Which criteria apply to a measuring task on a day, and why?',
  choose: 'Choose the measuring task and the day.',
  question: (gauge: string, characteristic: string, day: string) =>
    `Which criteria apply to ${gauge} on ${characteristic} on ${formatDate(day)}?`,
  none: (day: string) => `No criteria apply on ${formatDate(day)}.`,
  noneRest: 'What is measured then can be judged only by criteria that both sides signed for that day.',
  apply: (count: number) => `${several(count, 'clause')} ${count === 1 ? 'applies' : 'apply'}.`,
  from: (counts: { scope: agreements.ScopeKind; count: number }[]) =>
    `${capital(
      joinWords(
        counts.map(({ scope, count }) => `${countWord(count)} from what was signed for ${scopeIn[scope]}`),
      ),
    )}.`,
  since: (day: string) => `Criteria are in force without a gap since ${formatDate(day)}.`,
  task: 'Measuring task',
  searchTask: 'Gauge, part or characteristic',
  noTask: 'No measuring task is found.',
  day: 'Day',
  dayHint: 'In the time zone of the relationship.',
  clauses: 'Clauses',
  clausesCaption: 'Clauses that apply on the day, and those that do not',
  termsHeading: 'Terms',
  termsCaption: 'Terms that count on the day, and those that do not',
  about: 'About',
  applies: 'What applies',
  counts: 'What counts',
  why: 'Why',
  others: 'What does not, and why',
  nothing: 'nothing',
  takenAway: 'does not apply',
  source: ({ agreementNumber, versionNumber }: agreements.CriterionSource) =>
    capital(named(agreementNumber, versionNumber)),
  signedFor: (scope: agreements.AgreementScope, from: string) =>
    `for ${scopeIn[scope.kind]}, in force from ${formatDate(from)}`,
  unsigned: (scope: agreements.AgreementScope) => `for ${scopeIn[scope.kind]}`,
  standard: 'No agreement says it: the usual rule counts.',
  elsewhere: (total: number, shown: number) =>
    total === 0
      ? ''
      : `${formatCount(total, 'agreement')} for other parts or characteristics ${total === 1 ? 'is' : 'are'} in force on that day${
          shown < total ? `; ${countWord(shown)} of them ${shown === 1 ? 'is' : 'are'} named here` : ''
        }.`,
  empty: 'No agreement says anything that concerns this measuring task.',
  toTask: 'Open the measuring task',
} as const

const unsignedStates: Record<Extract<WhyNot, { code: 'not-signed' }>['state'], string> = {
  proposed: 'only proposed, not agreed',
  countered: 'still under negotiation',
  agreed: 'agreed, but not signed by both sides',
  lapsed: 'lapsed, because both sides had not signed in time',
  withdrawn: 'withdrawn',
}

/** Why something that an agreement says does not count on the day. */
export function whyNotText(
  why: WhyNot,
  source: Pick<agreements.CriterionSource, 'scope'>,
  parties: Record<Side, string>,
): string {
  switch (why.code) {
    case 'wider-scope':
      return `the narrower scope counts: ${byText(why.by)}`
    case 'does-not-apply':
      return `taken away by ${byText(why.by)}: ${why.reason}`
    case 'not-yet-in-force':
      return `in force only from ${formatDate(why.effectiveOn)}`
    case 'superseded':
      return `superseded by version ${why.by.versionNumber} since ${formatDate(why.since)}`
    case 'not-signed':
      return [
        unsignedStates[why.state],
        why.signedBy.length ? `signed so far by ${joinWords(why.signedBy.map((side) => parties[side]))}` : '',
      ]
        .filter(Boolean)
        .join('; ')
    case 'other-part':
      return `for another part: ${scopeText(source.scope)}`
    case 'other-characteristic':
      return `for another characteristic: ${scopeText(source.scope)}`
  }
}
