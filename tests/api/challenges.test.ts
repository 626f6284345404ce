import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { agreements, files, reviews, submissions, type EndpointShape } from '@evenrule/api/contract'
import { certificate, clauses, startStory, type Seen, type Story } from './prepared'

let story: Story
let task: Awaited<ReturnType<Story['ready']>>
let id: string
beforeAll(async () => {
  story = await startStory()
  task = await story.ready()
})
afterAll(() => story.stop())
beforeEach(async () => {
  id = await story.submission(task.id, 'submitted')
})

type Who = Parameters<Story['by']>[0]
const dueOn = '2026-11-16'
const onReadings = (readings = [2, 5]) => ({
  ...{ target: { kind: 'readings', study: task.study.code, readings }, reasonKind: 'outlying' },
  ...{ dueOn, text: 'Readings 3 and 6 lie apart.' },
})
const newest = ({ challenges }: Seen) => {
  const found = challenges.at(-1)
  if (!found) throw new Error('There is no challenge.')
  return found
}
const open = async (body: object, who: Who = 'quality') => {
  const { rowVersion: expectedVersion } = await story.read(who, id)
  return story
    .by(who)
    .call(reviews.openChallenge, { submissionId: id }, { body: { expectedVersion, ...body } })
}
const cannotOpen = async (body: object) => {
  const { rowVersion: expectedVersion } = await story.read('quality', id)
  return story
    .by('quality')
    .refusal(reviews.openChallenge, { submissionId: id }, { body: { expectedVersion, ...body } })
}
const target = async (who: Who) => {
  const { id: challengeId, rowVersion: expectedVersion } = newest(await story.read(who, id))
  return { params: { submissionId: id, challengeId }, expectedVersion }
}
const act = async (who: Who, endpoint: EndpointShape, body: object = {}) => {
  const { params, expectedVersion } = await target(who)
  return story.by(who).call(endpoint, params, { body: { expectedVersion, ...body } })
}
const cannot = async (who: Who, endpoint: EndpointShape, body: object = {}) => {
  const { params, expectedVersion } = await target('quality')
  return story.by(who).refusal(endpoint, params, { body: { expectedVersion, ...body } })
}
const upload = async (who: Who, name: string): Promise<string> =>
  (await story.by(who).call(files.uploadAttachment, {}, { body: {}, file: certificate(name) })).id
const decide = async (who: Who, endpoint: EndpointShape, more: object = {}) => {
  const { rowVersion: expectedVersion, sha256 } = await story.read(who, id)
  return story.by(who).call(endpoint, { submissionId: id }, { body: { expectedVersion, sha256, ...more } })
}

