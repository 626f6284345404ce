import { areCompatible } from '@evenrule/metrology'
import { studyMove, type StudyMove } from '../../../contract/moves/study'
import type { AnswerInputOf, BodyOf } from '../../../contract/define'
import type { readStudy, storeReadings } from '../../../contract/studies'
import { dayIn, dayInWords } from '../../calendar'
import { newId } from '../../db/columns'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, invalidInput, wrongState, type FieldError } from '../../errors'
import type { UploadedFile } from '../../http/route'
import { keepFile, type FileToKeep } from '../files/files.service'
import { standardById } from '../gauges/gauges.lookup.service'
import { selectTimeZone } from '../organisations/organisations.repository'
import { selectMembersAmong } from '../organisations/people.repository'
import { canonicalText, sha256 } from '../record/record.append'
import { rememberMapping } from '../mappings/mappings.service'
import { leftOutOf, readReadings } from './readings/read'
import { refuseOtherSheet, withoutKept } from './readings/run-sheet-back'
import type { ReadReadings } from './readings/take'
import { standardOfAnotherQuantity } from './studies.errors'
import { evaluateStudy, type Evaluated } from './studies.evaluate.service'
import { readStudyOf, studyById } from './studies.read.service'
import {
  insertEvaluations,
  insertRevision,
  selectRevisions,
  selectTasksOf,
  updateStudy,
  type StudyDataRow,
  type StudyRow,
} from './studies.repository'
import type { FrozenStandard } from './studies.table'

type Entered = BodyOf<typeof storeReadings>

/** Most cells an answer names; the preview says how many there are. */
const mostErrors = 200

/** Reads what is to be stored once more and refuses it where a cell is wrong that may not be left out. */
export async function readToStore(body: Entered, file: UploadedFile | undefined): Promise<ReadReadings> {
  const read = await readReadings(body, file)
  const leaving = body.leaveOutBadRows && read.mayLeaveOut
  if (read.errors.length > 0 && !leaving)
    throw invalidInput(
      read.errors.slice(0, mostErrors).map(({ row, column, message }) => ({
        path: file ? 'body.file' : 'body.text',
        ...{ message, row, column },
      })),
    )
  if (read.readings.length === 0)
    throw invalidInput([
      {
        path: file ? 'body.file' : 'body.text',
        message: 'There are no readings in it. Choose another file.',
      },
    ])
  return read
}

/**
 * Stores readings as a new revision of a study; earlier ones stay. A complete revision is computed: one evaluation per
 * task and clause. The computation runs before the study's row is locked.
 */
export async function storeReadingsOf(
  tenant: Tenant,
  studyId: string,
  body: Entered,
  { read, file }: { read: ReadReadings; file: FileToKeep | null },
): Promise<AnswerInputOf<typeof readStudy>> {
  const kept = file && { fileId: await keepFile(tenant, file), sha256: file.stored.sha256 }
  await storeRevision(tenant, studyId, body, { read, kept })
  return readStudyOf(tenant, studyId)
}

/** What is stored of readings, wherever they were read. */
type ReadingsToStore = Pick<ReadReadings, 'readAs' | 'readings' | 'errors' | 'runSheet' | 'lessons'>
/** A file that is noted already. */
interface KeptFile {
  fileId: string
  sha256: string
}

/** The same where many studies are stored from one file and nobody reads each answer. */
export async function storeRevision(
  tenant: Tenant,
  studyId: string,
  body: Entered,
  { read, kept }: { read: ReadingsToStore; kept: KeptFile | null },
): Promise<void> {
  const study = await studyById(tenant, studyId)
  if (study.rowVersion !== body.expectedVersion) throw changedMeanwhile('study')
  const move = moveFor(study, body)
  refuseOtherSheet(study, read)
  const revisions = await selectRevisions(tenant, studyId)
  const takenBy = [...new Set(body.takenBy)]
  await refuseWrongFields(tenant, study, body, takenBy)
  const before = body.append ? revisions[0] : undefined
  const readings = withoutKept(read, before)
  const texts = [...(before?.texts ?? []), ...readings.map(({ text }) => text)]
  const data: StudyDataRow = {
    orgId: tenant.organisationId,
    id: newId(),
    studyId,
    revision: (revisions[0]?.revision ?? 0) + 1,
    source: body.source,
    complete: body.complete,
    reason: move.name === 'correct' ? body.reason : null,
    fileId: kept?.fileId ?? null,
    readAs: read.readAs,
    standard: await frozenStandard(tenant, study),
    values: [...(before?.values ?? []), ...readings.map(({ value }) => value)],
    texts,
    leftOut: [...(before?.leftOut ?? []), ...leftOutOf(read)],
    appraiser: body.appraiser,
    takenBy: [...new Set([...(before?.takenBy ?? []), ...takenBy])],
    collectedOn: body.collectedOn,
    sha256: sha256(canonicalText(texts)),
    createdAt: tenant.now,
    createdBy: tenant.userId,
  }
  const tasks = await selectTasksOf(tenant, studyId)
  const evaluated = body.complete ? await evaluateStudy(tenant, study, tasks, data) : []
  const { collectedOn } = data
  const values = { state: move.to, collectedOn }
  if (!(await updateStudy(tenant, studyId, body.expectedVersion, values))) throw changedMeanwhile('study')
  await insertRevision(tenant, data)
  for (const lesson of read.lessons) await rememberMapping(tenant, lesson)
  await insertEvaluations(tenant, rowsOf(tenant, data, evaluated))
  recordReadings(tenant, { study, move, data, kept, evaluated })
}

