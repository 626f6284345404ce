import { z } from 'zod'
import {
  calendarDate,
  expectedVersion,
  line,
  organisationParams,
  paragraph,
  unitSchema,
  uuid,
} from './common'
import { defineEndpoint } from './define'
import {
  appraiserCode,
  largestReadingsFile,
  mostReadings,
  readingsInput,
  readingsPreviewSchema,
} from './readings'
import { measuredAs, planSchema, studiesPath, studyParams, studyPath, taskIds } from './study-parts'
import { studySchema } from './study-read'
import { separators } from './tables'

export const registerStudy = defineEndpoint({
  method: 'post',
  path: studiesPath,
  access: 'studies.change',
  params: organisationParams,
  body: z.object({
    code: line(40),
    taskIds,
    standardId: uuid,
    plannedReadings: z
      .number('Enter a whole number of readings.')
      .int('Enter a whole number of readings.')
      .min(2, 'Plan at least 2 readings; one says nothing about the spread.')
      .max(mostReadings, 'One study holds at most 100,000 readings.'),
    plan: planSchema.nullable().default(null),
    unit: unitSchema,
    measuredAs,
    /** Positions or times among which the run sheet deals the readings. */
    slots: z.array(line(40)).max(200, 'Name at most 200 positions or times.').default([]),
    /** False for readings taken before the study came to be registered here; the other side is told. */
    registeredBeforehand: z.boolean().default(true),
  }),
  response: studySchema,
  summary: 'Registers a study before its first reading: criteria and limits of every task are frozen.',
})

export const downloadRunSheet = defineEndpoint({
  method: 'get',
  path: `${studyPath}/run-sheet.csv`,
  access: 'studies.read',
  params: studyParams,
  query: z.object({ separator: z.enum(separators).exclude(['none']).default('comma') }),
  summary: 'The randomised run sheet as CSV, with an empty column to fill in and upload again.',
})

export const downloadRunSheetWorkbook = defineEndpoint({
  method: 'get',
  path: `${studyPath}/run-sheet.xlsx`,
  access: 'studies.read',
  params: studyParams,
  summary: 'The same as XLSX. Readings kept so far stand in it; it comes back filled in as it is.',
})

export const previewReadings = defineEndpoint({
  method: 'post',
  path: `${studyPath}/readings/preview`,
  access: 'studies.change',
  params: studyParams,
  body: readingsInput.extend({
    /** As when storing: the readings follow those kept so far. */
    append: z.boolean().default(false),
    /** A table with headings that were read before is read as then, unless sheet or columns are named. */
    asRemembered: z.boolean().default(true),
  }),
  upload: { maximumBytes: largestReadingsFile },
  response: readingsPreviewSchema,
  summary: 'Reads typed, pasted or uploaded readings and names every cell that is wrong; nothing is stored.',
})

export const storeReadings = defineEndpoint({
  method: 'post',
  path: `${studyPath}/readings`,
  access: 'studies.change',
  params: studyParams,
  body: readingsInput.extend({
    expectedVersion,
    /** These readings follow those kept so far; otherwise they are all of them. */
    append: z.boolean().default(false),
    /** True computes the study; false keeps the readings while more will follow. */
    complete: z.boolean(),
    /** Leaves out rows without a number; they are named in the study. */
    leaveOutBadRows: z.boolean().default(false),
    collectedOn: calendarDate,
    appraiser: appraiserCode,
    /** Members who took the readings, and may not sign the submission. */
    takenBy: z
      .array(uuid)
      .min(1, 'Say who took the readings: they may not sign the submission.')
      .max(20, 'Name at most 20 people.'),
    /** Why readings of a computed study are replaced. */
    reason: paragraph(1000).nullable().default(null),
  }),
  upload: { maximumBytes: largestReadingsFile },
  response: studySchema,
  summary: 'Stores readings as a revision of their own, the file byte for byte, and computes every clause.',
})

export const downloadReadings = defineEndpoint({
  method: 'get',
  path: `${studyPath}/readings/:revision/file`,
  access: 'studies.read',
  params: studyParams.extend({ revision: z.coerce.number().int().min(1) }),
  summary: 'The file a revision of the readings was uploaded as, byte for byte.',
})

export const abandonStudy = defineEndpoint({
  method: 'post',
  path: `${studyPath}/abandon`,
  access: 'studies.change',
  params: studyParams,
  body: z.object({ expectedVersion, reason: paragraph(1000).min(1, 'Say why it is abandoned.') }),
  response: studySchema,
  summary: 'Abandons a study that is not computed. It still counts as an attempt, with the reason.',
})
