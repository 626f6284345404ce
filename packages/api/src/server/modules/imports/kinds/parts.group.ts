import { createCharacteristic } from '../../../../contract/characteristics'
import type { BodyOf } from '../../../../contract/define'
import type { Tenant } from '../../../db/tenant'
import type { CharacteristicInPart } from '../../parts/characteristics.repository'
import { refuseChange } from '../../parts/characteristics.service'
import { isArchived } from '../../parts/parts.errors'
import { refusePartChange } from '../../parts/parts.service'
import { CarriedTexts, type Carried } from '../rows/carry'
import { keptDecimal, limitsAround } from '../rows/decimals'
import { refusalOf } from '../rows/refused'
import type { ExistingPart } from './parts.existing'
import type { PartRowRead, ReadCharacteristic } from './parts.read'

export type EnteredCharacteristic = BodyOf<typeof createCharacteristic>

/** A row of a part with what counts for it, taken over from the rows above where its own cells are empty. */
export interface SettledPartRow {
  read: PartRowRead
  row: number
  name: Carried | null
  supplierNumber: Carried | null
  revision: Carried | null
  takesFrom: number[]
  entered: { values: EnteredCharacteristic; stands: CharacteristicInPart | undefined } | null
}

/**
 * Settles the rows of one part against each other and against what is there: what a cell leaves open, what contradicts,
 * what stands twice, and what the rules of the single acts refuse. Problems are noted at the rows' cells.
 */
export async function settlePart(
  tenant: Tenant,
  rows: readonly PartRowRead[],
  existing: ExistingPart | undefined,
): Promise<SettledPartRow[]> {
  const carried = new CarriedTexts()
  const first = new Map<string, number>()
  const settled: SettledPartRow[] = []
  for (const read of rows) {
    const { cells } = read
    const name = carried.take(cells, 'name', read.name)
    const supplierNumber = carried.take(cells, 'supplierNumber', read.supplierNumber)
    const revision = carried.take(cells, 'revision', read.revision, { changing: true })
    const archived =
      existing &&
      (await refusalOf(() =>
        refusePartChange(tenant, existing.part, {
          supplierNumber: read.supplierNumber ?? existing.part.supplierNumber,
        }),
      ))
    if (archived) cells.refuse(existing.part.archivedAt ? 'number' : 'supplierNumber', archived)
    if (!existing && !name) cells.refuse('name', 'This part is new. Enter its name.')
    if (!existing && !revision) cells.refuse('revision', 'This part is new. Enter its revision.')
    const label = revision?.value ?? existing?.current.label ?? ''
    const row = cells.row
    settled.push({
      ...{ read, row, name, supplierNumber, revision },
      takesFrom: (existing ? [revision] : [name, supplierNumber, revision]).flatMap((each) =>
        each ? [each.row] : [],
      ),
      entered: read.characteristic && (await characteristicOf(tenant, read, label, existing, first)),
    })
  }
  return settled
}

async function characteristicOf(
  tenant: Tenant,
  { cells, characteristic }: PartRowRead,
  label: string,
  existing: ExistingPart | undefined,
  first: Map<string, number>,
): Promise<SettledPartRow['entered']> {
  if (!characteristic) return null
  const key = `${label} ${characteristic.number}`
  const twice = first.get(key)
  if (twice !== undefined)
    cells.refuse(
      'characteristic',
      `Row ${twice} enters this characteristic already. Remove one of the two rows.`,
    )
  else first.set(key, cells.row)
  const revisionId = existing?.revisions.find((each) => each.label === label)?.id
  const stands = existing?.characteristics.get(`${revisionId} ${characteristic.number}`)
  const values = cells.check(
    createCharacteristic.body,
    mergedWith(cells, characteristic, stands?.characteristic),
    {
      number: 'characteristic',
      name: 'characteristicName',
    },
  )
  if (!values) return null
  if (stands?.characteristic.archivedAt) cells.refuse('characteristic', isArchived('characteristic').message)
  else if (stands && isChanged(stands, values)) {
    const refused = await refusalOf(() => refuseChange(tenant, stands, values))
    if (refused) cells.refuse(null, refused)
  }
  return { values, stands }
}

/** Empty cells leave what stands; limits count together, so that one of them can be none. */
function mergedWith(
  cells: PartRowRead['cells'],
  read: ReadCharacteristic,
  stands: CharacteristicInPart['characteristic'] | undefined,
) {
  const nominal = keptDecimal(stands?.nominal, read.nominal) ?? stands?.nominal ?? null
  if (read.tolerance !== null && nominal === null)
    cells.refuse('nominal', 'Enter the nominal that the tolerance lies around.')
  const limits =
    read.tolerance !== null && nominal !== null
      ? limitsAround(nominal, read.tolerance)
      : read.lowerLimit !== null || read.upperLimit !== null || !stands
        ? read
        : stands
  return {
    number: read.number,
    name: read.name ?? stands?.name ?? '',
    nominal,
    lowerLimit: keptDecimal(stands?.lowerLimit, limits.lowerLimit),
    upperLimit: keptDecimal(stands?.upperLimit, limits.upperLimit),
    unit: read.unit ?? stands?.unit ?? '',
    class: read.class ?? stands?.class ?? 'ordinary',
    processStandardDeviation:
      keptDecimal(stands?.processStandardDeviation, read.processStandardDeviation) ??
      stands?.processStandardDeviation ??
      null,
  }
}

export const comparedFields = [
  'name',
  'nominal',
  'lowerLimit',
  'upperLimit',
  'unit',
  'class',
  'processStandardDeviation',
] as const

export const isChanged = (
  { characteristic }: CharacteristicInPart,
  entered: EnteredCharacteristic,
): boolean => comparedFields.some((field) => characteristic[field] !== entered[field])
