import { z } from 'zod'
import {
  calendarDate,
  decimalText,
  expectedVersion,
  instant,
  line,
  organisationParams,
  pageOf,
  pageQuery,
  paramsWith,
  positiveDecimalText,
  sortBy,
  unitSchema,
  uuid,
} from './common'
import { compareDecimals } from './decimal'
import { defineEndpoint } from './define'
import { archivedFilter } from './parts'
import { proofStates } from './proof'

export const characteristicClasses = ['ordinary', 'significant', 'safety'] as const
export const characteristicClass = z.enum(characteristicClasses, 'Choose ordinary, significant or safety.')
export type CharacteristicClass = z.output<typeof characteristicClass>

/** What a characteristic is, wherever it is told; decimal text as entered. */
export const characteristicFacts = {
  /** The number on the drawing. */
  number: z.number().int(),
  name: z.string(),
  nominal: z.string().nullable(),
  lowerLimit: z.string().nullable(),
  upperLimit: z.string().nullable(),
  unit: z.string(),
  class: characteristicClass,
}

export const characteristicSchema = z.object({
  id: uuid,
  relationshipId: uuid,
  partId: uuid,
  partNumber: z.string(),
  revisionId: uuid,
  revision: z.string(),
  currentRevision: z.boolean(),
  ...characteristicFacts,
  processStandardDeviation: z.string().nullable(),
  confirmedByCustomer: z.boolean(),
  /** A signed agreement rests on the limits: nominal, limits, unit and class can no longer change. */
  limitsFrozen: z.boolean(),
  /** Active measuring tasks, and the proof they have together. */
  tasks: z.number().int(),
  proof: z.enum(proofStates),
  /** The day on which accepted proof runs out, where that is soon. */
  runsOutOn: calendarDate.nullable(),
  archivedAt: instant.nullable(),
  rowVersion: z.number().int(),
})
export type Characteristic = z.output<typeof characteristicSchema>

const entered = z.object({
  number: z.coerce
    .number('Enter the whole number it has on the drawing.')
    .int('Enter the whole number it has on the drawing.')
    .min(1, 'Numbers on the drawing begin at 1.')
    .max(99_999, 'Enter a number up to 99999.'),
  name: line(),
  nominal: decimalText.nullable().default(null),
  lowerLimit: decimalText.nullable().default(null),
  upperLimit: decimalText.nullable().default(null),
  unit: unitSchema,
  class: characteristicClass,
  processStandardDeviation: positiveDecimalText.nullable().default(null),
})

interface Limits {
  lowerLimit: string | null
  upperLimit: string | null
  nominal: string | null
}

/** What is wrong with the limits of a characteristic, by field; empty when nothing is. */
export function limitProblems({ lowerLimit, upperLimit, nominal }: Limits): [keyof Limits, string][] {
  if (lowerLimit === null && upperLimit === null)
    return [['upperLimit', 'Enter at least one limit: upper, lower or both.']]
  const problems: [keyof Limits, string][] = []
  if (lowerLimit !== null && upperLimit !== null && compareDecimals(lowerLimit, upperLimit) >= 0)
    problems.push(['upperLimit', `Enter an upper limit above the lower limit, ${lowerLimit}.`])
  else if (nominal !== null && lowerLimit !== null && compareDecimals(nominal, lowerLimit) < 0)
    problems.push(['nominal', `The nominal lies below the lower limit, ${lowerLimit}. Check both.`])
  else if (nominal !== null && upperLimit !== null && compareDecimals(nominal, upperLimit) > 0)
    problems.push(['nominal', `The nominal lies above the upper limit, ${upperLimit}. Check both.`])
  return problems
}

const withLimits = <T extends z.ZodType<Limits>>(schema: T) =>
  schema.superRefine((value, context) => {
    for (const [field, message] of limitProblems(value))
      context.addIssue({ code: 'custom', path: [field], message })
  })

export const listCharacteristics = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/characteristics',
  access: 'parts.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(['number', 'name', 'class', 'part']),
    relationshipId: uuid.optional(),
    partId: uuid.optional(),
    /** Without a revision: the current one of each part. */
    revisionId: uuid.optional(),
    class: characteristicClass.optional(),
    archived: archivedFilter,
  }),
  response: pageOf(characteristicSchema),
  summary: 'Characteristics of a revision, or of the current revision of every part.',
})

export const readCharacteristic = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/characteristics/:characteristicId',
  access: 'parts.read',
  params: paramsWith('characteristicId'),
  response: characteristicSchema,
  summary: 'One characteristic.',
})

export const createCharacteristic = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/parts/:partId/revisions/:revisionId/characteristics',
  access: 'parts.change',
  params: paramsWith('partId', 'revisionId'),
  body: withLimits(entered),
  response: characteristicSchema,
  summary: 'Enters a characteristic. What the supplier enters waits for the customer to confirm it.',
})

export const changeCharacteristic = defineEndpoint({
  method: 'put',
  path: '/organisations/:organisationId/characteristics/:characteristicId',
  access: 'parts.change',
  params: paramsWith('characteristicId'),
  body: withLimits(entered.extend({ expectedVersion })),
  response: characteristicSchema,
  summary: 'Changes a characteristic. Limits on which a signed agreement rests are refused.',
})

const versionOnly = z.object({ expectedVersion })

export const confirmCharacteristic = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/characteristics/:characteristicId/confirm',
  access: 'parts.confirm',
  params: paramsWith('characteristicId'),
  body: versionOnly,
  response: characteristicSchema,
  summary: 'The customer confirms what the supplier entered.',
})

export const archiveCharacteristic = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/characteristics/:characteristicId/archive',
  access: 'parts.change',
  params: paramsWith('characteristicId'),
  body: versionOnly,
  response: characteristicSchema,
  summary: 'Takes a characteristic out of the lists; nothing is lost.',
})

export const restoreCharacteristic = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/characteristics/:characteristicId/restore',
  access: 'parts.change',
  params: paramsWith('characteristicId'),
  body: versionOnly,
  response: characteristicSchema,
  summary: 'Brings an archived characteristic back.',
})
