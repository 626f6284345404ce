import {
  evaluate,
  isError,
  type BiasIndexParameters,
  type Clause,
  type ClauseInput,
} from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { overallAnswer } from './answer'
import { intervalComparison } from './comparisons'
import { figureDigits, writeApart } from './digits'
import { readingsOf, studyFiguresOf } from './studyFigures'
import type { ClauseResult } from './types'
import { wayOf } from './way'

/** Thin spaces made plain, so that expectations can be read. */
const seen = (text: string) => text.replaceAll('\u202F', ' ')

const readings = [24.0002, 23.9995, 24.0008, 23.9999, 24.0004, 24.001, 23.9997, 24.0003, 24.0006, 23.9996]
const equivalence: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
}
const zeroTest: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }
const resolution: Clause = { type: 'resolution-share', parameters: { share: 0.05, base: 'tolerance' } }
const design: Clause = {
  type: 'design-minimum',
  parameters: { readings: 15, registeredBeforehand: true, attempts: 2 },
}
const tenth = { base: 'tolerance', share: 0.05 } as const
const uncertain: Clause = { type: 'bias-with-uncertainty', parameters: { margin: tenth, coverageFactor: 2 } }
const certified = {
  data: { kind: 'bias', readings, reference: { value: 24, standardUncertainty: 0.0003 } },
} as const satisfies Partial<ClauseInput>
const index = (more: Partial<BiasIndexParameters> = {}): Clause => ({
  type: 'bias-index',
  parameters: {
    ...{ share: 0.2, base: 'tolerance', sigmas: 6, leastCg: 1.33, leastCgk: 1.33 },
    ...{ basis: 'bound', confidence: 0.95 },
    ...more,
  },
})
const byHand: Clause = {
  type: 'by-hand',
  parameters: { subject: 'linearity', measure: 'slope', asks: 'a slope below 1 %' },
}
const calibration: Clause = { type: 'calibration-in-date', parameters: { gauge: true, standard: true } }

function judged(clause: Clause, more: Partial<ClauseInput> = {}): ClauseResult {
  const input: ClauseInput = {
    kind: 'clause',
    clause,
    unit: 'mm',
    tolerance: { lower: 23.975, upper: 24.025 },
    resolution: 0.0001,
    design: { registeredBeforehand: true, attempts: 1 },
    calibration: {
      collectedOn: '2026-10-09',
      gauge: { calibratedOn: '2026-03-02', dueOn: '2027-03-01' },
      standard: null,
    },
    data: { kind: 'bias', readings, reference: { value: 24 } },
    ...more,
  }
  const output = evaluate<'clause'>(input)
  if (isError(output)) throw new Error(output.error.message)
  return { clauseKey: output.clauseKey, clause, input, output, source: null }
}

const way = (result: ClauseResult) =>
  Object.fromEntries(wayOf(result).map(({ label, figure }) => [seen(label), seen(figure)]))

