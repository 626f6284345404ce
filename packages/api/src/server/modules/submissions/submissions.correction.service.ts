import { contentOf, type SubmissionContent } from '../../../contract/submission-content'
import type { Tenant } from '../../db/tenant'
import { canonicalText } from '../record/record.append'
import { resultsForTask, type StudyOfTask } from '../studies/studies.results.service'
import { byRegistration, type SignedClause } from './submissions.content'
import { selectChosen } from './submissions.draft.repository'
import { freeze, type Frozen } from './submissions.freeze'
import {
  selectFiles,
  selectText,
  type FileToFreeze,
  type FrozenTextRow,
} from './submissions.frozen.repository'
import type { SubmissionRow } from './submissions.repository'

/** What signing a correction now would freeze. */
export interface Corrected extends Frozen {
  /** Something that was frozen of a study is otherwise now. */
  differs: boolean
  studies: { studyId: string; code: string; corrected: boolean }[]
}

/**
 * The next revision of a signed submission: the same clauses, limits and terms on the same studies, with the readings
 * that stand in them now. Nothing of what was agreed is looked up again. The supplier's alone; stores nothing.
 */
export async function whatCorrectionFreezes(
  tenant: Tenant,
  submission: SubmissionRow,
  challenge: number,
): Promise<Corrected> {
  const { frozen: previous, content } = await newestContent(tenant, submission)
  const chosenIds = (await selectChosen(tenant, submission.id)).map(({ studyId }) => studyId)
  const studies = (await resultsForTask(tenant, submission.taskId))
    .filter(({ study }) => chosenIds.includes(study.id))
    .sort(byRegistration)
  const { clauses, advisory, studies: before, ...rest } = content
  const onStudy = (code: string | null) => studies.find(({ study }) => study.code === code) ?? null
  const frozen = await freeze(tenant, {
    content: {
      ...rest,
      revision: previous.revision + 1,
      corrects: { sha256: previous.sha256, challenge },
    },
    judged: clauses.map((each) => ({ named: signedClause(each), study: onStudy(each.study) })),
    advisory: advisory.map(({ clauseKey, clause, study }) => ({
      named: { clauseKey, clause },
      study: onStudy(study),
    })),
    studies,
    documents: await documentsOf(tenant, submission, previous),
  })
  const isCorrected = (code: string) => !sameStudy(before, frozen.content.studies, code)
  return {
    ...frozen,
    differs: studies.some(({ study }) => isCorrected(study.code)),
    studies: studies.map(({ study }: StudyOfTask) => ({
      ...{ studyId: study.id, code: study.code, corrected: isCorrected(study.code) },
    })),
  }
}

/** The newest signed text of a submission with its content; a text that cannot be read any more is a fault. */
export async function newestContent(
  tenant: Tenant,
  submission: Pick<SubmissionRow, 'id' | 'relationshipId'>,
): Promise<{ frozen: FrozenTextRow; content: SubmissionContent }> {
  const frozen = await selectText(tenant, submission)
  const content = frozen && contentOf(frozen.text)
  if (!frozen || !content) throw new Error(`The signed submission ${submission.id} has no readable text.`)
  return { frozen, content }
}

const signedClause = ({
  clauseKey,
  clause,
  agreementNumber,
  versionNumber,
  versionId,
  scope,
}: SubmissionContent['clauses'][number]): SignedClause => ({
  ...{ clauseKey, clause, agreementNumber, versionNumber, versionId, scope },
})

/** Documents that clauses were judged on by hand stay with the submission. */
async function documentsOf(
  tenant: Tenant,
  submission: SubmissionRow,
  { revision }: FrozenTextRow,
): Promise<FileToFreeze[]> {
  const files = await selectFiles(tenant, submission, revision)
  return files
    .filter(({ role }) => role === 'document')
    .map(({ role, name, contentType, size, sha256, storageKey }) => ({
      ...{ role, name, contentType, size, sha256, storageKey },
    }))
}

function sameStudy(
  before: SubmissionContent['studies'],
  after: SubmissionContent['studies'],
  code: string,
): boolean {
  const [was, is] = [before, after].map((studies) => studies.find((study) => study.code === code) ?? null)
  return canonicalText(was) === canonicalText(is)
}
