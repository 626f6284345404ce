import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import {
  calibrations,
  characteristics,
  gaugeEvents,
  messages,
  parts,
  reviews,
  standings,
  submissions,
  tasks,
} from '@evenrule/api/contract'
import { certificate, startStory, type Story } from './prepared'

let story: Story

beforeAll(async () => {
  story = await startStory()
})
afterAll(() => story.stop())

const day = (on: string) => story.harness.moveClock(`${on}T09:00:00.000Z`)

/** A task whose submission the customer accepted on the day of the clock. */
async function accepted() {
  const task = await story.ready()
  const submissionId = await story.submission(task.id, 'submitted')
  await accept(submissionId)
  return { ...task, submissionId }
}

async function accept(submissionId: string) {
  const { rowVersion, sha256 } = await story.read('quality', submissionId)
  await story
    .by('quality')
    .call(reviews.accept, { submissionId }, { body: { expectedVersion: rowVersion, sha256 } })
}

const standing = async (submissionId: string, who: 'quality' | 'engineer' = 'quality') =>
  (await story.by(who).call(standings.readStanding, { submissionId })).standing

const proofOf = async (taskId: string) => (await story.by('quality').call(tasks.readTask, { taskId })).proof

const report = (gaugeId: string, kind: gaugeEvents.GaugeEventKind, happenedOn: string, words = 'Dropped.') =>
  story.by('engineer').call(gaugeEvents.reportGaugeEvent, { gaugeId }, { body: { kind, happenedOn, words } })

const calibrate = (gaugeId: string, calibratedOn: string, dueOn: string, more: object = {}) =>
  story.by('engineer').call(
    calibrations.addGaugeCalibration,
    { gaugeId },
    {
      body: {
        ...{ certificateNumber: `C ${calibratedOn}`, calibratedOn, dueOn, foundWithinLimits: true },
        ...more,
      },
    },
  )

const subjectsFor = async (who: 'quality' | 'second' | 'approver') =>
  (await story.by(who).call(messages.listMessages, {}, { query: { size: 100 } })).items.map(
    ({ subject }) => subject,
  )

const eventsOf = async (submissionId: string) =>
  (
    await story.harness.owner.query<{ type: string }>(
      'select type from record_events where subject_id = $1 order by sequence',
      [submissionId],
    )
  ).rows.map(({ type }) => type)

describe('an acceptance', () => {
  it('stands, and is shown so to both sides', async () => {
    day('2026-11-02')
    const { submissionId, id } = await accepted()
    const expected = {
      state: 'stands',
      since: '2026-11-02',
      until: null,
      runsOutOn: null,
      calibrationDueOn: '2027-03-01',
      cause: null,
    }
    expect(await standing(submissionId)).toEqual(expected)
    expect(await standing(submissionId, 'engineer')).toEqual(expected)
    expect(await proofOf(id)).toBe('accepted')
  })

  it('is on hold once the calibration runs out, until one finds the gauge within limits', async () => {
    day('2026-11-02')
    const { submissionId, id, gauge, standard } = await accepted()
    day('2027-03-02')
    expect(await standing(submissionId)).toMatchObject({
      state: 'on-hold',
      since: '2027-03-02',
      cause: { kind: 'calibration-overdue', dueOn: '2027-03-01' },
    })
    expect(await proofOf(id)).toBe('on-hold')
    await calibrate(gauge.id, '2027-03-02', '2028-03-02')
    expect(await standing(submissionId)).toMatchObject({
      state: 'on-hold',
      cause: { of: 'standard', code: standard.code },
    })
    await story.by('engineer').call(
      calibrations.addStandardCalibration,
      { standardId: standard.id },
      {
        body: {
          ...{ certificateNumber: 'S again', calibratedOn: '2027-03-02', dueOn: '2028-03-02' },
          foundWithinLimits: true,
        },
      },
    )
    expect(await standing(submissionId)).toMatchObject({ state: 'stands', calibrationDueOn: '2028-03-02' })
    expect(await subjectsFor('quality')).toContain(`1 acceptance stands again: ${standard.code} calibrated`)
    expect((await eventsOf(submissionId)).at(-1)).toBe('submission.hold-lifted')
  })
})

