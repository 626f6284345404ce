import { checkSubmission, EngineProblem, type SubmissionCheck } from '../../../contract/submission-check'
import type { AnswerOf } from '../../../contract/define'
import type { verifySubmission } from '../../../contract/submissions'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import type { Download } from '../../http/route'
import type { Engines } from '../../integrations/engines'
import { notSigned } from './submissions.errors'
import { selectReviewFiles } from '../reviews/review-files.repository'
import {
  selectClauses,
  selectFiles,
  selectSignatures,
  selectTexts,
  type FrozenTextRow,
} from './submissions.frozen.repository'
import { submissionById } from './submissions.move.service'
import type { SubmissionRow } from './submissions.repository'

/** Computes every clause of every signed text again on the engine it names and compares everything frozen. */
export async function verify(tenant: Tenant, id: string): Promise<AnswerOf<typeof verifySubmission>> {
  const submission = await submissionById(tenant, id)
  if (submission.number === null) throw notSigned()
  const texts = await selectTexts(tenant, submission)
  const signatures = await selectSignatures(tenant, submission)
  const checks: (SubmissionCheck & { revision: number })[] = []
  for (const [at, text] of texts.entries()) {
    const previous = at === 0 ? undefined : texts[at - 1]
    const check = await checkText(tenant, submission, { text, previous, isNewest: at === texts.length - 1 }, [
      ...signatures.filter(({ revision }) => revision === text.revision),
    ])
    checks.push({ ...check, revision: text.revision })
  }
  const newest = checks.at(-1)
  if (!newest) throw new Error(`The signed submission ${id} has no text.`)
  return { ...newest, equal: checks.every(({ equal }) => equal), earlier: checks.slice(0, -1) }
}

async function checkText(
  tenant: Tenant,
  submission: SubmissionRow,
  {
    text,
    previous,
    isNewest,
  }: { text: FrozenTextRow; previous?: FrozenTextRow | undefined; isNewest: boolean },
  signatures: readonly { meaning: string; sha256: string }[],
): Promise<SubmissionCheck> {
  const { verdict, clausesMet, clausesTotal } = submission
  return checkSubmission(
    {
      text: text.text,
      sha256: text.sha256,
      signatures,
      evaluations: await selectClauses(tenant, submission, text.revision),
      previousText: previous?.text,
      // Lists show the newest.
      ...(isNewest ? { listed: { verdict, clausesMet, clausesTotal } } : {}),
    },
    recomputeOn(tenant.services.engines),
  )
}

/** The engines of the server; one that is unknown or not the file that was released is told apart. */
export const recomputeOn =
  (engines: Engines): Parameters<typeof checkSubmission>[1] =>
  async (evaluation) => {
    if (!engines.releases.some(({ sha256 }) => sha256 === evaluation.engineSha256))
      throw new EngineProblem('engine-unavailable')
    try {
      return (await engines.recompute(evaluation)).outputText
    } catch (error) {
      // The list of releases may outlive a file of it.
      throw new EngineProblem(isMissingFile(error) ? 'engine-unavailable' : 'engine-altered')
    }
  }

const isMissingFile = (error: unknown): boolean =>
  error instanceof Error && 'code' in error && error.code === 'ENOENT'

/** A file of a submission, byte for byte. */
export async function downloadOf(tenant: Tenant, id: string, fileId: string): Promise<Download> {
  const submission = await submissionById(tenant, id)
  const files = [...(await selectFiles(tenant, submission)), ...(await selectReviewFiles(tenant, submission))]
  const file = files.find((each) => each.id === fileId)
  if (!file) throw notFound('file')
  const bytes = await tenant.services.files.get(file.storageKey)
  return { name: file.name, contentType: file.contentType, bytes }
}
