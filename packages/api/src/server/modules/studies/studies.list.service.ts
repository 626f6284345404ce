import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import type { listStudies } from '../../../contract/studies'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { selectStudies, selectTasksOfStudies, selectVerdicts } from './studies.list.repository'

type Listed = AnswerInputOf<typeof listStudies>['items'][number]

/** One page of studies with their tasks, and how many clauses have which verdict. */
export async function listOfStudies(tenant: Tenant, query: QueryOf<typeof listStudies>) {
  return paged(
    query,
    (page) => selectStudies(tenant, page),
    async (rows): Promise<Listed[]> => {
      const ids = rows.map(({ study }) => study.id)
      const tasks = await selectTasksOfStudies(tenant, ids)
      const verdicts = await selectVerdicts(tenant, ids)
      return rows.map(({ study, standardCode, readings }) => {
        const { gauge } = study
        const count = (verdict: string): number =>
          verdicts.find((each) => each.studyId === study.id && each.verdict === verdict)?.count ?? 0
        return {
          ...study,
          ...{ gaugeCode: gauge.code, gaugeName: gauge.name, standardCode, readings },
          tasks: tasks
            .filter(({ studyId }) => studyId === study.id)
            .map(({ taskId, attempt, characteristic, customerName }) => ({
              ...{ taskId, attempt, customerName },
              partNumber: characteristic.partNumber,
              revision: characteristic.revision,
              characteristicNumber: characteristic.number,
              characteristicName: characteristic.name,
            })),
          verdicts:
            study.state === 'computed'
              ? {
                  meets: count('meets'),
                  'meets-with-conditions': count('meets-with-conditions'),
                  'falls-short': count('falls-short'),
                  'not-shown': count('not-shown'),
                }
              : null,
        }
      })
    },
  )
}
