import type { Tenant } from '../../../db/tenant'
import { storeCharacteristic, storeCharacteristicChange } from '../../parts/characteristics.service'
import { addRevisionTo, changePartOf, enterPart } from '../../parts/parts.service'
import { groupBy, inChunks, turn, type MappedRows } from '../rows/context'
import { differencesOf } from '../rows/differences'
import { partnersOf, type Partner } from '../rows/partners'
import type { Plan, Planned } from '../rows/plan'
import { dependentsOf } from '../rows/settle'
import { existingParts, type ExistingPart } from './parts.existing'
import { partFields } from './parts.fields'
import { comparedFields, isChanged, settlePart, type SettledPartRow } from './parts.group'
import { readPartRow, type PartRowRead } from './parts.read'

/** What a file of parts would do: part by part, its revisions and its characteristics. */
export async function planParts(tenant: Tenant, { rows, writing }: MappedRows): Promise<Plan> {
  const partners = await partnersOf(tenant)
  const read: PartRowRead[] = []
  await inChunks(rows, (row) => read.push(readPartRow(row, writing, partners, tenant.side)))
  const groups = groupBy(
    read.filter(({ partner, number }) => partner && number),
    ({ partner, number }) => `${partner?.relationshipId} ${number}`,
  )
  const found = await existingParts(tenant, new Set(read.flatMap(({ number }) => number ?? [])))
  const existing = new Map(found.map((each) => [`${each.part.relationshipId} ${each.part.number}`, each]))
  const labels = Object.fromEntries(partFields(tenant.side).map(({ key, label }) => [key, label]))
  const things: Planned[] = []
  const problems: Plan['problems'] = []
  for (const group of groups.values()) {
    const [{ partner, number } = { partner: null, number: null }] = group
    if (!partner || number === null) continue
    const stands = existing.get(`${partner.relationshipId} ${number}`)
    await turn()
    const settled = await settlePart(tenant, group, stands)
    const bad = new Set(group.filter(({ cells }) => cells.problems.length > 0).map(({ cells }) => cells.row))
    const dependents = dependentsOf(settled, bad)
    problems.push(...dependents)
    for (const { row } of dependents) bad.add(row)
    const good = settled.filter(({ row }) => !bad.has(row))
    if (good.length > 0) things.push(...thingsOf(tenant, { partner, number, good, stands, labels }))
  }
  problems.push(...read.flatMap(({ cells }) => cells.problems))
  return { things, problems, rows: rows.length }
}

interface PartOfFile {
  partner: Partner
  number: string
  good: readonly SettledPartRow[]
  stands: ExistingPart | undefined
  labels: Readonly<Record<string, string>>
}

/** Ids and the version of the part as they become known while it is entered. */
interface Made {
  id: string
  version: number
  revisions: Map<string, string>
}

function thingsOf(tenant: Tenant, file: PartOfFile): Planned[] {
  const { good, stands, number } = file
  const made: Made = {
    id: stands?.part.id ?? '',
    version: stands?.part.rowVersion ?? 0,
    revisions: new Map(stands?.revisions.map(({ label, id }) => [label, id])),
  }
  const labels = [...new Set(good.flatMap(({ revision }) => revision?.value ?? []))]
  const [first = ''] = labels
  const added = labels.filter((label) => !made.revisions.has(label)).slice(stands ? 0 : 1)
  return [
    partThing(file, made, first),
    ...added.map((label): Planned => {
      const before = stands?.current.label
      return {
        ...{
          row: rowOf(good, label),
          what: 'revision',
          label: `${number}, revision ${label}`,
          outcome: 'new',
        },
        differences: [],
        notes: before
          ? [
              `Becomes the current revision after ${before}; what was accepted for ${before} is reopened until it is carried over.`,
            ]
          : [],
        restsOn: [stands?.current.id ?? null],
        async act(acting) {
          const answer = await addRevisionTo(acting, made.id, {
            ...{ label, copyCharacteristics: false, expectedVersion: made.version },
          })
          made.version = answer.rowVersion
          made.revisions.set(label, answer.currentRevision.id)
        },
      }
    }),
    ...good.flatMap((row) => characteristicThing(tenant, file, made, row)),
  ]
}