describe('the way from the readings to a figure', () => {
  it('names every number of an equivalence, down to the comparison', () => {
    expect(way(judged(equivalence))).toEqual({
      'Number of readings': '10',
      'Mean of the readings': '24.000200 mm',
      'Reference value': '24.0000 mm',
      Bias: '0.000200 mm',
      'Standard deviation of the readings': '0.000516 mm',
      'Standard error of the mean': '0.000163 mm',
      'Degrees of freedom': '9',
      'Student’s t, one-sided': '1.8331',
      'Half width of the interval': '0.000299 mm',
      '90 % interval of the bias': '−0.000099 to 0.000499 mm',
      'p value': '< 0.0001',
      Margin: '±0.0025 mm',
      Comparison: '−0.00250 ≤ −0.00010 and 0.00050 ≤ 0.00250: inside',
    })
  })
  it('says how the margin was formed', () => {
    const formula = (margin: object) =>
      wayOf(judged({ ...equivalence, parameters: { margin, confidence: 0.95 } } as Clause))
        .filter(({ label }) => label === 'Margin')
        .map((step) => seen(`${step.formula} = ${step.figure}`))
    expect(formula({ base: 'tolerance', share: 0.1 })).toEqual(['10 % of (24.025 − 23.975) = ±0.005 mm'])
    expect(formula({ base: 'absolute', value: 2, unit: 'µm' })).toEqual([
      '2 µm as agreed, converted = ±0.002 mm',
    ])
    expect(formula({ base: 'process', share: 0.1 })).toEqual(['10 % of 6 · not defined = not defined'])
  })
  it('compares the bias with what the zero-difference test allows', () => {
    const steps = way(judged(zeroTest))
    expect(steps['Student’s t, two-sided']).toBe('2.2622')
    expect(steps['Bias the test allows']).toBe('±0.000369 mm')
    expect(steps.Comparison).toBe('0.00020 ≤ 0.00037')
  })
  it('stops where a figure is not defined', () => {
    const same = judged(equivalence, {
      data: { kind: 'bias', readings: [24, 24, 24], reference: { value: 24 } },
    })
    expect(same.output.verdict).toBe('not-shown')
    expect(Object.keys(way(same))).not.toContain('Comparison')
    expect(Object.keys(way(judged(equivalence, { data: null })))).toEqual(['Margin'])
  })
  it('takes the two-sided interval for a clause that wants all of it inside', () => {
    const steps = way(
      judged({ type: 'bias-interval-inside', parameters: { margin: tenth, confidence: 0.95 } }),
    )
    expect(steps['Student’s t, two-sided']).toBe('2.2622')
    expect(steps['95 % interval of the bias']).toBe('−0.000169 to 0.000569 mm')
    expect(steps.Comparison).toBe('−0.00250 ≤ −0.00017 and 0.00057 ≤ 0.00250: inside')
    expect(steps).not.toHaveProperty('p value')
  })
  it('compares the estimate alone with the margin of a point limit', () => {
    const steps = way(judged({ type: 'bias-point', parameters: { margin: tenth } }))
    expect([steps.Margin, steps.Comparison]).toEqual(['±0.0025 mm', '0.00020 ≤ 0.00250'])
  })
  it('adds the uncertainty of the reference, or says that it is not known', () => {
    expect(way(judged(uncertain, certified))).toMatchObject({
      'Standard uncertainty of the reference value': '0.000300 mm',
      'Standard uncertainty of the bias': '0.000342 mm',
      'Expanded uncertainty': '0.000683 mm',
      'Bias with its expanded uncertainty': '−0.000483 to 0.000883 mm',
      Comparison: '−0.00250 ≤ −0.00048 and 0.00088 ≤ 0.00250: inside',
    })
    const unknown = way(judged(uncertain))
    expect(unknown['Standard uncertainty of the reference value']).toBe('not on record')
    expect(unknown).not.toHaveProperty('Comparison')
  })
  it('shows both indices, their bounds where these decide, and what each is compared with', () => {
    const steps = way(judged(index()))
    expect(steps).toMatchObject({
      'Width the share is taken of': '0.05 mm',
      'Share the gauge may take up': '0.01 mm',
      Cg: '3.227',
      Cgk: '3.098',
      'Least Cgk that is agreed': '1.33',
    })
    expect(steps['Bounds of Cgk, each at 95 %']).toMatch(/^1\.\d{3} to 4\.\d{3}$/)
    const alone = way(judged(index({ basis: 'estimate', leastCg: null })))
    expect(Object.keys(alone).filter((label) => /Cg\b|Bounds/.test(label))).toEqual([])
  })
  it('tells the width of a one-sided tolerance by what was agreed for it', () => {
    const margin = { ...tenth, baseline: { kind: 'natural-bound', value: 0 } } as const
    const [step] = wayOf(
      judged({ type: 'bias-point', parameters: { margin } }, { tolerance: { upper: 0.05 }, data: null }),
    )
    expect(seen(`${step?.formula} = ${step?.figure}`)).toBe(
      '5 % of the distance to 0, the tolerance being one-sided = ±0.0025 mm',
    )
  })
  it('quotes who judged by hand', () => {
    expect(way(judged(byHand))).toEqual({
      'What the document must show': 'a slope below 1 %',
      'SHA-256 of the document': 'none yet',
    })
    const documentSha256 = 'ab'.repeat(32)
    const facts = { byHand: { verdict: 'meets', reason: 'See page 3.', documentSha256 } } as const
    expect(way(judged(byHand, facts))).toMatchObject({
      'Judged as': 'meets',
      'Reason given': 'See page 3.',
      'SHA-256 of the document': documentSha256,
    })
  })
  it('compares the resolution with the agreed share', () => {
    expect(way(judged(resolution))).toEqual({
      'Resolution of the gauge': '0.0001 mm',
      'Tolerance width': '0.05 mm',
      Share: '0.2 %',
      'Most that is agreed': '5 %',
      Comparison: '0.2 % ≤ 5.0 %',
    })
  })
  it('shows how the study was made and what was in calibration', () => {
    expect(way(judged(design))).toMatchObject({
      Comparison: '10 < 15',
      'Registered before the first reading': 'yes',
      'Most attempts agreed': '2',
    })
    expect(way(judged(calibration))).toEqual({
      'Day of collection': '9 Oct 2026',
      'Gauge calibrated and due': '2 Mar 2026 to 1 Mar 2027',
      'Reference standard calibrated and due': 'not on record',
    })
  })
})

describe('figures for reading', () => {
  it('have one place more than the gauge resolves, and enough for the margin', () => {
    expect(figureDigits(judged(equivalence))).toBe(5)
    expect(figureDigits(judged(equivalence, { resolution: 0.01 }))).toBe(4)
    expect(figureDigits(judged(zeroTest, { resolution: 0.01 }))).toBe(3)
  })
  it('look different where they are different', () => {
    expect(writeApart(0.00250004, 0.0025, 4)).toEqual(['0.00250004', '0.00250000'])
    expect(writeApart(0.0025, 0.0025, 4)).toEqual(['0.0025', '0.0025'])
  })
  it.each([
    [0.0028, 0.004, '0.0028 > 0.0025: wholly outside'],
    [-0.004, -0.0028, '−0.0028 < −0.0025: wholly outside'],
    [0.001, 0.0031, '0.0031 > 0.0025: reaches over the margin'],
    [-0.0031, 0.001, '−0.0031 < −0.0025: reaches under the margin'],
    [-0.0025, 0.0025, '−0.0025 ≤ −0.0025 and 0.0025 ≤ 0.0025: inside'],
  ])('place the interval %d to %d against the margin', (lower, upper, text) =>
    expect(intervalComparison(lower, upper, 0.0025, 4)).toBe(text),
  )
})

