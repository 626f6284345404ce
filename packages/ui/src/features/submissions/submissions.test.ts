import { createHash } from 'node:crypto'
import { allows } from '@evenrule/api/contract'
import { checkSubmission, EngineProblem } from '@evenrule/api/contract/submission-check'
import { submissionMoves, submissionStates } from '@evenrule/api/contract/moves/submission'
import { canonicalText, evaluate } from '@evenrule/metrology'
import { describe, expect, it, vi } from 'vitest'
import { actNames } from '../../strings/reviews'
import { inOrder, isFresh, possibleActs } from './acts'
import { checkLines, outcomeOf } from './checkLines'
import { submissionOf } from './fixture'
import {
  figuresOfStudy,
  isWeakOnSafety,
  partiesOf,
  readContent,
  resultsOfStudy,
  sizeParts,
  waitsFor,
} from './reading'
import { integrityOf, recomputeWith, type EngineSource } from './recompute'
import { stepsOf } from './steps'
import { answerOf, questionOf } from './words'

const hashOf = (text: string) => createHash('sha256').update(text).digest('hex')
const seen = (text: string) => text.replaceAll('\u202F', '_')

/** Near the reference value, little spread: the interval lies inside ±0.0025 mm. */
const fitting = ['24.000', '24.001', '24.000', '23.999', '24.000', '24.001', '24.000', '24.000']
/** A bias of about 0.008 mm: the interval lies outside. */
const biased = ['24.008', '24.009', '24.008', '24.007', '24.008', '24.009', '24.008', '24.008']
const engineText = 'the text of an engine'
const engineSha256 = hashOf(engineText)
const engine: EngineSource = {
  text: async () => engineText,
  load: async () => ({ evaluate, canonicalText }),
}

describe('the question and its answer', () => {
  it('ask after the gauge and answer with what was shown, then where it stands', async () => {
    const read = readContent(await submissionOf({ texts: fitting, engineSha256 }))
    expect(seen(questionOf(read.content))).toBe('Is bore gauge BG-14 fit for bore Ø 24.000 ±0.025_mm?')
    const [shown, stands] = answerOf(read, partiesOf(read.content, 'customer'))
    expect(shown?.strong).toMatch(/^Yes, .*clauses meet\.$/)
    expect(stands?.strong).toBe('It has waited 6 days for your decision.')
    const [, supplierReads] = answerOf(read, partiesOf(read.content, 'supplier'))
    expect(supplierReads?.strong).toBe('It has waited 6 days for Brackwell Drivelines’ decision.')
  })
  it('name both sides on paper, which anybody may read', async () => {
    const read = readContent(await submissionOf({ texts: fitting, engineSha256 }))
    const sentences = answerOf(
      readContent({ ...read.submission, state: 'challenged' }),
      partiesOf(read.content, null),
    )
    expect(sentences[1]).toEqual({
      strong: 'It has waited 6 days for Tarnfield Turned Parts’ answer.',
      rest: 'Brackwell Drivelines challenges something in it.',
    })
  })
  it('put the decision first once there is one', async () => {
    const submission = await submissionOf({ texts: biased, engineSha256 })
    const read = readContent({ ...submission, state: 'refused', decidedAt: '2026-11-08T09:00:00.000Z' })
    const [stands, shown] = answerOf(read, partiesOf(read.content, 'supplier'))
    expect(stands?.strong).toBe('Refused by Brackwell Drivelines on 8 Nov 2026.')
    expect(shown?.strong).toBe('No, one of two clauses falls short.')
  })
})

describe('results', () => {
  it('belong to the study that the text names', async () => {
    const read = readContent(await submissionOf({ texts: fitting, engineSha256 }))
    expect(resultsOfStudy(read, 'S-1').map(({ clause }) => clause.type)).toEqual(['bias-equivalence'])
    expect(resultsOfStudy(read, 'S-2')).toEqual([])
  })
  it('are weak on a safety characteristic where a zero-difference test decides', async () => {
    const zeroTest = { type: 'bias-zero-test', parameters: { alpha: 0.05 } } as const
    const options = { texts: fitting, engineSha256, clauses: [zeroTest] }
    for (const [classOf, weak] of [
      ['safety', true],
      ['ordinary', false],
    ] as const) {
      const { content, results } = readContent(await submissionOf({ ...options, class: classOf }))
      expect(isWeakOnSafety(results[0]!, content)).toBe(weak)
    }
    const safe = readContent(await submissionOf({ texts: fitting, engineSha256, class: 'safety' }))
    expect(safe.results.map((result) => isWeakOnSafety(result, safe.content))).toEqual([false, false])
  })
})

