import { describe, expect, it } from 'vitest'
import { hashOf, isTokenOf, linkOf, newNonce, tokenOf } from './invitations.token'

const secret = 'a secret of this test'
const sending = { id: '0198f5a0-0000-7000-8000-000000000001', nonce: 'first' }

describe('the token of an invitation', () => {
  it('follows from the secret, the invitation and the sending, and from nothing else', () => {
    const token = tokenOf(secret, sending)
    expect(token).toMatch(/^[\w-]{43}$/)
    expect(tokenOf(secret, { ...sending })).toBe(token)
    for (const other of [
      tokenOf('another secret', sending),
      tokenOf(secret, { ...sending, nonce: 'second' }),
      tokenOf(secret, { ...sending, id: '0198f5a0-0000-7000-8000-000000000002' }),
    ])
      expect(other).not.toBe(token)
  })

  it('is taken for its own sending alone, whole', () => {
    const token = tokenOf(secret, sending)
    expect(isTokenOf(secret, sending, token)).toBe(true)
    for (const wrong of [
      '',
      token.slice(1),
      `${token}x`,
      hashOf(token),
      tokenOf(secret, { ...sending, nonce: 'b' }),
    ])
      expect(isTokenOf(secret, sending, wrong)).toBe(false)
  })

  it('stands in the fragment of the link', () => {
    const link = new URL(linkOf('http://supplier.test', tokenOf(secret, sending)))
    expect(link.pathname + link.search).toBe('/invitation')
    expect(link.hash.slice(1)).toBe(tokenOf(secret, sending))
  })

  it('has another nonce each time', () => {
    expect(new Set(Array.from({ length: 100 }, newNonce)).size).toBe(100)
  })
})
