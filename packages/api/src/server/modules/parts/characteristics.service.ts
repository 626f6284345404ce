import { areCompatible } from '@evenrule/metrology'
import type {
  changeCharacteristic,
  createCharacteristic,
  listCharacteristics,
  readCharacteristic,
} from '../../../contract/characteristics'
import type { AnswerInputOf, BodyOf, QueryOf } from '../../../contract/define'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { uniqueOr409 } from '../../db/unique'
import { changedMeanwhile, notFound } from '../../errors'
import {
  insertCharacteristic,
  lockCharacteristic,
  selectCharacteristic,
  selectCharacteristics,
  updateCharacteristic,
  type CharacteristicInPart,
  type CharacteristicRow,
} from './characteristics.repository'
import {
  alreadyConfirmed,
  customerStandsBehind,
  isArchived,
  isNotArchived,
  limitsFrozen,
  otherQuantity,
  spreadFrozen,
} from './parts.errors'
import { partRow } from './parts.service'
import { proofOfCharacteristics, type ProofOfCharacteristic } from './proof.service'
import { selectRevision } from './revisions.repository'

type CharacteristicAnswer = AnswerInputOf<typeof readCharacteristic>

const taken = {
  characteristics_number: {
    path: 'body.number',
    message: 'This revision already has a characteristic of that number, perhaps an archived one.',
  },
}

/** One page of characteristics with the proof they have. */
export async function listOfCharacteristics(tenant: Tenant, query: QueryOf<typeof listCharacteristics>) {
  return paged(
    query,
    (page) => selectCharacteristics(tenant, page),
    async (rows) => {
      const ids = rows.map(({ characteristic }) => characteristic.id)
      const proofs = await proofOfCharacteristics(tenant, ids)
      return rows.map((row) => asAnswer(row, proofs.get(row.characteristic.id)))
    },
  )
}

/** One characteristic; 404 where this organisation does not have it on this side. */
export async function characteristicById(
  tenant: Tenant,
  characteristicId: string,
): Promise<CharacteristicAnswer> {
  const row = await loaded(tenant, characteristicId)
  return asAnswer(row, (await proofOfCharacteristics(tenant, [characteristicId])).get(characteristicId))
}

type Entered = BodyOf<typeof createCharacteristic>

/** Enters a characteristic; what the supplier enters waits for the customer's confirmation. */
export async function enterCharacteristic(
  tenant: Tenant,
  place: { partId: string; revisionId: string },
  entered: Entered,
): Promise<CharacteristicAnswer> {
  return characteristicById(tenant, (await storeCharacteristic(tenant, place, entered)).id)
}

/** The same where many are entered and nobody reads each answer. */
export async function storeCharacteristic(
  tenant: Tenant,
  { partId, revisionId }: { partId: string; revisionId: string },
  entered: Entered,
): Promise<CharacteristicRow> {
  const part = await partRow(tenant, partId)
  if (part.archivedAt) throw isArchived('part')
  const revision = await selectRevision(tenant, part, revisionId)
  if (!revision) throw notFound('revision')
  const row = await uniqueOr409(taken, () =>
    insertCharacteristic(tenant, part, revision.id, {
      ...entered,
      confirmedByCustomer: tenant.side === 'customer',
    }),
  )
  recordCharacteristic(tenant, row, 'characteristic.created', { ...entered, revision: revision.label })
  return row
}

/**
 * Changes a characteristic. Limits on which a signed agreement rests stay as they are; what the supplier changes
 * waits for the customer again; a unit of another quantity would leave its gauges without meaning.
 */
export async function changeCharacteristicOf(
  tenant: Tenant,
  characteristicId: string,
  { expectedVersion, ...entered }: BodyOf<typeof changeCharacteristic>,
): Promise<CharacteristicAnswer> {
  await storeCharacteristicChange(tenant, characteristicId, { expectedVersion, ...entered })
  return characteristicById(tenant, characteristicId)
}

/** The same where many are changed and nobody reads each answer. */
export async function storeCharacteristicChange(
  tenant: Tenant,
  characteristicId: string,
  { expectedVersion, ...entered }: BodyOf<typeof changeCharacteristic>,
): Promise<void> {
  await lockCharacteristic(tenant, characteristicId)
  await refuseChange(tenant, await loaded(tenant, characteristicId), entered)
  const values = { ...entered, confirmedByCustomer: tenant.side === 'customer' }
  const updated = await uniqueOr409(taken, () =>
    updateCharacteristic(tenant, characteristicId, expectedVersion, values),
  )
  if (!updated) throw changedMeanwhile('characteristic')
  recordCharacteristic(tenant, updated, 'characteristic.changed', values)
}

