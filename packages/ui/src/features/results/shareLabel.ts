import type { Clause, Judgement } from '@evenrule/metrology'
import { indexWords, shareOfWords } from '../../strings/results'

/**
 * "share of tolerance" for a clause whose figure is a share, "Cg" where that index decided; other clauses keep their own
 * word.
 */
export function shareLabel(clause: Clause, judgement?: Pick<Judgement, 'reason'>): string | undefined {
  if (clause.type === 'resolution-share') return shareOfWords[clause.parameters.base]
  return judgement?.reason.index === 'cg' ? indexWords.cg : undefined
}
