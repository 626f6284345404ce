import { offerRefusals, type offerHouseTerms } from '../../../contract/house-terms'
import type { AnswerInputOf, BodyOf } from '../../../contract/define'
import type { Tenant } from '../../db/tenant'
import { notFound, ProblemError } from '../../errors'
import { begin } from '../agreements/agreements.draft.service'
import { permittedMove } from './house-terms.move'
import { factsOf } from './house-terms.read.service'
import { selectOwn } from './house-terms.repository'
import { recordMove } from './house-terms.service'

type Answer = AnswerInputOf<typeof offerHouseTerms>
type Refusal = Answer['refused'][number]['code']

/**
 * Proposes a published version to suppliers, each for the whole relationship. Where one cannot be made, the others
 * are made all the same, and the reason is told.
 */
export async function offer(
  tenant: Tenant,
  houseTermsId: string,
  { relationshipIds, effectiveOn, comment }: BodyOf<typeof offerHouseTerms>,
): Promise<Answer> {
  const row = await selectOwn(tenant, houseTermsId)
  if (!row) throw notFound('version of house terms')
  const move = permittedMove(tenant, 'offer', row.state, factsOf(row))
  const answer: Answer = { offered: [], refused: [] }
  // In the order of their ids, as everywhere where several are locked.
  for (const relationshipId of [...new Set(relationshipIds)].sort()) {
    const proposal = {
      relationshipId,
      partId: null,
      characteristicId: null,
      houseTermsId,
      caseOf: null,
      clauses: row.clauses,
      terms: row.terms,
      effectiveOn,
      comment,
      send: true,
    }
    try {
      const agreement = await tenant.tx.transaction((tx) => begin({ ...tenant, tx }, proposal))
      const [version] = agreement.versions
      if (version) answer.offered.push({ relationshipId, agreementId: agreement.id, versionId: version.id })
    } catch (error) {
      answer.refused.push({ relationshipId, code: refusalOf(error) })
    }
  }
  if (answer.offered.length > 0)
    recordMove(tenant, move, row, { relationshipIds: answer.offered.map((each) => each.relationshipId) })
  return answer
}

/** Why nothing was proposed in one relationship. A day that has passed is wrong for all, and told at its field. */
function refusalOf(error: unknown): Refusal {
  if (!(error instanceof ProblemError)) throw error
  const known = offerRefusals.find((code) => code === error.code)
  if (known) return known
  const fields = error.errors?.map(({ path }) => path) ?? []
  if (fields.includes('body.relationshipId')) return 'not-found'
  if (fields.some((path) => path.startsWith('body.clauses'))) return 'clauses-cannot-be-agreed'
  throw error
}