/** Refuses a change that a characteristic does not allow as it stands. */
export async function refuseChange(
  tenant: Tenant,
  row: CharacteristicInPart,
  entered: Entered,
): Promise<void> {
  const { characteristic, part, spreadFrozenBy } = row
  if (part.archivedAt) throw isArchived('part')
  if (characteristic.archivedAt) throw isArchived('characteristic')
  const rests = restsOn(row)
  if (rests !== null && !sameLimits(characteristic, entered)) throw limitsFrozen(rests)
  const { processStandardDeviation: spread } = characteristic
  // A margin that is a share of the process variation would grow with it.
  if (spreadFrozenBy !== null && spread !== null && spread !== entered.processStandardDeviation)
    throw spreadFrozen(`Agreement ${spreadFrozenBy}`)
  if (!areCompatible(characteristic.unit, entered.unit)) {
    const measured = (await proofOfCharacteristics(tenant, [characteristic.id])).get(characteristic.id)
    if (measured && measured.tasks > 0) throw otherQuantity(entered.unit)
  }
}

/** The customer stands behind what the supplier entered. */
export async function confirmCharacteristicOf(
  tenant: Tenant,
  characteristicId: string,
  expectedVersion: number,
): Promise<CharacteristicAnswer> {
  const { characteristic } = await loaded(tenant, characteristicId)
  if (characteristic.archivedAt) throw isArchived('characteristic')
  if (characteristic.confirmedByCustomer) throw alreadyConfirmed()
  return move(tenant, characteristic, expectedVersion, 'characteristic.confirmed', {
    confirmedByCustomer: true,
  })
}

/** Takes a characteristic out of the lists. What the customer has confirmed, only the customer archives. */
export async function archiveCharacteristicOf(
  tenant: Tenant,
  characteristicId: string,
  expectedVersion: number,
): Promise<CharacteristicAnswer> {
  const { characteristic } = await loaded(tenant, characteristicId)
  if (characteristic.archivedAt) throw isArchived('characteristic')
  if (tenant.side === 'supplier' && characteristic.confirmedByCustomer)
    throw customerStandsBehind('characteristic')
  return move(tenant, characteristic, expectedVersion, 'characteristic.archived', { archivedAt: tenant.now })
}

export async function restoreCharacteristicOf(
  tenant: Tenant,
  characteristicId: string,
  expectedVersion: number,
): Promise<CharacteristicAnswer> {
  const { characteristic } = await loaded(tenant, characteristicId)
  if (!characteristic.archivedAt) throw isNotArchived('characteristic')
  return move(tenant, characteristic, expectedVersion, 'characteristic.restored', { archivedAt: null })
}

async function loaded(tenant: Tenant, characteristicId: string): Promise<CharacteristicInPart> {
  const row = await selectCharacteristic(tenant, characteristicId)
  if (!row) throw notFound('characteristic')
  return row
}

async function move(
  tenant: Tenant,
  characteristic: CharacteristicRow,
  expectedVersion: number,
  type: string,
  values: Partial<CharacteristicRow>,
): Promise<CharacteristicAnswer> {
  const updated = await updateCharacteristic(tenant, characteristic.id, expectedVersion, values)
  if (!updated) throw changedMeanwhile('characteristic')
  // A confirmation says what was confirmed; the rest says which characteristic it is.
  const { number, name, nominal, lowerLimit, upperLimit, unit, class: characteristicClass } = updated
  const limits = { nominal, lowerLimit, upperLimit, unit, class: characteristicClass }
  recordCharacteristic(tenant, updated, type, {
    number,
    name,
    ...(type === 'characteristic.confirmed' ? limits : {}),
  })
  return characteristicById(tenant, characteristic.id)
}

/** What rests on the limits as they are, by name; null where nothing does. */
const restsOn = ({ frozenBy, submittedWith }: CharacteristicInPart): string | null =>
  frozenBy !== null ? `Agreement ${frozenBy}` : submittedWith !== null ? `Submission ${submittedWith}` : null

const frozenFields = ['nominal', 'lowerLimit', 'upperLimit', 'unit', 'class'] as const

/** As entered: 24.0 and 24.000 are different texts, and a signature stands under one of them. */
const sameLimits = (
  a: Pick<CharacteristicRow, (typeof frozenFields)[number]>,
  b: Pick<CharacteristicRow, (typeof frozenFields)[number]>,
): boolean => frozenFields.every((field) => a[field] === b[field])

function recordCharacteristic(
  tenant: Tenant,
  row: CharacteristicRow,
  type: string,
  data: Record<string, unknown>,
): void {
  const { relationshipId: id, supplierOrgId, customerOrgId } = row
  tenant.record({
    type,
    relationship: { id, supplierOrgId, customerOrgId },
    subject: { type: 'characteristic', id: row.id },
    data: { partId: row.partId, ...data },
  })
}

function asAnswer(
  row: CharacteristicInPart,
  proof: ProofOfCharacteristic = { tasks: 0, proof: 'no-task', runsOutOn: null, leastFar: null },
): CharacteristicAnswer {
  const { characteristic, part, revision, isCurrent } = row
  return {
    ...characteristic,
    partNumber: part.number,
    revision: revision.label,
    currentRevision: isCurrent,
    limitsFrozen: restsOn(row) !== null,
    ...proof,
  }
}
