import { proofOfCharacteristic, proofOfTask, type ProofState } from '../../../contract/proof'
import type { Tenant } from '../../db/tenant'
import { selectActiveTasks, selectSubmissionStates } from './proof.repository'

/** How far the proof of each measuring task has come, as both sides see it. */
export async function proofOfTasks(
  tenant: Tenant,
  taskIds: readonly string[],
): Promise<Map<string, ProofState>> {
  const rows = await selectSubmissionStates(tenant, taskIds)
  return new Map(
    taskIds.map((taskId) => [
      taskId,
      proofOfTask(rows.filter((row) => row.taskId === taskId).map(({ state }) => state)),
    ]),
  )
}

export interface ProofOfCharacteristic {
  /** Active measuring tasks. */
  tasks: number
  proof: ProofState
  /** The task whose proof is least far; null where there is none. */
  leastFar: string | null
}

/** The proof of each characteristic: that of the task that is least far. */
export async function proofOfCharacteristics(
  tenant: Tenant,
  characteristicIds: readonly string[],
): Promise<Map<string, ProofOfCharacteristic>> {
  const tasks = await selectActiveTasks(tenant, characteristicIds)
  const proofs = await proofOfTasks(
    tenant,
    tasks.map(({ id }) => id),
  )
  return new Map(
    characteristicIds.map((characteristicId) => {
      const own = tasks.filter((task) => task.characteristicId === characteristicId)
      const proofOf = ({ id }: { id: string }) => proofs.get(id) ?? 'missing'
      const proof = proofOfCharacteristic(own.map(proofOf))
      const leastFar = own.find((task) => proofOf(task) === proof)?.id ?? null
      return [characteristicId, { tasks: own.length, proof, leastFar }]
    }),
  )
}
