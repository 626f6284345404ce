import { afterEach, describe, expect, it } from 'vitest'
import { forgetInvitation, keepInvitation, keptInvitation, takeInvitation, tokenIn } from './invitationToken'

const token = 'Ab_-'.repeat(10) + 'xyz'
afterEach(() => {
  forgetInvitation()
  history.replaceState(null, '', '/')
})

describe('a pasted text', () => {
  it.each([
    ['a link', `http://localhost:4310/invitation#${token}`, token],
    ['a mail around it', `Open this:\n\nhttps://x.example/invitation#${token}\n\nIt works once.`, token],
    ['the bare characters', `  ${token}\n`, token],
    ['a link that was cut', `http://localhost:4310/invitation#${token.slice(1)}`, undefined],
    ['a link with too much', `http://localhost:4310/invitation#${token}x`, undefined],
    ['words', 'my invitation', undefined],
    ['nothing', '', undefined],
  ])('that is %s', (_what, text, found) => expect(tokenIn(text)).toBe(found))
})

describe('the token of an opened link', () => {
  it('leaves the address at once and is kept in the tab until it is used', () => {
    history.replaceState(null, '', `/invitation#${token}`)
    takeInvitation()
    expect(location.hash).toBe('')
    expect(location.pathname).toBe('/invitation')
    expect(keptInvitation()).toBe(token)
    forgetInvitation()
    expect(keptInvitation()).toBeUndefined()
  })

  it('is not taken from other pages, and a broken one does not replace a good one', () => {
    keepInvitation(token)
    history.replaceState(null, '', `/organisations/1/parts#${'z'.repeat(43)}`)
    takeInvitation()
    expect(location.hash).toBe(`#${'z'.repeat(43)}`)
    history.replaceState(null, '', '/invitation#cut')
    takeInvitation()
    expect(location.hash).toBe('')
    expect(keptInvitation()).toBe(token)
  })
})
