import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { messages, reviews, submissions, tasks, type EndpointShape } from '@evenrule/api/contract'
import { sql } from './harness'
import { startStory, type Seen, type Story } from './prepared'

let story: Story
let ordinary: Awaited<ReturnType<Story['ready']>>
beforeAll(async () => {
  story = await startStory()
  ordinary = await story.ready()
})
afterAll(() => story.stop())

type Who = Parameters<Story['by']>[0]
const seenBy = async (who: Who, id: string) => {
  const { rowVersion: expectedVersion, sha256 } = await story.read(who, id)
  return { expectedVersion, sha256 }
}
const owed = { owner: 'supplier', followUp: 'new-study' } as const
const conditions = [{ text: 'x', dueOn: '2027-01-01', ...owed }]
const onClause = (clauseKey: string, text: string) => ({
  ...{ target: { kind: 'clause', clauseKey }, reasonKind: 'verdict', dueOn: '2026-11-30', text },
})
/** A move by somebody who has just looked. */
const act = async (who: Who, endpoint: EndpointShape, id: string, body: object = {}) =>
  story.by(who).call(endpoint, { submissionId: id }, { body: { ...(await seenBy(who, id)), ...body } })
const refusal = async (who: Who, endpoint: EndpointShape, id: string, body: object = {}) =>
  story
    .by(who)
    .refusal(endpoint, { submissionId: id }, { body: { ...(await seenBy('quality', id)), ...body } })
const events = async (id: string): Promise<string[]> =>
  (
    await story.harness.owner.query(
      `select type from record_events where chain_id = $1 and (subject_id = $2 or text like $3) order by sequence`,
      [story.relationship.id, id, `%"submissionId":"${id}"%`],
    )
  ).rows.map((row: { type: string }) => row.type)
const proofOf = async (taskId: string) => (await story.by('quality').call(tasks.readTask, { taskId })).proof

