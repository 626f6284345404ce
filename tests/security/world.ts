import {
  agreements,
  gauges,
  houseTerms,
  reviews,
  roles,
  submissions,
  type Role,
  type Side,
} from '@evenrule/api/contract'
import type { Organisation, Person } from '../api/harness'
import { clauses, startStory } from '../api/prepared'

/** Ids for the parameters of paths, and for fields of bodies, by their name. */
export type Samples = Record<string, string>

/**
 * A supplier and a customer with rows in every table, members for every role, and two attackers: a competitor, who
 * supplies the same customer, and a foreigner, who has nothing to do with either. Both hold every role at home.
 */
export async function startWorld() {
  const story = await startStory()
  const { harness, relationship } = story
  const { supplier, customer, rivals } = story.organisations
  const victims: Record<Side, Organisation> = { supplier, customer }

  const join = (organisation: Organisation, person: Person, held: readonly Role[]) =>
    harness.owner.query(
      `insert into memberships (org_id, user_id, roles, created_at) values ($1, $2, $3, $4)
       on conflict (org_id, user_id) do update set roles = excluded.roles`,
      [organisation.id, person.id, held, harness.now()],
    )
  const insider = await harness.person('Every Role')
  const withOnly = {} as Record<Role, Person>
  for (const role of roles) withOnly[role] = await harness.person(`Only ${role}`)
  for (const organisation of Object.values(victims)) {
    await join(organisation, insider, roles)
    for (const role of roles) await join(organisation, withOnly[role], [role])
  }
  const competitor = story.people.stranger
  await join(rivals, competitor, roles)
  await harness.relationship(rivals, customer)
  // One in which nothing has happened yet, so that its chain has no row.
  const quiet = await harness.relationship(customer, supplier)
  const foreigner = await harness.person('Some Foreigner')
  const abroad = await harness.organisation('Abroad', [[foreigner, [...roles]]])

  // Something in every table: an agreement, a study, a challenged and an accepted submission, a returned draft.
  await story
    .by('engineer')
    .call(
      gauges.createGauge,
      {},
      { body: { code: 'BG-0', name: 'Spare', resolution: '0.01', unit: 'mm', site: 'Hall 1' } },
    )
  const task = await story.ready()
  const seen = async (id: string) => {
    const { rowVersion: expectedVersion, sha256 } = await story.read('quality', id)
    return { expectedVersion, sha256 }
  }
  const accepted = await story.submission(task.id, 'submitted')
  await story.by('quality').call(reviews.accept, { submissionId: accepted }, { body: await seen(accepted) })
  const challenged = await story.submission(task.id, 'submitted')
  const { expectedVersion } = await seen(challenged)
  await story.by('quality').call(
    reviews.openChallenge,
    { submissionId: challenged },
    {
      body: { expectedVersion, clauseKey: 'bias/mean', reasonKind: 'result', text: 'Is it still so?' },
    },
  )
  const other = await story.ready()
  const returned = await story.submission(other.id, 'for-signature')
  await story
    .by('approver')
    .call(
      submissions.returnSubmission,
      { submissionId: returned },
      { body: { expectedVersion: 2, note: 'Which fixture was it?' } },
    )

  // A negotiation in which the other side has commented and marked, begun from published house terms.
  const { id: houseTermsId } = await story
    .by('quality')
    .call(houseTerms.beginHouseTerms, {}, { body: { clauses, words: 'What we ask of everybody.' } })
  await story
    .by('quality')
    .call(houseTerms.publishHouseTerms, { houseTermsId }, { body: { expectedVersion: 1 } })
  const { id: agreementId, versions } = await story.by('quality').call(
    agreements.beginVersion,
    {},
    {
      body: {
        ...{ relationshipId: relationship.id, partId: other.part.id, houseTermsId, clauses },
        ...{ effectiveOn: '2027-03-01', send: true },
      },
    },
  )
  const open = { agreementId, versionId: versions[0]?.id ?? '' }
  const effective = versions[0]?.acceptance?.items.find(({ kind }) => kind === 'effective-on')
  const about = { kind: 'effective-on' }
  await story
    .by('engineer')
    .call(agreements.commentOnRound, open, { body: { round: 1, about, text: 'March is early.' } })
  await story
    .by('engineer')
    .call(agreements.markAccepted, open, {
      body: { round: 1, items: [{ about, sha256: effective?.sha256 }] },
    })

  /** The first row of a query, as samples. */
  const one = async (text: string, ...values: unknown[]): Promise<Samples> => {
    const { rows } = await harness.owner.query<Samples>(text, values)
    if (!rows[0]) throw new Error(`The prepared world has no row for: ${text}`)
    return rows[0]
  }
  const shared: Samples = {
    relationshipId: relationship.id,
    otherRelationshipId: quiet.id,
    partId: task.part.id,
    revisionId: task.part.currentRevision.id,
    characteristicId: task.characteristic.id,
    taskId: task.id,
    gaugeId: task.gauge.id,
    standardId: task.standard.id,
    studyId: task.study.id,
    revision: '1',
    submissionId: challenged,
    userId: story.people.reader.id,
    chainId: relationship.id,
    houseTermsId,
    ...(await one(`select id as "challengeId" from challenges where submission_id = $1`, challenged)),
    ...(await one(`select id as "fileId" from files where org_id = $1 limit 1`, supplier.id)),
    ...(await one(
      `select id as "submissionFileId" from submission_files where submission_id = $1 limit 1`,
      challenged,
    )),
    ...(await one(
      `select agreement_id as "agreementId", id as "versionId" from agreement_versions where relationship_id = $1 and number is not null limit 1`,
      relationship.id,
    )),
  }
  const ofSide = async (side: Side): Promise<Samples> => ({
    ...shared,
    organisationId: victims[side].id,
    ...(await one(
      `select id as "messageId" from messages where org_id = $1 and user_id = $2 and side = $3 limit 1`,
      victims[side].id,
      insider.id,
      side,
    )),
  })
  return {
    harness,
    victims,
    insider,
    withOnly,
    attackers: [
      { name: 'a competitor', person: competitor, home: rivals },
      { name: 'a foreigner', person: foreigner, home: abroad },
    ],
    samples: { supplier: await ofSide('supplier'), customer: await ofSide('customer') },
    /** Signs everybody in afresh, for routes that take a signature. */
    freshen() {
      for (const person of [insider, competitor, foreigner, ...Object.values(withOnly)])
        harness.signInAfresh(person)
    },
    stop: () => story.stop(),
  }
}

export type World = Awaited<ReturnType<typeof startWorld>>
