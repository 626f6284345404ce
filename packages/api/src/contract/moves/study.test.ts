import { describe, expect, it } from 'vitest'
import { registration, studyMove, studyMoves, studyStates } from './study'

describe('the moves of a study', () => {
  it('begin with the registration, and reach every state', () => {
    const reached = new Set<string>([registration.to])
    for (let before = 0; before < reached.size;) {
      before = reached.size
      for (const { from, to } of studyMoves) if (from.some((state) => reached.has(state))) reached.add(to)
    }
    expect([...reached].sort()).toEqual([...studyStates].sort())
  })
  it('never lead out of an abandoned study, nor out of a computed one', () => {
    const outOf = (state: string) =>
      studyMoves.filter(({ from }) => (from as readonly string[]).includes(state))
    expect(outOf('abandoned')).toEqual([])
    expect(outOf('computed').map(({ to }) => to)).toEqual(['computed'])
  })
  it('are the supplier’s alone and each leaves an event of its own', () => {
    for (const move of studyMoves)
      expect(move).toMatchObject({ side: 'supplier', permission: 'studies.change' })
    expect(new Set(studyMoves.map(({ event }) => event)).size).toBe(studyMoves.length)
  })
  it('are found by name only where the state allows them', () => {
    expect(studyMove('correct', 'computed')?.to).toBe('computed')
    expect(studyMove('correct', 'collecting')).toBeUndefined()
  })
})
