import { beginVersion } from '../../contract/agreements'
import { uploadAttachment } from '../../contract/files'
import {
  accept,
  acceptWithConditions,
  agreeOneOff,
  answerChallenge,
  confirm,
  confirmCondition,
  openChallenge,
  proposeUnresolved,
  readCorrection,
  refuse,
  reportCondition,
  settleChallenge,
  signCorrection,
} from '../../contract/reviews'
import { readStudy, storeReadings } from '../../contract/studies'
import { contentOf } from '../../contract/submission-content'
import { page } from './certificate'
import {
  answerText,
  challengedReadings,
  challengeText,
  conditionReport,
  conditionTexts,
  correctionText,
  criterionComment,
  criterionText,
  laboratory,
  refusalReason,
  unresolvedText,
} from './scenario.studies'
import { within } from './scenario.clauses'
import type { Stage } from './stage'
import type { Played } from './submission-cast'
import type { Deed } from './submission-deeds'

type OfReview = Exclude<Deed, 'prepare' | 'send' | 'sign' | 'withdraw'>
/** What is done on a day, so many days before the seeding. */
export type Acts<D extends Deed> = Record<D, (daysAgo: number) => Promise<unknown>>

/** How the customer reviews and the supplier answers. */
export function reviewActs(stage: Stage, played: Played): Acts<OfReview> {
  const { cast, params } = played
  const decide = async (act: typeof cast.reviewer, endpoint: typeof accept | typeof confirm) =>
    act(endpoint, { params: params(), body: { ...(await played.seen()), reason: '' } })
  const conditional = async (conditions: object[]) =>
    cast.customerApprover(acceptWithConditions, {
      params: params(),
      body: { ...(await played.seen()), conditions, reason: '' },
    })
  const repeated = { text: conditionTexts.study, owner: 'supplier', followUp: 'new-study' }
  const instruction = { text: conditionTexts.instruction, owner: 'supplier', followUp: 'document' }
  return {
    challenge: async (daysAgo) => {
      const { rowVersion: expectedVersion, text } = await played.see()
      const [study] = contentOf(text)?.studies ?? []
      const readings = challengedReadings.filter((at) => at < (study?.data.readings.length ?? 0))
      await cast.reviewer(openChallenge, {
        params: params(),
        body: {
          ...{ expectedVersion, reasonKind: 'not-as-planned', text: challengeText },
          target: { kind: 'readings', study: study?.code, readings },
          dueOn: stage.day(daysAgo - 21),
        },
      })
    },
    answer: async () => {
      const { params: of, expectedVersion } = await played.challenge()
      await cast.engineer(answerChallenge, { params: of, body: { expectedVersion, text: answerText } })
    },
    'answer-by-criterion': async (daysAgo) => answerByCriterion(stage, played, daysAgo),
    'correct-readings': async () => storeCorrected(played),
    'sign-correction': async () => {
      const { params: of, expectedVersion } = await played.challenge()
      const { sha256 } = await cast.approver(readCorrection, { params: of })
      const body = { expectedVersion, sha256, text: correctionText }
      await cast.approver(signCorrection, { params: of, body })
    },
    settle: async () => {
      const { params: of, expectedVersion } = await played.challenge()
      await cast.reviewer(settleChallenge, { params: of, body: { expectedVersion, text: '' } })
    },
    'propose-unresolved': async () => {
      const { params: of, expectedVersion } = await played.challenge()
      const body = { expectedVersion, text: unresolvedText, laboratory }
      await cast.customerApprover(proposeUnresolved, { params: of, body })
    },
    refuse: async () =>
      cast.reviewer(refuse, {
        params: params(),
        body: { ...(await played.seen()), reason: refusalReason },
      }),
    accept: async () => decide(cast.reviewer, accept),
    'accept-as-approver': async () => decide(cast.customerApprover, accept),
    confirm: async () => decide(cast.second, confirm),
    'accept-with-conditions': async (daysAgo) =>
      conditional([
        { ...repeated, dueOn: stage.day(-90) },
        { ...instruction, dueOn: stage.day(daysAgo - 14) },
      ]),
    'accept-with-short-condition': async (daysAgo) =>
      conditional([{ ...repeated, dueOn: stage.day(daysAgo - 30) }]),
    'agree-one-off': async () => cast.approver(agreeOneOff, { params: params(), body: await played.seen() }),
    'report-condition': async () => {
      const { params: of, expectedVersion } = await played.condition()
      const lines = ['Work instruction (demonstration, invented)', 'Clamp at both ends; wipe the contact.']
      const file = { name: 'work instruction.pdf', bytes: page(lines) }
      const { id } = await cast.engineer(uploadAttachment, { body: {}, file })
      const body = { expectedVersion, text: conditionReport, fileIds: [id] }
      await cast.engineer(reportCondition, { params: of, body })
    },
    'confirm-condition': async () => {
      const { params: of, expectedVersion } = await played.condition()
      await cast.reviewer(confirmCondition, { params: of, body: { expectedVersion, text: '' } })
    },
  }
}

/** Another margin proposed for the characteristic with the challenge as its case, and the answer that names it. */
async function answerByCriterion(stage: Stage, played: Played, daysAgo: number): Promise<void> {
  const { engineer } = played.cast
  const { id: submissionId, relationshipId, characteristicId, challenges } = await played.see()
  const { params, expectedVersion } = await played.challenge()
  const { versions } = await engineer(beginVersion, {
    body: {
      ...{ relationshipId, characteristicId, clauses: [within(0.2, 'µm')], send: true },
      ...{ effectiveOn: stage.day(daysAgo - 60), comment: criterionComment },
      caseOf: { submissionId, challengeId: challenges.at(-1)?.id },
    },
  })
  await engineer(answerChallenge, {
    params,
    body: { expectedVersion, kind: 'criterion', text: criterionText, versionId: versions[0]?.id },
  })
}

/** The challenged readings read again: each a last digit nearer to its neighbours. */
async function storeCorrected(played: Played): Promise<void> {
  const { cast } = played
  const { params } = await played.challenge()
  const { studies } = await cast.engineer(readCorrection, { params })
  const frozen = contentOf((await played.see()).text)?.studies[0]
  const studyId = studies.find(({ code }) => code === frozen?.code)?.studyId
  if (!frozen || studyId === undefined) throw new Error('There is no study to correct.')
  const { readings } = frozen.data
  const texts = readings.map((text, at) =>
    challengedReadings.includes(at) ? (readings[at - 1] ?? text) : text,
  )
  const { rowVersion: expectedVersion } = await cast.engineer(readStudy, { params: { studyId } })
  await cast.engineer(storeReadings, {
    params: { studyId },
    body: {
      ...{ expectedVersion, source: 'typed', text: texts.join('\n'), complete: true },
      ...{ reason: 'Entered wrongly; read again from the printed strip.', appraiser: 'A1' },
      ...{ collectedOn: frozen.data.collectedOn, takenBy: [cast.engineerId] },
    },
  })
}
