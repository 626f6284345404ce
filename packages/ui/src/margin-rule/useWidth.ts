import { onBeforeUnmount, onMounted, ref, type Ref } from 'vue'

/** The width of an element in whole pixels, kept up to date; `initial` until it is on the page. */
export function useWidth(element: Readonly<Ref<Element | null>>, initial: number): Readonly<Ref<number>> {
  const width = ref(initial)
  let observer: ResizeObserver | undefined
  onMounted(() => {
    if (!element.value || typeof ResizeObserver === 'undefined') return
    const measured = Math.floor(element.value.getBoundingClientRect().width)
    if (measured > 0) width.value = measured
    observer = new ResizeObserver(([entry]) => {
      const next = Math.floor(entry?.contentRect.width ?? 0)
      // Zero while hidden, as in a closed disclosure: keep the last drawing.
      if (next > 0) width.value = next
    })
    observer.observe(element.value)
  })
  onBeforeUnmount(() => observer?.disconnect())
  return width
}
