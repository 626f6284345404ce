import { checkSubmission, EngineProblem, type SubmissionCheck } from '../../../contract/submission-check'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import type { Download } from '../../http/route'
import type { Engines } from '../../integrations/engines'
import { notSigned } from './submissions.errors'
import { selectClauses, selectFiles, selectSignatures, selectText } from './submissions.frozen.repository'
import { submissionById } from './submissions.move.service'

/** Computes every clause again on the engine it names and compares everything that was frozen. */
export async function verify(tenant: Tenant, id: string): Promise<SubmissionCheck> {
  const submission = await submissionById(tenant, id)
  if (submission.number === null) throw notSigned()
  const frozen = await selectText(tenant, submission)
  if (!frozen) throw new Error(`The signed submission ${id} has no text.`)
  const { verdict, clausesMet, clausesTotal } = submission
  return checkSubmission(
    {
      ...frozen,
      signatures: await selectSignatures(tenant, submission),
      evaluations: await selectClauses(tenant, submission),
      listed: { verdict, clausesMet, clausesTotal },
    },
    recomputeOn(tenant.services.engines),
  )
}

/** The engines of the server; one that is unknown or not the file that was released is told apart. */
const recomputeOn =
  (engines: Engines): Parameters<typeof checkSubmission>[1] =>
  async (evaluation) => {
    if (!engines.releases.some(({ sha256 }) => sha256 === evaluation.engineSha256))
      throw new EngineProblem('engine-unavailable')
    try {
      return (await engines.recompute(evaluation)).outputText
    } catch {
      throw new EngineProblem('engine-altered')
    }
  }

/** A file of a submission, byte for byte. */
export async function downloadOf(tenant: Tenant, id: string, fileId: string): Promise<Download> {
  const submission = await submissionById(tenant, id)
  const file = (await selectFiles(tenant, submission)).find((each) => each.id === fileId)
  if (!file) throw notFound('file')
  const bytes = await tenant.services.files.get(file.storageKey)
  return { name: file.name, contentType: file.contentType, bytes }
}
