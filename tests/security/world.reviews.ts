import type { Clause } from '@evenrule/metrology'
import { files, reviews, submissions } from '@evenrule/api/contract'
import { clauseKey } from '@evenrule/metrology'
import { certificate, clauses, type Story } from '../api/prepared'
import type { Samples } from './world'

const byHand: Clause = {
  type: 'by-hand',
  parameters: { subject: 'stability', measure: 'Drift chart', asks: 'A control chart over three months.' },
}

/** A condition that was reported with a file, and a draft with a judgement by hand; ids for their routes. */
export async function reviewRows(story: Story): Promise<Samples> {
  const owed = await story.ready()
  const submissionId = await story.submission(owed.id, 'submitted')
  const { rowVersion, sha256 } = await story.read('approves', submissionId)
  const asked = { text: 'Send the chart.', dueOn: '2027-01-31', owner: 'supplier', followUp: 'document' }
  await story
    .by('approves')
    .call(
      reviews.acceptWithConditions,
      { submissionId },
      { body: { expectedVersion: rowVersion, sha256, conditions: [asked] } },
    )
  const [condition] = (await story.read('engineer', submissionId)).decisions[0]?.conditions ?? []
  const { id: fileId } = await story
    .by('engineer')
    .call(files.uploadAttachment, {}, { body: {}, file: certificate('chart') })
  await story
    .by('engineer')
    .call(
      reviews.reportCondition,
      { submissionId, conditionId: condition?.id ?? '' },
      { body: { expectedVersion: 1, text: 'Here it is.', fileIds: [fileId] } },
    )

  const manual = await story.task()
  await story.agree(manual.part.id, [...clauses, byHand])
  await story.study(manual, { beside: true })
  const draft = await story.submission(manual.id, 'draft')
  await story.by('engineer').call(
    submissions.judgeByHand,
    { submissionId: draft, clauseKey: encodeURIComponent(clauseKey(byHand)) },
    {
      body: { expectedVersion: 1, verdict: 'meets', reason: 'No drift in the chart.', fileId },
    },
  )
  return { conditionId: condition?.id ?? '', clauseKey: encodeURIComponent(clauseKey(byHand)) }
}
