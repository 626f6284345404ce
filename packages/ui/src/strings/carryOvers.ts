import type { standings } from '@evenrule/api/contract'
import { formatCount, formatDate } from '../format'
import { standingStateWords } from './standings'

type Row = standings.CarryOver

export const carryOverWords = {
  heading: (revision: string) => `What was accepted before revision ${revision}`,
  characteristic: 'Characteristic',
  submission: 'Accepted',
  task: 'Measured by',
  pick: 'Choose',
  pickOne: (number: number) => `Choose submission ${number}`,
  state: (revision: string) => `For revision ${revision}`,
  numbered: (number: number, name: string) => `${number} ${name}`,
  ofRevision: (number: number, revision: string) => `submission ${number}, revision ${revision}`,
  customerCarries: 'An approver of the customer carries over what did not change.',
  carryAll: (count: number) => (count === 1 ? 'Carry it over' : `Carry over all ${count} unchanged`),
  carryChosen: (count: number) => `Carry over ${formatCount(count, 'acceptance')}`,
  title: (count: number, revision: string) =>
    `Carry ${formatCount(count, 'acceptance')} over to revision ${revision}?`,
  text: (revision: string) =>
    `You sign that what was accepted holds for revision ${revision} too: nominal, limits, unit and class of these characteristics are the same. The supplier is told, and it stands in the record of both sides.`,
} as const

/** How an earlier acceptance stands for the current revision, and what else stops it. */
export function carryOverState({ limits, carriedOverOn, carriedOverBy, standing }: Row): string {
  const besides = standing === 'stands' ? '' : `; it is ${standingStateWords[standing]} besides`
  if (carriedOverOn !== null)
    return `carried over on ${formatDate(carriedOverOn)}${carriedOverBy ? ` by ${carriedOverBy}` : ''}${besides}`
  const reopened: Record<Row['limits'], string> = {
    same: 'reopened; its limits did not change',
    differ: 'reopened; its limits changed, new proof is needed',
    missing: 'reopened; the revision has no such characteristic',
  }
  return limits === 'same' ? reopened.same + besides : reopened[limits]
}

/** Whether an earlier acceptance covers the current revision today. */
export const holdsForRevision = ({ carriedOverOn, standing }: Row): boolean =>
  carriedOverOn !== null && standing === 'stands'

/** How much of what was accepted holds for the current revision: the decisive part, and the rest. */
export function carryOverAnswer(revision: string, rows: readonly Row[]): { strong: string; rest: string } {
  const carried = rows.filter(holdsForRevision).length
  const open = rows.filter(({ carriedOverOn }) => carriedOverOn === null)
  const same = open.filter(({ limits }) => limits === 'same').length
  const other = open.length - same
  const strong =
    carried === rows.length
      ? `All of it holds for revision ${revision}.`
      : carried === 0
        ? `None of it holds for revision ${revision} yet.`
        : `${carried} of ${formatCount(rows.length, 'acceptance')} ${carried === 1 ? 'holds' : 'hold'} for revision ${revision}.`
  const rest = [
    same > 0 ? `${same} ${same === 1 ? 'rests' : 'rest'} on limits that did not change.` : '',
    other > 0 ? `${other} ${other === 1 ? 'needs' : 'need'} new proof.` : '',
  ]
  return { strong, rest: rest.filter(Boolean).join(' ') }
}