describe('what a challenge is about', () => {
  it('is one named thing of the frozen submission: readings, clause, standard, set-up or calculation', async () => {
    const study = task.study.code
    const about = [
      [onReadings().target, 'outlying'],
      [{ kind: 'clause', clauseKey: 'bias/mean' }, 'too-few-readings'],
      [{ kind: 'standard', study }, 'uncertainty'],
      [{ kind: 'set-up', study }, 'fixture'],
      [{ kind: 'calculation', clauseKey: 'bias/mean' }, 'rounding'],
    ] as const
    for (const [named, reasonKind] of about) {
      const opened = await open({ target: named, reasonKind, dueOn, text: 'Is it?' })
      expect(opened).toMatchObject({
        ...{ target: named, reasonKind, dueOn, revision: 1, state: 'open', overdue: false },
        openedBy: 'Ola Brandt',
      })
    }
    const { text, challenges } = await story.read('engineer', id)
    const content = submissions.contentOf(text)
    if (!content) throw new Error('The text is readable.')
    const concerned = challenges.map((each) => reviews.clausesConcerned(each.target, content))
    const ofStudy = ['design/readings', 'resolution/share', 'calibration/date', 'bias/mean']
    expect(concerned).toEqual([ofStudy, ['bias/mean'], ofStudy, ofStudy, ['bias/mean']])
  })

  it('must be there', async () => {
    const study = task.study.code
    for (const [named, path] of [
      [{ kind: 'clause', clauseKey: 'no/such' }, 'body.target.clauseKey'],
      [{ kind: 'standard', study: 'BS-none' }, 'body.target.study'],
      [{ kind: 'readings', study, readings: [15] }, 'body.target.readings'],
      [{ kind: 'readings', study, readings: [] }, 'body.target.readings'],
    ] as const)
      expect(await cannotOpen({ target: named, reasonKind: 'other', dueOn, text: 'Is it?' })).toMatchObject({
        status: 422,
        errors: [{ path }],
      })
    expect((await story.read('quality', id)).challenges).toEqual([])
  })

  it('takes a reason of its kind and a day that is still to come', async () => {
    expect(await cannotOpen({ ...onReadings(), reasonKind: 'fixture' })).toMatchObject({
      ...{ status: 422, errors: [{ path: 'body.reasonKind' }] },
    })
    expect(await cannotOpen({ ...onReadings(), dueOn: '2026-11-01' })).toMatchObject({
      ...{ status: 422, errors: [{ path: 'body.dueOn' }] },
    })
    const now = story.harness.now()
    await open(onReadings())
    story.harness.moveClock(new Date('2026-11-16T22:30:00.000Z'))
    // Half an hour before midnight in Berlin the day is not over; an hour later it is.
    expect(newest(await story.read('engineer', id)).overdue).toBe(false)
    story.harness.moveClock(new Date('2026-11-16T23:30:00.000Z'))
    expect(newest(await story.read('engineer', id)).overdue).toBe(true)
    await act('engineer', reviews.answerChallenge, { text: 'Late, but here.' })
    expect(newest(await story.read('engineer', id)).overdue).toBe(false)
    story.harness.moveClock(now)
  })

  it('is under one challenge at a time: readings that overlap, the same clause, the same study', async () => {
    await open(onReadings([1, 2]))
    expect(await cannotOpen(onReadings([2, 3]))).toMatchObject({
      status: 409,
      code: 'target-under-challenge',
    })
    await open(onReadings([3, 4]))
    await act('quality', reviews.withdrawChallenge)
    expect((await open(onReadings([4]))).number).toBe(3)
  })
})

describe('files', () => {
  it('go with a challenge and its answer, and both sides read them byte for byte', async () => {
    const photo = await upload('quality', 'photo')
    await open({ ...onReadings(), fileIds: [photo] })
    expect(
      await cannot('engineer', reviews.answerChallenge, { kind: 'evidence', text: 'See.' }),
    ).toMatchObject({ status: 422, errors: [{ path: 'body.fileIds' }] })
    const strip = await upload('engineer', 'strip')
    await act('engineer', reviews.answerChallenge, { kind: 'evidence', text: 'See.', fileIds: [strip] })
    for (const who of ['engineer', 'quality', 'buyerReader'] as const) {
      const { messages } = newest(await story.read(who, id))
      expect(messages.map(({ files: named }) => named.map(({ name }) => name))).toEqual([
        ['photo.pdf'],
        ['strip.pdf'],
      ])
      const fileId = messages[1]?.files[0]?.id ?? ''
      const { client, organisation } = story.by(who)
      const answer = await client
        .send('get', `/organisations/${organisation.id}/submissions/${id}/files/${fileId}`)
        .buffer(true)
      expect(answer.status).toBe(200)
      expect(Buffer.from(answer.body as Uint8Array)).toEqual(certificate('strip').bytes)
    }
    expect(
      await story
        .by('stranger')
        .refusal(submissions.downloadSubmissionFile, { submissionId: id, fileId: strip }),
    ).toMatchObject({ status: 404 })
  })

  it('of the other organisation cannot be named, and what is no document is refused by its content', async () => {
    const theirs = await upload('engineer', 'theirs')
    expect(await cannotOpen({ ...onReadings(), fileIds: [theirs] })).toMatchObject({
      ...{ status: 422, errors: [{ path: 'body.fileIds.0' }] },
    })
    expect(
      await story
        .by('quality')
        .refusal(
          files.uploadAttachment,
          {},
          { body: {}, file: { name: 'virus.pdf', bytes: Buffer.from([77, 90, 0, 1]) } },
        ),
    ).toMatchObject({ status: 422, errors: [{ path: 'body.file' }] })
    expect(
      await story.by('buyerReader').refusal(files.uploadAttachment, {}, { body: {}, file: certificate('x') }),
    ).toMatchObject({ status: 403 })
  })
})

