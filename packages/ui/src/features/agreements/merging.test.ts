import { describe, expect, it } from 'vitest'
import { differingPieces, firstChoices, mergedPieces, type Choice } from './merging'

const base = { bias: { margin: '5' }, design: { readings: '15' }, day: '2026-12-31' }

describe('two people on one round', () => {
  it('leaves aside what both have alike, whatever the order of keys', () =>
    expect(differingPieces({}, { a: { x: 1, y: 2 } }, { a: { y: 2, x: 1 } })).toEqual([]))

  it('tells whose change each difference is', () => {
    const theirs = { ...base, bias: { margin: '8' }, day: '2027-01-15' }
    const mine = { ...base, design: { readings: '25' }, day: '2027-02-01' }
    expect(differingPieces(base, theirs, mine).map(({ key, changedBy }) => [key, changedBy])).toEqual([
      ['bias', 'theirs'],
      ['design', 'mine'],
      ['day', null],
    ])
  })

  it('keeps the changes of both to begin with, and what was typed where both changed the same', () => {
    const theirs = { ...base, bias: { margin: '8' }, day: '2027-01-15' }
    const mine = { ...base, design: { readings: '25' }, day: '2027-02-01' }
    const choices = firstChoices(differingPieces(base, theirs, mine))
    expect(mergedPieces(theirs, mine, choices)).toEqual({
      bias: { margin: '8' },
      design: { readings: '25' },
      day: '2027-02-01',
    })
  })

  it('lets a clause that one took out fall away, and one that they added stay', () => {
    const mine = { bias: base.bias, day: base.day }
    const theirs = { ...base, resolution: { share: '10' } }
    const rows = differingPieces(base, theirs, mine)
    expect(rows.map(({ key, changedBy }) => [key, changedBy])).toEqual([
      ['design', 'mine'],
      ['resolution', 'theirs'],
    ])
    expect(mergedPieces(theirs, mine, firstChoices(rows))).toEqual({
      bias: base.bias,
      day: base.day,
      resolution: { share: '10' },
    })
  })

  it('takes all of one side where that is chosen', () => {
    const theirs = { bias: { margin: '8' }, resolution: { share: '10' } }
    const mine = { bias: { margin: '6' }, design: { readings: '25' } }
    const all = (choice: Choice) =>
      Object.fromEntries(differingPieces(base, theirs, mine).map(({ key }) => [key, choice]))
    expect(mergedPieces(theirs, mine, all('theirs'))).toEqual(theirs)
    expect(mergedPieces(theirs, mine, all('mine'))).toEqual(mine)
  })
})
