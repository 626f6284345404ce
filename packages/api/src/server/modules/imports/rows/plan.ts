import { sha256 } from '../../record/record.append'
import type { ImportThing } from '../../../../contract/imports'
import type { Tenant } from '../../../db/tenant'
import type { RowProblem } from './fields'

/** One thing that the file makes new, changes or finds as it is. */
export interface Planned extends ImportThing {
  /** Ids and versions of what it rests on, so that a change meanwhile is seen. */
  restsOn: readonly (string | number | null)[]
  /** Does it through the service of the single act; absent where nothing is to be done. */
  act?: (tenant: Tenant) => Promise<unknown>
}

/** What a file would do: the things in the order in which they are done, and every bad row. */
export interface Plan {
  things: Planned[]
  problems: RowProblem[]
  /** Rows that hold anything. */
  rows: number
}

const short = (text: string) => sha256(text).slice(0, 8)

/** What the things of each row rest on, as `row:hash`, one after the other. */
export function basisOf({ things }: Pick<Plan, 'things'>): string {
  const byRow = new Map<number, string[]>()
  for (const { row, what, label, outcome, differences, restsOn } of things) {
    const told = JSON.stringify([what, label, outcome, differences, restsOn])
    byRow.set(row, [...(byRow.get(row) ?? []), told])
  }
  return [...byRow].map(([row, told]) => `${row}:${short(told.join())}`).join(' ')
}

/** Rows of which the two differ. */
export function changedRows(before: string, now: string): number[] {
  const read = (basis: string) =>
    new Map(
      basis
        .split(' ')
        .filter(Boolean)
        .map((each) => each.split(':') as [string, string]),
    )
  const [old, fresh] = [read(before), read(now)]
  const rows = new Set([...old.keys(), ...fresh.keys()])
  return [...rows]
    .filter((row) => old.get(row) !== fresh.get(row))
    .map(Number)
    .sort((a, b) => a - b)
}
