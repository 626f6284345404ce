import type { Tenant } from '../../../db/tenant'
import {
  selectCharacteristicsOfParts,
  type CharacteristicInPart,
} from '../../parts/characteristics.repository'
import { selectPartsNumbered, type PartListed, type PartRow } from '../../parts/parts.repository'
import { selectRevisionsOfParts, type RevisionRow } from '../../parts/revisions.repository'

/** A part that is there already, with everything of it that a file may name. */
export interface ExistingPart {
  part: PartRow
  current: RevisionRow
  revisions: RevisionRow[]
  /** By revision and number on the drawing: `<revision id> 5`. */
  characteristics: Map<string, CharacteristicInPart>
}

const atOnce = 1000

/** Asks for many things in portions that the database takes well. */
export async function inPortions<K, R>(
  keys: readonly K[],
  select: (keys: readonly K[]) => Promise<R[]>,
): Promise<R[]> {
  const found: R[] = []
  for (let at = 0; at < keys.length; at += atOnce) found.push(...(await select(keys.slice(at, at + atOnce))))
  return found
}

/** Parts of this side by the numbers that a file names. */
export async function existingParts(tenant: Tenant, numbers: ReadonlySet<string>): Promise<ExistingPart[]> {
  const listed = await inPortions([...numbers], (some) => selectPartsNumbered(tenant, some))
  const byId = new Map<string, PartListed>(listed.map((row) => [row.part.id, row]))
  const ids = [...byId.keys()]
  const found = new Map<string, ExistingPart>(
    [...byId.values()].map(({ part, revision }) => [
      part.id,
      { part, current: revision, revisions: [], characteristics: new Map() },
    ]),
  )
  for (const revision of await inPortions(ids, (some) => selectRevisionsOfParts(tenant, some)))
    found.get(revision.partId)?.revisions.push(revision)
  for (const row of await inPortions(ids, (some) => selectCharacteristicsOfParts(tenant, some)))
    found
      .get(row.part.id)
      ?.characteristics.set(`${row.characteristic.revisionId} ${row.characteristic.number}`, row)
  return [...found.values()]
}
