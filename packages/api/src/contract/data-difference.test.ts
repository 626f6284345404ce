import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readingChanges } from './data-difference'

const texts = fc.array(fc.constantFrom('24.001', '24.002', '24.003', '24.004'), { maxLength: 30 })

/** What the second list is, made from the first and the changes. */
function applied(before: readonly string[], { changes }: ReturnType<typeof readingChanges>): string[] {
  const removed = new Set(changes.flatMap(({ before: was }) => (was ? [was.number] : [])))
  const kept = before.filter((_text, at) => !removed.has(at + 1))
  const result: string[] = []
  const added = new Map(changes.flatMap(({ after }) => (after ? [[after.number, after.text] as const] : [])))
  while (kept.length > 0 || added.has(result.length + 1))
    result.push(added.get(result.length + 1) ?? kept.shift() ?? '')
  return result
}

describe('the difference of two lists of readings', () => {
  it.each([
    [['1', '2', '3'], ['1', '2', '3'], [], 3],
    [['1', '2', '3'], ['1', '9', '3'], [[2, '2', 2, '9']], 2],
    [['1', '2', '3'], ['1', '3'], [[2, '2', null, null]], 2],
    [['1', '3'], ['1', '2', '3'], [[null, null, 2, '2']], 2],
    [[], ['1'], [[null, null, 1, '1']], 0],
    [['1'], [], [[1, '1', null, null]], 0],
    [['5', '5', '5'], ['5', '5'], [[3, '5', null, null]], 2],
  ])('of %j and %j', (before, after, changes, kept) => {
    const found = readingChanges(before, after)
    expect(found.kept).toBe(kept)
    expect(
      found.changes.map(({ before: was, after: is }) => [
        ...[was?.number ?? null, was?.text ?? null, is?.number ?? null, is?.text ?? null],
      ]),
    ).toEqual(changes)
  })

  it('leads from the one to the other, whatever they are', () => {
    fc.assert(
      fc.property(texts, texts, (before, after) => {
        const found = readingChanges(before, after)
        expect(applied(before, found)).toEqual(after)
        const gone = found.changes.filter(({ before: was }) => was !== null).length
        expect(found.kept + gone).toBe(before.length)
      }),
    )
  })

  it('is nothing for the same list, and each reading once for lists with nothing in common', () => {
    fc.assert(
      fc.property(texts, (list) => {
        expect(readingChanges(list, list)).toEqual({ changes: [], kept: list.length })
        const other = list.map((text) => `${text}9`)
        expect(readingChanges(list, other).changes).toHaveLength(list.length)
      }),
    )
  })

  it('of very long lists is told by place, without comparing everything with everything', () => {
    const before = Array.from({ length: 10_000 }, (_each, at) => `a${at}`)
    const after = before.map((text, at) => (at % 1000 === 7 ? 'changed' : text))
    expect(readingChanges(before, after).changes).toHaveLength(10)
  })
})
