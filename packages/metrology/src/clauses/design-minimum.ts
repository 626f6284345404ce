import type { ClauseDescriptor, Judgement, Reason, Verdict } from '../types'

/**
 * Design of the study: least readings, registration before the first reading, most attempts. Judged on documents;
 * it meets or falls short, and is not shown without a study.
 */
export const designMinimum: ClauseDescriptor<'design-minimum'> = {
  type: 'design-minimum',
  subject: 'design',
  measure: 'readings',
  basis: 'document',
  studyKind: 'bias',
  fields: [
    { name: 'readings', kind: 'integer', required: true, minimum: 2, maximum: 100_000, default: 15 },
    { name: 'registeredBeforehand', kind: 'boolean', required: true, default: true },
    { name: 'attempts', kind: 'integer', required: false, minimum: 1, maximum: 1000 },
  ],
  check: () => [],
  judge: ({ parameters }, { design, study }) => {
    const n = study?.n ?? null
    const answer = (verdict: Verdict, reason: Reason): Judgement => ({
      verdict,
      figure: n,
      interval: null,
      limits: { lower: parameters.readings, upper: null },
      quantity: 'count',
      reason: { ...reason, readings: n, least: parameters.readings },
    })
    if (n === null) return answer('not-shown', { code: 'no-study' })
    if (n < parameters.readings) return answer('falls-short', { code: 'too-few-readings' })
    const needsDesign = parameters.registeredBeforehand || parameters.attempts !== undefined
    if (!design) {
      return needsDesign
        ? answer('not-shown', { code: 'design-unknown' })
        : answer('meets', { code: 'design-as-agreed' })
    }
    if (parameters.registeredBeforehand && !design.registeredBeforehand) {
      return answer('falls-short', { code: 'not-registered-beforehand' })
    }
    const most = parameters.attempts ?? null
    const attempts = { attempts: design.attempts, most }
    return most !== null && design.attempts > most
      ? answer('falls-short', { code: 'too-many-attempts', ...attempts })
      : answer('meets', { code: 'design-as-agreed', ...attempts })
  },
  readingsNeeded: ({ parameters }) => ({ readings: parameters.readings, chance: null, reason: 'minimum' }),
}
