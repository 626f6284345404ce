import { assert, property, stringMatching, tuple } from 'fast-check'
import { describe, expect, it } from 'vitest'
import { maskedAddress, sameAddress } from './invitations.address'

describe('a masked address', () => {
  it.each([
    ['ada.pell@quillmark.example', 'a•••@q•••.example'],
    ['Q@x.co.uk', 'Q•••@x•••.uk'],
    ['somebody@localhost', 's•••@l•••'],
  ])('of %s is %s', (address, masked) => expect(maskedAddress(address)).toBe(masked))

  it('never holds more of the name or the domain than a first letter and the ending', () => {
    const word = stringMatching(/^[a-z0-9]{2,20}$/)
    assert(
      property(tuple(word, word), ([name, domain]) => {
        expect(maskedAddress(`${name}@${domain}.example`)).toBe(`${name[0]}•••@${domain[0]}•••.example`)
      }),
    )
  })
})

it('addresses that differ by case are the same, others are not', () => {
  expect(sameAddress('Ada.Pell@Quillmark.example', 'ada.pell@quillmark.EXAMPLE')).toBe(true)
  expect(sameAddress('ada.pell@quillmark.example', 'ada.pel@quillmark.example')).toBe(false)
})
