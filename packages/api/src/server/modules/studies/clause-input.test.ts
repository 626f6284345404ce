import { describe, expect, it } from 'vitest'
import type { Clause } from '@evenrule/metrology'
import { clauseInputOf } from './clause-input'
import type { StudyOfTask } from './studies.results.service'
import type { FrozenCharacteristic } from './studies.table'

const clause: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
}
const id = '01890a5d-ac96-774b-bcce-b302099a8057'
const characteristic: FrozenCharacteristic = {
  ...{ characteristicId: id, partNumber: 'P-1', revision: 'A', number: 5, name: 'bore' },
  ...{ nominal: '24.000', lowerLimit: '23.975', upperLimit: '24.025', unit: 'mm' },
  ...{ class: 'ordinary', processStandardDeviation: null },
}
const gauge = { resolution: '0.5', unit: 'µm' }

function studyOf({
  unit = 'mm',
  measuredAs = 'value' as 'value' | 'deviation',
  values = [24.001],
  standard = {},
}: {
  unit?: string
  measuredAs?: 'value' | 'deviation'
  values?: number[]
  standard?: Partial<StudyOfTask['standard']>
}): StudyOfTask {
  const at = '2026-11-02T09:00:00.000Z'
  const ring = {
    ...{ code: 'R-1', name: 'ring', certifiedValue: '24.0000', unit: 'mm' },
    ...{ expandedUncertainty: '0.0006', coverageFactor: '2' },
    ...standard,
  }
  return {
    study: {
      ...{ orgId: id, id, code: 'BS-1', kind: 'bias', gaugeId: id, standardId: id, state: 'computed' },
      gauge: { code: 'BG-1', name: 'Bore gauge', ...gauge },
      ...{ registeredAt: at, registeredBy: id, registeredBeforehand: true, plannedReadings: 1, plan: null },
      ...{ runSheetSeed: 1, slots: [], unit, measuredAs, collectedOn: '2026-11-02' },
      ...{ abandonedAt: null, abandonReason: null, rowVersion: 2 },
    },
    task: {
      ...{ orgId: id, studyId: id, taskId: id, relationshipId: id, customerOrgId: id, attempt: 1 },
      ...{ criteria: [], characteristic },
    },
    data: {
      ...{ orgId: id, id, studyId: id, revision: 1, source: 'typed', complete: true, reason: null },
      ...{ fileId: null, standard: ring, values, texts: values.map(String), leftOut: [], appraiser: 'A' },
      ...{ takenBy: [id], collectedOn: '2026-11-02', sha256: '', createdAt: at, createdBy: id },
      readAs: {
        ...{ encoding: 'utf-8', byteOrderMark: false, separator: 'none', decimal: 'point' },
        ...{ direction: 'down', headerRows: 0, column: 'A', columnName: null },
      },
    },
    standard: { orgId: id, id, createdAt: at, createdBy: id, archivedAt: null, rowVersion: 1, ...ring },
    calibration: {
      gauge: { calibratedOn: '2026-03-02', dueOn: '2027-03-01', certificateNumber: 'G', fileId: null },
      standard: null,
    },
  }
}
const inputOf = (study: StudyOfTask | null, of = characteristic) =>
  clauseInputOf({ clause, characteristic: of, gauge, study, attempts: 3 })

describe('the input of a clause', () => {
  it('holds limits, design, calibrations, readings and reference in the characteristic’s unit', () => {
    expect(inputOf(studyOf({}))).toEqual({
      kind: 'clause',
      clause,
      unit: 'mm',
      tolerance: { lower: 23.975, upper: 24.025 },
      resolution: 0.0005,
      design: { registeredBeforehand: true, attempts: 3 },
      calibration: {
        collectedOn: '2026-11-02',
        gauge: { calibratedOn: '2026-03-02', dueOn: '2027-03-01' },
        standard: null,
      },
      data: { kind: 'bias', readings: [24.001], reference: { value: 24, standardUncertainty: 0.0003 } },
    })
  })
  it('converts readings and certified value exactly, each from its own unit', () => {
    const inches = studyOf({
      unit: 'in',
      values: [0.945],
      standard: { certifiedValue: '24000.1', unit: 'µm', expandedUncertainty: '0.6' },
    })
    expect(inputOf(inches).data).toEqual({
      kind: 'bias',
      readings: [24.003],
      reference: { value: 24.0001, standardUncertainty: 0.0003 },
    })
    // 0.1 µm + 0.2 µm style sums stay decimal: 1.1 µm is 0.0011 mm and no double beside it.
    expect(inputOf(studyOf({ unit: 'µm', values: [1.1, 24000.3] })).data?.readings).toEqual([0.0011, 24.0003])
  })
  it('takes deviations as they were read, against zero, with the uncertainty of the standard', () => {
    expect(inputOf(studyOf({ unit: 'µm', measuredAs: 'deviation', values: [0.7, -0.2] })).data).toEqual({
      kind: 'bias',
      readings: [0.0007, -0.0002],
      reference: { value: 0, standardUncertainty: 0.0003 },
    })
  })
  it('has no uncertainty where the certificate states none', () => {
    const data = inputOf(studyOf({ standard: { expandedUncertainty: null } })).data
    expect(data?.reference).toEqual({ value: 24 })
  })
  it('has an open side where the tolerance has one', () => {
    expect(inputOf(null, { ...characteristic, lowerLimit: null }).tolerance).toEqual({ upper: 24.025 })
  })
  it('has nothing to judge on without a study', () => {
    expect(inputOf(null)).toMatchObject({ design: null, calibration: null, data: null })
  })
})