const rowOf = (good: readonly SettledPartRow[], label: string): number =>
  good.find(({ revision }) => revision?.value === label)?.row ?? 0

function partThing(
  { good, stands, number, partner, labels }: PartOfFile,
  made: Made,
  firstRevision: string,
): Planned {
  const said = (field: 'name' | 'supplierNumber') =>
    good.find(({ row, [field]: carried }) => carried?.row === row)?.[field]?.value
  const values = {
    number,
    name: said('name') ?? stands?.part.name ?? '',
    supplierNumber: said('supplierNumber') ?? stands?.part.supplierNumber ?? null,
  }
  const differences = stands
    ? differencesOf(pick(labels, ['name', 'supplierNumber']), stands.part, values)
    : []
  const thing = {
    ...{ row: good[0]?.row ?? 0, what: 'part' as const, label: `${number} ${values.name}`, differences },
    restsOn: [stands?.part.id ?? null, stands?.part.rowVersion ?? null],
  }
  if (!stands)
    return {
      ...thing,
      outcome: 'new',
      notes: [`For ${partner.name}, revision ${firstRevision}.`],
      async act(acting) {
        const { relationshipId } = partner
        const answer = await enterPart(acting, { relationshipId, ...values, revision: firstRevision })
        made.id = answer.id
        made.version = answer.rowVersion
        made.revisions.set(firstRevision, answer.currentRevision.id)
      },
    }
  if (differences.length === 0) return { ...thing, outcome: 'unchanged', notes: [] }
  return {
    ...thing,
    outcome: 'changed',
    notes: [],
    async act(acting) {
      const answer = await changePartOf(acting, made.id, { ...values, expectedVersion: made.version })
      made.version = answer.rowVersion
    },
  }
}

function characteristicThing(
  tenant: Tenant,
  { number: partNumber, stands: existing, labels }: PartOfFile,
  made: Made,
  { row, entered, revision }: SettledPartRow,
): Planned[] {
  if (!entered) return []
  const { values, stands } = entered
  const label = revision?.value ?? existing?.current.label ?? ''
  const thing = {
    ...{ row, what: 'characteristic' as const, label: `${partNumber} no. ${values.number} ${values.name}` },
    restsOn: [stands?.characteristic.id ?? null, stands?.characteristic.rowVersion ?? null],
  }
  if (!stands)
    return [
      {
        ...thing,
        ...{ outcome: 'new', differences: [] },
        notes: tenant.side === 'supplier' ? ['Waits for the customer’s confirmation.'] : [],
        act: (acting) =>
          storeCharacteristic(
            acting,
            { partId: made.id, revisionId: made.revisions.get(label) ?? '' },
            values,
          ),
      },
    ]
  const { characteristic } = stands
  if (!isChanged(stands, values)) return [{ ...thing, outcome: 'unchanged', differences: [], notes: [] }]
  const own = Object.fromEntries(
    comparedFields.map((field) => [field === 'name' ? 'characteristicName' : field, field]),
  )
  const shown = (from: Readonly<Record<(typeof comparedFields)[number], string | null>>) =>
    Object.fromEntries(Object.entries(own).map(([key, field]) => [key, from[field]]))
  return [
    {
      ...thing,
      outcome: 'changed',
      differences: differencesOf(pick(labels, Object.keys(own)), shown(characteristic), shown(values)),
      notes:
        tenant.side === 'supplier' && characteristic.confirmedByCustomer
          ? ['The customer confirmed it as it stands and has to confirm it again.']
          : [],
      act: (acting) =>
        storeCharacteristicChange(acting, characteristic.id, {
          ...values,
          expectedVersion: characteristic.rowVersion,
        }),
    },
  ]
}

const pick = (labels: Readonly<Record<string, string>>, keys: readonly string[]) =>
  Object.fromEntries(keys.map((key) => [key, labels[key] ?? key]))
