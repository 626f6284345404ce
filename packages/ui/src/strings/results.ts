import type { Subject } from '@evenrule/metrology'
import { countWord, formatCount, joinWords } from '../format'
import { subjectWords } from './clauses'

/** Where an agreed clause stands: for everything between two parties, one part, or one characteristic. */
export type CriteriaScope = 'relationship' | 'part' | 'characteristic'

export const scopeWords: Record<CriteriaScope, string> = {
  relationship: 'for the whole relationship',
  part: 'for this part',
  characteristic: 'for this characteristic',
}

/** "Agreement 3, version 2, for this part" */
export const sourceText = (source: {
  agreementNumber: number
  versionNumber: number
  scope: CriteriaScope
}): string =>
  `Agreement ${source.agreementNumber}, version ${source.versionNumber}, ${scopeWords[source.scope]}`

/** "Bias", "Bias and resolution", "Bias, resolution and calibration". */
export function listSubjects(subjects: readonly Subject[]): string {
  const names = [...new Set(subjects)].map((subject, at) =>
    at === 0 ? subjectWords[subject] : subjectWords[subject].toLowerCase(),
  )
  return joinWords(names)
}

/** The answer to "is it fit?", in words; the counts and reasons come from the results. */
export const answerWords = {
  noCriteria: 'Nothing is judged.',
  noCriteriaRest: 'No criteria were agreed when the study was registered.',
  unjudged: (bias: string, interval: string, confidence: string) =>
    `The bias is ${bias}${interval ? `, its ${confidence} interval ${interval}` : ''}.`,
  allMeet: (count: number) =>
    count === 1
      ? 'Yes, the one clause meets.'
      : `Yes, ${count === 2 ? 'both' : `all ${countWord(count)}`} clauses meet.`,
  fallsShort: (count: number, total: number) =>
    total === 1
      ? 'No, the one clause falls short.'
      : count === total
        ? `No, ${total === 2 ? 'both' : `all ${countWord(total)}`} clauses fall short.`
        : `No, ${countWord(count)} of ${countWord(total)} clauses ${count === 1 ? 'falls' : 'fall'} short.`,
  notShown: (met: number, total: number) =>
    total === 1
      ? 'Not shown yet.'
      : `Not shown yet: ${countWord(met)} of ${countWord(total)} clauses ${met === 1 ? 'meets' : 'meet'}.`,
  subjectsFallShort: (subjects: readonly Subject[]) =>
    `${listSubjects(subjects)} ${new Set(subjects).size > 1 ? 'fall' : 'falls'} short`,
  subjectsNotShown: (subjects: readonly Subject[]) =>
    `${listSubjects(subjects)} ${new Set(subjects).size > 1 ? 'are' : 'is'} not shown`,
  biasInside: (bias: string, margin: string) =>
    `The bias is ${bias}, and its whole interval lies inside ${margin}.`,
  biasWithin: (bias: string, margin: string) => `The bias is ${bias}, within ${margin}.`,
  index: (name: string, figure: string, least: string) =>
    `${name} is ${figure}; at least ${least} is agreed.`,
  biasAllowed: (bias: string, allowed: string) => `The bias is ${bias}; the test allows ${allowed}.`,
} as const

