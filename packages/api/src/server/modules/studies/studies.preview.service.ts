import type { AnswerInputOf, BodyOf } from '../../../contract/define'
import type { previewReadings } from '../../../contract/studies'
import type { Tenant } from '../../db/tenant'
import { wrongState } from '../../errors'
import type { PrepareCall, UploadedFile } from '../../http/route'
import { standardById } from '../gauges/gauges.lookup.service'
import { sha256 } from '../record/record.append'
import { mappingsOf } from '../mappings/mappings.service'
import { nothingRemembered, purposes, rememberedColumns, rememberedSheet } from './readings/memory'
import { readReadings } from './readings/read'
import type { ReadReadings } from './readings/take'
import { warningsOf } from './readings/warnings'
import { refuseOtherSheet, withoutKept } from './readings/run-sheet-back'
import { studyById } from './studies.read.service'
import { selectRevisions, selectTasksOf } from './studies.repository'

const mostErrors = 200

/** Reads what is to be looked at: as remembered, unless the sender says how or wants it detected anew. */
export async function readToPreview(
  body: BodyOf<typeof previewReadings>,
  file: UploadedFile | undefined,
  ask: PrepareCall<typeof previewReadings>['ask'],
): Promise<ReadReadings> {
  const remembered =
    body.asRemembered && body.source !== 'typed'
      ? await ask(async (tenant) => ({
          sheets: await mappingsOf(tenant, purposes.sheet, rememberedSheet),
          columns: await mappingsOf(tenant, purposes.columns, rememberedColumns),
        }))
      : nothingRemembered
  return readReadings(body, file, remembered)
}

/** What was read, in the light of the study it is for; nothing is stored. */
export async function previewOf(
  tenant: Tenant,
  studyId: string,
  { append }: BodyOf<typeof previewReadings>,
  { read, file }: { read: ReadReadings; file: UploadedFile | undefined },
): Promise<AnswerInputOf<typeof previewReadings>> {
  const study = await studyById(tenant, studyId)
  if (study.state === 'abandoned') throw wrongState('study', study.state)
  refuseOtherSheet(study, read)
  const [newest] = append ? await selectRevisions(tenant, studyId) : []
  const readings = withoutKept(read, newest)
  const warnings = warningsOf(readings, {
    study,
    standard: await standardById(tenant, study.standardId),
    characteristics: (await selectTasksOf(tenant, studyId)).map(({ characteristic }) => characteristic),
    before: newest?.values.length ?? 0,
  })
  return {
    ...read,
    readings,
    errors: read.errors.slice(0, mostErrors),
    errorCount: read.errors.length,
    warnings,
    file: file ? { name: file.name, size: file.bytes.length, sha256: sha256(file.bytes) } : null,
  }
}