describe('the answer in words', () => {
  const answer = (...results: ClauseResult[]) => {
    const { decisive, rest } = overallAnswer(results)
    return [decisive, seen(rest)]
  }
  it('is yes with the bias where every clause meets', () =>
    expect(answer(judged(equivalence), judged(resolution))).toEqual([
      'Yes, both clauses meet.',
      'The bias is 0.00020 mm, and its whole interval lies inside ±0.0025 mm.',
    ]))
  it('is yes with the index where no clause has the bias itself', () => {
    expect(answer(judged(index()), judged(resolution))[1]).toMatch(
      /^Cgk is 3\.10; at least 1\.33 is agreed\.$/,
    )
    expect(answer(judged(index()), judged(equivalence))[1]).toMatch(/^The bias is /)
    const point: Clause = { type: 'bias-point', parameters: { margin: tenth } }
    expect(answer(judged(point))[1]).toBe('The bias is 0.00020 mm, within ±0.0025 mm.')
  })
  it('says what a document, a certificate or a better index would settle', () => {
    expect(answer(judged(byHand))).toEqual([
      'Not shown yet.',
      'Linearity is not shown: a document that shows it is needed.',
    ])
    expect(answer(judged(uncertain))[1]).toMatch(/uncertainty of the reference standard is needed/)
    expect(answer(judged(index({ leastCgk: 9, leastCg: null })))[1]).toMatch(/below the 9 that is agreed/)
  })
  it('counts and names what falls short and what is open', () => {
    const wide = judged(equivalence, {
      data: {
        kind: 'bias',
        readings: readings.slice(0, 3).map((value) => value + 0.0017),
        reference: { value: 24 },
      },
    })
    expect(wide.output.verdict).toBe('not-shown')
    const [decisive, rest] = answer(judged(resolution), judged(design), wide)
    expect(decisive).toBe('No, one of three clauses falls short.')
    expect(rest).toMatch(
      /^Study design falls short: the study has 10 readings; at least 15 are agreed\. Bias is not shown: \d+ readings in all would show it with a chance of \d+ %/,
    )
  })
  it('says what is missing where nothing falls short', () =>
    expect(answer(judged(resolution), judged(calibration))).toEqual([
      'Not shown yet: one of two clauses meets.',
      'Calibration is not shown: there is no calibration on record for the reference standard.',
    ]))
  it('says that nothing is judged without criteria', () => expect(answer()[0]).toBe('Nothing is judged.'))
})

describe('the plot of a study', () => {
  it('shows the clause that is furthest from meeting, with its interval and margin as values', () => {
    const failing: Clause = {
      type: 'bias-equivalence',
      parameters: { margin: { base: 'absolute', value: 0.00005, unit: 'mm' }, confidence: 0.95 },
    }
    const figures = studyFiguresOf([judged(equivalence), judged(failing)])
    expect(figures?.leading?.clause).toEqual(failing)
    expect(figures?.margin?.upper).toBeCloseTo(24.00005, 10)
    expect(figures?.band?.lower).toBeCloseTo(23.9999007, 6)
    expect(figures?.bandName.replace('\u202F', ' ')).toBe('90 % interval')
  })
  it('marks the readings that warnings name', () => {
    const outlying = [...readings, 24.02]
    const figures = studyFiguresOf([
      judged(equivalence, { data: { kind: 'bias', readings: outlying, reference: { value: 24 } } }),
    ])
    expect(figures?.marked).toEqual([10])
  })
  it('shows readings that no clause judges, without warnings about clauses', () => {
    const study = evaluate<'bias'>({ kind: 'bias', readings, reference: { value: 24 }, unit: 'mm' } as never)
    if (isError(study)) throw new Error(study.error.message)
    const figures = readingsOf(readings, 'mm', study)
    expect(figures.margin).toBeNull()
    expect(figures.warnings.map(({ code }) => code)).toEqual([])
  })
  it('shows bias and expanded uncertainty where these are compared with the margin', () => {
    const figures = studyFiguresOf([judged(uncertain, certified)])
    expect(figures?.bandName).toBe('expanded uncertainty (k = 2)')
    expect(figures?.band?.upper).toBeCloseTo(24.0002 + 0.00068, 5)
    expect(figures?.margin?.lower).toBeCloseTo(23.9975, 10)
  })
  it('shows no index as if it were a length', () => {
    const figures = studyFiguresOf([judged(index())])
    expect(figures?.band?.lower).toBeGreaterThan(23)
    expect(figures?.margin).toBeNull()
  })
  it('needs readings', () => expect(studyFiguresOf([judged(equivalence, { data: null })])).toBeNull())
})