/** The way from the readings to a figure: what each line is, and its formula in plain notation. */
export const wayWords = {
  heading: 'The way from the readings to this figure',
  step: 'Step',
  formula: 'Formula',
  figure: 'Figure',
  settle: 'What would likely settle it',
  mend: 'What would mend it',
  why: 'Why',
  agreed: 'Agreed in',
  readings: 'Number of readings',
  readingsFormula: 'n',
  mean: 'Mean of the readings',
  meanFormula: 'x̄ = Σxᵢ / n',
  reference: 'Reference value',
  referenceFormula: 'r, certified value of the standard',
  bias: 'Bias',
  biasFormula: 'b = x̄ − r',
  deviation: 'Standard deviation of the readings',
  deviationFormula: 's = √(Σ(xᵢ − x̄)² / (n − 1))',
  error: 'Standard error of the mean',
  errorFormula: 's / √n',
  freedom: 'Degrees of freedom',
  freedomFormula: 'n − 1',
  quantileOneSided: 'Student’s t, one-sided',
  quantileTwoSided: 'Student’s t, two-sided',
  quantileFormula: (probability: string, df: number) => `t(${probability}; ${df})`,
  halfWidth: 'Half width of the interval',
  halfWidthFormula: 't · s / √n',
  interval: (confidence: string) => `${confidence} interval of the bias`,
  intervalFormula: 'b ± t · s / √n',
  pValue: 'p value',
  pLarger: 'the larger of the two one-sided tests',
  pTwoSided: 'two-sided, of t = b / (s / √n)',
  margin: 'Margin',
  marginOneSided: (share: string, of: string) => `${share} of ${of}, the tolerance being one-sided`,
  allowance: 'Share the gauge may take up',
  allowanceFormula: (share: string) => `${share} of the width`,
  indexWidth: 'Width the share is taken of',
  cg: 'Cg',
  cgFormula: (sigmas: string) => `share of the width / (${sigmas} · s)`,
  cgk: 'Cgk',
  cgkFormula: (sigmas: string) => `(half the share − |b|) / (${sigmas} · s / 2)`,
  indexBounds: (name: string, confidence: string) => `Bounds of ${name}, each at ${confidence}`,
  boundsFormula: {
    cg: 'Cg · √(χ²(p; n − 1) / (n − 1))',
    cgk: 'noncentral t of √n · (half the share − |b|) / s',
  },
  bounds: (lower: string, upper: string) => `${lower} to ${upper}`,
  leastOf: (name: string) => `Least ${name} that is agreed`,
  repeatability: 'Repeatability',
  repeatabilityFormula: 's',
  repeatabilityOfResolution: 'resolution / √12, as that is larger than s',
  referenceUncertainty: 'Standard uncertainty of the reference value',
  referenceUncertaintyFormula: 'u, from the certificate',
  biasUncertainty: 'Standard uncertainty of the bias',
  biasUncertaintyFormula: '√(s² / n + u²)',
  biasExpanded: 'Expanded uncertainty',
  biasExpandedFormula: (factor: string) => `U = ${factor} · √(s² / n + u²)`,
  biasRange: 'Bias with its expanded uncertainty',
  biasRangeFormula: 'b ± U',
  asks: 'What the document must show',
  judgedAs: 'Judged as',
  judgedReason: 'Reason given',
  document: 'SHA-256 of the document',
  noDocument: 'none yet',
  marginTolerance: (share: string, upper: string, lower: string) => `${share} of (${upper} − ${lower})`,
  marginProcess: (share: string, sigma: string) => `${share} of 6 · ${sigma}`,
  marginAbsolute: 'as agreed',
  marginConverted: (value: string) => `${value} as agreed, converted`,
  uncertainty: 'Expanded uncertainty of the standard',
  uncertaintyFormula: 'k · u, must be smaller than the margin',
  allowed: 'Bias the test allows',
  allowedFormula: 't · s / √n',
  absoluteFormula: '|b| against what is allowed',
  comparison: 'Comparison',
  resolution: 'Resolution of the gauge',
  widthTolerance: 'Tolerance width',
  widthToleranceFormula: 'upper less lower limit',
  widthProcess: 'Process variation',
  widthProcessFormula: '6 · σ of the process',
  share: 'Share',
  shareFormula: 'resolution / width',
  mostAgreed: 'Most that is agreed',
  leastAgreed: 'Least that is agreed',
  registered: 'Registered before the first reading',
  attempts: 'Attempts on this task, this one included',
  attemptsMost: 'Most attempts agreed',
  collected: 'Day of collection',
  gaugeWindow: 'Gauge calibrated and due',
  standardWindow: 'Reference standard calibrated and due',
  window: (from: string, until: string) => `${from} to ${until}`,
  unknown: 'not on record',
  yes: 'yes',
  no: 'no',
  notDefined: 'not defined',
  inside: (margin: string, lower: string, upper: string) =>
    `−${margin} ≤ ${lower} and ${upper} ≤ ${margin}: inside`,
  above: (margin: string, lower: string) => `${lower} > ${margin}: wholly outside`,
  below: (margin: string, upper: string) => `${upper} < −${margin}: wholly outside`,
  reachesAbove: (margin: string, upper: string) => `${upper} > ${margin}: reaches over the margin`,
  reachesBelow: (margin: string, lower: string) => `${lower} < −${margin}: reaches under the margin`,
  atMost: (value: string, limit: string) => `${value} ≤ ${limit}`,
  over: (value: string, limit: string) => `${value} > ${limit}`,
  atLeast: (value: string, limit: string) => `${value} ≥ ${limit}`,
  under: (value: string, limit: string) => `${value} < ${limit}`,
} as const

/** The indices by name, where one of them decided. */
export const indexWords = { cg: 'Cg', cgk: 'Cgk' } as const

/** What a share is a share of, beside its figure. */
export const shareOfWords = {
  tolerance: 'share of tolerance',
  process: 'share of process variation',
} as const

export const figuresWords = {
  why: {
    meets: (subject: string) => `Why ${subject} meets`,
    'meets-with-conditions': (subject: string) => `Why ${subject} meets with conditions`,
    'falls-short': (subject: string) => `Why ${subject} falls short`,
    'not-shown': (subject: string) => `Why ${subject} is not shown`,
  },
  readings: 'The readings',
  interval: (confidence: string) => `${confidence} interval`,
  uncertainty: (factor: string) => `expanded uncertainty (k = ${factor})`,
  text: (count: number, band: string, margin: boolean) =>
    [
      `${formatCount(count, 'reading')} in the order taken`,
      band ? `, their mean with its ${band}` : ', their mean',
      margin ? ', and the agreed margin around the reference value.' : ' and the reference value.',
    ].join(''),
  warnings: 'What to know about these readings',
  noWarning: 'Nothing about these readings stands out.',
  neverVerdict: 'None of this changes a verdict.',
} as const

export const cautionWords = {
  general:
    'Results support, and never replace, customer-specific requirements, applicable standards and law, accredited calibration, and the judgement of qualified people.',
  safety:
    'This is a characteristic of class safety: no verdict here takes the decision from the people who answer for it.',
} as const