/** The move that storing these readings makes; refuses it where the state does not allow it. */
function moveFor({ state }: StudyRow, { complete, append, reason }: Entered): StudyMove {
  const move = studyMove(state === 'computed' ? 'correct' : complete ? 'compute' : 'keep-readings', state)
  if (!move) throw wrongState('study', state)
  const errors: FieldError[] = []
  const refuse = (path: string, message: string) => void errors.push({ path, message })
  if (move.name === 'correct') {
    if (!reason) refuse('body.reason', 'Say why the readings are corrected. Both revisions are kept.')
    if (!complete)
      refuse('body.complete', 'This study is computed already, so a correction must hold all its readings.')
    if (append)
      refuse(
        'body.append',
        'This study is computed, so no readings can follow. Register another study for more readings.',
      )
  }
  if (errors.length > 0) throw invalidInput(errors)
  return move
}

async function refuseWrongFields(
  tenant: Tenant,
  study: StudyRow,
  { collectedOn }: Entered,
  takenBy: readonly string[],
): Promise<void> {
  const errors: FieldError[] = []
  const timeZone = await selectTimeZone(tenant)
  const registeredOn = dayIn(timeZone, study.registeredAt)
  if (collectedOn > dayIn(timeZone, tenant.now))
    errors.push({
      path: 'body.collectedOn',
      message: 'This day is still to come. Enter the day the readings were taken.',
    })
  else if (study.registeredBeforehand && collectedOn < registeredOn)
    errors.push({
      path: 'body.collectedOn',
      message: `This study was registered on ${dayInWords(registeredOn)}, before its first reading, so its readings cannot be older. Register older readings as a study that was not registered beforehand.`,
    })
  const members = await selectMembersAmong(tenant, takenBy)
  for (const [at, id] of takenBy.entries())
    if (!members.has(id))
      errors.push({ path: `body.takenBy.${at}`, message: 'Choose a member of this organisation.' })
  if (errors.length > 0) throw invalidInput(errors)
}

/** The standard with its values of today, as long as they can be compared with the readings. */
async function frozenStandard(
  tenant: Tenant,
  { standardId, unit }: Pick<StudyRow, 'standardId' | 'unit'>,
): Promise<FrozenStandard> {
  const row = await standardById(tenant, standardId)
  if (!areCompatible(row.unit, unit)) throw standardOfAnotherQuantity(row.code, row.unit)
  const { code, name, certifiedValue, unit: ofStandard, expandedUncertainty, coverageFactor } = row
  return { code, name, certifiedValue, unit: ofStandard, expandedUncertainty, coverageFactor }
}

const rowsOf = (tenant: Tenant, { id, studyId }: StudyDataRow, evaluated: readonly Evaluated[]) =>
  evaluated.map(({ taskId, clauseKey, verdict, stored }) => ({
    ...{ studyId, dataId: id, taskId, clauseKey, verdict },
    ...stored,
    createdAt: tenant.now,
  }))

function recordReadings(
  tenant: Tenant,
  stored: {
    study: StudyRow
    move: StudyMove
    data: StudyDataRow
    kept: KeptFile | null
    evaluated: readonly Evaluated[]
  },
): void {
  const { study, move, data, kept, evaluated } = stored
  tenant.record({
    type: move.event,
    subject: { type: 'study', id: study.id },
    data: {
      code: study.code,
      revision: data.revision,
      readings: data.values.length,
      leftOut: data.leftOut.length,
      readingsSha256: data.sha256,
      fileSha256: kept?.sha256 ?? null,
      appraiser: data.appraiser,
      takenBy: data.takenBy,
      collectedOn: data.collectedOn,
      reason: data.reason,
      evaluations: evaluated.map(
        ({ taskId, clauseKey, verdict, stored: { outputSha256, engineSha256 } }) => ({
          ...{ taskId, clauseKey, verdict, outputSha256, engineSha256 },
        }),
      ),
    },
  })
}
