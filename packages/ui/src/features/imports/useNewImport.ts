import { imports } from '@evenrule/api/contract'
import { computed, reactive, ref, shallowRef } from 'vue'
import { useApi } from '../../session/client'
import { useSession } from '../../session/useSessionStore'
import { useHere } from '../common'

type Columns = Record<string, string[]>

/** One file on its way in: chosen, looked at as often as one likes, then imported. */
export function useNewImport(kind: imports.ImportKind) {
  const api = useApi()
  const here = useHere()
  const session = useSession()
  const endpoints = imports.importsOf[kind]

  const file = shallowRef<File>()
  const preview = shallowRef<imports.ImportPreview>()
  const problem = shallowRef<unknown>()
  const busy = ref<'looking' | 'importing'>()
  const how = reactive<{ sheet?: string; headerRow?: number; columns?: Columns }>({})
  const takenBy = ref<string[]>(session.person ? [session.person.id] : [])
  let asked = 0

  const body = () => ({ ...how, ...(kind === 'studies' ? { takenBy: takenBy.value } : {}) })

  /** Reads the file as it is to be read now; the latest question wins, and what was shown stays while it is asked. */
  async function look(): Promise<void> {
    if (!file.value) return
    const mine = (asked += 1)
    busy.value = 'looking'
    problem.value = undefined
    try {
      const answer = await api.call(endpoints.preview, {
        params: here.params(),
        body: body(),
        file: file.value,
      })
      if (mine === asked) preview.value = answer
    } catch (thrown) {
      if (mine === asked) problem.value = thrown
    } finally {
      if (mine === asked) busy.value = undefined
    }
  }

  /** Another file is read by its own names. */
  async function choose(chosen: File): Promise<void> {
    file.value = chosen
    preview.value = undefined
    Object.assign(how, { sheet: undefined, headerRow: undefined, columns: undefined })
    await look()
  }

  /** Says what one column holds; a field of one column leaves the column it had. */
  async function assign(letter: string, key: string | null): Promise<void> {
    const shown = preview.value
    if (!shown) return
    const columns: Columns = {}
    for (const column of shown.columns) {
      const field = column.letter === letter ? key : column.field
      if (!field) continue
      const several = shown.fields.find((each) => each.key === field)?.several
      const taken = column.letter !== letter && field === key && !several
      if (!taken) columns[field] = [...(columns[field] ?? []), column.letter]
    }
    how.columns = columns
    await look()
  }

  /** Reads another sheet, or takes the names from another row. */
  async function readOtherwise(changed: { sheet?: string; headerRow?: number }): Promise<void> {
    Object.assign(how, { columns: undefined }, changed)
    await look()
  }

  /** Begins the import; undefined where it was refused. */
  async function start(mode: 'all' | 'good-rows'): Promise<imports.Import | undefined> {
    const shown = preview.value
    if (!file.value || !shown) return undefined
    busy.value = 'importing'
    problem.value = undefined
    try {
      const { basis, file: told } = shown
      return await api.call(endpoints.apply, {
        params: here.params(),
        body: { ...body(), mode, basis, sha256: told.sha256 },
        file: file.value,
      })
    } catch (thrown) {
      problem.value = thrown
      return undefined
    } finally {
      busy.value = undefined
    }
  }

  const goodRows = computed(() =>
    preview.value ? preview.value.counts.rows - preview.value.counts.badRows : 0,
  )
  const template = (format: 'csv' | 'xlsx', layout: 'wide' | 'long' = 'wide') =>
    api.url(endpoints.template, { params: here.params(), query: { format, layout } })

  return {
    file,
    preview,
    problem,
    busy,
    takenBy,
    goodRows,
    choose,
    look,
    assign,
    readOtherwise,
    start,
    template,
  }
}

export type NewImport = ReturnType<typeof useNewImport>
