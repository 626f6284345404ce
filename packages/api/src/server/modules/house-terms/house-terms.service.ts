import type { AnswerInputOf, BodyOf } from '../../../contract/define'
import type {
  beginHouseTerms,
  discardHouseTerms,
  HouseTermsConflict,
  saveHouseTerms,
} from '../../../contract/house-terms'
import type { HouseTermsMove } from '../../../contract/moves/house-terms'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, notFound, withCurrent, type ProblemError } from '../../errors'
import { canonicalText, sha256 } from '../record/record.append'
import { permittedMove } from './house-terms.move'
import { factsOf, houseTermsById } from './house-terms.read.service'
import {
  deleteDraft,
  highestNumber,
  insertHouseTerms,
  lockHouseTerms,
  selectOwn,
  selectOwnDraft,
  updateHouseTerms,
  type HouseTermsRow,
} from './house-terms.repository'

/** Begins a draft of the next version. */
export async function begin(tenant: Tenant, content: BodyOf<typeof beginHouseTerms>) {
  await lockHouseTerms(tenant)
  const known = await selectOwnDraft(tenant)
  const move = await orWith(tenant, known?.id, () =>
    permittedMove(tenant, 'keep-draft', null, { 'no-draft': known === undefined }),
  )
  const row = await insertHouseTerms(tenant, {
    ...content,
    orgId: tenant.organisationId,
    state: 'draft',
    createdAt: tenant.now,
    savedAt: tenant.now,
    savedBy: tenant.userId,
  })
  recordMove(tenant, move, row)
  return houseTermsById(tenant, row.id)
}

/** Changes the draft as it was when its writer opened it. */
export async function save(
  tenant: Tenant,
  houseTermsId: string,
  { expectedVersion, ...content }: BodyOf<typeof saveHouseTerms>,
) {
  const row = await open(tenant, houseTermsId, expectedVersion)
  const move = permittedMove(tenant, 'keep-draft', row.state, factsOf(content))
  const saved = await updateHouseTerms(tenant, row, {
    ...content,
    savedAt: tenant.now,
    savedBy: tenant.userId,
  })
  if (!saved) throw changedMeanwhile('draft')
  recordMove(tenant, move, saved)
  return houseTermsById(tenant, houseTermsId)
}

/** Publishes the draft under the next number; it never changes from then on. */
export async function publish(tenant: Tenant, houseTermsId: string, expectedVersion: number) {
  const row = await open(tenant, houseTermsId, expectedVersion)
  const move = permittedMove(tenant, 'publish', row.state, factsOf(row))
  const number = (await highestNumber(tenant)) + 1
  const { clauses, terms, words } = row
  const text = canonicalText({
    format: 'evenrule.house-terms/1',
    customer: tenant.organisationId,
    number,
    clauses,
    terms,
    words,
  })
  const published = await updateHouseTerms(tenant, row, {
    state: 'published',
    number,
    text,
    sha256: sha256(text),
    publishedAt: tenant.now,
    savedBy: tenant.userId,
  })
  if (!published) throw changedMeanwhile('draft')
  recordMove(tenant, move, published, { sha256: published.sha256 })
  return houseTermsById(tenant, houseTermsId)
}

/** Discards the draft. */
export async function discard(
  tenant: Tenant,
  houseTermsId: string,
  expectedVersion: number,
): Promise<AnswerInputOf<typeof discardHouseTerms>> {
  const row = await open(tenant, houseTermsId, expectedVersion)
  const move = permittedMove(tenant, 'discard-draft', row.state, factsOf(row))
  await deleteDraft(tenant, row.id)
  recordMove(tenant, move, row)
  return { discarded: true }
}

/** One own version, with all changes of this customer's house terms waiting until the transaction ends. */
async function open(tenant: Tenant, houseTermsId: string, expectedVersion: number): Promise<HouseTermsRow> {
  await lockHouseTerms(tenant)
  const row = await selectOwn(tenant, houseTermsId)
  if (!row) throw notFound('version of house terms')
  if (row.rowVersion === expectedVersion) return row
  throw withCurrent(changedMeanwhile('draft'), await conflict(tenant, houseTermsId))
}

const conflict = async (tenant: Tenant, houseTermsId: string): Promise<HouseTermsConflict> => ({
  draft: await houseTermsById(tenant, houseTermsId),
})

/** A refusal carries the draft there is, so that one goes on there. */
async function orWith<T>(tenant: Tenant, draftId: string | undefined, work: () => T): Promise<T> {
  try {
    return work()
  } catch (error) {
    if (draftId === undefined) throw error
    throw withCurrent(error as ProblemError, await conflict(tenant, draftId))
  }
}

/** House terms are the customer's own: their moves stand in its journal. */
export function recordMove(
  tenant: Tenant,
  move: Pick<HouseTermsMove, 'event'>,
  { id, number }: Pick<HouseTermsRow, 'id' | 'number'>,
  data: Record<string, unknown> = {},
): void {
  tenant.record({ type: move.event, subject: { type: 'house-terms', id }, data: { number, ...data } })
}
