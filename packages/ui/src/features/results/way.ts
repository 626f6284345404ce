import {
  type BiasOutput,
  type CalibrationWindow,
  type ClauseOf,
  type ClauseType,
  marginInUnit,
  type Margin,
} from '@evenrule/metrology'
import { decimalPlaces, formatDate, formatInterval, formatNumber, formatShare } from '../../format'
import { shiftDecimal } from '../../format/numbers'
import { wayWords as words } from '../../strings/results'
import { atMostComparison, intervalComparison } from './comparisons'
import { figureDigits } from './digits'
import type { ClauseResult } from './types'

/** One line of the way from the readings to a figure. */
export interface WayStep {
  label: string
  /** In plain notation; empty for what is a fact rather than computed. */
  formula: string
  figure: string
}

type Judged = Pick<ClauseResult, 'input' | 'output'>
type Of<T extends ClauseType> = Omit<ClauseResult, 'clause'> & { clause: ClauseOf<T> }
type Ways = { [T in ClauseType]: (result: Of<T>) => WayStep[] }

const step = (label: string, formula: string, figure: string): WayStep => ({ label, formula, figure })
const count = (value: number | null): string => formatNumber(value)
const yesNo = (value: boolean): string => (value ? words.yes : words.no)

/** Writers of figures in the unit; working figures carry one place more than the row shows. */
function writers({ input, output }: Judged) {
  const digits = figureDigits({ input, output })
  const { unit } = input
  return {
    digits,
    figure: (value: number | null) => formatNumber(value, { unit, digits: digits + 1 }),
    entered: (value: number | null) =>
      formatNumber(value, { unit, digits: value === null ? 0 : Math.max(digits - 1, decimalPlaces(value)) }),
    plain: (value: number) => formatNumber(value),
    limit: (value: number | null) => formatNumber(value, { unit }),
  }
}

/** What every clause on the mean of a bias study shares: from the readings to the standard error. */
function commonSteps(result: Judged, study: BiasOutput): WayStep[] {
  const { figure, entered } = writers(result)
  return [
    step(words.readings, words.readingsFormula, count(study.n)),
    step(words.mean, words.meanFormula, figure(study.mean)),
    step(words.reference, words.referenceFormula, entered(study.reference.value)),
    step(words.bias, words.biasFormula, figure(study.bias)),
    step(words.deviation, words.deviationFormula, figure(study.standardDeviation)),
    step(words.error, words.errorFormula, figure(study.standardError)),
    step(words.freedom, words.freedomFormula, count(study.degreesOfFreedom)),
  ]
}

/** A margin formed from what was agreed. */
function marginStep(margin: Margin, { input, output }: Judged): WayStep {
  const { limit, plain } = writers({ input, output })
  const inUnit = output.study?.equivalence.margin ?? numberOf(output.limits?.upper)
  const share = margin.base === 'absolute' ? '' : formatShare(margin.share)
  const { tolerance, processStandardDeviation: sigma } = input
  const formula =
    margin.base === 'absolute'
      ? margin.unit === input.unit
        ? words.marginAbsolute
        : words.marginConverted(formatNumber(margin.value, { unit: margin.unit }))
      : margin.base === 'tolerance'
        ? words.marginTolerance(share, written(tolerance?.upper, plain), written(tolerance?.lower, plain))
        : words.marginProcess(share, written(sigma, plain))
  return step(words.margin, formula, inUnit === null ? words.notDefined : `±${limit(inUnit)}`)
}

const written = (value: number | undefined, write: (value: number) => string): string =>
  value === undefined ? words.notDefined : write(value)
const numberOf = (value: unknown): number | null => (typeof value === 'number' ? value : null)

const probabilityText = (alpha: number): string => formatNumber(1 - alpha, { digits: decimalPlaces(alpha) })
const quantile = (alpha: number, df: number): string => words.quantileFormula(probabilityText(alpha), df)
const critical = (value: number | null): string => formatNumber(value, { digits: 4 })
const pText = (value: number | null): string =>
  value === null ? words.notDefined : value < 0.0001 ? '< 0.0001' : formatNumber(value, { digits: 4 })

function equivalence(result: Of<'bias-equivalence'>): WayStep[] {
  const { clause, output, input } = result
  const { study } = output
  const margin = marginStep(clause.parameters.margin, result)
  if (!study) return [margin]
  const { figure, digits, limit } = writers(result)
  const { alpha, criticalValue, interval, pValue } = study.equivalence
  const edge = study.equivalence.margin
  const u = study.reference.standardUncertainty
  const factor = study.withUncertainty.coverageFactor
  const half =
    criticalValue !== null && study.standardError !== null ? criticalValue * study.standardError : null
  const confidence = formatShare(shiftDecimal(Math.round(shiftDecimal(1 - 2 * alpha, 6)), -6))
  return [
    ...commonSteps(result, study),
    ...(interval && study.standardDeviation
      ? [
          step(words.quantileOneSided, quantile(alpha, study.degreesOfFreedom), critical(criticalValue)),
          step(words.halfWidth, words.halfWidthFormula, figure(half)),
          step(
            words.interval(confidence),
            words.intervalFormula,
            formatInterval(interval, { unit: input.unit, digits: digits + 1 }),
          ),
          step(words.pValue, words.pLarger, pText(pValue)),
        ]
      : []),
    margin,
    ...(u !== null ? [step(words.uncertainty, words.uncertaintyFormula, limit(factor * u))] : []),
    ...(output.interval && interval && edge !== null
      ? [step(words.comparison, '', intervalComparison(interval.lower, interval.upper, edge, digits))]
      : []),
  ]
}

function zeroTest(result: Of<'bias-zero-test'>): WayStep[] {
  const { study } = result.output
  if (!study) return []
  const { figure, digits } = writers(result)
  const { alpha, criticalValue, allowedBias } = study.zeroTest
  const tested =
    allowedBias !== null && study.bias !== null && study.standardDeviation
      ? [
          step(words.quantileTwoSided, quantile(alpha / 2, study.degreesOfFreedom), critical(criticalValue)),
          step(words.allowed, words.allowedFormula, `±${figure(allowedBias)}`),
          step(words.pValue, words.pTwoSided, pText(study.pValue)),
          step(
            words.comparison,
            words.absoluteFormula,
            atMostComparison(Math.abs(study.bias), allowedBias, digits),
          ),
        ]
      : []
  return [...commonSteps(result, study), ...tested]
}

function resolution(result: Of<'resolution-share'>): WayStep[] {
  const { clause, input, output } = result
  const { base, share } = clause.parameters
  const { entered } = writers(result)
  // The whole of the base is its width.
  const width = marginInUnit({ base, share: 1 }, input)
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

const ways: Ways = {
  'bias-equivalence': equivalence,
  'bias-zero-test': zeroTest,
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
