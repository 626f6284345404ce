import { assert, property, string, tuple } from 'fast-check'
import { describe, expect, it } from 'vitest'
import { maskedAddress, sameAddress } from './invitations.address'

describe('a masked address', () => {
  it.each([
    ['ada.pell@quillmark.example', 'a•••@q•••.example'],
    ['Q@x.co.uk', 'Q•••@x•••.uk'],
    ['somebody@localhost', 's•••@l•••'],
  ])('of %s is %s', (address, masked) => expect(maskedAddress(address)).toBe(masked))

  it('never holds more of the name or the domain than a first letter and the ending', () => {
    const word = string({ unit: 'binary-ascii', minLength: 2, maxLength: 20 }).filter((text) =>
      /^[a-z0-9]+$/.test(text),
    )
    assert(
      property(tuple(word, word), ([name, domain]) => {
        const masked = maskedAddress(`${name}@${domain}.example`)
        expect(masked).not.toContain(name)
        expect(masked).not.toContain(domain)
      }),
    )
  })
})

it('addresses that differ by case are the same, others are not', () => {
  expect(sameAddress('Ada.Pell@Quillmark.example', 'ada.pell@quillmark.EXAMPLE')).toBe(true)
  expect(sameAddress('ada.pell@quillmark.example', 'ada.pel@quillmark.example')).toBe(false)
})