describe('the steps', () => {
  const times = {
    createdAt: '2026-11-01T08:00:00.000Z',
    sentForSignatureAt: '2026-11-01T09:00:00.000Z',
    submittedAt: '2026-11-02T08:00:00.000Z',
    decidedAt: null,
  }
  it('show what is still to come', () =>
    expect(
      stepsOf({ ...times, state: 'draft', sentForSignatureAt: null, submittedAt: null }).map(
        ({ label, at, current }) => [label, at !== null, current],
      ),
    ).toEqual([
      ['prepared', true, true],
      ['sent for signature', false, false],
      ['signed and submitted', false, false],
      ['decided', false, false],
    ]))
  it('leave out what the customer does not see', () =>
    expect(
      stepsOf({ ...times, state: 'challenged', sentForSignatureAt: null }).map(({ label }) => label),
    ).toEqual(['prepared', 'signed and submitted', 'challenged', 'decided']))
  it('end with what was decided', () =>
    expect(stepsOf({ ...times, state: 'accepted', decidedAt: '2026-11-05T08:00:00.000Z' }).at(-1)).toEqual({
      label: 'accepted',
      at: '2026-11-05T08:00:00.000Z',
      current: true,
    }))
  it('never promise a signature to what was discarded', () =>
    expect(
      stepsOf({ ...times, state: 'withdrawn', sentForSignatureAt: null, submittedAt: null }).map(
        ({ label }) => label,
      ),
    ).not.toContain('signed and submitted'))
  it.each(submissionStates)('stand at one step in the state %s', (state) =>
    expect(stepsOf({ ...times, state }).filter(({ current }) => current)).toHaveLength(1),
  )
})

describe('what can be done', () => {
  const offered = (
    state: (typeof submissionStates)[number],
    side: 'supplier' | 'customer',
    ...roles: Parameters<typeof allows>[2]
  ) =>
    inOrder(
      possibleActs({ state, hindrances: [] }, side, (permission) => allows(permission, side, roles)),
    ).map(({ name }) => name)

  it('follows state, side and role', () => {
    expect(offered('draft', 'supplier', 'gauge-engineer')).toEqual(['send-for-signature', 'discard'])
    expect(offered('for-signature', 'supplier', 'gauge-engineer')).toEqual(['return', 'discard'])
    expect(offered('for-signature', 'supplier', 'supplier-approver')).toEqual(['sign', 'return', 'discard'])
    expect(offered('submitted', 'customer', 'quality-representative')).toEqual(['accept', 'refuse'])
    expect(offered('submitted', 'customer', 'customer-approver')).toEqual([
      'accept',
      'accept-with-conditions',
      'refuse',
    ])
    expect(offered('awaiting-second-person', 'customer', 'customer-approver')).toEqual([
      'confirm',
      'send-back',
    ])
    expect(offered('awaiting-other-side', 'supplier', 'supplier-approver')).toEqual([
      'agree-one-off',
      'decline-one-off',
      'withdraw',
    ])
    expect(offered('accepted', 'customer', 'customer-approver')).toEqual([])
    expect(offered('submitted', 'customer', 'reader')).toEqual([])
  })
  it('names what stands in the way at the move it hinders', () => {
    const [sign] = possibleActs(
      { state: 'for-signature', hindrances: [{ move: 'sign', code: 'took-the-readings' }] },
      'supplier',
      () => true,
    ).filter(({ name }) => name === 'sign')
    expect(sign?.hindrances).toEqual(['took-the-readings'])
  })
  it('keeps the decisions in sight while a challenge waits, with the reason', () =>
    expect(
      possibleActs({ state: 'challenged', hindrances: [] }, 'customer', (permission) =>
        allows(permission, 'customer', ['quality-representative']),
      ).map(({ name, hindrances }) => [name, ...hindrances]),
    ).toEqual([
      ['accept', 'challenge-open'],
      ['refuse', 'challenge-open'],
    ]))
  it('knows every move of the table that is made by a button', () => {
    const elsewhere = ['prepare', 'challenge', 'answer', 'resume', 'supersede']
    const names = new Set(submissionMoves.map(({ name }) => name as string))
    expect([...names].filter((name) => !elsewhere.includes(name)).sort()).toEqual([...actNames].sort())
  })
  it('waits for the side whose step is next', () => {
    expect(waitsFor('submitted', 'customer')).toBe('us')
    expect(waitsFor('submitted', 'supplier')).toBe('them')
    expect(waitsFor('accepted', 'supplier')).toBeNull()
  })
  it('counts a sign-in as fresh for five minutes', () => {
    const now = Date.parse('2026-11-02T08:05:00.000Z')
    expect(isFresh('2026-11-02T08:00:00.000Z', now)).toBe(true)
    expect(isFresh('2026-11-02T07:59:59.000Z', now)).toBe(false)
    expect(isFresh(undefined, now)).toBe(false)
  })
})

