import { nextTick, watch } from 'vue'
import { useRoute } from 'vue-router'

function goToSigning() {
  const heading = document.getElementById('sign-heading')
  heading?.scrollIntoView({ block: 'center' })
  heading?.focus({ preventScroll: true })
}

/** A link to the signing, as on the way back from the fresh sign-in, waits for what stands above it. */
export function useSignLink(ready: () => boolean) {
  const route = useRoute()
  watch(ready, async (now) => {
    if (!now || route.hash !== '#sign') return
    await nextTick()
    requestAnimationFrame(goToSigning)
  })
  return { goToSigning }
}
