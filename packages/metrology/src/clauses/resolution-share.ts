import { compare, divide, rational, toNumber } from '../decimal'
import type { ClauseDescriptor, Judgement } from '../types'
import { baselineProblems, baselineWidth, missingBaseline } from './baselines'

/**
 * Resolution of the measuring system as a share of the tolerance width or of the process variation, at most the
 * share agreed (the rule of ten: 0.1). Compared in decimal; a share equal to the limit meets it.
 */
export const resolutionShare: ClauseDescriptor<'resolution-share'> = {
  type: 'resolution-share',
  subject: 'resolution',
  measure: 'share',
  basis: 'document',
  studyKind: null,
  fields: [
    { name: 'share', kind: 'share', required: true, default: 0.1 },
    { name: 'base', kind: 'choice', required: true, choices: ['tolerance', 'process'], default: 'tolerance' },
    { name: 'baseline', kind: 'baseline', required: false },
  ],
  check: ({ parameters }, characteristic) =>
    baselineProblems(
      parameters.base,
      characteristic,
      { base: 'parameters.base', agreed: 'parameters.baseline' },
      parameters.baseline,
    ),
  judge: ({ parameters }, { characteristic }): Judgement => {
    const { base, share, baseline } = parameters
    const limits = { lower: null, upper: share }
    const unknown = { verdict: 'not-shown', figure: null, interval: null, limits, quantity: 'share' } as const
    const width = baselineWidth(base, characteristic, baseline)
    if (!width) return { ...unknown, reason: { code: missingBaseline(base) } }
    const { resolution } = characteristic
    if (resolution === undefined) return { ...unknown, reason: { code: 'resolution-unknown' } }
    const actual = divide(rational(resolution), width)
    const fine = compare(actual, rational(share)) <= 0
    return {
      verdict: fine ? 'meets' : 'falls-short',
      figure: toNumber(actual),
      interval: null,
      limits,
      quantity: 'share',
      reason: { code: fine ? 'resolution-fine-enough' : 'resolution-too-coarse', resolution, base },
    }
  },
}
