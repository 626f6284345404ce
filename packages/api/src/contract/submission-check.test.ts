import { createHash } from 'node:crypto'
import canonicalize from 'canonicalize'
import { describe, expect, it } from 'vitest'
import { checkSubmission, EngineProblem, firstDifference, sha256Of } from './submission-check'
import { overallVerdict, type SubmissionContent } from './submission-content'
import { defaultTerms } from './terms'

const hashOf = (text: string) => createHash('sha256').update(text).digest('hex')
const id = '01890a5d-ac96-774b-bcce-b302099a8057'

describe('the first difference of two outputs', () => {
  it('is none for the same bytes', () => expect(firstDifference('{"a":1}', '{"a":1}')).toBeNull())
  it('names the first differing field in key order with both values', () =>
    expect(
      firstDifference(
        '{"kind":"clause","study":{"bias":-0.0009,"interval":{"lower":-0.0017,"upper":-0.0001}},"verdict":"meets"}',
        '{"kind":"clause","study":{"bias":-0.0009,"interval":{"lower":-0.0018,"upper":-0.0001}},"verdict":"not-shown"}',
      ),
    ).toEqual({ path: 'study.interval.lower', stored: '-0.0017', recomputed: '-0.0018' }))
  it('names a place in a list', () =>
    expect(firstDifference('{"warnings":[{"code":"drift"}]}', '{"warnings":[{"code":"few"}]}')).toEqual({
      path: 'warnings[0].code',
      stored: '"drift"',
      recomputed: '"few"',
    }))
  it('tells a field that is missing from one that is null', () =>
    expect(firstDifference('{"a":null}', '{}')).toEqual({ path: 'a', stored: 'null', recomputed: null }))
  it('finds other bytes of the same values', () =>
    expect(firstDifference('{"b":1,"a":2}', '{"a":2,"b":1}')).toEqual({
      path: '',
      stored: '{"b":1,"a":2}',
      recomputed: '{"a":2,"b":1}',
    }))
  it('answers for a text that is not JSON at all', () =>
    expect(firstDifference('oops', '{"a":1}')).toMatchObject({ path: '', stored: 'oops' }))
})

describe('a hash', () => {
  it('is that of the bytes in UTF-8', async () =>
    expect(await sha256Of('Ø 24.000 ±0.025')).toBe(hashOf('Ø 24.000 ±0.025')))
})

describe('the verdict of a whole submission', () => {
  it.each([
    [['meets', 'meets'], 'meets'],
    [['meets', 'not-shown', 'falls-short'], 'falls-short'],
    [['meets', 'not-shown'], 'not-shown'],
    [['meets', 'meets-with-conditions'], 'meets-with-conditions'],
    [[], 'not-shown'],
  ] as const)('of %j is %s', (verdicts, verdict) => expect(overallVerdict(verdicts)).toBe(verdict))
})

/** An engine that adds two numbers stands in for the computation. */
const engine = hashOf('engine')
const inputText = '{"a":1,"b":2}'
const outputText = '{"sum":3,"verdict":"meets"}'
const readings = ['24.001', '24.002']
const content: SubmissionContent = {
  format: 'evenrule.submission/1',
  number: 1,
  revision: 1,
  corrects: null,
  criteria: 'agreed',
  criteriaOn: '2026-11-02',
  relationship: {
    id,
    supplier: { id, name: 'Tarnfield' },
    customer: { id, name: 'Brackwell' },
    timeZone: 'Europe/Berlin',
  },
  characteristic: {
    characteristicId: id,
    partNumber: '7741-220',
    revision: 'C',
    number: 5,
    name: 'bore',
    nominal: '24.000',
    lowerLimit: '23.975',
    upperLimit: '24.025',
    unit: 'mm',
    class: 'ordinary',
    processStandardDeviation: null,
  },
  part: { id, name: 'Output shaft' },
  task: {
    id,
    gaugeCode: 'BG-14',
    gaugeName: 'Bore gauge',
    gaugeResolution: '0.001',
    gaugeUnit: 'mm',
    site: null,
    processStep: null,
  },
  agreements: [],
  terms: defaultTerms,
  houseTerms: null,
  advisory: [],
  byHand: [],
  requests: [],
  clauses: [
    {
      clauseKey: 'bias.equivalence',
      clause: {
        type: 'bias-equivalence',
        parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
      },
      agreementNumber: 1,
      versionNumber: 1,
      versionId: id,
      scope: 'part',
      study: 'BS-1',
      verdict: 'meets',
      inputSha256: hashOf(inputText),
      outputSha256: hashOf(outputText),
      engineVersion: '0.1.0',
      engineSha256: engine,
    },
  ],
  studies: [
    {
      code: 'BS-1',
      kind: 'bias',
      attempt: 1,
      registeredAt: '2026-11-01T08:00:00.000Z',
      registeredBeforehand: true,
      plannedReadings: 2,
      unit: 'mm',
      measuredAs: 'value',
      gauge: { code: 'BG-14', name: 'Bore gauge', resolution: '0.001', unit: 'mm' },
      standard: {
        code: 'RS-1',
        name: 'ring',
        certifiedValue: '24.000',
        unit: 'mm',
        expandedUncertainty: null,
        coverageFactor: '2',
      },
      calibration: { gauge: null, standard: null },
      data: {
        revision: 1,
        reason: null,
        source: 'typed',
        collectedOn: '2026-11-01',
        appraiser: 'A',
        readings,
        leftOut: [],
        sha256: hashOf(JSON.stringify(readings)),
        fileSha256: null,
      },
    },
  ],
  attemptsSince: null,
  attempts: [],
  files: [],
}
const evaluation = {
  clauseKey: 'bias.equivalence',
  inputText,
  outputText,
  outputSha256: hashOf(outputText),
  engineVersion: '0.1.0',
  engineSha256: engine,
}
const frozen = (changed: Partial<SubmissionContent> = {}) => {
  const text = canonicalize({ ...content, ...changed }) as string
  return {
    text,
    sha256: hashOf(text),
    signatures: [{ meaning: 'submits', sha256: hashOf(text) }],
    evaluations: [evaluation],
  }
}
const recompute = async ({ inputText: input }: { inputText: string }) => {
  const { a, b } = JSON.parse(input) as { a: number; b: number }
  return `{"sum":${a + b},"verdict":"meets"}`
}