describe('an event of a gauge', () => {
  it('shows what it would suspend before it is reported, and suspends it', async () => {
    day('2026-11-02')
    const { submissionId, id, gauge } = await accepted()
    const query = { kind: 'reported-out-of-limits', happenedOn: '2026-11-02' }
    const before = await story
      .by('engineer')
      .call(gaugeEvents.previewGaugeEvent, { gaugeId: gauge.id }, { query })
    expect(before).toMatchObject({
      ...{ lastGoodOn: '2026-03-02', reachesBack: true, suspended: 1, stays: 0, underReview: 0 },
      acceptances: [{ submissionId, customer: 'Nordhof Drives', effect: 'suspended' }],
    })
    expect(await standing(submissionId)).toMatchObject({ state: 'stands' })
    day('2026-11-03')
    const event = await report(gauge.id, 'reported-out-of-limits', '2026-11-03', 'Zero drifts by 4 µm.')
    expect(event).toMatchObject({ suspended: 1, stays: 0, lastGoodOn: '2026-03-02', reportedBy: 'Grit Falk' })
    expect(await standing(submissionId)).toMatchObject({
      state: 'suspended',
      since: '2026-11-03',
      cause: {
        ...{ kind: 'gauge-event', event: 'reported-out-of-limits', code: gauge.code },
        ...{ inDoubtSince: '2026-03-02', words: 'Zero drifts by 4 µm.' },
      },
    })
    expect(await proofOf(id)).toBe('suspended')
    expect((await eventsOf(submissionId)).at(-1)).toBe('submission.suspended')
    const told = `1 acceptance suspended: ${gauge.code} was found out of limits on 3 Nov 2026`
    expect(await subjectsFor('quality')).toContain(told)
    expect(await subjectsFor('approver')).toContain(
      `${gauge.code} was found out of limits on 3 Nov 2026: 1 acceptance suspended`,
    )
  })

  it('leaves standing what the terms let stand, and tells the customer all the same', async () => {
    day('2026-11-02')
    const { submissionId, gauge } = await accepted()
    day('2026-11-03')
    expect(await report(gauge.id, 'moved', '2026-11-03')).toMatchObject({ suspended: 0, stays: 1 })
    expect(await standing(submissionId)).toMatchObject({ state: 'stands' })
    const { entries } = await story.by('quality').call(standings.readStanding, { submissionId })
    expect(entries[0]).toMatchObject({ kind: 'gauge-event', event: 'moved' })
    expect(await subjectsFor('quality')).toContain(`${gauge.code} was moved on 3 Nov 2026`)
  })

  it('does not suspend what is accepted later, knowing it', async () => {
    day('2026-11-02')
    const task = await story.ready()
    const submissionId = await story.submission(task.id, 'submitted')
    day('2026-11-03')
    await report(task.gauge.id, 'repaired', '2026-11-03')
    day('2026-11-04')
    await accept(submissionId)
    expect(await standing(submissionId)).toMatchObject({ state: 'stands' })
  })

  it('that happened after the readings and before the signature is told with the submission', async () => {
    day('2026-11-02')
    const task = await story.ready()
    day('2026-11-03')
    await report(task.gauge.id, 'changed', '2026-11-03', 'New software 2.1.')
    const submissionId = await story.submission(task.id, 'submitted')
    const { entries } = await story.by('quality').call(standings.readStanding, { submissionId })
    expect(entries.map(({ kind }) => kind)).toContain('gauge-event')
  })

  it('is what a calibration finds that is out of limits', async () => {
    day('2026-11-02')
    const { submissionId, gauge } = await accepted()
    day('2026-11-05')
    await calibrate(gauge.id, '2026-11-05', '2027-11-05', { foundWithinLimits: false })
    expect(await standing(submissionId)).toMatchObject({
      state: 'suspended',
      cause: { event: 'reported-out-of-limits', inDoubtSince: '2026-03-02' },
    })
    const { items } = await story.by('engineer').call(gaugeEvents.listGaugeEvents, { gaugeId: gauge.id })
    expect(items).toMatchObject([{ certificateNumber: 'C 2026-11-05', suspended: 1 }])
  })

  it('is refused for a day to come, without words, and to others', async () => {
    day('2026-11-02')
    const { gauge } = await accepted()
    const body = { kind: 'moved', happenedOn: '2026-11-03', words: 'x' }
    const params = { gaugeId: gauge.id }
    expect(await story.by('engineer').refusal(gaugeEvents.reportGaugeEvent, params, { body })).toMatchObject({
      status: 422,
      errors: [{ path: 'body.happenedOn' }],
    })
    expect(
      await story
        .by('engineer')
        .refusal(gaugeEvents.reportGaugeEvent, params, { body: { ...body, words: ' ' } }),
    ).toMatchObject({ status: 422, errors: [{ path: 'body.words' }] })
    expect((await story.by('quality').refusal(gaugeEvents.listGaugeEvents, params)).status).toBe(403)
    expect((await story.by('reader').refusal(gaugeEvents.reportGaugeEvent, params, { body })).status).toBe(
      403,
    )
  })

  it('keeps the rows of the gauge from the customer, and its own rows from strangers', async () => {
    day('2026-11-02')
    const { submissionId, gauge } = await accepted()
    await report(gauge.id, 'repaired', '2026-11-02')
    const { customer, rivals } = story.organisations
    const count = async (organisation: typeof customer, table: string) =>
      story.harness.inTenant('customer', organisation, story.people.quality, [], async ({ tx }) => {
        const { rows } = await tx.execute<{ n: number }>(`select count(*)::integer as n from ${table}`)
        return rows[0]?.n
      })
    expect(await count(customer, 'gauge_events')).toBe(0)
    expect(await count(customer, `standing_events where submission_id = '${submissionId}'`)).toBe(1)
    for (const table of ['standing_events', 'standing_calibrations', 'reinstatements', 'carry_overs'])
      expect(await count(rivals, table)).toBe(0)
  })
})

