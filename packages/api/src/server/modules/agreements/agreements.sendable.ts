import { blockingWarnings, clauseWarnings } from '../../../contract/agreement-check'
import { saysNothing } from '../../../contract/terms'
import type { FieldError } from '../../errors'
import type { Negotiation } from './agreements.negotiation.service'
import type { RoundRow } from './agreements.rounds.repository'

type Content = Pick<RoundRow, 'clauses' | 'terms'>

/** Whether a proposal has anything that could be agreed on. */
export const isEmpty = ({ clauses, terms }: Content): boolean => clauses.length === 0 && saysNothing(terms)

/** What keeps a proposal from being agreed as it stands, for the characteristics in scope as they are now. */
export function contentErrors(
  round: Content,
  { characteristics, scope }: Pick<Negotiation, 'characteristics' | 'scope'>,
): FieldError[] {
  const { clauses } = round
  if (isEmpty(round))
    return [{ path: 'body.clauses', message: 'Add at least one clause, or one of the terms.' }]
  const impossible = blockingWarnings(clauseWarnings(clauses, characteristics), characteristics)
  return [
    ...impossible.map(({ clause, path, message }) => ({ path: `body.clauses.${clause}.${path}`, message })),
    ...clauses.flatMap(({ type }, place) =>
      type === 'does-not-apply' && scope.kind === 'relationship'
        ? [
            {
              path: `body.clauses.${place}.parameters.key`,
              message: 'There is no wider scope whose clause could be taken away. Leave the clause out.',
            },
          ]
        : [],
    ),
  ]
}

export const canBeAgreed = (
  round: Content,
  negotiation: Pick<Negotiation, 'characteristics' | 'scope'>,
): boolean => contentErrors(round, negotiation).length === 0
