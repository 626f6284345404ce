import type { front } from '@evenrule/api/contract'
import { frontWords as words } from '../../strings/front'
import { characteristicText } from '../parts/tolerance'

type Waiting = front.Waiting

const pageOf: Record<front.WaitingAct, string> = {
  decide: 'submissions',
  'confirm-as-second-person': 'submissions',
  'answer-challenge': 'submissions',
  'agree-unresolved': 'submissions',
  'agree-one-off': 'submissions',
  'report-condition': 'submissions',
  'confirm-condition': 'submissions',
  'answer-request': 'requests',
  'sign-submission': 'submissions',
  'finish-submission': 'submissions',
  'sign-criteria': 'agreements',
  'answer-proposal': 'agreements',
  'finish-proposal': 'agreements',
  'take-readings': 'studies',
  'confirm-characteristics': 'parts',
}

/** Page of the thing that waits, below the organisation. */
export const pathOf = ({ act, id }: Waiting): string => `${pageOf[act]}/${id}`

/** What is asked and of what, in words: "Sign the submission, bore gauge BG-14". */
export function whatWaits({ act, gauge, name }: Waiting): { act: string; of: string } {
  return { act: words.act[act], of: thingOf(act, gauge, name) }
}

function thingOf(act: front.WaitingAct, gauge: Waiting['gauge'], name: string | null): string {
  const measured = gauge ? `${gauge.name} ${gauge.code}` : ''
  if (act === 'report-condition' || act === 'confirm-condition') return words.condition(name, measured)
  switch (pageOf[act]) {
    case 'requests':
      return words.request(name)
    case 'agreements':
      return words.agreement(name)
    case 'studies':
      return words.study(name ?? '', gauge?.code ?? '')
    default:
      return measured
  }
}

/** The characteristic, part or relationship it is about, in words. */
export function subjectOf({ act, partNumber, characteristic }: Waiting): string {
  const text = characteristic ? characteristicText(characteristic) : null
  if (text) return partNumber ? `${partNumber} / ${text}` : text
  if (act === 'answer-request') return words.asked
  if (!partNumber) return act === 'take-readings' ? '' : words.everything
  return act === 'confirm-characteristics' ? partNumber : words.all(partNumber)
}

/** Clauses met, or what else is counted for the act. */
export function countOf({ act, clausesMet, clausesTotal, count }: Waiting): string {
  if (clausesMet !== null && clausesTotal) return words.ofClauses(clausesMet, clausesTotal)
  return count === null ? '' : (words.counted[act]?.(count) ?? '')
}
