import { afterAll, beforeAll, expect, it } from 'vitest'
import { agreements, reviews } from '@evenrule/api/contract'
import { clauses, startStory, type Story } from './prepared'

let story: Story
beforeAll(async () => {
  story = await startStory()
})
afterAll(() => story.stop())

/** A challenged submission of a task of its own. */
async function challenged() {
  const task = await story.ready()
  const submissionId = await story.submission(task.id, 'submitted')
  const { rowVersion } = await story.read('quality', submissionId)
  const challenge = await story.by('quality').call(
    reviews.openChallenge,
    { submissionId },
    {
      body: {
        ...{ expectedVersion: rowVersion, target: { kind: 'clause', clauseKey: 'bias/mean' } },
        ...{ reasonKind: 'verdict', text: 'Is the margin right?', dueOn: '2026-12-01' },
      },
    },
  )
  return { partId: task.part.id, caseOf: { submissionId, challengeId: challenge.id } }
}
const body = (partId: string | null, caseOf: object | null) => ({
  ...{
    relationshipId: story.relationship.id,
    partId,
    clauses,
    effectiveOn: '2027-03-01',
    send: true,
    caseOf,
  },
})

it('a proposal may carry the challenge that asked for it, and both sides see which', async () => {
  const { partId, caseOf } = await challenged()
  const { id, versions } = await story
    .by('engineer')
    .call(agreements.beginVersion, {}, { body: body(partId, caseOf) })
  expect(versions[0]).toMatchObject({ state: 'proposed', caseOf, rounds: [{ caseOf }] })
  const seen = await story.by('quality').call(agreements.readAgreement, { agreementId: id })
  expect(seen.versions[0]).toMatchObject({ caseOf, rounds: [{ caseOf }] })
  const { rows } = await story.harness.owner.query<{ text: string }>(
    `select text from record_events where type = 'agreement.proposed' and subject_id = $1`,
    [versions[0]?.id],
  )
  expect(JSON.parse(rows[0]?.text ?? '').data).toMatchObject({ challengeId: caseOf.challengeId })
})

it('an answer attaches one too, which the other side learns when it is sent, not before', async () => {
  const { caseOf } = await challenged()
  const { partId } = await challenged()
  const begun = await story.by('quality').call(agreements.beginVersion, {}, { body: body(partId, null) })
  const [version] = begun.versions
  const params = { agreementId: begun.id, versionId: version?.id ?? '' }
  const written = { clauses, effectiveOn: '2027-03-01', expectedVersion: version?.rowVersion }
  const drafted = await story
    .by('engineer')
    .call(agreements.answerRound, params, { body: { ...written, caseOf } })
  expect(drafted.versions[0]).toMatchObject({ caseOf })
  const before = await story.by('quality').call(agreements.readAgreement, params)
  expect(before.versions[0]).toMatchObject({ caseOf: null, rounds: [{ caseOf: null }] })
  await story.by('engineer').call(agreements.sendDraft, params, { body: { expectedVersion: 1 } })
  const after = await story.by('quality').call(agreements.readAgreement, params)
  expect(after.versions[0]).toMatchObject({ caseOf, rounds: [{ caseOf: null }, { caseOf }] })
})

it('is refused where the challenge is not of that submission and this relationship', async () => {
  const [one, two] = [await challenged(), await challenged()]
  for (const wrong of [
    { ...one.caseOf, challengeId: two.caseOf.challengeId },
    { ...one.caseOf, submissionId: two.caseOf.submissionId },
    { ...one.caseOf, challengeId: one.partId },
  ])
    expect(
      await story.by('engineer').refusal(agreements.beginVersion, {}, { body: body(one.partId, wrong) }),
    ).toMatchObject({ status: 422, errors: [{ path: 'body.caseOf' }] })
  // A stranger that supplies the same customer names a challenge of others.
  const { rivals, customer } = story.organisations
  const theirs = await story.harness.relationship(rivals, customer)
  const stranger = story.harness.as('supplier', story.people.stranger)
  const answer = await stranger
    .send('post', `/organisations/${rivals.id}/agreements`)
    .send({ ...body(null, one.caseOf), relationshipId: theirs.id })
  expect(answer.body).toMatchObject({ status: 422, errors: [{ path: 'body.caseOf' }] })
})
