import {
  namedElsewhere,
  type CriterionSource,
  type explainCriteria,
  type WhyNot,
} from '../../../contract/agreements'
import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import type { Terms } from '../../../contract/terms'
import type { Tenant } from '../../db/tenant'
import { taskById } from '../parts/parts.lookup.service'
import { relationshipById, todayIn } from '../relationships/relationships.lookup.service'
import {
  countElsewhere,
  selectCovering,
  selectElsewhere,
  selectFirstDayInForce,
  type CriteriaScope,
  type NamedVersion,
} from './agreements.apply.repository'
import { explain, type Candidate } from './agreements.explain'
import { selectRounds, selectSignatures, type RoundRow } from './agreements.rounds.repository'
import { namedScope } from './agreements.scope'
import { readAgreementText } from './agreements.text'
import type { Clause } from '@evenrule/metrology'

type Content = { clauses: readonly Clause[]; terms: Terms; effectiveOn: string }

/** What applies to a measuring task on a day, by default today, and why everything else does not. */
export async function explanationOfTask(
  tenant: Tenant,
  taskId: string,
  query: QueryOf<typeof explainCriteria>,
): Promise<AnswerInputOf<typeof explainCriteria>> {
  const { relationshipId, partId, characteristicId } = await taskById(tenant, taskId)
  const today = todayIn(await relationshipById(tenant, relationshipId), tenant)
  const scope: CriteriaScope = { relationshipId, partId, characteristicId, on: query.on ?? today }
  const others = await selectElsewhere(tenant, scope, namedElsewhere)
  const candidates = [
    ...(await coveringCandidates(tenant, scope)),
    ...others.map((named) => candidate(named, signedContent(named), elsewhere(named, scope))),
  ]
  return {
    on: scope.on,
    today,
    since: await selectFirstDayInForce(tenant, scope),
    relationshipId,
    partId,
    characteristicId,
    ...explain(candidates),
    elsewhere: { total: await countElsewhere(tenant, scope), named: others.length },
  }
}

/** Every version that was sent for the characteristic, with what keeps it from being in force on the day. */
async function coveringCandidates(tenant: Tenant, scope: CriteriaScope): Promise<Candidate[]> {
  const covering = await selectCovering(tenant, scope)
  const versions = covering.map(({ version }) => version)
  const rounds = await selectRounds(tenant, versions)
  const signatures = await selectSignatures(tenant, versions)
  return covering.map((named) => {
    const { version, state } = named
    const of = ({ versionId }: { versionId: string }) => versionId === version.id
    const why = outOfForce(named, covering, scope.on) ?? null
    const unsigned: WhyNot | null =
      state === 'proposed' ||
      state === 'countered' ||
      state === 'agreed' ||
      state === 'lapsed' ||
      state === 'withdrawn'
        ? { code: 'not-signed', state, signedBy: signatures.filter(of).map(({ side }) => side) }
        : null
    return candidate(named, contentOf(named, rounds.filter(of)), unsigned ?? why)
  })
}

/** Why a signed version is not the one of its agreement in force on the day; null where it is. */
function outOfForce(
  { agreement, version }: NamedVersion,
  all: readonly NamedVersion[],
  on: string,
): WhyNot | null {
  const later = all.find(
    (each) =>
      each.agreement.id === agreement.id &&
      each.version.state === 'signed' &&
      (each.version.number ?? 0) > (version.number ?? 0) &&
      (each.version.effectiveOn ?? on) <= on,
  )
  if (later) {
    const { agreementNumber, versionNumber, scope, effectiveOn } = sourceOf(
      later,
      later.version.effectiveOn ?? on,
    )
    return {
      code: 'superseded',
      by: { agreementNumber, versionNumber, scope: scope.kind },
      since: effectiveOn,
    }
  }
  const { effectiveOn } = version
  return effectiveOn !== null && effectiveOn > on ? { code: 'not-yet-in-force', effectiveOn } : null
}

const elsewhere = ({ agreement }: NamedVersion, { partId }: CriteriaScope): WhyNot => ({
  code: agreement.partId === partId ? 'other-characteristic' : 'other-part',
})

/** What a version says: the agreed text, or the last proposal that was sent. */
function contentOf(named: NamedVersion, rounds: readonly RoundRow[]): Content {
  if (named.version.text !== null) return signedContent(named)
  const last = rounds.findLast(({ state }) => state !== 'draft')
  if (!last) throw new Error('A version that was sent has no proposal.')
  return last
}

function signedContent({ version: { text } }: NamedVersion): Content {
  if (text === null) throw new Error('An agreed version lacks its text.')
  return readAgreementText(text)
}

const candidate = (
  named: NamedVersion,
  { clauses, terms, effectiveOn }: Content,
  why: WhyNot | null,
): Candidate => ({
  source: sourceOf(named, effectiveOn),
  clauses,
  terms,
  why,
})

function sourceOf(named: NamedVersion, effectiveOn: string): CriterionSource {
  const { agreement, version, state } = named
  if (agreement.number === null || version.number === null)
    throw new Error('A sent version lacks its numbers.')
  return {
    agreementId: agreement.id,
    agreementNumber: agreement.number,
    versionId: version.id,
    versionNumber: version.number,
    state,
    scope: namedScope(agreement, named),
    effectiveOn,
  }
}
