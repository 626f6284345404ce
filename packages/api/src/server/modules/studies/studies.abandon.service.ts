import { studyMove } from '../../../contract/moves/study'
import type { AnswerInputOf, BodyOf } from '../../../contract/define'
import type { abandonStudy, readStudy } from '../../../contract/studies'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, wrongState } from '../../errors'
import { readStudyOf, studyById } from './studies.read.service'
import { updateStudy } from './studies.repository'

/** Abandons a study that is not computed; it stays an attempt, with the reason. */
export async function abandonStudyOf(
  tenant: Tenant,
  studyId: string,
  { expectedVersion, reason }: BodyOf<typeof abandonStudy>,
): Promise<AnswerInputOf<typeof readStudy>> {
  const study = await studyById(tenant, studyId)
  const move = studyMove('abandon', study.state)
  if (!move) throw wrongState('study', study.state)
  const values = { state: move.to, abandonedAt: tenant.now, abandonReason: reason }
  if (!(await updateStudy(tenant, studyId, expectedVersion, values))) throw changedMeanwhile('study')
  tenant.record({
    type: move.event,
    subject: { type: 'study', id: studyId },
    data: { code: study.code, reason },
  })
  return readStudyOf(tenant, studyId)
}