describe('accepting', () => {
  let id: string
  beforeEach(async () => {
    id = await story.submission(ordinary.id, 'submitted')
  })

  it('is signed by who decides, told to the supplier, and shown as proof of the task', async () => {
    expect(await act('quality', reviews.accept, id, { reason: 'Looks right.' })).toMatchObject({
      ...{ id, state: 'accepted', rowVersion: 4 },
    })
    const seen = await story.read('engineer', id)
    expect(seen).toMatchObject({
      ...{ state: 'accepted', decidedAt: story.harness.now().toISOString() },
      decisions: [
        { kind: 'accepted', state: 'final', reason: 'Looks right.', decidedBy: 'Ola Brandt', secondBy: null },
      ],
    })
    expect(seen.signatures.map(({ side, meaning, name, sha256 }) => [side, meaning, name, sha256])).toEqual([
      ['supplier', 'submits', 'Arne Holt', seen.sha256],
      ['customer', 'accepts', 'Ola Brandt', seen.sha256],
    ])
    expect(await proofOf(ordinary.id)).toBe('accepted')
    expect(await events(id)).toEqual(['submission.signed', 'submission.accepted'])
    const told = await story.by('engineer').call(messages.listMessages, {}, { query: { size: 100 } })
    expect(told.items.find(({ link, kind }) => kind === 'decision' && link.endsWith(id))?.subject).toContain(
      'Accepted: submission',
    )
    expect(await story.by('quality').call(submissions.verifySubmission, { submissionId: id })).toMatchObject({
      equal: true,
    })
  })

  it('supersedes what was accepted of the same task before', async () => {
    await act('quality', reviews.accept, id)
    const later = await story.submission(ordinary.id, 'submitted')
    await act('quality', reviews.accept, later)
    const older = await story.read('engineer', id)
    const newer = await story.read('engineer', later)
    expect(older).toMatchObject({ state: 'superseded', supersededBy: { id: later, number: newer.number } })
    expect(newer).toMatchObject({ state: 'accepted', supersededBy: null })
    expect(await events(id)).toEqual(['submission.signed', 'submission.accepted', 'submission.superseded'])
    // What is superseded is at its end.
    expect(await refusal('quality', reviews.refuse, id, { reason: 'x' })).toMatchObject({
      code: 'wrong-state',
    })
  })

  it('is refused for one that is older than what is accepted already', async () => {
    const later = await story.submission(ordinary.id, 'submitted')
    await act('quality', reviews.accept, later)
    expect(await refusal('quality', reviews.accept, id)).toMatchObject({
      status: 409,
      code: 'newer-accepted',
    })
    const { hindrances } = await story.read('quality', id)
    expect(hindrances).toEqual([{ move: 'accept', code: 'newer-accepted' }])
    expect((await story.read('approves', id)).hindrances).toHaveLength(2)
    await act('quality', reviews.refuse, id, { reason: 'A newer one is accepted.' })
  })

  it('takes an approver to set conditions, a day that is still to come, and words', async () => {
    const asked = { text: 'Repeat with the new ring.', dueOn: '2026-12-31', ...owed }
    const body = { conditions: [asked] }
    expect(await refusal('quality', reviews.acceptWithConditions, id, body)).toMatchObject({
      ...{ status: 403, code: 'not-allowed' },
    })
    expect(
      await refusal('approves', reviews.acceptWithConditions, id, {
        conditions: [asked, { ...asked, dueOn: '2026-11-01' }],
      }),
    ).toMatchObject({ status: 422, errors: [{ path: 'body.conditions.1.dueOn' }] })
    expect(
      await refusal('approves', reviews.acceptWithConditions, id, { conditions: [{ ...asked, text: ' ' }] }),
    ).toMatchObject({ status: 422, errors: [{ path: 'body.conditions.0.text' }] })
    await act('approves', reviews.acceptWithConditions, id, body)
    const seen = await story.read('engineer', id)
    expect(seen).toMatchObject({
      state: 'accepted-with-conditions',
      decisions: [{ ...body, state: 'final' }],
    })
    expect(seen.signatures.at(-1)).toMatchObject({ meaning: 'accepts-with-conditions', name: 'Veit Sahm' })
    expect(await proofOf(ordinary.id)).toBe('accepted-with-conditions')
  })

  it('names the bytes it is about, and takes a fresh sign-in', async () => {
    expect(await refusal('quality', reviews.accept, id, { sha256: '0'.repeat(64) })).toMatchObject({
      ...{ status: 409, code: 'not-as-seen' },
    })
    const body = await seenBy('quality', id)
    const { client, organisation } = story.by('quality')
    const before = story.harness.now()
    story.harness.moveClock(new Date(before.getTime() + 6 * 60_000))
    for (const move of ['accept', 'refuse', 'confirm', 'accept-with-conditions']) {
      const answer = await client
        .send('post', `/organisations/${organisation.id}/submissions/${id}/${move}`)
        .send({ ...body, reason: 'x', conditions })
      expect(answer.status).toBe(403)
    }
    story.harness.moveClock(before)
    expect((await story.read('quality', id)).state).toBe('submitted')
  })

  it('or refusing is signed with its reason', async () => {
    await act('second', reviews.refuse, id, { reason: 'The ring was not the one agreed.' })
    const seen = await story.read('engineer', id)
    expect(seen).toMatchObject({
      state: 'refused',
      decisions: [{ kind: 'refused', state: 'final', reason: 'The ring was not the one agreed.' }],
    })
    expect(seen.signatures.at(-1)).toMatchObject({ meaning: 'refuses', name: 'Ida Mohn' })
    expect(await events(id)).toEqual(['submission.signed', 'submission.refused'])
  })

  it('and withdrawing at the same moment: one wins, the other is told', async () => {
    const seen = await seenBy('quality', id)
    const quality = story.by('quality')
    const engineer = story.by('engineer')
    const [accepted, withdrawn] = await Promise.all([
      quality.client
        .send('post', `/organisations/${quality.organisation.id}/submissions/${id}/accept`)
        .send(seen),
      engineer.client
        .send('post', `/organisations/${engineer.organisation.id}/submissions/${id}/withdraw`)
        .send({ expectedVersion: seen.expectedVersion, reason: 'Wrong gauge.' }),
    ])
    expect([accepted.status, withdrawn.status].sort()).toEqual([200, 409])
    const { state, rowVersion } = await story.read('engineer', id)
    expect(state).toBe(accepted.status === 200 ? 'accepted' : 'withdrawn')
    expect(rowVersion).toBe(seen.expectedVersion + 1)
    expect(await events(id)).toHaveLength(2)
  })

  it('of two submissions of one task at the same moment leaves one accepted', async () => {
    const later = await story.submission(ordinary.id, 'submitted')
    const { client, organisation } = story.by('quality')
    const both = [await seenBy('quality', id), await seenBy('quality', later)]
    await Promise.all(
      [id, later].map((each, at) =>
        client.send('post', `/organisations/${organisation.id}/submissions/${each}/accept`).send(both[at]),
      ),
    )
    const states = [(await story.read('quality', id)).state, (await story.read('quality', later)).state]
    // The older may have come first and been superseded, or come second and been refused; never both accepted.
    expect(states[1]).toBe('accepted')
    expect(['superseded', 'submitted']).toContain(states[0])
  })
})

