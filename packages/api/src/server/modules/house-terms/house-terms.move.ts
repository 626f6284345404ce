import { allows } from '../../../contract/access'
import { chooseMove, type Facts } from '../../../contract/moves/define'
import {
  houseTermsMoveNames,
  houseTermsMoves,
  type HouseTermsMove,
  type HouseTermsMoveName,
  type HouseTermsPrecondition,
  type HouseTermsState,
} from '../../../contract/moves/house-terms'
import type { Tenant } from '../../db/tenant'
import { refusals, wrongHouseTermsState } from './house-terms.errors'

type Actor = Pick<Tenant, 'side' | 'roles'>

const candidates = ({ side, roles }: Actor, name: HouseTermsMoveName, from: HouseTermsState | null) =>
  houseTermsMoves.filter(
    (move) =>
      move.name === name &&
      move.side === side &&
      allows(move.permission, side, roles) &&
      (from === null ? move.from.length === 0 : (move.from as readonly string[]).includes(from)),
  )

/** The row of the table of moves that may be made here and now; refuses with the condition that does not hold. */
export function permittedMove(
  actor: Actor,
  name: HouseTermsMoveName,
  from: HouseTermsState | null,
  facts: Facts<HouseTermsPrecondition>,
): HouseTermsMove {
  const { move, refused } = chooseMove<HouseTermsPrecondition, HouseTermsMove>(
    candidates(actor, name, from),
    facts,
  )
  if (move) return move
  throw refused ? refusals[refused]() : wrongHouseTermsState(from ?? 'draft')
}

/** Moves that the person may make with a version as it stands. */
export const movesOf = (
  actor: Actor,
  from: HouseTermsState,
  facts: Facts<HouseTermsPrecondition>,
): HouseTermsMoveName[] =>
  houseTermsMoveNames.filter(
    (name) =>
      chooseMove<HouseTermsPrecondition, HouseTermsMove>(candidates(actor, name, from), facts).move !== null,
  )
