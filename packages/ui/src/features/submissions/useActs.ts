import { computed, nextTick, ref, watch, type Ref } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import { signInAfresh } from '../../session/freshSignIn'
import type { ActName } from '../../strings/reviews'
import { useHere } from '../common'
import { mayChallenge, possibleSayings } from '../reviews/challenges'
import { inOrder, possibleActs } from './acts'
import type { ReadSubmission } from './reading'

/** Name in the address of the move that a fresh sign-in was asked for. */
const returning = 'do'

/**
 * What may be done with a submission, which question is being asked, and coming back to it after a fresh sign-in.
 */
export function useActs(read: Ref<ReadSubmission | undefined>, moved: () => Promise<void>) {
  const here = useHere()
  const route = useRoute()
  const router = useRouter()
  const asked = ref<ActName>()
  const challenging = ref<{ clauseKey: string | undefined }>()

  const possible = computed(() =>
    read.value ? inOrder(possibleActs(read.value.submission, here.side, here.allows)) : [],
  )
  const mayOpen = computed(
    () => read.value !== undefined && mayChallenge(read.value.submission.state, here.side, here.allows),
  )

  /** The first challenge that waits for this person's answer. */
  const toAnswer = computed(() => {
    const { state, challenges } = read.value?.submission ?? { challenges: [] }
    return challenges.find(
      (each) =>
        state !== undefined && possibleSayings(state, each.state, here.side, here.allows).includes('answer'),
    )
  })

  /** Leaves for the sign-in; the dialog goes first, so that its unsaved words hold nobody back. They are kept. */
  async function askAfresh() {
    const act = asked.value
    asked.value = undefined
    await nextTick()
    const back = router.resolve({ query: { ...route.query, [returning]: act } })
    signInAfresh(back.fullPath)
  }

  // Back from a fresh sign-in: the question is asked again, where it still can be.
  watch(
    read,
    () => {
      const wanted = route.query[returning]
      if (!read.value || typeof wanted !== 'string') return
      const found = possible.value.find(({ name, hindrances }) => name === wanted && !hindrances.length)
      asked.value = found?.name
      const { [returning]: _done, ...query } = route.query
      void router.replace({ query, hash: route.hash })
    },
    { immediate: true },
  )

  async function done() {
    asked.value = undefined
    challenging.value = undefined
    await moved()
  }

  return { possible, asked, askAfresh, done, challenging, mayOpen, toAnswer }
}