describe('who may decide', () => {
  it('is nobody of the supplier, no reader and no stranger', async () => {
    const id = await story.submission(ordinary.id, 'submitted')
    const body = { reason: 'x', conditions }
    const moves = [
      reviews.accept,
      reviews.acceptWithConditions,
      reviews.refuse,
      reviews.confirm,
      reviews.sendBack,
    ]
    for (const endpoint of moves) {
      for (const who of ['engineer', 'approver', 'buyerReader'] as const)
        expect((await refusal(who, endpoint, id, body)).status).toBe(403)
      expect((await refusal('stranger', endpoint, id, body)).status).toBe(404)
    }
    const challenged = onClause('bias/mean', 'x')
    expect((await refusal('engineer', reviews.openChallenge, id, challenged)).status).toBe(403)
    expect((await refusal('stranger', reviews.openChallenge, id, challenged)).status).toBe(404)
    expect(
      (
        await story.by('quality').refusal(
          submissions.withdrawSubmission,
          { submissionId: id },
          {
            body: { expectedVersion: 3, reason: 'x' },
          },
        )
      ).status,
    ).toBe(403)
    await act('quality', reviews.refuse, id, { reason: 'end' })
  })
})

describe('a second person on a safety-class characteristic', () => {
  let task: Awaited<ReturnType<Story['ready']>>
  let id: string
  beforeAll(async () => {
    task = await story.ready({ safety: true })
  })
  beforeEach(async () => {
    id = await story.submission(task.id, 'submitted')
  })

  it('must confirm the acceptance; the first may not', async () => {
    expect(await act('quality', reviews.accept, id)).toMatchObject({ state: 'awaiting-second-person' })
    expect((await story.read('quality', id)).hindrances).toEqual([{ move: 'confirm', code: 'same-person' }])
    expect((await story.read('second', id)).hindrances).toEqual([])
    expect(await refusal('quality', reviews.confirm, id)).toMatchObject({ status: 403, code: 'same-person' })
    expect(await act('second', reviews.confirm, id)).toMatchObject({ state: 'accepted' })
    const seen = await story.read('engineer', id)
    expect(seen.decisions).toMatchObject([
      { kind: 'accepted', state: 'final', decidedBy: 'Ola Brandt', secondBy: 'Ida Mohn' },
    ])
    expect(seen.signatures.map(({ meaning }) => meaning)).toEqual(['submits', 'accepts', 'second-person'])
    expect(await events(id)).toEqual([
      ...['submission.signed', 'submission.second-person-asked', 'submission.accepted'],
    ])
  })

  it('confirms conditions as they were proposed, which the supplier sees only then', async () => {
    const body = { conditions: [{ text: 'Repeat by spring.', dueOn: '2027-03-01', ...owed }] }
    await act('approves', reviews.acceptWithConditions, id, body)
    const between = await story.read('engineer', id)
    expect(between).toMatchObject({ state: 'awaiting-second-person', decisions: [] })
    expect(between.signatures.map(({ meaning }) => meaning)).toEqual(['submits'])
    const asked = await story.harness.owner.query(
      `select text from record_events where subject_id = $1 and type = 'submission.second-person-asked'`,
      [id],
    )
    expect(Object.keys(JSON.parse(asked.rows[0].text).data).sort()).toEqual(['number', 'sha256'])
    await act('quality', reviews.confirm, id)
    expect(await story.read('engineer', id)).toMatchObject({
      ...{ state: 'accepted-with-conditions', decisions: [{ ...body, state: 'final' }] },
    })
  })

  it('may send it back instead; the supplier learns of no reason and sees no signature', async () => {
    await act('quality', reviews.accept, id)
    await act('second', reviews.sendBack, id, { reason: 'I see a drift.' })
    expect(await story.read('quality', id)).toMatchObject({
      state: 'submitted',
      decisions: [{ state: 'withdrawn', sentBackReason: 'I see a drift.', decidedBy: 'Ola Brandt' }],
    })
    const theirs = await story.read('engineer', id)
    expect(theirs.decisions).toEqual([])
    expect(theirs.signatures).toHaveLength(1)
    expect(JSON.stringify(theirs)).not.toContain('drift.')
    // The review goes on: the same two may do it once more.
    await act('second', reviews.accept, id)
    await act('quality', reviews.confirm, id)
    expect((await story.read('engineer', id)).state).toBe('accepted')
  })

  it('is not needed to refuse, and not waited for once the supplier takes the submission back', async () => {
    await act('quality', reviews.accept, id)
    expect(await refusal('second', reviews.refuse, id, { reason: 'x' })).toMatchObject({
      code: 'wrong-state',
    })
    await story.by('engineer').call(
      submissions.withdrawSubmission,
      { submissionId: id },
      {
        body: { expectedVersion: 4, reason: 'Wrong ring.' },
      },
    )
    expect((await story.read('quality', id)).decisions).toMatchObject([{ state: 'withdrawn' }])
    const next = await story.submission(task.id, 'submitted')
    expect(await act('quality', reviews.refuse, next, { reason: 'No.' })).toMatchObject({ state: 'refused' })
  })

  it('confirms once when two confirm at the same moment', async () => {
    await act('quality', reviews.accept, id)
    const seen = await seenBy('second', id)
    const answers = await Promise.all(
      (['second', 'approves'] as const).map((who) => {
        const { client, organisation } = story.by(who)
        return client.send('post', `/organisations/${organisation.id}/submissions/${id}/confirm`).send(seen)
      }),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect((await story.read('quality', id)).signatures).toHaveLength(3)
  })
})

describe('challenging a result', () => {
  const bias = onClause('bias/mean', 'The spread looks too small.')
  let task: Awaited<ReturnType<Story['ready']>>
  let id: string
  beforeAll(async () => {
    task = await story.ready()
  })
  beforeEach(async () => {
    id = await story.submission(task.id, 'submitted')
  })
  const challengeOf = (seen: Seen, at = 0) => {
    const challenge = seen.challenges[at]
    if (!challenge) throw new Error('There is no challenge.')
    return challenge
  }
  const say = async (who: Who, endpoint: EndpointShape, text: string, at = 0) => {
    const { id: challengeId, rowVersion } = challengeOf(await story.read(who, id), at)
    return story.by(who).call(
      endpoint,
      { submissionId: id, challengeId },
      {
        body: { expectedVersion: rowVersion, text },
      },
    )
  }
  const cannot = async (who: Who, endpoint: EndpointShape, text = 'words', at = 0) => {
    const { id: challengeId, rowVersion } = challengeOf(await story.read('quality', id), at)
    return story.by(who).refusal(
      endpoint,
      { submissionId: id, challengeId },
      {
        body: { expectedVersion: rowVersion, text },
      },
    )
  }

  it('goes to and fro in words until the answer settles it, and then it can be accepted', async () => {
    const opened = await act('quality', reviews.openChallenge, id, bias)
    expect(opened).toMatchObject({
      ...{ number: 1, target: bias.target, reasonKind: 'verdict', state: 'open', closedAt: null },
      messages: [{ side: 'customer', name: 'Ola Brandt', text: bias.text }],
    })
    expect(await story.read('engineer', id)).toMatchObject({ state: 'challenged' })
    expect(await proofOf(task.id)).toBe('challenged')
    expect(await refusal('quality', reviews.accept, id)).toMatchObject({ status: 409, code: 'wrong-state' })
    await say('engineer', reviews.answerChallenge, 'It is a new gauge.')
    const answered = await story.read('quality', id)
    expect(answered).toMatchObject({ state: 'answered' })
    expect(answered.hindrances).toEqual([{ move: 'accept', code: 'challenge-unsettled' }])
    expect(await refusal('quality', reviews.accept, id)).toMatchObject({ code: 'challenge-unsettled' })
    await say('second', reviews.replyToAnswer, 'Show us the certificate.')
    expect((await story.read('engineer', id)).state).toBe('challenged')
    await say('approver', reviews.answerChallenge, 'It is among the files.')
    expect(await say('quality', reviews.settleChallenge, '')).toMatchObject({
      ...{ state: 'resolved-by-evidence', closedBy: 'Ola Brandt' },
    })
    const settled = await story.read('quality', id)
    expect(settled).toMatchObject({ state: 'answered', hindrances: [] })
    expect(challengeOf(settled).messages.map(({ side, name }) => [side, name])).toEqual([
      ['customer', 'Ola Brandt'],
      ['supplier', 'Grit Falk'],
      ['customer', 'Ida Mohn'],
      ['supplier', 'Arne Holt'],
      ['customer', 'Ola Brandt'],
    ])
    expect(await act('quality', reviews.accept, id)).toMatchObject({ state: 'accepted' })
    expect(await events(id)).toEqual([
      'submission.signed',
      ...['challenge.opened', 'submission.challenged', 'challenge.answered', 'submission.answered'],
      ...['challenge.replied', 'submission.challenged', 'challenge.answered', 'submission.answered'],
      ...['challenge.settled', 'submission.accepted'],
    ])
  })

  it('names a clause of the submission, one challenge at a time for each', async () => {
    expect(await refusal('quality', reviews.openChallenge, id, onClause('no/such', 'x'))).toMatchObject({
      ...{ status: 422, errors: [{ path: 'body.target.clauseKey' }] },
    })
    expect(await refusal('quality', reviews.openChallenge, id, { ...bias, text: ' ' })).toMatchObject({
      ...{ status: 422, errors: [{ path: 'body.text' }] },
    })
    await act('quality', reviews.openChallenge, id, bias)
    expect(await refusal('quality', reviews.openChallenge, id, bias)).toMatchObject({
      ...{ status: 409, code: 'target-under-challenge' },
    })
    const other = await act('quality', reviews.openChallenge, id, onClause('design/readings', 'x'))
    expect(other).toMatchObject({ number: 2 })
    // Answered only once both are.
    await say('engineer', reviews.answerChallenge, 'first', 0)
    expect((await story.read('quality', id)).state).toBe('challenged')
    await say('engineer', reviews.answerChallenge, 'second', 1)
    expect((await story.read('quality', id)).state).toBe('answered')
  })

  it('can be withdrawn, and puts the review back to where it was', async () => {
    await act('quality', reviews.openChallenge, id, bias)
    await say('second', reviews.withdrawChallenge, 'My mistake.')
    expect(await story.read('engineer', id)).toMatchObject({
      state: 'submitted',
      challenges: [{ state: 'withdrawn', closedBy: 'Ida Mohn' }],
    })
    // Withdrawn after an answer, the submission stays answered.
    await act('quality', reviews.openChallenge, id, bias)
    await say('engineer', reviews.answerChallenge, 'Here.', 1)
    await say('quality', reviews.withdrawChallenge, '', 1)
    expect((await story.read('engineer', id)).state).toBe('answered')
    expect(await events(id)).toEqual([
      'submission.signed',
      ...['challenge.opened', 'submission.challenged', 'challenge.withdrawn', 'submission.review-resumed'],
      ...['challenge.opened', 'submission.challenged', 'challenge.answered', 'submission.answered'],
      'challenge.withdrawn',
    ])
  })

  it('stays unresolved where the submission is refused over it', async () => {
    await act('quality', reviews.openChallenge, id, bias)
    expect(await refusal('quality', reviews.refuse, id, { reason: 'No.' })).toMatchObject({
      code: 'wrong-state',
    })
    await say('engineer', reviews.answerChallenge, 'No, it is right.')
    await act('quality', reviews.refuse, id, { reason: 'We do not agree.' })
    expect(await story.read('engineer', id)).toMatchObject({
      state: 'refused',
      challenges: [{ state: 'unresolved', closedBy: 'Ola Brandt' }],
    })
    expect((await events(id)).slice(-2)).toEqual(['submission.refused', 'challenge.left-unresolved'])
  })

  it('gives each side its own moves, and none to readers and strangers', async () => {
    await act('quality', reviews.openChallenge, id, bias)
    expect((await cannot('quality', reviews.answerChallenge)).status).toBe(403)
    for (const endpoint of [reviews.replyToAnswer, reviews.settleChallenge])
      expect(await cannot('quality', endpoint)).toMatchObject({ status: 409, code: 'wrong-state' })
    for (const endpoint of [reviews.replyToAnswer, reviews.settleChallenge, reviews.withdrawChallenge])
      for (const who of ['engineer', 'buyerReader'] as const)
        expect((await cannot(who, endpoint)).status).toBe(403)
    for (const endpoint of [reviews.answerChallenge, reviews.withdrawChallenge])
      expect((await cannot('stranger', endpoint)).status).toBe(
        endpoint === reviews.answerChallenge ? 403 : 404,
      )
    expect((await cannot('reader', reviews.answerChallenge)).status).toBe(403)
    expect(await cannot('engineer', reviews.answerChallenge, '  ')).toMatchObject({ status: 422 })
  })

  it('is over once the submission is taken back', async () => {
    await act('quality', reviews.openChallenge, id, bias)
    await story.by('engineer').call(
      submissions.withdrawSubmission,
      { submissionId: id },
      {
        body: { expectedVersion: 4, reason: 'You are right.' },
      },
    )
    expect(await cannot('engineer', reviews.answerChallenge)).toMatchObject({ code: 'wrong-state' })
    expect(await cannot('quality', reviews.withdrawChallenge)).toMatchObject({ code: 'wrong-state' })
  })

  it('gives the submission a new version with every word, so that nobody decides on an old view', async () => {
    const before = await seenBy('quality', id)
    await act('second', reviews.openChallenge, id, bias)
    await say('engineer', reviews.answerChallenge, 'Here.')
    await say('second', reviews.settleChallenge, '')
    const stale = await story.by('quality').refusal(reviews.accept, { submissionId: id }, { body: before })
    expect(stale).toMatchObject({ status: 409, code: 'changed-meanwhile' })
  })

  it('takes one of two answers at the same moment', async () => {
    await act('quality', reviews.openChallenge, id, bias)
    const { id: challengeId, rowVersion } = challengeOf(await story.read('engineer', id))
    const { client, organisation } = story.by('engineer')
    const path = `/organisations/${organisation.id}/submissions/${id}/challenges/${challengeId}/answer`
    const answers = await Promise.all(
      ['one', 'two'].map((text) => client.send('post', path).send({ expectedVersion: rowVersion, text })),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect(challengeOf(await story.read('engineer', id)).messages).toHaveLength(2)
  })

  it('leaves words that nobody can change, and answers that only the supplier can give', async () => {
    await act('quality', reviews.openChallenge, id, bias)
    const { engineer } = story.people
    const { supplier } = story.organisations
    const attempt = (statement: string) =>
      story.harness
        .inTenant('supplier', supplier, engineer, [], async ({ tx }) => tx.execute(sql.raw(statement)))
        .then(
          () => 'not refused',
          (error: { cause?: unknown }) => String(error.cause),
        )
    expect(await attempt(`update challenge_messages set text = 'x'`)).toMatch(/permission denied/)
    expect(await attempt(`delete from challenges`)).toMatch(/permission denied/)
    expect(
      await attempt(
        `insert into challenge_messages select gen_random_uuid(), relationship_id, supplier_org_id, customer_org_id, challenge_id, 'customer', user_id, 'answer', 'words', 'we were wrong', null, null, null, null, created_at from challenge_messages limit 1`,
      ),
    ).toMatch(/row-level security/)
    expect(
      await attempt(
        `insert into decisions select gen_random_uuid(), relationship_id, supplier_org_id, customer_org_id, id, 'accepted', 'final', '', 1, created_by, created_at from submissions where id = '${id}'`,
      ),
    ).toMatch(/row-level security/)
  })
})
