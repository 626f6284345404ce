import { ApiProblem } from '@evenrule/api/client'
import { onErrorCaptured, ref, type Ref } from 'vue'
import { useRouter } from 'vue-router'
import { failureWords } from '../../strings/session'

/** Errors that no page has caught: told above the page, which stays with what was typed in it. */
export function useFailures(): { failure: Ref<string | undefined>; reload: Ref<boolean> } {
  const failure = ref<string>()
  const reload = ref(false)
  const router = useRouter()

  onErrorCaptured((error) => {
    // The notice of an ended sign-in says it already.
    if (error instanceof ApiProblem && error.status === 401) return false
    failure.value = error instanceof ApiProblem ? error.message : failureWords.page
    if (!(error instanceof ApiProblem)) console.error(error)
    return false
  })
  router.onError((error) => {
    // The usual cause: the app was built anew and the old parts of it are gone.
    failure.value = failureWords.outdated
    reload.value = true
    console.error(error)
  })
  router.afterEach((_to, _from, failed) => {
    if (!failed && !reload.value) failure.value = undefined
  })
  return { failure, reload }
}
