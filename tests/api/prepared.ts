import type { Clause } from '@evenrule/metrology'
import {
  agreements,
  calibrations,
  characteristics,
  gauges,
  parts,
  standards,
  studies,
  submissions,
  tasks,
  type EndpointShape,
} from '@evenrule/api/contract'
import type { SubmissionState } from '../../packages/api/src/contract/moves/submission'
import { startHarness, type Harness, type Organisation, type Person, type Relationship } from './harness'

/** Clauses that the readings below meet, each in its own way. */
export const clauses: Clause[] = [
  { type: 'design-minimum', parameters: { readings: 10, registeredBeforehand: true } },
  { type: 'resolution-share', parameters: { share: 0.1, base: 'tolerance' } },
  { type: 'calibration-in-date', parameters: { gauge: true, standard: true } },
  {
    type: 'bias-equivalence',
    parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
  },
]

/** Fifteen readings of a 24.000 mm ring: mean 24.0001, spread about half a micrometre. */
export const goodReadings = [
  ...['24.0003', '23.9998', '24.0001', '24.0005', '24.0000', '23.9996', '24.0002', '24.0004'],
  ...['23.9999', '24.0001', '24.0003', '23.9997', '24.0002', '24.0000', '24.0004'],
]

/** A bias of 4 µm, beyond the margin of 2.5 µm. */
export const biasedReadings = goodReadings.map((reading) => (Number(reading) + 0.004).toFixed(4))

export const certificate = (text: string) => ({
  name: `${text}.pdf`,
  bytes: Buffer.from(`%PDF-1.7\n${text}\n%%EOF\n`),
})

/** One supplier and one customer with their people, and what brings a measuring task to a signed submission. */
export async function startStory() {
  const harness = await startHarness()
  const people = {
    engineer: await harness.person('Grit Falk'),
    approver: await harness.person('Arne Holt'),
    quality: await harness.person('Ola Brandt'),
    second: await harness.person('Ida Mohn'),
    approves: await harness.person('Veit Sahm'),
    reader: await harness.person('Pim Rehn'),
    buyerReader: await harness.person('Una Lahn'),
    stranger: await harness.person('Sten Uhl'),
  }
  const supplier = await harness.organisation('Halm Turning', [
    [people.engineer, ['gauge-engineer']],
    [people.approver, ['supplier-approver']],
    [people.reader, ['reader']],
  ])
  const customer = await harness.organisation('Nordhof Drives', [
    [people.quality, ['quality-representative']],
    [people.second, ['quality-representative']],
    [people.approves, ['customer-approver']],
    [people.buyerReader, ['reader']],
  ])
  const rivals = await harness.organisation('Lindau Pumps', [
    [people.stranger, ['gauge-engineer', 'supplier-approver', 'quality-representative', 'customer-approver']],
  ])
  const relationship = await harness.relationship(supplier, customer)
  return new Story(harness, { supplier, customer, rivals }, relationship, people)
}

type People = Record<
  'engineer' | 'approver' | 'quality' | 'second' | 'approves' | 'reader' | 'buyerReader' | 'stranger',
  Person
>
export type Seen = submissions.Submission

export class Story {
  #counter = 0

  constructor(
    readonly harness: Harness,
    readonly organisations: Record<'supplier' | 'customer' | 'rivals', Organisation>,
    readonly relationship: Relationship,
    readonly people: People,
  ) {}

  /** Acts of a person for their own organisation, freshly signed in. */
  by(who: keyof People) {
    const person = this.people[who]
    const atSupplier = who === 'engineer' || who === 'approver' || who === 'reader'
    const side = atSupplier ? 'supplier' : 'customer'
    const organisation = who === 'stranger' ? this.organisations.rivals : this.organisations[side]
    this.harness.signInAfresh(person)
    const client = this.harness.as(side, person)
    return {
      organisation,
      client,
      call: <E extends EndpointShape>(
        endpoint: E,
        params: Record<string, string> = {},
        input: Parameters<typeof client.call>[2] = {},
      ) => client.call(endpoint, { organisationId: organisation.id, ...params }, input),
      /** Status and code of an answer that is expected to be a refusal. */
      refusal: async (
        endpoint: EndpointShape,
        params: Record<string, string> = {},
        input: Parameters<typeof client.call>[2] = {},
      ): Promise<{ status: number; code: string; errors?: { path: string }[] }> => {
        try {
          await client.call(endpoint, { organisationId: organisation.id, ...params }, input)
        } catch (error) {
          const { status, problem } = error as { status: number; problem: { code: string } }
          return { ...problem, status }
        }
        throw new Error(`${endpoint.path} was not refused.`)
      },
    }
  }

