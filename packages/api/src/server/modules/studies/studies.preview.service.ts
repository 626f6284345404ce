import type { AnswerInputOf, BodyOf } from '../../../contract/define'
import type { previewReadings } from '../../../contract/studies'
import type { Tenant } from '../../db/tenant'
import { wrongState } from '../../errors'
import type { UploadedFile } from '../../http/route'
import { standardById } from '../gauges/gauges.lookup.service'
import { sha256 } from '../record/record.append'
import type { ReadReadings } from './readings/read'
import { warningsOf } from './readings/warnings'
import { studyById } from './studies.read.service'
import { selectRevisions, selectTasksOf } from './studies.repository'

const mostErrors = 200

/** What was read, in the light of the study it is for; nothing is stored. */
export async function previewOf(
  tenant: Tenant,
  studyId: string,
  { append }: BodyOf<typeof previewReadings>,
  { read, file }: { read: ReadReadings; file: UploadedFile | undefined },
): Promise<AnswerInputOf<typeof previewReadings>> {
  const study = await studyById(tenant, studyId)
  if (study.state === 'abandoned') throw wrongState('study', study.state)
  const [newest] = append ? await selectRevisions(tenant, studyId) : []
  const warnings = warningsOf(read.readings, {
    study,
    standard: await standardById(tenant, study.standardId),
    characteristics: (await selectTasksOf(tenant, studyId)).map(({ characteristic }) => characteristic),
    before: newest?.values.length ?? 0,
  })
  return {
    ...read,
    errors: read.errors.slice(0, mostErrors),
    errorCount: read.errors.length,
    warnings,
    file: file ? { name: file.name, size: file.bytes.length, sha256: sha256(file.bytes) } : null,
  }
}
