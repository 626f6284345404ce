import type { Clause } from '@evenrule/metrology'
import { shareOfWords } from '../../strings/results'

/** "share of tolerance" for a clause whose figure is a share; other clauses keep their own word. */
export const shareLabel = (clause: Clause): string | undefined =>
  clause.type === 'resolution-share' ? shareOfWords[clause.parameters.base] : undefined