  /** A measuring task with a calibrated gauge and ring, both with certificates. */
  async task({ safety = false, resolution = '0.0001' } = {}) {
    const at = (this.#counter += 1)
    const supplier = this.by('engineer')
    const part = await this.by('quality').call(
      parts.createPart,
      {},
      {
        body: {
          relationshipId: this.relationship.id,
          number: `P-${at}`,
          name: `Housing ${at}`,
          revision: 'A',
        },
      },
    )
    const characteristic = await this.by('quality').call(
      characteristics.createCharacteristic,
      { partId: part.id, revisionId: part.currentRevision.id },
      {
        body: {
          ...{ number: 5, name: 'bore', nominal: '24.000', lowerLimit: '23.975', upperLimit: '24.025' },
          ...{ unit: 'mm', class: safety ? 'safety' : 'ordinary' },
        },
      },
    )
    const gauge = await supplier.call(
      gauges.createGauge,
      {},
      {
        body: { code: `BG-${at}`, name: 'Bore gauge', resolution, unit: 'mm' },
      },
    )
    const standard = await supplier.call(
      standards.createStandard,
      {},
      {
        body: {
          ...{ code: `R-${at}`, name: 'Setting ring', certifiedValue: '24.0000', unit: 'mm' },
          ...{ expandedUncertainty: '0.0004', coverageFactor: '2' },
        },
      },
    )
    const calibrated = { calibratedOn: '2026-03-02', dueOn: '2027-03-01', foundWithinLimits: true }
    await supplier.call(
      calibrations.addGaugeCalibration,
      { gaugeId: gauge.id },
      {
        body: { ...calibrated, certificateNumber: `G-${at}` },
        file: certificate(`gauge ${at}`),
      },
    )
    await supplier.call(
      calibrations.addStandardCalibration,
      { standardId: standard.id },
      {
        body: { ...calibrated, certificateNumber: `S-${at}` },
        file: certificate(`ring ${at}`),
      },
    )
    const task = await supplier.call(
      tasks.createTask,
      {},
      {
        body: { characteristicId: characteristic.id, gaugeId: gauge.id, site: 'Hall 2' },
      },
    )
    return { id: task.id, at, part, characteristic, gauge, standard }
  }

  /** Both sides sign criteria: for a part, or for the whole relationship without one; in force from today. */
  async agree(partId: string | null, agreed: Clause[] = clauses) {
    const today = this.harness.now().toISOString().slice(0, 10)
    const scope = { relationshipId: this.relationship.id, partId, characteristicId: null }
    const begun = await this.by('quality').call(
      agreements.beginVersion,
      {},
      {
        body: { ...scope, clauses: agreed, effectiveOn: today, send: true },
      },
    )
    const at = (found: agreements.Agreement) => {
      const version = found.versions[0]
      if (!version) throw new Error('The agreement has no version.')
      return {
        params: { agreementId: found.id, versionId: version.id },
        expectedVersion: version.rowVersion,
        sha256: version.sha256,
      }
    }
    const sent = at(begun)
    let now = at(
      await this.by('engineer').call(agreements.acceptRound, sent.params, {
        body: { expectedVersion: sent.expectedVersion },
      }),
    )
    for (const who of ['approves', 'approver'] as const)
      now = at(
        await this.by(who).call(agreements.signVersion, now.params, {
          body: { expectedVersion: now.expectedVersion, sha256: now.sha256 },
        }),
      )
    return now.params
  }

  /**
   * A registered study, computed from readings that the engineer took and uploaded, or typed; beside another column,
   * which would be read if none were chosen, the choice is remembered.
   */
  async study(
    task: { id: string; standard: { id: string } },
    { readings = goodReadings, takenBy = this.people.engineer, upload = true, beside = false } = {},
  ): Promise<studies.Study> {
    const code = `BS-${(this.#counter += 1)}`
    const engineer = this.by('engineer')
    const registered = await engineer.call(
      studies.registerStudy,
      {},
      {
        body: {
          ...{ code, taskIds: [task.id], standardId: task.standard.id, plannedReadings: readings.length },
          ...{ unit: 'mm', measuredAs: 'value' },
        },
      },
    )
    const rows = beside
      ? ['left;value', ...readings.map((reading) => `${reading};1.5`)]
      : ['reading', ...readings]
    const bytes = Buffer.from(`${rows.join('\r\n')}\r\n`)
    return engineer.call(
      studies.storeReadings,
      { studyId: registered.id },
      {
        body: {
          ...(upload ? { source: 'uploaded' } : { source: 'typed', text: readings.join('\n') }),
          ...(beside ? { columns: ['A'] } : {}),
          expectedVersion: registered.rowVersion,
          complete: true,
          collectedOn: this.harness.now().toISOString().slice(0, 10),
          appraiser: 'A',
          takenBy: [takenBy.id],
        },
        ...(upload ? { file: { name: `${code}.csv`, bytes } } : {}),
      },
    )
  }

  /** A task with criteria in force and one computed study. */
  async ready(options: Parameters<Story['task']>[0] & Parameters<Story['study']>[1] = {}) {
    const task = await this.task(options)
    await this.agree(task.part.id)
    return { ...task, study: await this.study(task, options) }
  }

  read = (who: keyof People, id: string): Promise<Seen> =>
    this.by(who).call(submissions.readSubmission, { submissionId: id })

  /** A submission of the task in the state asked for. */
  async submission(taskId: string, state: Extract<SubmissionState, 'draft' | 'for-signature' | 'submitted'>) {
    const { id } = await this.by('engineer').call(submissions.prepareSubmission, {}, { body: { taskId } })
    const params = { submissionId: id }
    if (state !== 'draft')
      await this.by('engineer').call(submissions.sendForSignature, params, { body: { expectedVersion: 1 } })
    if (state === 'submitted') {
      const { rowVersion, sha256 } = await this.read('approver', id)
      await this.by('approver').call(submissions.signSubmission, params, {
        body: { expectedVersion: rowVersion, sha256 },
      })
    }
    return id
  }

  stop = (): Promise<void> => this.harness.stop()
}
