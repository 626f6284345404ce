import { agreements, tasks, type SentQueryOf } from '@evenrule/api/contract'
import { computed } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import { useApi } from '../../session/client'
import { useHere, useLoaded } from '../common'
import { characteristicText } from '../parts/tolerance'

const taskText = (task: tasks.MeasuringTask): string =>
  `${task.gaugeCode}, ${task.partNumber} rev ${task.revision}, ${characteristicText(task.characteristic)}`

/** What applies to the measuring task and on the day that the address names. */
export function useApplying() {
  const api = useApi()
  const here = useHere()
  const route = useRoute()
  const router = useRouter()
  const named = (key: string) => (typeof route.query[key] === 'string' ? route.query[key] : '')
  const taskId = computed(() => named('task'))
  const on = computed(() => (/^\d{4}-\d{2}-\d{2}$/.test(named('on')) ? named('on') : ''))

  const task = useLoaded(
    () => taskId.value,
    async (id) => (id ? api.call(tasks.readTask, { params: here.params({ taskId: id }) }) : undefined),
  )
  const applying = useLoaded(
    () => ({ taskId: taskId.value, on: on.value }),
    async ({ taskId: id, on: day }) =>
      id
        ? api.call(agreements.explainCriteria, {
            params: here.params({ taskId: id }),
            query: day ? { on: day } : {},
          })
        : undefined,
  )
  /** Finds measuring tasks to choose from; the one chosen is among them whatever is typed. */
  async function find(search: string) {
    const query: SentQueryOf<typeof tasks.listTasks> = { size: 20, ...(search ? { search } : {}) }
    const { items } = await api.call(tasks.listTasks, { params: here.params(), query })
    const chosen = task.data.value
    const all = chosen && !items.some(({ id }) => id === chosen.id) ? [chosen, ...items] : items
    return all.map((each) => ({ value: each.id, label: taskText(each) }))
  }
  return {
    task,
    applying,
    taskId,
    /** The day shown: that of the address, else today where the relationship is. */
    day: computed(() => on.value || (applying.data.value?.on ?? '')),
    find,
    choose: (part: { task?: string; on?: string }) => router.replace({ query: { ...route.query, ...part } }),
  }
}

/** How many clauses apply, by the scope for which they were signed, the narrowest first. */
export function countsByScope(clauses: readonly agreements.ExplainedClause[]) {
  const order: readonly agreements.ScopeKind[] = ['characteristic', 'part', 'relationship']
  return order
    .map((scope) => ({
      scope,
      count: clauses.filter(({ applies, winner }) => applies && winner?.source.scope.kind === scope).length,
    }))
    .filter(({ count }) => count > 0)
}
