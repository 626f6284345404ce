import { areCompatible } from '@evenrule/metrology'
import type { CharacteristicInPart } from '../../parts/characteristics.repository'
import { isArchived } from '../../parts/parts.errors'
import type { TaskListed } from '../../parts/tasks.repository'
import type { StandardRow } from '../../gauges/standards.repository'
import { CarriedTexts, type Carried } from '../rows/carry'
import type { RowCells } from '../rows/cells'
import type { ExistingPart } from './parts.existing'
import type { StudyWorld } from './studies.existing'
import { studyOwnFields, type StudyField, type StudyRowRead } from './studies.read'

/** A study as its rows have it, with what it names. */
export interface SettledStudy {
  code: string
  row: number
  tasks: TaskListed[]
  standard: StandardRow
  unit: string
  measuredAs: 'value' | 'deviation'
  collectedOn: string
  appraiser: string
  readings: { text: string; value: number }[]
}

const asked: Partial<Record<StudyField, string>> = {
  number: 'the part number',
  characteristics: 'the number of the characteristic',
  gauge: 'the code of the gauge',
  standard: 'the code of the reference standard',
  collectedOn: 'the day on which the readings were taken',
  appraiser: 'a code of the person who took the readings',
}

/**
 * Settles the rows of one study and looks up what they name; null where anything of it is wrong. A study is taken as a
 * whole or not at all: nobody leaves out a reading of it here.
 */
export function settleStudy(rows: readonly StudyRowRead[], world: StudyWorld): SettledStudy | null {
  const [first] = rows
  if (!first?.code) return null
  const carried = new CarriedTexts()
  const own = {} as Record<StudyField, Carried | null>
  for (const { cells, own: said } of rows)
    for (const field of studyOwnFields) own[field] = carried.take(cells, field, said[field])
  for (const [field, what] of Object.entries(asked) as [StudyField, string][])
    if (!own[field]) first.cells.refuse(field, `Enter ${what} in the first row of the study.`)
  /** The row that says a field answers for it. */
  const at = (field: StudyField): RowCells =>
    rows.find(({ cells }) => cells.row === own[field]?.row)?.cells ?? first.cells
  const wrong = () => rows.some(({ cells }) => cells.problems.length > 0)
  const readings = rows.flatMap((row) => row.readings)
  if (readings.length < 2 && !wrong())
    first.cells.refuse(
      'readings',
      `This study has ${readings.length === 0 ? 'no reading' : 'one reading'}; enter at least 2. One says nothing about the spread.`,
    )
  if (own.collectedOn && own.collectedOn.value > world.today)
    at('collectedOn').refuse(
      'collectedOn',
      'This day is still to come. Enter the day the readings were taken.',
    )
  const tasks = tasksOf(own, at, rows, world)
  const unit = own.unit?.value ?? world.gauges.get(own.gauge?.value ?? '')?.unit ?? ''
  const standard = standardOf(own, at, unit, world)
  for (const { characteristic } of tasks)
    if (unit && !areCompatible(unit, characteristic.unit))
      at('unit').refuse(
        'unit',
        `${characteristic.name} is in ${characteristic.unit}; the readings must be in a unit of the same quantity, not ${unit}.`,
      )
  if (wrong() || !standard || !own.collectedOn || !own.appraiser) return null
  return {
    ...{ code: first.code, row: first.cells.row, tasks, standard, unit, readings },
    measuredAs: own.measuredAs?.value === 'deviation' ? 'deviation' : 'value',
    collectedOn: own.collectedOn.value,
    appraiser: own.appraiser.value,
  }
}

type Own = Record<StudyField, Carried | null>

function tasksOf(
  own: Own,
  at: (field: StudyField) => RowCells,
  rows: readonly StudyRowRead[],
  world: StudyWorld,
): TaskListed[] {
  const part = partOf(own, at, rows, world)
  const gauge = world.gauges.get(own.gauge?.value ?? '')
  if (own.gauge && !gauge)
    at('gauge').refuse(
      'gauge',
      `There is no gauge “${own.gauge.value}” of yours. Register it first, or correct the code.`,
    )
  if (gauge?.archivedAt) at('gauge').refuse('gauge', isArchived('gauge').message)
  if (!part || !gauge || !own.characteristics) return []
  const label = own.revision?.value ?? part.current.label
  const revision = part.revisions.find((each) => each.label === label)
  if (!revision) {
    at('revision').refuse(
      'revision',
      `Part ${part.part.number} has no revision “${label}”. Leave it empty for the current one, ${part.current.label}.`,
    )
    return []
  }
  const numbers = own.characteristics.value.split(/[\s,;+/]+/).filter(Boolean)
  const cells = at('characteristics')
  return [...new Set(numbers)].flatMap((number) => {
    const found = part.characteristics.get(`${revision.id} ${Number(number)}`)
    if (!found) {
      cells.refuse(
        'characteristics',
        `Part ${part.part.number}, revision ${label}, has no characteristic number “${number}”. Enter it first, or correct the number.`,
      )
      return []
    }
    return taskOf(own, cells, found, world) ?? []
  })
}

function partOf(
  own: Own,
  at: (field: StudyField) => RowCells,
  rows: readonly StudyRowRead[],
  world: StudyWorld,
): ExistingPart | null {
  if (!own.number) return null
  const partner = rows.find((row) => row.partner)?.partner
  const found = (world.parts.get(own.number.value) ?? []).filter(
    ({ part }) => !partner || part.relationshipId === partner.relationshipId,
  )
  const cells = at('number')
  if (found.length > 1)
    return cells.refuse(
      'number',
      'Several customers have a part of this number. Name the customer in the column Customer.',
    )
  const [one] = found
  if (!one)
    return cells.refuse(
      'number',
      `There is no part “${own.number.value}” here. Enter it first, or correct the number.`,
    )
  return one.part.archivedAt ? cells.refuse('number', isArchived('part').message) : one
}

function taskOf(
  own: Own,
  cells: RowCells,
  { characteristic, part }: CharacteristicInPart,
  world: StudyWorld,
): TaskListed | null {
  const same = (wanted: Carried | null, value: string | null) => !wanted || wanted.value === value
  const found = (world.tasks.get(characteristic.id) ?? []).filter(
    ({ task }) =>
      task.gaugeCode === own.gauge?.value &&
      same(own.site, task.site) &&
      same(own.processStep, task.processStep),
  )
  if (found.length > 1)
    return cells.refuse(
      'characteristics',
      `${own.gauge?.value} measures number ${characteristic.number} at several places. Name the process step or the site.`,
    )
  return (
    found[0] ??
    cells.refuse(
      'characteristics',
      `${own.gauge?.value} is not set up to measure number ${characteristic.number} of ${part.number}${own.site || own.processStep ? ' there' : ''}. Set that up on the page of the part first.`,
    )
  )
}

function standardOf(
  own: Own,
  at: (field: StudyField) => RowCells,
  unit: string,
  world: StudyWorld,
): StandardRow | null {
  if (!own.standard) return null
  const cells = at('standard')
  const standard = world.standards.get(own.standard.value)
  if (!standard)
    return cells.refuse(
      'standard',
      `There is no reference standard “${own.standard.value}” of yours. Register it first, or correct the code.`,
    )
  if (standard.archivedAt) return cells.refuse('standard', isArchived('reference standard').message)
  if (unit && !areCompatible(standard.unit, unit))
    return cells.refuse(
      'standard',
      `${standard.code} is certified in ${standard.unit}, but the readings are in ${unit}. Name a standard of the same quantity.`,
    )
  return standard
}
