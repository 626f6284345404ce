import { agreements } from '@evenrule/api/contract'
import { ref, shallowRef } from 'vue'
import { useApi } from '../../session/client'
import { useHere } from '../common'
import { sameAbout, type About } from './acceptance'

interface Point {
  agreement: agreements.Agreement
  version: agreements.AgreementVersion
}

/** Acts on single points of the standing round: marking them as accepted, and which thread of comments is open. */
export function usePoints(source: () => Point | undefined, done: (agreement: agreements.Agreement) => void) {
  const api = useApi()
  const here = useHere()
  const busy = ref(false)
  const problem = shallowRef<unknown>()
  const thread = shallowRef<About>()

  /** Accepts exactly what stands on the page, or takes that back; a round replaced meanwhile is refused. */
  async function mark(about: About, accepted: boolean) {
    const at = source()
    const { acceptance } = at?.version ?? {}
    const item = acceptance?.items.find((each) => sameAbout(each, about))
    if (!at || !acceptance || !item || busy.value) return
    busy.value = true
    problem.value = undefined
    try {
      const { kind, clauseKey } = about
      const items = [{ about: { kind, clauseKey }, sha256: item.sha256 }]
      done(
        await api.call(agreements.markAccepted, {
          params: here.params({ agreementId: at.agreement.id, versionId: at.version.id }),
          body: { round: acceptance.round, items, accepted },
        }),
      )
    } catch (thrown) {
      problem.value = thrown
    } finally {
      busy.value = false
    }
  }
  return {
    busy,
    problem,
    thread,
    mark,
    isOpen: (about: About) => thread.value !== undefined && sameAbout(thread.value, about),
    toggle(about: About) {
      thread.value = thread.value && sameAbout(thread.value, about) ? undefined : about
    },
  }
}

export type Points = ReturnType<typeof usePoints>
