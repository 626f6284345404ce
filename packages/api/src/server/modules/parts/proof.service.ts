import { acceptedStates } from '../../../contract/moves/submission'
import {
  isAccepted,
  proofOfCharacteristic,
  proofOfTask,
  runsOutOfTask,
  type ProofOfSubmission,
  type ProofState,
} from '../../../contract/proof'
import type { Tenant } from '../../db/tenant'
import { selectCarriedTo } from '../standing/standing.carry.repository'
import { standingsOf } from '../standing/standing.service'
import { selectActiveTasks, selectPlacesOfTasks, selectSubmissionStates } from './proof.repository'

/** How far the proof of each measuring task has come, as both sides see it. */
export async function proofOfTasks(
  tenant: Tenant,
  taskIds: readonly string[],
): Promise<Map<string, ProofState>> {
  const submissions = await submissionsOfTasks(tenant, taskIds)
  return new Map(taskIds.map((id) => [id, proofOfTask(submissions.get(id) ?? [])]))
}

/**
 * What the proof of each task follows from, the newest first. What was carried over from an earlier revision counts for
 * the task of the same gauge, site and process step.
 */
async function submissionsOfTasks(
  tenant: Tenant,
  taskIds: readonly string[],
): Promise<Map<string, ProofOfSubmission[]>> {
  const own = await selectSubmissionStates(tenant, taskIds)
  const places = await selectPlacesOfTasks(tenant, taskIds)
  const carried = await selectCarriedTo(
    tenant,
    places.map(({ characteristicId }) => characteristicId),
  )
  const standings = await standingsOf(tenant, [
    ...own.filter(({ state }) => acceptedStates.includes(state)).map(({ id }) => id),
    ...carried.map(({ submissionId }) => submissionId),
  ])
  const proofOf = (id: string, state: string): ProofOfSubmission => {
    const standing = standings.get(id)
    return { state, standing: standing?.state ?? null, runsOutOn: standing?.runsOutOn ?? null }
  }
  return new Map(
    taskIds.map((taskId) => {
      const place = places.find(({ id }) => id === taskId)
      const older = place ? carried.filter((each) => isSamePlace(each, place)) : []
      return [
        taskId,
        [
          ...own.filter((row) => row.taskId === taskId).map(({ id, state }) => proofOf(id, state)),
          ...older.map(({ submissionId, state }) => proofOf(submissionId, state)),
        ],
      ]
    }),
  )
}

type Place = Omit<Awaited<ReturnType<typeof selectPlacesOfTasks>>[number], 'id'>

const isSamePlace = (a: Place, b: Place): boolean =>
  (['characteristicId', 'gaugeId', 'site', 'processStep'] as const).every((field) => a[field] === b[field])

export interface ProofOfCharacteristic {
  /** Active measuring tasks. */
  tasks: number
  proof: ProofState
  /** The day on which the first acceptance it rests on runs out, where that is soon. */
  runsOutOn: string | null
  /** The task whose proof is least far; null where there is none. */
  leastFar: string | null
}

/** The proof of each characteristic: that of the task that is least far. */
export async function proofOfCharacteristics(
  tenant: Tenant,
  characteristicIds: readonly string[],
): Promise<Map<string, ProofOfCharacteristic>> {
  const tasks = await selectActiveTasks(tenant, characteristicIds)
  const submissions = await submissionsOfTasks(
    tenant,
    tasks.map(({ id }) => id),
  )
  return new Map(
    characteristicIds.map((characteristicId) => {
      const own = tasks.filter((task) => task.characteristicId === characteristicId)
      const proofOf = ({ id }: { id: string }) => proofOfTask(submissions.get(id) ?? [])
      const proof = proofOfCharacteristic(own.map(proofOf))
      const leastFar = own.find((task) => proofOf(task) === proof)?.id ?? null
      const ends = own.map(({ id }) => runsOutOfTask(submissions.get(id) ?? [])).filter((day) => day !== null)
      const runsOutOn = isAccepted(proof) ? (ends.sort()[0] ?? null) : null
      return [characteristicId, { tasks: own.length, proof, runsOutOn, leastFar }]
    }),
  )
}
