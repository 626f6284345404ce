import { z } from 'zod'
import { organisationParams, unitSchema, uuid } from './common'
import { defineEndpoint } from './define'
import { criterionSchema } from './agreements-applies'
import { frozenCharacteristicSchema } from './frozen'
import { planSchema, studiesPath, taskIds } from './study-parts'

export const planReasons = [
  'size-found',
  'minimum',
  'any-size',
  'no-size-suffices',
  'size-does-not-help',
  /** Judged on something that the number of readings does not touch: resolution, calibration. */
  'not-about-size',
] as const
export type PlanReason = (typeof planReasons)[number]

export const studyPlanSchema = z.object({
  /** Least readings for every clause of every task; null where a clause has none, or none asks for a number. */
  readings: z.number().int().nullable(),
  fewestReadings: z.number().int(),
  mostReadings: z.number().int(),
  tasks: z.array(
    z.object({
      taskId: uuid,
      readings: z.number().int().nullable(),
      characteristic: frozenCharacteristicSchema,
      /** Registered on this task so far since criteria came into force; a new study is one more. */
      attempts: z.number().int(),
      clauses: z.array(
        criterionSchema.extend({
          readings: z.number().int().nullable(),
          chance: z.number().nullable(),
          reason: z.enum(planReasons),
        }),
      ),
    }),
  ),
})
export type StudyPlanned = z.output<typeof studyPlanSchema>

export const planStudy = defineEndpoint({
  method: 'post',
  path: `${studiesPath}/plan`,
  access: 'studies.read',
  params: organisationParams,
  body: planSchema.extend({ taskIds, unit: unitSchema }),
  response: studyPlanSchema,
  summary: 'How many readings give the wanted chance to meet the clauses in force; nothing is stored.',
})
