import {
  agreements,
  calibrations,
  gaugeEvents,
  gauges,
  houseTerms,
  invitations,
  requests,
  parts,
  reviews,
  roles,
  standings,
  submissions,
  type Role,
  type Side,
} from '@evenrule/api/contract'
import { openDatabase } from '../../packages/api/src/server/db/database'
import { tellReminders } from '../../packages/api/src/server/modules/reminders/reminders.service'
import type { Organisation, Person } from '../api/harness'
import { clauses, startStory } from '../api/prepared'
import { importRow } from './world.imports'
import { reviewRows } from './world.reviews'

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
  const request = await story.by('quality').call(
    requests.askForProof,
    {},
    {
      body: {
        ...{ relationshipId: relationship.id, taskIds: [task.id], dueOn: '2027-03-01' },
        ...{ occasion: 'yearly', words: 'For the yearly review.' },
      },
    },
  )
  const accepted = await story.submission(task.id, 'submitted')
  await story.by('quality').call(reviews.accept, { submissionId: accepted }, { body: await seen(accepted) })
  const challenged = await story.submission(task.id, 'submitted')
  const { expectedVersion } = await seen(challenged)
  await story.by('quality').call(
    reviews.openChallenge,
    { submissionId: challenged },
    {
      body: {
        ...{ expectedVersion, target: { kind: 'clause', clauseKey: 'bias/mean' }, reasonKind: 'verdict' },
        ...{ text: 'Is it still so?', dueOn: '2026-12-01' },
      },
    },
  )
  // What the acceptances follow from: an event, a reinstatement, a carry-over, a calibration without a certificate.
  const later = () => harness.moveClock(new Date(harness.now().getTime() + 60_000))
  later()
  await story
    .by('engineer')
    .call(
      gaugeEvents.reportGaugeEvent,
      { gaugeId: task.gauge.id },
      { body: { kind: 'repaired', happenedOn: '2026-11-02', words: 'A new guide.' } },
    )
  later()
  await story
    .by('approves')
    .call(standings.reinstate, { submissionId: accepted }, { body: { words: 'Shown by a master.' } })
  const revised = await story.ready()
  const carried = await story.submission(revised.id, 'submitted')
  await story.by('quality').call(reviews.accept, { submissionId: carried }, { body: await seen(carried) })
  const { currentRevision } = await story
    .by('quality')
    .call(
      parts.addRevision,
      { partId: revised.part.id },
      { body: { label: 'B', copyCharacteristics: true, expectedVersion: 1 } },
    )
  await story
    .by('approves')
    .call(
      standings.carryOver,
      { partId: revised.part.id },
      { body: { revisionId: currentRevision.id, submissionIds: [carried] } },
    )
  const { id: calibrationId } = await story.by('engineer').call(
    calibrations.addGaugeCalibration,
    { gaugeId: revised.gauge.id },
    {
      body: {
        ...{ certificateNumber: 'late', calibratedOn: '2026-10-01', dueOn: '2027-10-01' },
        foundWithinLimits: true,
      },
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
  await story.by('engineer').call(agreements.markAccepted, open, {
    body: { round: 1, items: [{ about, sha256: effective?.sha256 }] },
  })

  // Invitations that are open: of a member on either side, and of a supplier.
  const invite = (side: Side, email: string) =>
    harness
      .as(side, insider)
      .call(
        invitations.inviteMember,
        { organisationId: victims[side].id },
        { body: { email, roles: ['reader'] } },
      )
  const invited: Record<Side, { id: string }> = {
    supplier: await invite('supplier', 'one@people.example'),
    customer: await invite('customer', 'two@people.example'),
  }
  const invitedSupplier = await harness
    .as('customer', insider)
    .call(
      invitations.inviteSupplier,
      { organisationId: customer.id },
      { body: { email: 'three@people.example', supplierName: 'Three' } },
    )

  // The worker's chore, under a clock that runs ahead to the days before the request is due.
  const system = openDatabase(harness.urlAs('evenrule_system'), 1)
  const ahead = () => new Date('2027-02-25T09:00:00.000Z')
  await tellReminders({ database: system.database, logger: harness.services.logger, clock: ahead })
  await system.pool.end()

  const ofReviews = await reviewRows(story)

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
    calibrationId,
    standardId: task.standard.id,
    studyId: task.study.id,
    revision: '1',
    requestId: request.id,
    submissionId: challenged,
    userId: story.people.reader.id,
    chainId: relationship.id,
    houseTermsId,
    supplierInvitationId: invitedSupplier.id,
    ...ofReviews,
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
    invitationId: invited[side].id,
    importId: await importRow(story, side === 'supplier' ? 'engineer' : 'quality'),
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
