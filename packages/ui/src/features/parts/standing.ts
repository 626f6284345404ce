import type { characteristics, proof } from '@evenrule/api/contract'
import type { CoverageState, CoverageTick } from '../../coverage/types'
import { characteristicWords as words } from '../../strings/parts'
import { toleranceText } from './tolerance'

type Row = characteristics.Characteristic
type TickRow = Pick<
  Row,
  'number' | 'name' | 'nominal' | 'lowerLimit' | 'upperLimit' | 'unit' | 'proof' | 'runsOutOn'
>

const coverageOf: Record<proof.ProofState, CoverageState> = {
  'no-task': 'missing',
  missing: 'missing',
  refused: 'challenged',
  reopened: 'ended',
  expired: 'ended',
  lapsed: 'ended',
  suspended: 'stopped',
  challenged: 'challenged',
  'on-hold': 'stopped',
  waiting: 'missing',
  'accepted-with-conditions': 'conditional',
  accepted: 'accepted',
}

/** The ticks of a revision's coverage rule, by number on the drawing. */
export const coverageTicks = (rows: readonly TickRow[]): CoverageTick[] =>
  [...rows]
    .sort((a, b) => a.number - b.number)
    .map((row) => ({
      number: row.number,
      label: `${row.name} ${toleranceText(row)}`,
      state: row.runsOutOn === null ? coverageOf[row.proof] : 'running-out',
      runsOutOn: row.runsOutOn,
    }))

/** Whether accepted proof covers it, with conditions or without. */
export const isCovered = (proof: proof.ProofState): boolean =>
  proof === 'accepted' || proof === 'accepted-with-conditions'

export interface PartAnswer {
  /** The plain part of the answer, and the decisive one. */
  plain: string
  strong: string
}

/** What a revision asks and how much of it is proved, in words. */
export function answerOfPart(revision: string, rows: readonly Row[]): PartAnswer {
  if (rows.length === 0) return { plain: words.noneOf(revision), strong: '' }
  const count = (...states: proof.ProofState[]) => rows.filter((row) => states.includes(row.proof)).length
  const accepted = count('accepted', 'accepted-with-conditions')
  const open = [
    [count('challenged', 'refused'), words.challengedCount],
    [count('on-hold', 'suspended'), words.stoppedCount],
    [count('expired', 'lapsed', 'reopened'), words.endedCount],
    [count('waiting'), words.waitingCount],
    [count('missing', 'no-task'), words.missingCount],
  ] as const
  const rest = open.filter(([number]) => number > 0).map(([number, say]) => say(number))
  const ending = rows.filter(({ runsOutOn }) => runsOutOn !== null).length
  const safety = rows.filter((row) => row.class === 'safety').length
  return {
    plain: words.has(revision, rows.length, safety),
    strong: [
      words.accepted(accepted, rows.length) + (rest.length > 0 ? words.open(rest) : ''),
      ...(ending > 0 ? [words.runsOutCount(ending)] : []),
    ].join(' '),
  }
}