describe('the plot of a study that no clause rests on', () => {
  it('shows readings that were entered with a decimal comma', async () => {
    const read = readContent(await submissionOf({ texts: fitting, engineSha256 }))
    const [study] = read.content.studies
    const commas = fitting.map((text) => text.replace('.', ','))
    const unjudged = { ...read, content: { ...read.content, clauses: [] }, results: [] }
    const figures = figuresOfStudy(unjudged, { ...study!, data: { ...study!.data, readings: commas } })
    expect(figures?.readings).toEqual(fitting.map(Number))
  })
})

describe('the recompute', () => {
  it('finds everything equal, with each engine fetched once', async () => {
    const submission = await submissionOf({ texts: fitting, engineSha256 })
    const text = vi.fn(engine.text)
    const check = await checkSubmission(submission, recomputeWith({ ...engine, text }))
    expect(check.equal).toBe(true)
    expect(text).toHaveBeenCalledTimes(1)
    const lines = checkLines(check, readContent(submission))
    expect(lines.map(({ equal }) => equal)).toEqual([true, true, true, true, true])
    expect(outcomeOf(lines)).toBe('equal')
    expect(seen(lines[3]!.label)).toBe('Bias within ±5_% of tolerance, shown at 95_%')
  })
  it('names the field of a result that was changed', async () => {
    const submission = await submissionOf({ texts: fitting, engineSha256 })
    const [first, ...others] = submission.evaluations
    const altered = { ...first!, outputText: first!.outputText.replace(/"bias":[^,]+/, '"bias":0.25') }
    const check = await checkSubmission(
      { ...submission, evaluations: [altered, ...others] },
      recomputeWith(engine),
    )
    const line = checkLines(check, readContent(submission)).find(({ difference }) => difference)
    expect(line).toMatchObject({ equal: false, difference: { path: 'study.bias', stored: '0.25' } })
    expect(line?.problem).toMatch(/stored result/)
    expect(outcomeOf(checkLines(check, readContent(submission)))).toBe('differs')
  })
  it('does not run an engine whose bytes have another hash', async () => {
    const submission = await submissionOf({ texts: fitting, engineSha256 })
    const load = vi.fn(engine.load)
    const recompute = recomputeWith({ text: async () => 'something else', load })
    await expect(recompute(submission.evaluations[0]!)).rejects.toThrow(EngineProblem)
    expect(load).not.toHaveBeenCalled()
    const check = await checkSubmission(submission, recompute)
    expect(check.clauses.map(({ problem }) => problem)).toEqual(['engine-altered', 'engine-altered'])
  })
  it('says so when the engine cannot be had', async () => {
    const submission = await submissionOf({ texts: fitting, engineSha256 })
    const check = await checkSubmission(submission, recomputeWith({ ...engine, text: async () => undefined }))
    expect(check.equal).toBe(false)
    expect(check.clauses[0]?.problem).toBe('engine-unavailable')
    expect(outcomeOf(checkLines(check, readContent(submission)))).toBe('unchecked')
  })
  it('asks the browser for the very hash', () =>
    expect(integrityOf(engineSha256)).toBe(
      `sha256-${createHash('sha256').update(engineText).digest('base64')}`,
    ))
})

describe('sizes of files', () => {
  it.each([
    [312, { value: 312, unit: 'B', digits: 0 }],
    [4100, { value: 4.1, unit: 'kB', digits: 1 }],
    [2_000_000, { value: 2, unit: 'MB', digits: 1 }],
  ] as const)('%d bytes', (bytes, parts) => expect(sizeParts(bytes)).toEqual(parts))
})
