import { z } from 'zod'
import { decimalText, paramsWith, positiveDecimalText, uuid } from './common'
import { studyStates } from './moves/study'

export const studyState = z.enum(studyStates)
export const measuredAs = z.enum(['value', 'deviation'], 'Choose value or deviation.')
export const studiesPath = '/organisations/:organisationId/studies'
export const studyPath = `${studiesPath}/:studyId`
export const studyParams = paramsWith('studyId')

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
