import type { agreements, Side } from '@evenrule/api/contract'
import { countWord, formatCount, formatDate, formatDateTime, joinWords } from '../format'
import { several, whose } from './agreements'

/** The list of what can be added to a proposal. */
export const addWords = {
  heading: 'Add a clause',
  close: 'Close the list',
  any: 'For any subject',
  there: 'In it already.',
  taken: 'Another kind of it is in already; change the kind there.',
} as const

const person = (by: string | null): string => by ?? 'Somebody of our side'

/** Two people wrote on one round. */
export const conflictWords = {
  heading: (by: string | null) => `${person(by)} saved this round meanwhile`,
  headingOther: (other: string) => `${other} changed its round meanwhile`,
  text: 'Nothing you typed is lost. Choose what counts, then go on; nothing is saved before you do.',
  savedAt: (at: string) => `Saved ${formatDateTime(at)}.`,
  caption: 'What was saved meanwhile beside what you typed',
  piece: 'About',
  theirs: (by: string | null) => `Saved by ${person(by)}`,
  theirsOther: (other: string) => `From ${other}`,
  mine: 'Yours, not saved',
  takeTheirs: 'Take all of theirs',
  keepMine: 'Keep all of mine',
  go: 'Go on with this choice',
  nothing: 'not in it',
  empty: 'empty',
  onlyTheirs: 'only they changed it',
  onlyMine: 'only you changed it',
  bothChanged: 'both changed it',
  unreadable: 'not complete yet',
  texts: {
    effectiveOn: 'First day in force',
    comment: 'Comment to the other side',
    words: 'Why they are so',
  } as Record<string, string | undefined>,
  choose: (what: string) => `Which counts: ${what}`,
} as const

/** What is typed for a round that can no longer be saved. */
export const goneWords = {
  text: 'Somebody of our side sent or discarded this round meanwhile, so it cannot be saved here. What you typed stays until you close the form.',
  discarded:
    'Somebody of our side discarded this draft meanwhile. What you typed is still here, not saved; saving it begins the answer anew.',
  replaced: (from: number, to: number) =>
    `This answer was begun for round ${from}; round ${to} stands now. Look at what changed below before you send it.`,
} as const

const points = (count: number): string => `${countWord(count)} ${count === 1 ? 'point' : 'points'}`

/** Who has accepted what of the standing round. */
export const acceptanceWords = {
  column: 'Accepted',
  accept: 'Accept',
  acceptLabel: (what: string) => `Accept: ${what}`,
  takeBack: 'Take back',
  takeBackLabel: (what: string) => `Take back the acceptance: ${what}`,
  agreed: 'both sides accept',
  ours: 'we accept',
  theirs: (other: string) => `${other} accepts`,
  open: 'open',
  since: (round: number, at: string) => `since round ${round}, ${formatDate(at)}`,
  takeOut: 'Take out',
  takeOutLabel: (what: string) => `Take out of our round: ${what}`,
  lineOurs: (other: string, accepted: number, total: number) =>
    accepted === 0
      ? `We stand by our round; ${other} has marked nothing as accepted yet.`
      : accepted === total
        ? `We stand by our round; ${other} has marked everything in it as accepted.`
        : `We stand by our round; ${other} has marked ${countWord(accepted)} of ${points(total)} as accepted.`,
  lineTheirs: (other: string, accepted: number, total: number) =>
    accepted === 0
      ? `${other} stands by its round; we have marked nothing as accepted yet.`
      : accepted === total
        ? `${other} stands by its round; we have marked everything in it as accepted. Accept the proposal to fix its text.`
        : `${other} stands by its round; we have marked ${countWord(accepted)} of ${points(total)} as accepted.`,
  leftOut: 'left out of this round',
  firstDay: 'First day in force',
  terms: 'Terms',
} as const

/** Comments on one point of a negotiation. */
export const commentWords = {
  comment: 'Comment',
  count: (count: number) => formatCount(count, 'comment'),
  of: (what: string) => `: ${what}`,
  hide: 'Hide comments',
  none: 'Nobody has commented on this yet.',
  field: (other: string) => `Comment for ${other}`,
  hint: 'Both sides read it; it cannot be changed later.',
  send: 'Send the comment',
  missing: 'Write the comment first.',
  onRound: (round: number) => `on round ${round}`,
  by: (by: string | null, side: Side, own: Side, other: string) =>
    [by, side === own ? 'our side' : other].filter(Boolean).join(', '),
  closed: 'Comments are closed with the negotiation.',
} as const

export const takeOutWords = {
  title: (what: string) => `Take “${what}” out of our round?`,
  text: (other: string) =>
    `The round is sent anew without it, and ${other} sees why. What the other side has accepted of the rest stays accepted.`,
  reason: 'Reason',
  reasonHint: 'Both sides read it with the round.',
  act: 'Take the clause out',
} as const

/** Any two rounds side by side. */
export const compareWords = {
  heading: 'Compare any two rounds',
  from: 'Earlier',
  to: 'Later',
  round: (version: string, round: number, side: Side, own: Side, other: string) =>
    `${version}round ${round}, ${whose(side, own, other)}`,
  version: (number: number | null) => (number === null ? '' : `Version ${number}, `),
  inForce: 'what is in force',
  same: 'These two rounds say the same.',
  changed: (count: number) => `${several(count, 'point')} ${count === 1 ? 'differs' : 'differ'}.`,
  caption: (from: string, to: string) => `Differences from ${from} to ${to}`,
  what: 'About',
  change: 'Change',
  marks: { changed: 'changed', added: 'added', removed: 'taken out', same: 'unchanged' },
  was: 'was',
  now: 'now',
  showSame: (count: number) => `Show what is the same (${count})`,
  hideSame: 'Hide what is the same',
  missing: 'not in it',
} as const

/** The challenge that asks for the change. */
export const caseWords = {
  text: 'A challenge asks for this change of criteria.',
  link: 'Open the challenge',
  answer: 'Answer the challenge with it',
  cannotBegin:
    'You came from a challenge to change the criterion, but these criteria are under negotiation and it is not our turn. Wait for the answer or withdraw what we proposed; then begin again from the challenge.',
  attach: 'The challenge you came from is attached to this proposal, and both sides see it.',
} as const

/** Where a round came from or what its own side took out of it. */
export const roundNotes = {
  houseTerms: (number: number) => `Begun from house terms ${number}.`,
  withdrawn: (what: readonly string[]) => `Taken out by its own side: ${joinWords(what)}.`,
  answers: (round: number) => `answers round ${round}`,
  replaced: 'replaced',
} as const

export const stateOfRound: Record<agreements.RoundState, string> = {
  draft: 'not sent',
  sent: '',
  accepted: 'accepted',
  answered: 'answered',
  replaced: 'replaced by its own side',
  withdrawn: 'withdrawn',
}
