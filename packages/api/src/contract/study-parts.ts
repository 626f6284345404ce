import type { Clause } from '@evenrule/metrology'
import { z } from 'zod'
import { characteristicClass } from './characteristics'
import { decimalText, paramsWith, positiveDecimalText, uuid } from './common'
import { studyStates } from './moves/study'

export const hash = z.string().regex(/^[0-9a-f]{64}$/)
export const studyState = z.enum(studyStates)
export const measuredAs = z.enum(['value', 'deviation'], 'Choose value or deviation.')
export const studiesPath = '/organisations/:organisationId/studies'
export const studyPath = `${studiesPath}/:studyId`
export const studyParams = paramsWith('studyId')

/** A clause as it was in force when the study was registered, with the agreement it comes from. */
export const frozenClauseSchema = z.object({
  clauseKey: z.string(),
  clause: z.custom<Clause>(
    (value) => typeof value === 'object' && value !== null && 'type' in value && 'parameters' in value,
  ),
  agreementId: uuid,
  agreementNumber: z.number().int(),
  versionId: uuid,
  versionNumber: z.number().int(),
  versionSha256: z.string(),
  scope: z.enum(['relationship', 'part', 'characteristic']),
})

export const characteristicSchema = z.object({
  characteristicId: uuid,
  partNumber: z.string(),
  revision: z.string(),
  number: z.number().int(),
  name: z.string(),
  nominal: z.string().nullable(),
  lowerLimit: z.string().nullable(),
  upperLimit: z.string().nullable(),
  unit: z.string(),
  class: characteristicClass,
  processStandardDeviation: z.string().nullable(),
})

export const planSchema = z.object({
  /** True bias and spread that are assumed, in the unit of the readings. */
  bias: decimalText,
  standardDeviation: positiveDecimalText,
  /** The wanted chance to meet every clause. */
  chance: z
    .number('Enter a chance, such as 0.9.')
    .min(0.01, 'Enter a chance from 0.01 to 0.999.')
    .max(0.999, 'Enter a chance from 0.01 to 0.999.'),
})

export const taskIds = z
  .array(uuid)
  .min(1, 'Choose at least one measuring task.')
  .max(20, 'One study serves at most 20 measuring tasks.')
