import type { AnswerInputOf, BodyOf, QueryOf } from '../../../contract/define'
import type {
  addRevision,
  changePart,
  createPart,
  listParts,
  listRevisions,
  readPart,
} from '../../../contract/parts'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { uniqueOr409 } from '../../db/unique'
import { changedMeanwhile, invalidInput, notFound } from '../../errors'
import { reopening } from '../standing/standing.reopen.service'
import { customerStandsBehind, isArchived, isNotArchived } from './parts.errors'
import {
  hasConfirmedCharacteristic,
  insertPart,
  selectPart,
  selectParts,
  selectRelationship,
  updatePart,
  type PartListed,
  type PartRow,
} from './parts.repository'
import { copyCharacteristics, insertRevision, selectRevisions } from './revisions.repository'

type PartAnswer = AnswerInputOf<typeof readPart>

const taken = {
  parts_relationship_number: {
    path: 'body.number',
    message: 'This part number is already entered for this customer. Look among the archived ones too.',
  },
  part_revisions_label: {
    path: 'body.label',
    message: 'This part already has a revision of that name. Enter another.',
  },
}

/** One page of this side's part numbers. */
export async function listOfParts(tenant: Tenant, query: QueryOf<typeof listParts>) {
  return paged(
    query,
    (page) => selectParts(tenant, page),
    (rows) => rows.map(asAnswer),
  )
}

/** One part number; 404 where this organisation does not have it on this side. */
export async function partById(tenant: Tenant, partId: string): Promise<PartAnswer> {
  return asAnswer(await listedPart(tenant, partId))
}

/** The row of a part; 404 where this organisation does not have it on this side. */
export async function partRow(tenant: Tenant, partId: string): Promise<PartRow> {
  return (await listedPart(tenant, partId)).part
}

/** Enters a part number with its first revision. */
export async function enterPart(tenant: Tenant, body: BodyOf<typeof createPart>): Promise<PartAnswer> {
  const relationship = await selectRelationship(tenant, body.relationshipId)
  if (!relationship)
    throw invalidInput([
      { path: 'body.relationshipId', message: 'Choose one of your customers or suppliers from the list.' },
    ])
  const { number, supplierNumber, name, revision } = body
  const part = await uniqueOr409(taken, () =>
    insertPart(tenant, {
      ...relationship,
      number,
      supplierNumber,
      name,
      createdAt: tenant.now,
      createdBy: tenant.userId,
    }),
  )
  await insertRevision(tenant, part, revision)
  recordPart(tenant, part, 'part.created', { number, supplierNumber, name, revision })
  return partById(tenant, part.id)
}

/** Changes number and names. The supplier's own number is the supplier's alone. */
export async function changePartOf(
  tenant: Tenant,
  partId: string,
  { expectedVersion, ...values }: BodyOf<typeof changePart>,
): Promise<PartAnswer> {
  refusePartChange(tenant, await partRow(tenant, partId), values)
  const updated = await uniqueOr409(taken, () => updatePart(tenant, partId, expectedVersion, values))
  if (!updated) throw changedMeanwhile('part')
  recordPart(tenant, updated, 'part.changed', { ...values })
  return partById(tenant, partId)
}

/** Refuses a change that a part does not allow as it stands. */
export function refusePartChange(
  tenant: Tenant,
  part: PartRow,
  { supplierNumber }: Pick<PartRow, 'supplierNumber'>,
): void {
  if (part.archivedAt) throw isArchived('part')
  if (tenant.side === 'customer' && supplierNumber !== part.supplierNumber)
    throw invalidInput([
      { path: 'body.supplierNumber', message: 'This is the supplier’s own number; only they change it.' },
    ])
}

/** Takes a part out of the lists. What the customer has confirmed, only the customer archives. */
export async function archivePartOf(
  tenant: Tenant,
  partId: string,
  expectedVersion: number,
): Promise<PartAnswer> {
  const part = await partRow(tenant, partId)
  if (part.archivedAt) throw isArchived('part')
  if (tenant.side === 'supplier' && (await hasConfirmedCharacteristic(tenant, part)))
    throw customerStandsBehind('part')
  return setArchived(tenant, part, expectedVersion, tenant.now)
}

export async function restorePartOf(
  tenant: Tenant,
  partId: string,
  expectedVersion: number,
): Promise<PartAnswer> {
  const part = await partRow(tenant, partId)
  if (!part.archivedAt) throw isNotArchived('part')
  return setArchived(tenant, part, expectedVersion, null)
}

/** One page of a part's revisions. */
export async function revisionsOfPart(tenant: Tenant, partId: string, query: QueryOf<typeof listRevisions>) {
  const part = await partRow(tenant, partId)
  return paged(
    query,
    (page) => selectRevisions(tenant, part, page),
    (rows) => rows.map(({ revision }) => revision),
  )
}

/**
 * Adds a revision, which becomes the current one. The copies of characteristics are new ones: what was agreed and
 * proved for the old revision stays with it, and acceptances are reopened until the customer carries them over.
 */
export async function addRevisionTo(
  tenant: Tenant,
  partId: string,
  { label, copyCharacteristics: copy, expectedVersion }: BodyOf<typeof addRevision>,
): Promise<PartAnswer> {
  const { part, revision: before } = await listedPart(tenant, partId)
  if (part.archivedAt) throw isArchived('part')
  // The part's own version is raised, so that two revisions cannot be added at once from the same view.
  if (!(await updatePart(tenant, partId, expectedVersion, {}))) throw changedMeanwhile('part')
  await reopening(tenant, part, label, async () => {
    const revision = await uniqueOr409(taken, () => insertRevision(tenant, part, label))
    const copied = copy ? await copyCharacteristics(tenant, before, revision) : 0
    recordPart(tenant, part, 'part.revision-added', { revisionId: revision.id, label, copied })
  })
  return partById(tenant, partId)
}

async function listedPart(tenant: Tenant, partId: string): Promise<PartListed> {
  const row = await selectPart(tenant, partId)
  if (!row) throw notFound('part')
  return row
}

async function setArchived(
  tenant: Tenant,
  part: PartRow,
  expectedVersion: number,
  archivedAt: string | null,
): Promise<PartAnswer> {
  if (!(await updatePart(tenant, part.id, expectedVersion, { archivedAt }))) throw changedMeanwhile('part')
  recordPart(tenant, part, archivedAt ? 'part.archived' : 'part.restored', { number: part.number })
  return partById(tenant, part.id)
}

function recordPart(tenant: Tenant, part: PartRow, type: string, data: Record<string, unknown>): void {
  const { relationshipId: id, supplierOrgId, customerOrgId } = part
  tenant.record({
    type,
    relationship: { id, supplierOrgId, customerOrgId },
    subject: { type: 'part', id: part.id },
    data,
  })
}

function asAnswer({ part, revision, supplierName, customerName, ...counts }: PartListed): PartAnswer {
  const { characteristics, unconfirmed } = counts
  return { ...part, currentRevision: revision, supplierName, customerName, characteristics, unconfirmed }
}
