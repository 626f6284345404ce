import { noTerms } from '@evenrule/api/contract'
import { describe, expect, it } from 'vitest'
import { typedClause, typedClauses, type TypedProposal } from './proposalDraft'
import { fromPieces, piecesOf } from './proposalPieces'
import { pieceText, pieceTitle } from './pieceText'
import { design, equivalence } from './rooms.fixture'
import { readTerms, typedTerms } from './typedTerms'

const proposal: TypedProposal = {
  clauses: typedClauses([equivalence, design(15)]),
  terms: typedTerms({ ...noTerms, validityMonths: 24, readingsTakerMaySign: false }),
  effectiveOn: '2027-01-01',
  comment: 'As last year.',
}

describe('a proposal in pieces', () => {
  it('is the same when it is put together again', () =>
    expect(fromPieces(piecesOf(proposal), proposal)).toEqual(proposal))

  it('keeps two clauses apart that cannot be read yet', () => {
    const two = { ...proposal, clauses: [typedClause('by-hand'), typedClause('by-hand')] }
    expect(fromPieces(piecesOf(two), two).clauses).toHaveLength(2)
  })

  it('says every piece in words, also one that is not complete', () => {
    const pieces = piecesOf({ ...proposal, clauses: [typedClause('by-hand'), ...proposal.clauses] })
    for (const key of Object.keys(pieces)) {
      const row = { key, base: pieces[key], theirs: undefined, mine: pieces[key], changedBy: null }
      expect(pieceTitle(row)).toMatch(/^[A-Z]/)
      expect(pieceText(key, pieces[key])).not.toBe('')
    }
    expect(pieceText('clause:by-hand', pieces['clause:by-hand'])).toContain('not complete yet')
    expect(pieceText('term:validityMonths', '24')).toMatch(/^24\smonths$/)
    expect(pieceText('term:readingsTakerMaySign', '')).toBe('not said here')
  })
})

describe('terms as typed', () => {
  it('say nothing where nothing is typed', () => expect(readTerms(typedTerms()).terms).toEqual(noTerms))
  it('read back what they were made from', () =>
    expect(readTerms(proposal.terms).terms).toEqual({
      ...noTerms,
      validityMonths: 24,
      readingsTakerMaySign: false,
    }))
  it('name months that are none', () => {
    const endless = { ...noTerms, validityMonths: 'no-expiry' as const }
    expect(readTerms(typedTerms(endless))).toEqual({ terms: endless, problems: {} })
    expect(pieceText('term:validityMonths', 'no-expiry')).toBe('no time limit')
    for (const validityMonths of ['0', '121', '1.5', 'two'])
      expect(readTerms({ ...typedTerms(), validityMonths }).problems).toHaveProperty(['terms.validityMonths'])
  })
})
