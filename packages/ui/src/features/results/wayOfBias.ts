import { clauseDescriptor, type BiasOutput } from '@evenrule/metrology'
import { formatInterval, formatNumber, formatShare } from '../../format'
import { shiftDecimal } from '../../format/numbers'
import { indexWords, wayWords as words } from '../../strings/results'
import { atMostComparison, intervalComparison } from './comparisons'
import {
  commonSteps,
  count,
  critical,
  marginStep,
  pText,
  quantile,
  step,
  writers,
  type Of,
  type WayStep,
} from './waySteps'

type IntervalResult = Of<'bias-equivalence' | 'bias-interval-inside'>

/** The t quantile and p value that make the interval of the clause; the p value is of equivalence alone. */
function quantileSteps({ clause }: IntervalResult, study: BiasOutput): WayStep[] {
  const { degreesOfFreedom: df, zeroTest, equivalence } = study
  return clause.type === 'bias-equivalence'
    ? [step(words.quantileOneSided, quantile(equivalence.alpha, df), critical(equivalence.criticalValue))]
    : [step(words.quantileTwoSided, quantile(zeroTest.alpha / 2, df), critical(zeroTest.criticalValue))]
}

/** Equivalence within a margin, or the whole two-sided interval inside it. */
export function intervalWay(result: IntervalResult): WayStep[] {
  const { clause, output, input } = result
  const { study } = output
  const margin = marginStep(clause.parameters.margin, result)
  if (!study) return [margin]
  const { figure, digits, limit } = writers(result)
  const isEquivalence = clause.type === 'bias-equivalence'
  const { alpha, margin: edge, pValue } = study.equivalence
  const interval = isEquivalence ? study.equivalence.interval : study.interval
  const half = interval && (interval.upper - interval.lower) / 2
  const u = study.reference.standardUncertainty
  const factor = study.withUncertainty.coverageFactor
  const outside = isEquivalence ? 2 * alpha : alpha
  const confidence = formatShare(shiftDecimal(Math.round(shiftDecimal(1 - outside, 6)), -6))
  return [
    ...commonSteps(result, study),
    ...(interval && study.standardDeviation
      ? [
          ...quantileSteps(result, study),
          step(words.halfWidth, words.halfWidthFormula, figure(half)),
          step(
            words.interval(confidence),
            words.intervalFormula,
            formatInterval(interval, { unit: input.unit, digits: digits + 1 }),
          ),
          ...(isEquivalence ? [step(words.pValue, words.pLarger, pText(pValue))] : []),
        ]
      : []),
    margin,
    ...(u !== null ? [step(words.uncertainty, words.uncertaintyFormula, limit(factor * u))] : []),
    ...(output.interval && interval && edge !== null
      ? [step(words.comparison, '', intervalComparison(interval.lower, interval.upper, edge, digits))]
      : []),
  ]
}

/** The zero-difference test. */
export function zeroTestWay(result: Of<'bias-zero-test'>): WayStep[] {
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

/** The estimate alone against the margin. */
export function pointWay(result: Of<'bias-point'>): WayStep[] {
  const { clause, output } = result
  const { study } = output
  const margin = marginStep(clause.parameters.margin, result)
  if (!study) return [margin]
  const { digits } = writers(result)
  const { bias } = study
  const edge = study.equivalence.margin
  return [
    ...commonSteps(result, study),
    margin,
    ...(output.verdict !== 'not-shown' && bias !== null && edge !== null
      ? [step(words.comparison, words.absoluteFormula, atMostComparison(Math.abs(bias), edge, digits))]
      : []),
  ]
}

/** Bias plus or minus its expanded uncertainty against the margin. */
export function withUncertaintyWay(result: Of<'bias-with-uncertainty'>): WayStep[] {
  const { clause, output, input } = result
  const { study } = output
  const margin = marginStep(clause.parameters.margin, result)
  if (!study) return [margin]
  const { figure, digits } = writers(result)
  const of = study.withUncertainty
  const edge = study.equivalence.margin
  const { interval } = output
  const ends = interval as { lower: number; upper: number } | null
  return [
    ...commonSteps(result, study),
    step(
      words.repeatability,
      of.resolutionUsed ? words.repeatabilityOfResolution : words.repeatabilityFormula,
      figure(of.repeatability),
    ),
    step(
      words.referenceUncertainty,
      words.referenceUncertaintyFormula,
      study.reference.standardUncertainty === null
        ? words.unknown
        : figure(study.reference.standardUncertainty),
    ),
    ...(ends
      ? [
          step(words.biasUncertainty, words.biasUncertaintyFormula, figure(of.standardUncertainty)),
          step(
            words.biasExpanded,
            words.biasExpandedFormula(formatNumber(of.coverageFactor)),
            figure(of.expandedUncertainty),
          ),
          step(
            words.biasRange,
            words.biasRangeFormula,
            formatInterval(ends, { unit: input.unit, digits: digits + 1 }),
          ),
        ]
      : []),
    margin,
    ...(ends && edge !== null
      ? [step(words.comparison, '', intervalComparison(ends.lower, ends.upper, edge, digits))]
      : []),
  ]
}

/** Cg and Cgk from the width, the spread and the bias, and what each is compared with. */
export function indexWay(result: Of<'bias-index'>): WayStep[] {
  const { clause, output, input } = result
  const { share, sigmas, leastCg, leastCgk, basis, confidence } = clause.parameters
  const { study } = output
  const width = clauseDescriptor(clause).options?.(clause, input).index?.width ?? null
  const ofWidth = [
    step(words.indexWidth, '', formatNumber(width, { unit: input.unit })),
    step(words.allowance, words.allowanceFormula(formatShare(share)), allowanceOf(width, share, input.unit)),
  ]
  if (!study) return ofWidth
  const factor = formatNumber(sigmas)
  const asked = [
    { key: 'cg' as const, least: leastCg, value: study.cg, ends: [study.cgLowerBound, study.cgUpperBound] },
    {
      key: 'cgk' as const,
      least: leastCgk,
      value: study.cgk,
      ends: [study.cgkLowerBound, study.cgkUpperBound],
    },
  ].filter(({ least, value }) => least !== null && value !== null)
  const index = (value: number | null | undefined) => formatNumber(value ?? null, { digits: 3 })
  return [
    ...commonSteps(result, study).filter(({ label }) => label !== words.error),
    ...ofWidth,
    ...asked.flatMap(({ key, least, value, ends }) => [
      step(indexWords[key], key === 'cg' ? words.cgFormula(factor) : words.cgkFormula(factor), index(value)),
      ...(basis === 'bound'
        ? [
            step(
              words.indexBounds(indexWords[key], formatShare(confidence)),
              words.boundsFormula[key],
              words.bounds(index(ends[0]), index(ends[1])),
            ),
          ]
        : []),
      step(words.leastOf(indexWords[key]), '', count(least)),
    ]),
  ]
}

const allowanceOf = (width: number | null, share: number, unit: string): string =>
  width === null ? words.notDefined : formatNumber(Number((width * share).toPrecision(12)), { unit })
