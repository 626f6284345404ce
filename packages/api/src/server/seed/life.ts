import { addGaugeCalibration } from '../../contract/calibrations'
import { changeCharacteristic, listCharacteristics } from '../../contract/characteristics'
import { reportGaugeEvent } from '../../contract/gauge-events'
import { addRevision, readPart } from '../../contract/parts'
import { carryOver, listCarryOvers, reinstate } from '../../contract/standings'
import { listSubmissions } from '../../contract/submissions'
import { takeOverTasks } from '../../contract/tasks'
import { memberWith, type Base } from './base'
import type { Ids } from './ids'
import { foundOutside, gaugeEvents, revised, withoutCertificate } from './scenario.life'
import type { OrganisationKey } from './scenario.organisations'
import { parts } from './scenario.parts'
import type { Scene } from './scenes'
import type { Act, Stage } from './stage'

/** What happens to acceptances afterwards: events of gauges, calibrations, a new revision. */
export const lifeScenes = (stage: Stage, base: Base, ids: Ids): Scene[] => [
  ...eventScenes(stage, base, ids),
  ...calibrationScenes(stage, base, ids),
  ...revisionScenes(stage, base, ids),
]

const engineerOf = (stage: Stage, base: Base, key: OrganisationKey): Act =>
  stage.as('supplier', base.organisations[key], memberWith(base.organisations[key], 'gauge-engineer'))
const approverOf = (stage: Stage, base: Base, key: OrganisationKey): Act =>
  stage.as('customer', base.organisations[key], memberWith(base.organisations[key], 'customer-approver'))

function eventScenes(stage: Stage, base: Base, ids: Ids): Scene[] {
  return gaugeEvents.flatMap(({ owner, gauge, daysAgo, kind, words, reinstated }): Scene[] => {
    const report = async () => {
      await engineerOf(
        stage,
        base,
        owner,
      )(reportGaugeEvent, {
        params: { gaugeId: ids.get('gauge', gauge) },
        body: { kind, happenedOn: stage.day(daysAgo), words },
      })
    }
    if (!reinstated) return [{ daysAgo, play: report }]
    const letStand = async () => {
      const act = approverOf(stage, base, reinstated.by)
      const { items } = await act(listSubmissions, { query: { standing: 'suspended', search: gauge } })
      for (const { id } of items)
        await act(reinstate, { params: { submissionId: id }, body: { words: reinstated.words } })
    }
    return [
      { daysAgo, play: report },
      { daysAgo: reinstated.daysAgo, play: letStand },
    ]
  })
}

const calibrationScenes = (stage: Stage, base: Base, ids: Ids): Scene[] =>
  [
    { ...foundOutside, foundWithinLimits: false },
    { ...withoutCertificate, foundWithinLimits: true, words: '' },
  ].map(({ owner, gauge, daysAgo, intervalDays, foundWithinLimits, words }) => ({
    daysAgo,
    play: async () => {
      await engineerOf(
        stage,
        base,
        owner,
      )(addGaugeCalibration, {
        params: { gaugeId: ids.get('gauge', gauge) },
        body: {
          certificateNumber: `HCL ${stage.day(daysAgo).replaceAll('-', '')} ${gauge}`,
          laboratory: 'Harrowgate Calibration Laboratory',
          calibratedOn: stage.day(daysAgo),
          dueOn: stage.day(daysAgo - intervalDays),
          ...{ foundWithinLimits, words },
        },
      })
    },
  }))

function revisionScenes(stage: Stage, base: Base, ids: Ids): Scene[] {
  const part = parts.find(({ number }) => number === revised.part)
  if (!part) throw new Error(`${revised.part} is no part of the demonstration.`)
  const params = () => ({ partId: ids.get('part', revised.part) })
  const customer = base.organisations[part.customer]
  const quality = stage.as('customer', customer, memberWith(customer, 'quality-representative'))
  const approver = approverOf(stage, base, part.customer)
  const revise = async () => {
    const { rowVersion } = await quality(readPart, { params: params() })
    await quality(addRevision, {
      params: params(),
      body: { label: revised.label, copyCharacteristics: true, expectedVersion: rowVersion },
    })
    const { items } = await quality(listCharacteristics, { query: params() })
    const found = items.find(({ number }) => number === revised.changed)
    if (!found?.upperLimit) throw new Error(`${revised.part} has no upper limit to change.`)
    const { id, rowVersion: expectedVersion, ...entered } = found
    stage.pass(10)
    await quality(changeCharacteristic, {
      params: { characteristicId: id },
      body: { ...entered, upperLimit: tightened(found.nominal, found.upperLimit), expectedVersion },
    })
    stage.pass(60)
    await engineerOf(stage, base, part.supplier)(takeOverTasks, { params: params() })
  }
  const carry = async () => {
    const { currentRevision } = await approver(readPart, { params: params() })
    const { items } = await approver(listCarryOvers, { params: params() })
    const submissionIds = items
      .filter(
        ({ limits, characteristicNumber }) =>
          limits === 'same' && (revised.carried as readonly number[]).includes(characteristicNumber),
      )
      .map(({ submissionId }) => submissionId)
    await approver(carryOver, { params: params(), body: { revisionId: currentRevision.id, submissionIds } })
  }
  return [
    { daysAgo: revised.daysAgo, play: revise },
    { daysAgo: revised.carriedDaysAgo, play: carry },
  ]
}

/** An upper limit nearer to the nominal, with as many decimals as it had. */
function tightened(nominal: string | null, upper: string): string {
  const decimals = upper.split('.')[1]?.length ?? 0
  const middle = Number(nominal ?? 0)
  return (middle + (Number(upper) - middle) * revised.tightenTo).toFixed(decimals)
}