describe('answering with another criterion', () => {
  it('takes a proposal of one’s own with the challenge as its case', async () => {
    const opened = await open({
      ...{ target: { kind: 'clause', clauseKey: 'bias/mean' }, reasonKind: 'wrong-method' },
      ...{ dueOn, text: 'The margin is too wide.' },
    })
    const refused = await cannot('engineer', reviews.answerChallenge, { kind: 'criterion', text: 'See.' })
    expect(refused).toMatchObject({ status: 422, errors: [{ path: 'body.versionId' }] })
    const begun = await story.by('engineer').call(
      agreements.beginVersion,
      {},
      {
        body: {
          ...{ relationshipId: story.relationship.id, partId: task.part.id, characteristicId: null },
          ...{ clauses, effectiveOn: '2026-12-01', send: true },
          caseOf: { submissionId: id, challengeId: opened.id },
        },
      },
    )
    const versionId = begun.versions[0]?.id ?? ''
    await act('engineer', reviews.answerChallenge, { kind: 'criterion', text: 'We propose this.', versionId })
    const { messages, state } = newest(await story.read('quality', id))
    expect(state).toBe('answered')
    expect(messages.at(-1)).toMatchObject({
      ...{ answerKind: 'criterion', proposal: { agreementId: begun.id, versionId } },
    })
    await act('quality', reviews.settleChallenge)
    expect(newest(await story.read('quality', id)).state).toBe('resolved-by-evidence')
  })
})

describe('leaving a challenge unresolved', () => {
  it('takes an approver of each side, and counts as settled for the decision', async () => {
    await open(onReadings())
    await act('engineer', reviews.answerChallenge, { text: 'They stand.' })
    const proposal = { text: 'We do not agree.', laboratory: 'Hallvik laboratory' }
    expect((await cannot('quality', reviews.proposeUnresolved, proposal)).status).toBe(403)
    await act('approves', reviews.proposeUnresolved, proposal)
    const waiting = await story.read('quality', id)
    expect(waiting).toMatchObject({ state: 'challenged' })
    expect(newest(waiting)).toMatchObject({ state: 'unresolved-proposed', laboratory: 'Hallvik laboratory' })
    const { rowVersion: expectedVersion, sha256 } = waiting
    expect(
      await story
        .by('quality')
        .refusal(reviews.accept, { submissionId: id }, { body: { expectedVersion, sha256 } }),
    ).toMatchObject({ code: 'wrong-state' })
    expect((await cannot('engineer', reviews.agreeUnresolved)).status).toBe(403)
    await act('approver', reviews.agreeUnresolved, { text: 'Agreed.' })
    expect(newest(await story.read('engineer', id))).toMatchObject({
      ...{ state: 'unresolved', closedBy: 'Arne Holt', laboratory: 'Hallvik laboratory' },
    })
    expect(await decide('quality', reviews.accept)).toMatchObject({ state: 'accepted' })
  })

  it('can be declined with words; then it stands as answered', async () => {
    await open(onReadings())
    await act('approves', reviews.proposeUnresolved, { text: 'We do not agree.', laboratory: 'Hallvik' })
    expect(await cannot('approver', reviews.declineUnresolved, { text: ' ' })).toMatchObject({ status: 422 })
    await act('approver', reviews.declineUnresolved, { text: 'We measure again.' })
    const seen = await story.read('quality', id)
    expect(seen.state).toBe('answered')
    expect(newest(seen)).toMatchObject({ state: 'answered', laboratory: null })
    const { rowVersion: expectedVersion, sha256 } = seen
    expect(
      await story
        .by('quality')
        .refusal(reviews.accept, { submissionId: id }, { body: { expectedVersion, sha256 } }),
    ).toMatchObject({ code: 'challenge-unsettled' })
  })
})
