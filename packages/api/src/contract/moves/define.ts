import type { Permission, Side } from '../access'

/**
 * One move of an aggregate's state machine. The table of an aggregate's moves is the one home of what is
 * allowed: the service asks it before it changes a state, the apps offer only what it allows.
 */
export interface Move<State extends string, Precondition extends string = string> {
  name: string
  /** States it may start from; an empty list for the move that makes the aggregate. */
  from: readonly State[]
  to: State
  /** Who may make it: the side, and the permission a member of that side must hold. */
  side: Side
  permission: Permission
  /** Named conditions beyond the state, each checked by the service. */
  preconditions: readonly Precondition[]
  /** The type of the event it leaves in the record. */
  event: string
  /** What the button says. */
  words: string
}

/** Moves that a state allows, for those who hold the permission. */
export const possibleMoves = <M extends Move<string>>(
  moves: readonly M[],
  state: M['from'][number],
  side: Side,
  holds: (permission: Permission) => boolean,
): M[] =>
  moves.filter(
    (move) =>
      (move.from as readonly string[]).includes(state) && move.side === side && holds(move.permission),
  )

/** What a service knows of the named conditions; one that is not named does not hold. */
export type Facts<Precondition extends string> = Partial<Record<Precondition, boolean>>

/** The conditions of a move that do not hold. */
export const unmet = <P extends string>(move: Pick<Move<string, P>, 'preconditions'>, facts: Facts<P>): P[] =>
  move.preconditions.filter((each) => !facts[each])

/**
 * Of moves that may start from where the aggregate stands, the one whose conditions hold, the most particular where
 * several do. Where none may be made, what keeps the nearest one back: the first condition, and all of them.
 */
export function chooseMove<P extends string, M extends Move<string, P>>(
  candidates: readonly M[],
  facts: Facts<P>,
): { move: M | null; refused: P | null; lacking: readonly P[] } {
  const [nearest] = candidates
    .map((move) => ({ move, lacking: unmet(move, facts) }))
    .sort(
      (a, b) =>
        a.lacking.length - b.lacking.length || b.move.preconditions.length - a.move.preconditions.length,
    )
  if (!nearest) return { move: null, refused: null, lacking: [] }
  const { move, lacking } = nearest
  return { move: lacking.length === 0 ? move : null, refused: lacking[0] ?? null, lacking }
}
