import { computed, nextTick, ref, watch, type Ref } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import { signInAfresh } from '../../session/freshSignIn'
import { useHere } from '../common'
import { mayChallenge, possibleSayings, type Saying } from '../reviews/challenges'
import { inOrder, possibleActs } from './acts'
import { readAsked, writeAsked, type Asked } from './asks'
import type { ReadSubmission } from './reading'

/** Name in the address of the move that a fresh sign-in was asked for. */
const returning = 'do'

/**
 * What may be done with a submission, which question is being asked, and coming back to it after a fresh sign-in.
 * Nothing can be done with an earlier revision.
 */
export function useActs(
  read: Ref<ReadSubmission | undefined>,
  newest: Ref<boolean>,
  moved: () => Promise<void>,
) {
  const here = useHere()
  const route = useRoute()
  const router = useRouter()
  const asked = ref<Asked>()

  const acting = computed(() => (newest.value ? read.value?.submission : undefined))
  const possible = computed(() =>
    acting.value ? inOrder(possibleActs(acting.value, here.side, here.allows)) : [],
  )
  const mayOpen = computed(
    () => acting.value !== undefined && mayChallenge(acting.value.state, here.side, here.allows),
  )
  /** What this person may say in each challenge. */
  const sayingsOf = (challengeId: string): Saying[] => {
    const challenge = acting.value?.challenges.find(({ id }) => id === challengeId)
    return acting.value && challenge
      ? possibleSayings(acting.value.state, challenge.state, here.side, here.allows)
      : []
  }
  /** The first challenge that waits for this person's answer. */
  const toAnswer = computed(() => acting.value?.challenges.find(({ id }) => sayingsOf(id).includes('answer')))

  const isPossible = (wanted: Asked): boolean =>
    wanted.kind === 'act'
      ? possible.value.some(({ name, hindrances }) => name === wanted.act && !hindrances.length)
      : wanted.kind === 'say'
        ? sayingsOf(wanted.challengeId).includes(wanted.saying)
        : true

  /** Leaves for the sign-in; the dialog goes first, so that its unsaved words hold nobody back. They are kept. */
  async function askAfresh() {
    const wanted = asked.value && writeAsked(asked.value)
    asked.value = undefined
    await nextTick()
    const back = router.resolve({ query: { ...route.query, [returning]: wanted } })
    signInAfresh(back.fullPath)
  }

  // Back from a fresh sign-in: the question is asked again, where it still can be.
  watch(
    read,
    () => {
      const text = route.query[returning]
      if (!read.value || typeof text !== 'string') return
      const wanted = readAsked(text)
      asked.value = wanted && isPossible(wanted) ? wanted : undefined
      const { [returning]: _done, ...query } = route.query
      void router.replace({ query, hash: route.hash })
    },
    { immediate: true },
  )

  async function done() {
    asked.value = undefined
    await moved()
  }

  return { possible, asked, askAfresh, done, mayOpen, sayingsOf, toAnswer }
}