describe('reinstating', () => {
  it('is the customer’s approver’s, with words, and lifts what was reported until then', async () => {
    day('2026-11-02')
    const { submissionId, gauge } = await accepted()
    const params = { submissionId }
    const body = { words: 'Ring measured before and after, no shift.' }
    expect(await story.by('approves').refusal(standings.reinstate, params, { body })).toMatchObject({
      status: 409,
      code: 'not-suspended',
    })
    day('2026-11-03')
    await report(gauge.id, 'repaired', '2026-11-03')
    expect((await story.by('quality').refusal(standings.reinstate, params, { body })).status).toBe(403)
    expect((await story.by('approver').refusal(standings.reinstate, params, { body })).status).toBe(403)
    expect(
      await story.by('approves').refusal(standings.reinstate, params, { body: { words: '' } }),
    ).toMatchObject({ status: 422 })
    expect(await story.by('approves').call(standings.readStanding, params)).toMatchObject({
      mayReinstate: true,
    })
    day('2026-11-04')
    expect(await story.by('approves').call(standings.reinstate, params, { body })).toMatchObject({
      standing: { state: 'stands' },
    })
    const { entries } = await story.by('engineer').call(standings.readStanding, params)
    expect(entries[0]).toMatchObject({ kind: 'reinstated', by: 'Veit Sahm', ...body })
    expect((await subjectsFor('approver')).some((subject) => subject.startsWith('Stands again'))).toBe(true)
    day('2026-11-06')
    await report(gauge.id, 'changed', '2026-11-06')
    expect(await standing(submissionId)).toMatchObject({ state: 'suspended', cause: { event: 'changed' } })
  })
})

