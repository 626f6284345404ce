import { describe, expect, it } from 'vitest'
import { importMoves, importStates, mayMoveImport } from './import'

describe('the moves of an import', () => {
  it('begin it, reach every state but the one that is derived, and never lead out of one that was applied', () => {
    expect(new Set(importMoves.map(({ to }) => to))).toEqual(new Set(['applying', 'applied', 'failed']))
    for (const { name } of importMoves) expect(mayMoveImport(name, 'applied')).toBe(false)
  })
  it('let only one that failed or was interrupted be repeated', () =>
    expect(importStates.filter((state) => mayMoveImport('repeat', state))).toEqual(['failed', 'interrupted']))
})
