import { clauseBasis, clauseSubject, whatWouldSettle, type Subject, type Verdict } from '@evenrule/metrology'
import { isMet, overallVerdict } from '@evenrule/api/contract/submission-content'
import { formatLimits, formatNumber } from '../../format'
import { figureWords } from '../../strings/clauses'
import { describeReason, describeSettling } from '../../strings/reasons'
import { answerWords as words } from '../../strings/results'
import { figureDigits } from './digits'
import { shareLabel } from './shareLabel'
import type { ClauseResult } from './types'

/** The answer to "is it fit?": the decisive part, and one or two sentences of why. */
export interface Answer {
  verdict: Verdict
  decisive: string
  rest: string
}

const subjectsOf = (results: readonly ClauseResult[]): Subject[] =>
  results.map(({ clause }) => clauseSubject(clause))

/** "The uncertainty …" behind a colon becomes "the uncertainty …". */
const continued = (sentence: string): string => sentence.charAt(0).toLowerCase() + sentence.slice(1)

/** "Bias is not shown: 19 readings in all would show it …"; the reason where no remedy can be computed. */
function open(results: readonly ClauseResult[]): string {
  const [first] = results
  if (!first) return ''
  const name = words.subjectsNotShown(subjectsOf(results))
  const settling = whatWouldSettle(first.input, first.output)
  const why =
    settling.reason === 'not-an-equivalence'
      ? describeReason(first.output.reason).sentence
      : describeSettling(settling)
  return `${name}: ${continued(why)}`
}

function short(results: readonly ClauseResult[]): string {
  const [first] = results
  if (!first) return ''
  return `${words.subjectsFallShort(subjectsOf(results))}: ${continued(describeReason(first.output.reason).sentence)}`
}

/** Where everything meets, the bias is the figure that was asked for; where it was not, the index is. */
function biasSentence(results: readonly ClauseResult[]): string {
  const onBias = results.filter(({ clause }) => clauseSubject(clause) === 'bias')
  const result = onBias.find(({ output }) => output.quantity === 'value') ?? onBias[0]
  const { figure, limits, quantity } = result?.output ?? {}
  if (!result || typeof figure !== 'number') return ''
  if (quantity === 'ratio') return indexSentence(result, figure)
  if (typeof limits?.upper !== 'number') return ''
  const digits = figureDigits(result)
  const { unit } = result.input
  const bias = formatNumber(figure, { unit, digits })
  const margin = { lower: -limits.upper, upper: limits.upper }
  if (clauseBasis(result.clause) === 'bound') return words.biasInside(bias, formatLimits(margin, { unit }))
  return result.clause.type === 'bias-zero-test'
    ? words.biasAllowed(bias, formatLimits(margin, { unit, digits }))
    : words.biasWithin(bias, formatLimits(margin, { unit }))
}

function indexSentence({ clause, output }: ClauseResult, figure: number): string {
  const least = output.limits?.lower
  if (typeof least !== 'number') return ''
  const name = shareLabel(clause, output) ?? figureWords[clause.type]
  return words.index(name, formatNumber(figure, { digits: 2 }), formatNumber(least))
}

/** The overall answer in words, computed from the results of all clauses that are asked for. */
export function overallAnswer(results: readonly ClauseResult[]): Answer {
  const verdicts = results.map(({ output }) => output.verdict)
  const verdict = overallVerdict(verdicts)
  const total = results.length
  if (total === 0) return { verdict, decisive: words.noCriteria, rest: words.noCriteriaRest }
  const falling = results.filter(({ output }) => output.verdict === 'falls-short')
  const opened = results.filter(({ output }) => output.verdict === 'not-shown')
  const rest = [short(falling), open(opened)].filter(Boolean).join(' ')
  if (falling.length) return { verdict, decisive: words.fallsShort(falling.length, total), rest }
  if (opened.length) return { verdict, decisive: words.notShown(verdicts.filter(isMet).length, total), rest }
  return { verdict, decisive: words.allMeet(total), rest: biasSentence(results) }
}
