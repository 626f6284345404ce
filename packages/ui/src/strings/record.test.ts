import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { agreementMoves } from '@evenrule/api/contract/moves/agreement-version'
import { challengeMoves } from '@evenrule/api/contract/moves/challenge'
import { conditionMoves } from '@evenrule/api/contract/moves/condition'
import { houseTermsMoves } from '@evenrule/api/contract/moves/house-terms'
import { invitationMoves } from '@evenrule/api/contract/moves/invitation'
import { requestMoves } from '@evenrule/api/contract/moves/request'
import { studyMoves } from '@evenrule/api/contract/moves/study'
import { submissionMoves } from '@evenrule/api/contract/moves/submission'
import { describe, expect, it } from 'vitest'
import { eventDetail, eventSentence, eventWords, faultWords } from './record'

const modules = join(process.cwd(), 'packages/api/src/server/modules')
/** Types of events that services name themselves, beside those of the tables of moves. */
const namedInServices = (): string[] => {
  const files = readdirSync(modules, { recursive: true, encoding: 'utf8' }).filter((file) =>
    /\.(service|messages)\.ts$/.test(file),
  )
  const kind =
    /'((?:agreement|study|submission|challenge|condition|request|house-terms|part|characteristic|measuring-task|gauge|reference-standard|calibration|member|organisation|invitation|relationship)\.[a-z-]+)'/g
  return files.flatMap((file) =>
    [...readFileSync(join(modules, file), 'utf8').matchAll(kind)].map(([, type]) => type ?? ''),
  )
}
const ofMoves = [
  ...agreementMoves,
  ...challengeMoves,
  ...conditionMoves,
  ...houseTermsMoves,
  ...invitationMoves,
  ...requestMoves,
  ...studyMoves,
  ...submissionMoves,
].map(({ event }) => event as string)

describe('the sentence of an event', () => {
  it('is there for every move of every table', () => {
    expect(ofMoves.length).toBeGreaterThan(40)
    expect(ofMoves.filter((type) => !eventWords[type])).toEqual([])
  })

  it('is there for every event that a service names', () => {
    const named = namedInServices()
    expect(named).toContain('calibration.entered')
    expect(named.filter((type) => !eventWords[type])).toEqual([])
  })

  it('always has a place for the thing', () => {
    for (const words of Object.values(eventWords)) expect(words.split('*')).toHaveLength(2)
  })

  it('can be read even for a type without words', () => {
    expect(eventSentence('submission.second-thoughts-had')).toEqual([
      'recorded “second thoughts had” for ',
      '',
    ])
    expect(eventSentence('study.registered', { registeredBeforehand: false })[1]).toMatch(/taken before/)
    expect(eventSentence('submission.signed')).toEqual(['signed ', ' and submitted it'])
  })
})

describe('what an event adds', () => {
  it.each([
    ['submission.refused', { reason: 'Bias too large.' }, '“Bias too large.”'],
    ['part.revision-added', { label: 'C' }, 'Revision C.'],
    ['calibration.entered', { dueOn: '2027-10-14' }, 'Due 14 Oct 2027.'],
    [
      'calibration.entered',
      { dueOn: '2027-10-14', foundWithinLimits: false },
      'Found out of limits. Due 14 Oct 2027.',
    ],
    [
      'submission.suspended',
      {
        ...{ gauge: 'BG-14', kind: 'reported-out-of-limits' },
        ...{ happenedOn: '2026-11-03', inDoubtSince: '2026-03-02' },
      },
      'BG-14 was found out of limits on 3 Nov 2026, in doubt since 2 Mar 2026.',
    ],
    ['gauge.repaired', { happenedOn: '2026-11-03' }, 'On 3 Nov 2026.'],
    ['submission.reopened', { revision: 'B', limits: 'differ' }, 'Revision B: its limits changed.'],
    ['submission.signed', { clauses: [{ clauseKey: 'bias/mean', verdict: 'meets' }] }, 'Bias meets.'],
    [
      'member.changed',
      { roles: ['admin', 'reader'], endsOn: '2027-01-31' },
      'Organisation admin, Reader. Until 31 Jan 2027.',
    ],
    ['import.applied', { new: 3, changed: 0, badRows: 2 }, '3 new, 0 changed. 2 rows left out.'],
    ['part.changed', { label: 'C', reason: '' }, ''],
  ])('for %s with %j is “%s”', (type, data, words) => expect(eventDetail({ type, data })).toBe(words))
})

it('every fault names the event', () => {
  for (const words of Object.values(faultWords)) expect(words(37)[0]).toMatch(/\b37\b/)
})
