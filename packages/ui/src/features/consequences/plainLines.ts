import {
  marginInUnit,
  type Characteristic,
  type Clause,
  type ClauseOf,
  type Margin,
} from '@evenrule/metrology'
import { formatNumber } from '../../format'
import { describeMargin } from '../../strings/clauses'
import { plainWords as words } from '../../strings/consequences'

/** What a clause without a rule of chance asks of gauge, standard, study and document, a sentence each. */
export function plainLines(clause: Clause, characteristic: Characteristic, unit: string): string[] {
  switch (clause.type) {
    case 'design-minimum': {
      const { readings, registeredBeforehand, attempts } = clause.parameters
      return [
        words.design(readings),
        registeredBeforehand ? words.registered : words.notRegistered,
        attempts === undefined ? words.anyAttempts : words.attempts(attempts),
      ]
    }
    case 'resolution-share':
      return resolutionLines(clause, characteristic, unit)
    case 'calibration-in-date': {
      const { gauge, standard } = clause.parameters
      return [
        ...(gauge ? [words.gauge] : []),
        ...(standard ? [words.standard] : []),
        ...(gauge && standard ? [words.calibrationPlan] : []),
      ]
    }
    case 'by-hand':
      return [words.byHand(clause.parameters.measure), words.byHandAsks(clause.parameters.asks)]
    case 'does-not-apply':
      return [words.doesNotApply(clause.parameters.reason)]
    default:
      return []
  }
}

/** The coarsest step that a clause on the resolution allows, where the characteristic defines it. */
function resolutionLines(
  { parameters: { share, base, baseline } }: ClauseOf<'resolution-share'>,
  characteristic: Characteristic,
  unit: string,
): string[] {
  const margin: Margin =
    base === 'tolerance' ? { base, share, ...(baseline && { baseline }) } : { base, share }
  const step = marginInUnit(margin, characteristic)
  const asked = describeMargin(margin)
  if (step === null) return [words.resolutionUndefined(asked)]
  const written = formatNumber(step, { unit })
  return [words.resolution(asked, written), words.resolutionBuy(written)]
}
