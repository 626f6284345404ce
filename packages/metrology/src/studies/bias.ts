import { clauseDescriptor, clauseKey } from '../clauses'
import { mostReadings } from '../kinds/sample-size'
import type { StudyKindDescriptor } from '../types'

/** Repeated readings of one reference object, in the order taken. */
export const biasStudy: StudyKindDescriptor<'bias'> = {
  kind: 'bias',
  columns: [{ name: 'reading', role: 'reading', kind: 'number', required: true }],
  figures: [
    { name: 'n', path: ['n'], quantity: 'count' },
    { name: 'mean', path: ['mean'], quantity: 'value' },
    { name: 'bias', path: ['bias'], quantity: 'value' },
    { name: 'standardDeviation', path: ['standardDeviation'], quantity: 'value' },
    { name: 'standardError', path: ['standardError'], quantity: 'value' },
    { name: 'shareOfTolerance', path: ['shareOfTolerance'], quantity: 'share' },
    { name: 'cg', path: ['cg'], quantity: 'ratio' },
    { name: 'cgk', path: ['cgk'], quantity: 'ratio' },
  ],
  fewestReadings: 2,
  mostReadings,
  plan: (clauses, characteristic, truth, power) => {
    const byClause = clauses.flatMap((clause) => {
      const needed = clauseDescriptor(clause).readingsNeeded?.(clause, characteristic, truth, power)
      return needed ? [{ clauseKey: clauseKey(clause), ...needed }] : []
    })
    const sizes = byClause.map(({ readings }) => readings).filter((readings) => readings !== null)
    // A clause that no size suffices for has no plan, whatever the others need.
    const impossible = byClause.some(({ reason }) => reason === 'no-size-suffices')
    return { readings: impossible || sizes.length === 0 ? null : Math.max(...sizes), byClause }
  },
}