describe('checking a submission', () => {
  it('finds everything equal when nothing was changed', async () => {
    const check = await checkSubmission(frozen(), recompute)
    expect(check.equal).toBe(true)
    expect(check.clauses[0]).toMatchObject({ equal: true, recomputedSha256: hashOf(outputText) })
  })
  it('finds an altered output and names its first differing field', async () => {
    const altered = '{"sum":4,"verdict":"meets"}'
    const check = await checkSubmission(
      { ...frozen(), evaluations: [{ ...evaluation, outputText: altered, outputSha256: hashOf(altered) }] },
      recompute,
    )
    expect(check.equal).toBe(false)
    expect(check.clauses[0]).toMatchObject({
      problem: 'output-altered',
      difference: { path: 'sum', stored: '4', recomputed: '3' },
    })
  })
  it('tells an engine that is not there from an output that was altered', async () => {
    const nowhere = () => Promise.reject(new EngineProblem('engine-unavailable'))
    const untouched = await checkSubmission(frozen(), nowhere)
    expect(untouched.clauses[0]).toMatchObject({ equal: false, problem: 'engine-unavailable' })
    const altered = { ...evaluation, outputText: `${evaluation.outputText} ` }
    const check = await checkSubmission({ ...frozen(), evaluations: [altered] }, nowhere)
    expect(check.clauses[0]).toMatchObject({ problem: 'output-altered' })
  })
  it('finds an altered input even when its output follows from it', async () => {
    const output = '{"sum":9,"verdict":"meets"}'
    const changed = {
      ...evaluation,
      inputText: '{"a":1,"b":8}',
      outputText: output,
      outputSha256: hashOf(output),
    }
    const check = await checkSubmission({ ...frozen(), evaluations: [changed] }, recompute)
    expect(check.clauses[0]).toMatchObject({ equal: false, problem: 'input-altered' })
  })
  it('finds an altered text, and that the signatures name another', async () => {
    const signed = frozen()
    const check = await checkSubmission(
      { ...signed, text: signed.text.replace('24.001', '24.003') },
      recompute,
    )
    expect(check).toMatchObject({ equal: false, text: { equal: false }, signatures: [{ equal: false }] })
    expect(check.data[0]).toMatchObject({ equal: false })
  })
  it('finds a verdict in the text that the output does not have', async () => {
    const clauses = [{ ...content.clauses[0]!, verdict: 'falls-short' as const }]
    const check = await checkSubmission(frozen({ clauses }), recompute)
    expect(check.clauses[0]).toMatchObject({ equal: false, problem: 'verdict-altered' })
  })
  it('finds an evaluation that is missing and one that nobody signed', async () => {
    const check = await checkSubmission(
      { ...frozen(), evaluations: [{ ...evaluation, clauseKey: 'design.minimum' }] },
      recompute,
    )
    expect(check.clauses.map(({ clauseKey, problem }) => [clauseKey, problem])).toEqual([
      ['bias.equivalence', 'missing'],
      ['design.minimum', 'not-in-text'],
    ])
  })
  it('finds a stored verdict that is not the signed one, and names it', async () => {
    const check = await checkSubmission(
      { ...frozen(), evaluations: [{ ...evaluation, verdict: 'falls-short' }] },
      recompute,
    )
    expect(check.clauses[0]).toMatchObject({
      problem: 'verdict-altered',
      difference: { path: 'verdict', stored: '"falls-short"', recomputed: '"meets"' },
    })
  })
  it('finds a stored hash that is not that of its output', async () => {
    const check = await checkSubmission(
      { ...frozen(), evaluations: [{ ...evaluation, outputSha256: hashOf('other') }] },
      recompute,
    )
    expect(check.clauses[0]).toMatchObject({
      problem: 'output-altered',
      difference: { path: 'outputSha256', recomputed: JSON.stringify(hashOf(outputText)) },
    })
  })
  it('finds counts in the list that are not those of the text', async () => {
    const listed = { verdict: 'meets', clausesMet: 1, clausesTotal: 1 }
    expect((await checkSubmission({ ...frozen(), listed }, recompute)).listed).toMatchObject({ equal: true })
    const check = await checkSubmission({ ...frozen(), listed: { ...listed, clausesMet: 2 } }, recompute)
    expect(check).toMatchObject({
      equal: false,
      listed: { equal: false, difference: { path: 'clausesMet', stored: '2', recomputed: '1' } },
    })
  })
  it.each(['oops', '{}', '{"format":"evenrule.submission/1"}'])(
    'finds a text that is no submission any more: %s',
    async (text) => {
      const check = await checkSubmission({ ...frozen(), text, sha256: hashOf(text) }, recompute)
      expect(check).toMatchObject({ equal: false, text: { equal: false } })
      expect(check.clauses[0]).toMatchObject({ problem: 'not-in-text' })
    },
  )
  it('says so when the engine is not the one named', async () => {
    const check = await checkSubmission(frozen(), async () => {
      throw new EngineProblem('engine-altered')
    })
    expect(check.clauses[0]).toMatchObject({ equal: false, problem: 'engine-altered' })
  })
})
