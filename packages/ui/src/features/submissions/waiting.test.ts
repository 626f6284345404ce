import { defaultTerms } from '@evenrule/api/contract/terms'
import { describe, expect, it } from 'vitest'
import { missingInConditions } from './conditionDraft'
import { readAsked, writeAsked, type Asked } from './asks'
import { submissionOf } from './fixture'
import { partiesOf, readContent } from './reading'
import { dueText, waitingOf } from './waiting'
import { answerOf, termsText } from './words'

const engineSha256 = 'a'.repeat(64)
const texts = ['24.001', '24.000', '24.002', '23.999', '24.001', '24.000']
const id = '01890a5d-ac96-774b-bcce-b302099a8057'
const base = async () => readContent(await submissionOf({ texts, engineSha256 }))

const challenge = {
  id,
  number: 1,
  target: { kind: 'readings' as const, study: 'S-1', readings: [2, 4] },
  reasonKind: 'other' as const,
  revision: 1,
  dueOn: '2026-11-10',
  overdue: false,
  state: 'open' as const,
  openedAt: '2026-11-03T08:00:00.000Z',
  openedBy: null,
  laboratory: null,
  closedAt: null,
  closedBy: null,
  rowVersion: 1,
  messages: [],
}
const condition = (number: number, dueOn: string, state: 'open' | 'reported' | 'confirmed') => ({
  id: `${id.slice(0, -1)}${number}`,
  number,
  text: 'Send the sheet.',
  dueOn,
  owner: 'supplier' as const,
  followUp: 'document' as const,
  state,
  overdue: false,
  confirmedAt: null,
  rowVersion: 1,
  reports: [],
})
const decision = {
  id,
  kind: 'accepted-with-conditions' as const,
  state: 'final' as const,
  reason: '',
  revision: 1,
  decidedBy: null,
  decidedAt: '2026-11-05T08:00:00.000Z',
  secondBy: null,
  secondAt: null,
  sentBackReason: null,
  otherSideBy: null,
  otherSideAt: null,
  declinedReason: null,
}

describe('what waits for whom', () => {
  it('counts days by the server’s calendar', () => {
    expect(dueText('2026-11-10', '2026-11-08')).toEqual({ text: 'due 10 Nov 2026, 2 days left', over: false })
    expect(dueText('2026-11-08', '2026-11-08')).toEqual({ text: 'due 8 Nov 2026, today', over: false })
    expect(dueText('2026-11-08', '2026-11-09')).toEqual({ text: 'due 8 Nov 2026, 1 day over', over: true })
  })
  it('names the side whose step is next, from where the reader stands', async () => {
    const read = await base()
    const open = readContent({ ...read.submission, state: 'challenged', challenges: [challenge] })
    const told = (side: 'supplier' | 'customer' | null) =>
      waitingOf(open, partiesOf(open.content, side)).map(({ what, waits, ours }) => [what, waits, ours])
    expect(told('supplier')).toEqual([['Challenge 1', 'waits for your answer', true]])
    expect(told('customer')).toEqual([['Challenge 1', 'waits for Tarnfield Turned Parts’ answer', false]])
    expect(told(null)[0]?.[2]).toBe(false)
  })
  it('puts what is due first at the top and leaves out what is settled', async () => {
    const { submission } = await base()
    const conditions = [
      condition(1, '2027-01-10', 'open'),
      condition(2, '2026-11-20', 'reported'),
      condition(3, '2026-11-12', 'confirmed'),
    ]
    const read = readContent({
      ...submission,
      state: 'accepted-with-conditions',
      decisions: [{ ...decision, conditions }],
      challenges: [{ ...challenge, state: 'resolved-by-correction' }],
    })
    expect(
      waitingOf(read, partiesOf(read.content, 'customer')).map(({ what, waits }) => `${what} ${waits}`),
    ).toEqual([
      'Condition 2 is reported done; your confirmation is next',
      'Condition 1 waits for Tarnfield Turned Parts’ report',
    ])
  })
})

describe('the answer', () => {
  it('says before all else that an acceptance does not stand any more', async () => {
    const { submission } = await base()
    const read = readContent({
      ...submission,
      state: 'accepted',
      decidedAt: '2026-11-03T08:00:00.000Z',
      standing: {
        state: 'on-hold',
        since: '2026-11-07',
        until: null,
        runsOutOn: null,
        calibrationDueOn: '2026-11-06',
        cause: { kind: 'calibration-overdue', of: 'gauge', code: 'BG-14', dueOn: '2026-11-06' },
      },
    })
    const [first, second] = answerOf(read, partiesOf(read.content, 'customer'))
    expect(first?.strong).toBe('On hold since 7 Nov 2026.')
    expect(first?.rest).toBe(
      'The calibration of gauge BG-14 was due on 6 Nov 2026. A calibration that finds it within limits lifts this.',
    )
    expect(second?.strong).toMatch(/^Accepted by Brackwell Drivelines/)
  })
  it('never calls it a verdict where no criteria are agreed', async () => {
    const { submission } = await base()
    const content = { ...JSON.parse(submission.text), criteria: 'none', clauses: [] } as unknown
    const read = readContent({ ...submission, criteria: 'none', text: JSON.stringify(content) })
    expect(answerOf(read, partiesOf(read.content, 'supplier'))[0]).toEqual({
      strong: 'No criteria agreed.',
      rest: 'So there is no verdict: an approver of Brackwell Drivelines decides for this once, and yours must agree.',
    })
  })
  it('tells the terms as sentences', () => {
    expect(termsText(defaultTerms)).toBe(
      'It does not run out. While a calibration is overdue it is on hold. It is suspended when the gauge is found out of limits, repaired or changed in software or fixture. It stays when the gauge is moved. Whoever took the readings may not sign.',
    )
    expect(termsText({ ...defaultTerms, validityMonths: 12 })).toMatch(/^It is valid for 12 months\./)
  })
})

describe('a question that is carried over a fresh sign-in', () => {
  it.each<Asked>([
    { kind: 'act', act: 'accept-with-conditions' },
    { kind: 'reinstate' },
    { kind: 'say', challengeId: id, saying: 'correct' },
    { kind: 'say', challengeId: id, saying: 'answer' },
  ])('%j comes back', (asked) => expect(readAsked(writeAsked(asked) ?? '')).toEqual(asked))
  it('is only one that ends in a signature, or comes with a proposal to answer by', () => {
    expect(writeAsked({ kind: 'challenge', preset: {} })).toBeUndefined()
    expect(writeAsked({ kind: 'say', challengeId: id, saying: 'withdraw' })).toBeUndefined()
    expect(readAsked('correct.nothing')).toBeUndefined()
  })
})

describe('conditions being written', () => {
  it('name what is missing of each, by its field', () => {
    const full = { text: 'Send it.', dueOn: '2026-12-01', owner: 'supplier', followUp: 'document' } as const
    const missing = missingInConditions(
      [full, { ...full, text: ' ', dueOn: '2026-11-07', followUp: '' }],
      '2026-11-08',
    )
    expect(Object.entries(missing).filter(([, message]) => message)).toEqual([
      ['conditions.1.text', 'Say what must follow.'],
      ['conditions.1.dueOn', 'Choose a day from today on.'],
      ['conditions.1.followUp', 'Choose what shows that it is fulfilled.'],
    ])
  })
})
