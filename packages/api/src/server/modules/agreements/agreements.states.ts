import { sql, type SQL } from 'drizzle-orm'
import type { Side } from '../../../contract/access'
import type { AgreementVersionState } from '../../../contract/moves/agreement-version'
import type { Tenant } from '../../db/tenant'
import { relationships } from '../relationships/relationships.table'
import { agreementVersions } from './agreements.table'

/**
 * What follows from dates, as SQL over a query that joins the relationship; one home for lists and single reads.
 */

/** Today in the relationship's time zone. */
export const todayOf = ({ now }: Tenant): SQL<string> =>
  sql<string>`(${now}::timestamptz at time zone ${relationships.timeZone})::date`

/** The state of a version as both sides see it today. */
export function stateToday(tenant: Tenant): SQL<AgreementVersionState> {
  const { state, effectiveOn, number, relationshipId, agreementId } = agreementVersions
  const today = todayOf(tenant)
  return sql<AgreementVersionState>`case
    when ${state} = 'agreed' and ${effectiveOn} < ${today} then 'lapsed'
    when ${state} = 'signed' and exists (
      select 1 from agreement_versions later where later.relationship_id = ${relationshipId}
        and later.agreement_id = ${agreementId} and later.state = 'signed' and later.number > ${number}
        and later.effective_on <= ${today}) then 'superseded'
    when ${state} = 'signed' and ${effectiveOn} <= ${today} then 'in-force'
    else ${state} end`
}

/** Whether the version waits for the side: for its answer, its signature, or the sending of its own draft. */
export const waitsOnSide = (state: SQL, proposedBy: SQL, side: Side): SQL<boolean> => sql<boolean>`case
    when ${state} = 'draft' then ${agreementVersions.begunBy} = ${side}
    when ${state} in ('proposed', 'countered') then ${proposedBy} <> ${side}
    when ${state} = 'agreed' then not exists (
      select 1 from agreement_signatures g where g.relationship_id = ${agreementVersions.relationshipId}
        and g.version_id = ${agreementVersions.id} and g.side = ${side})
    else false end`