describe('a newer revision of a part', () => {
  const revise = async (partId: string, label: string) => {
    const { rowVersion } = await story.by('quality').call(parts.readPart, { partId })
    return story
      .by('quality')
      .call(
        parts.addRevision,
        { partId },
        { body: { label, copyCharacteristics: true, expectedVersion: rowVersion } },
      )
  }
  const listed = async (partId: string) =>
    (await story.by('approves').call(standings.listCarryOvers, { partId })).items

  it('reopens what was accepted, until the customer carries it over', async () => {
    day('2026-11-02')
    const { submissionId, part, id } = await accepted()
    day('2026-11-10')
    const { currentRevision } = await revise(part.id, 'B')
    expect(await standing(submissionId)).toMatchObject({
      ...{ state: 'reopened', since: '2026-11-10' },
      cause: { kind: 'revision', label: 'B', limits: 'same' },
    })
    expect(await proofOf(id)).toBe('reopened')
    expect((await eventsOf(submissionId)).at(-1)).toBe('submission.reopened')
    for (const who of ['approver', 'second'] as const)
      expect(await subjectsFor(who)).toContain(`${part.number} B: 1 acceptance reopened`)
    expect(await listed(part.id)).toMatchObject([
      { submissionId, revision: 'A', limits: 'same', standing: 'stands', carriedOverOn: null },
    ])
    // The supplier sets its tasks up anew; nothing is shown for them yet.
    await story.by('engineer').call(tasks.takeOverTasks, { partId: part.id })
    const [anew] = (
      await story.by('quality').call(tasks.listTasks, {}, { query: { revisionId: currentRevision.id } })
    ).items
    expect(anew?.proof).toBe('missing')
    const body = { revisionId: currentRevision.id, submissionIds: [submissionId] }
    const params = { partId: part.id }
    expect((await story.by('quality').refusal(standings.carryOver, params, { body })).status).toBe(403)
    expect((await story.by('approver').refusal(standings.carryOver, params, { body })).status).toBe(403)
    expect(await story.by('approves').call(standings.carryOver, params, { body })).toEqual({ carried: 1 })
    expect(await standing(submissionId)).toMatchObject({ state: 'stands' })
    expect(await proofOf(anew?.id ?? '')).toBe('accepted')
    expect(await listed(part.id)).toMatchObject([
      { carriedOverOn: '2026-11-10', carriedOverBy: 'Veit Sahm', standing: 'stands' },
    ])
    expect(await story.by('approves').refusal(standings.carryOver, params, { body })).toMatchObject({
      code: 'not-to-carry-over',
    })
    // A third revision asks again.
    await revise(part.id, 'C')
    expect(await standing(submissionId)).toMatchObject({ state: 'reopened', cause: { label: 'C' } })
    expect(await story.by('approves').refusal(standings.carryOver, params, { body })).toMatchObject({
      code: 'newer-revision',
    })
  })

  it('is not carried over where limits, unit or class changed', async () => {
    day('2026-11-02')
    const { submissionId, part } = await accepted()
    day('2026-11-03')
    const { currentRevision } = await revise(part.id, 'B')
    const [copy] = (
      await story.by('quality').call(characteristics.listCharacteristics, {}, { query: { partId: part.id } })
    ).items
    if (!copy) throw new Error('The revision has no copy.')
    const { number, name, nominal, unit } = copy
    const change = (limits: object) => ({
      ...{ number, name, nominal, unit, class: copy.class, expectedVersion: copy.rowVersion },
      ...{ lowerLimit: '23.975', upperLimit: '24.025' },
      ...limits,
    })
    const params = { characteristicId: copy.id }
    await story
      .by('quality')
      .call(characteristics.changeCharacteristic, params, { body: change({ upperLimit: '24.020' }) })
    expect(await listed(part.id)).toMatchObject([{ limits: 'differ' }])
    const body = { revisionId: currentRevision.id, submissionIds: [submissionId] }
    expect(
      await story.by('approves').refusal(standings.carryOver, { partId: part.id }, { body }),
    ).toMatchObject({ code: 'not-to-carry-over' })
    expect(await standing(submissionId)).toMatchObject({ cause: { limits: 'differ' } })
    // The limits that were accepted can no longer change.
    const [old] = (
      await story
        .by('quality')
        .call(characteristics.listCharacteristics, {}, { query: { revisionId: part.currentRevision.id } })
    ).items
    expect(old).toMatchObject({ limitsFrozen: true })
    expect(
      await story
        .by('quality')
        .refusal(
          characteristics.changeCharacteristic,
          { characteristicId: old?.id ?? '' },
          { body: { ...change({ upperLimit: '24.020' }), expectedVersion: old?.rowVersion } },
        ),
    ).toMatchObject({ status: 409, code: 'limits-frozen' })
  })

  it('of others is not to be seen', async () => {
    day('2026-11-02')
    const { part, submissionId } = await accepted()
    expect((await story.by('stranger').refusal(standings.listCarryOvers, { partId: part.id })).status).toBe(
      404,
    )
    expect((await story.by('stranger').refusal(standings.readStanding, { submissionId })).status).toBe(404)
  })
})

describe('the certificate of a calibration', () => {
  it('can be added once to one that was entered without', async () => {
    day('2026-11-02')
    const { gauge } = await story.task()
    const entered = await calibrate(gauge.id, '2026-10-01', '2027-10-01')
    const params = { gaugeId: gauge.id, calibrationId: entered.id }
    const file = certificate('late')
    const withIt = await story.by('engineer').call(calibrations.attachGaugeCertificate, params, { file })
    expect(withIt.certificate).toMatchObject({ name: 'late.pdf' })
    expect(
      await story.by('engineer').refusal(calibrations.attachGaugeCertificate, params, { file }),
    ).toMatchObject({ status: 409, code: 'has-certificate' })
    expect(await story.by('engineer').refusal(calibrations.attachGaugeCertificate, params, {})).toMatchObject(
      { status: 422, errors: [{ path: 'body.file' }] },
    )
    const other = await story.task()
    expect(
      (
        await story
          .by('engineer')
          .refusal(calibrations.attachGaugeCertificate, { ...params, gaugeId: other.gauge.id }, { file })
      ).status,
    ).toBe(404)
  })
})

it('lists say how each stands', async () => {
  day('2026-11-02')
  const { submissionId, gauge, id } = await accepted()
  day('2026-11-03')
  await report(gauge.id, 'repaired', '2026-11-02')
  const { items } = await story
    .by('quality')
    .call(submissions.listSubmissions, {}, { query: { taskId: id, standing: 'suspended' } })
  expect(items).toMatchObject([{ id: submissionId, standing: { state: 'suspended' } }])
})
