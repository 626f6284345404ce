import { type BiasOutput, type ClauseOf, type ClauseType, type Margin } from '@evenrule/metrology'
import { decimalPlaces, formatNumber, formatShare } from '../../format'
import { describeBaseline } from '../../strings/clauses'
import { wayWords as words } from '../../strings/results'
import { figureDigits } from './digits'
import type { ClauseResult } from './types'

/** One line of the way from the readings to a figure. */
export interface WayStep {
  label: string
  /** In plain notation; empty for what is a fact rather than computed. */
  formula: string
  figure: string
  /** The figure is a sentence, so it may wrap. */
  isText?: true
}

export type Judged = Pick<ClauseResult, 'input' | 'output'>
/** A result of one clause type. */
export type Of<T extends ClauseType> = Omit<ClauseResult, 'clause'> & { clause: ClauseOf<T> }

export const step = (label: string, formula: string, figure: string): WayStep => ({ label, formula, figure })
/** A fact in words, where nothing is computed. */
export const textStep = (label: string, figure: string): WayStep => ({
  ...step(label, '', figure),
  isText: true,
})
export const count = (value: number | null): string => formatNumber(value)
export const yesNo = (value: boolean): string => (value ? words.yes : words.no)

/** Writers of figures in the unit; working figures carry one place more than the row shows. */
export function writers({ input, output }: Judged) {
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
export function commonSteps(result: Judged, study: BiasOutput): WayStep[] {
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

const isOneSided = (tolerance: Judged['input']['tolerance']): boolean =>
  (tolerance?.lower === undefined) !== (tolerance?.upper === undefined)

/** A margin formed from what was agreed. */
export function marginStep(margin: Margin, { input, output }: Judged): WayStep {
  const { limit, plain } = writers({ input, output })
  const inUnit = output.study?.equivalence.margin ?? numberOf(output.limits?.upper)
  const share = margin.base === 'absolute' ? '' : formatShare(margin.share)
  const { tolerance, processStandardDeviation: sigma } = input
  const formula =
    margin.base === 'absolute'
      ? margin.unit === input.unit
        ? words.marginAbsolute
        : words.marginConverted(formatNumber(margin.value, { unit: margin.unit }))
      : margin.base === 'process'
        ? words.marginProcess(share, written(sigma, plain))
        : isOneSided(tolerance) && margin.baseline
          ? words.marginOneSided(share, describeBaseline(margin.baseline))
          : words.marginTolerance(share, written(tolerance?.upper, plain), written(tolerance?.lower, plain))
  return step(words.margin, formula, inUnit === null ? words.notDefined : `±${limit(inUnit)}`)
}

export const written = (value: number | undefined, write: (value: number) => string): string =>
  value === undefined ? words.notDefined : write(value)
export const numberOf = (value: unknown): number | null => (typeof value === 'number' ? value : null)

const probabilityText = (alpha: number): string => formatNumber(1 - alpha, { digits: decimalPlaces(alpha) })
export const quantile = (alpha: number, df: number): string =>
  words.quantileFormula(probabilityText(alpha), df)
export const critical = (value: number | null): string => formatNumber(value, { digits: 4 })
export const pText = (value: number | null): string =>
  value === null ? words.notDefined : value < 0.0001 ? '< 0.0001' : formatNumber(value, { digits: 4 })
