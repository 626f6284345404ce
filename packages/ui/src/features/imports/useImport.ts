import { imports, mayMoveImport } from '@evenrule/api/contract'
import { computed, onScopeDispose, ref, shallowRef, watch } from 'vue'
import { useApi } from '../../session/client'
import { useHere, useLoaded } from '../common'

/** Milliseconds between two looks at an import that runs. */
const lookEvery = 800

/** One import, looked at again and again while it runs. */
export function useImport(importId: () => string) {
  const api = useApi()
  const here = useHere()
  const params = () => here.params({ importId: importId() })
  const { data, error, loading, reload } = useLoaded(importId, () =>
    api.call(imports.readImport, { params: params() }),
  )
  let timer: ReturnType<typeof setTimeout> | undefined
  watch([data, error], ([now]) => {
    clearTimeout(timer)
    if (now?.state === 'applying') timer = setTimeout(() => void reload(), lookEvery)
  })
  onScopeDispose(() => clearTimeout(timer))

  const problem = shallowRef<unknown>()
  const busy = ref(false)
  /** Another look at a preview is needed where what it rested on has changed; anything else can just be repeated. */
  const mayRepeat = computed(
    () =>
      data.value !== undefined &&
      mayMoveImport('repeat', data.value.state) &&
      (data.value.failure === null || ['unexpected', 'unavailable'].includes(data.value.failure.code)),
  )
  async function repeat(): Promise<void> {
    const shown = data.value
    if (!shown) return
    busy.value = true
    problem.value = undefined
    try {
      await api.call(imports.importsOf[shown.kind].repeat, {
        params: params(),
        body: { expectedVersion: shown.rowVersion },
      })
      await reload()
    } catch (thrown) {
      problem.value = thrown
    } finally {
      busy.value = false
    }
  }
  return {
    ...{ data, error, loading, reload, problem, busy, mayRepeat, repeat },
    fileUrl: () => api.url(imports.downloadImport, { params: params() }),
    leftOutUrl: () => api.url(imports.downloadLeftOut, { params: params() }),
  }
}
