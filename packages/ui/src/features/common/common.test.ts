import { effectScope, nextTick, ref } from 'vue'
import { describe, expect, it } from 'vitest'
import { inSentence, orNull } from './text'
import { chosen } from './useList'
import { useLoaded } from './useLoaded'

describe('names inside a sentence', () => {
  it.each([
    ['Bore gauge', 'bore gauge'],
    ['CMM large', 'CMM large'],
    ['Ø gauge', 'Ø gauge'],
    ['Öse', 'öse'],
    ['R', 'R'],
  ])('%s reads %s', (name, read) => expect(inSentence(name)).toBe(read))
})

describe('optional fields', () => {
  it('are sent as nothing when they are empty', () => {
    expect(orNull('  ')).toBeNull()
    expect(orNull(' 24.0 ')).toBe('24.0')
    expect(chosen({ page: 1, search: '', archived: 'all', sort: undefined })).toEqual({
      page: 1,
      archived: 'all',
    })
  })
})

describe('loading', () => {
  it('shows the answer to the latest question, whichever comes last', async () => {
    const answers = new Map<string, (value: string) => void>()
    const asked = ref('first')
    const scope = effectScope()
    const loaded = scope.run(() =>
      useLoaded(
        () => asked.value,
        (what) => new Promise<string>((resolve) => answers.set(what, resolve)),
      ),
    )
    asked.value = 'second'
    await nextTick()
    answers.get('second')?.('second answer')
    await nextTick()
    answers.get('first')?.('first answer')
    await new Promise((resolve) => setTimeout(resolve))
    expect(loaded?.data.value).toBe('second answer')
    expect(loaded?.loading.value).toBe(false)
    scope.stop()
  })

  it('keeps what was there when loading again fails', async () => {
    let works = true
    const scope = effectScope()
    const loaded = scope.run(() =>
      useLoaded(
        () => 1,
        async () => {
          if (!works) throw new Error('away')
          return 'there'
        },
      ),
    )
    await new Promise((resolve) => setTimeout(resolve))
    works = false
    await loaded?.reload()
    expect(loaded?.data.value).toBe('there')
    expect(loaded?.error.value).toBeInstanceOf(Error)
    scope.stop()
  })
})
