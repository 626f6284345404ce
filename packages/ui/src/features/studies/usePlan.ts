import { studies, type SentBodyOf } from '@evenrule/api/contract'
import { parseNumber } from '../../format'
import { useApi } from '../../session/client'
import { useHere, type Loaded } from '../common'
import { chanceOf } from './planFacts'
import { useAsked } from './useAsked'

export interface PlanAsked {
  taskIds: string[]
  unit: string
  bias: string
  standardDeviation: string
  chance: string
}

type PlanBody = SentBodyOf<typeof studies.planStudy>

/** What can be asked of the server for what is typed; null while something is missing. */
export function planBody({ taskIds, unit, bias, standardDeviation, chance }: PlanAsked): PlanBody | null {
  const wanted = chanceOf(chance)
  const spread = parseNumber(standardDeviation).value
  if (!taskIds.length || !unit || parseNumber(bias).value === null || wanted === undefined) return null
  return spread === null || spread <= 0 ? null : { taskIds, unit, bias, standardDeviation, chance: wanted }
}

/** The plan for what is typed, asked anew a moment after the last change. */
export function usePlan(asked: () => PlanAsked): Loaded<studies.StudyPlanned | null> {
  const api = useApi()
  const here = useHere()
  return useAsked(
    () => planBody(asked()),
    (body) => api.call(studies.planStudy, { params: here.params(), body }),
  )
}
