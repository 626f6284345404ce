import { marginInUnit, type CalibrationWindow, type ClauseType } from '@evenrule/metrology'
import { formatDate, formatNumber, formatShare } from '../../format'
import { shiftDecimal } from '../../format/numbers'
import { wayWords as words } from '../../strings/results'
import { verdictWords } from '../../strings/verdicts'
import { atMostComparison } from './comparisons'
import type { ClauseResult } from './types'
import { indexWay, intervalWay, pointWay, withUncertaintyWay, zeroTestWay } from './wayOfBias'
import { count, numberOf, step, textStep, writers, yesNo, type Of, type WayStep } from './waySteps'

export type { WayStep } from './waySteps'

type Ways = { [T in ClauseType]: (result: Of<T>) => WayStep[] }

function resolution(result: Of<'resolution-share'>): WayStep[] {
  const { clause, input, output } = result
  const { base, share, baseline } = clause.parameters
  const { entered } = writers(result)
  // The whole of the base is its width.
  const width = marginInUnit({ base, share: 1, ...(base === 'tolerance' && baseline && { baseline }) }, input)
  const figure = numberOf(output.figure)
  return [
    step(words.resolution, '', input.resolution === undefined ? words.unknown : entered(input.resolution)),
    base === 'tolerance'
      ? step(words.widthTolerance, words.widthToleranceFormula, formatNumber(width, { unit: input.unit }))
      : step(words.widthProcess, words.widthProcessFormula, formatNumber(width, { unit: input.unit })),
    ...(figure === null ? [] : [step(words.share, words.shareFormula, formatShare(figure))]),
    step(words.mostAgreed, '', formatShare(share)),
    ...(figure === null
      ? []
      : [
          step(
            words.comparison,
            '',
            atMostComparison(shiftDecimal(figure, 2), shiftDecimal(share, 2), 1, '%'),
          ),
        ]),
  ]
}

function design({ clause, input, output }: Of<'design-minimum'>): WayStep[] {
  const { readings, registeredBeforehand, attempts } = clause.parameters
  const n = numberOf(output.figure)
  const facts = input.design ?? null
  return [
    step(words.readings, words.readingsFormula, n === null ? words.notDefined : count(n)),
    step(words.leastAgreed, '', count(readings)),
    ...(n === null
      ? []
      : [
          step(
            words.comparison,
            '',
            n >= readings ? words.atLeast(count(n), count(readings)) : words.under(count(n), count(readings)),
          ),
        ]),
    ...(registeredBeforehand
      ? [step(words.registered, '', facts ? yesNo(facts.registeredBeforehand) : words.unknown)]
      : []),
    ...(facts ? [step(words.attempts, '', count(facts.attempts))] : []),
    ...(attempts === undefined ? [] : [step(words.attemptsMost, '', count(attempts))]),
  ]
}

function calibration({ clause, input }: Of<'calibration-in-date'>): WayStep[] {
  const facts = input.calibration ?? null
  const window = (of: CalibrationWindow | null | undefined) =>
    of ? words.window(formatDate(of.calibratedOn), formatDate(of.dueOn)) : words.unknown
  return [
    step(words.collected, '', facts ? formatDate(facts.collectedOn) : words.unknown),
    ...(clause.parameters.gauge ? [step(words.gaugeWindow, '', window(facts?.gauge))] : []),
    ...(clause.parameters.standard ? [step(words.standardWindow, '', window(facts?.standard))] : []),
  ]
}

function byHand({ clause, input }: Of<'by-hand'>): WayStep[] {
  const judged = input.byHand ?? null
  return [
    textStep(words.asks, clause.parameters.asks),
    ...(judged
      ? [
          textStep(words.judgedAs, verdictWords[judged.verdict]),
          textStep(words.judgedReason, judged.reason),
          textStep(words.document, judged.documentSha256),
        ]
      : [textStep(words.document, words.noDocument)]),
  ]
}

const ways: Ways = {
  'bias-equivalence': intervalWay,
  'bias-interval-inside': intervalWay,
  'bias-point': pointWay,
  'bias-zero-test': zeroTestWay,
  'bias-index': indexWay,
  'bias-with-uncertainty': withUncertaintyWay,
  'by-hand': byHand,
  // It judges nothing, so there is no way to follow.
  'does-not-apply': () => [],
  'resolution-share': resolution,
  'design-minimum': design,
  'calibration-in-date': calibration,
}

/**
 * The way from the readings to the figure of one clause, from the computed output: each step with its formula in plain
 * notation and its number. Steps that are not defined for the data are left out.
 */
export const wayOf = (result: ClauseResult): WayStep[] =>
  // Each way only ever gets results of its own type; TypeScript cannot follow that through the union.
  (ways[result.clause.type] as (result: ClauseResult) => WayStep[])(result)
