import { line } from '../../../../contract/common'
import { appraiserCode } from '../../../../contract/readings'
import { registerStudy } from '../../../../contract/study-acts'
import { RowCells } from '../rows/cells'
import type { Writing } from '../rows/context'
import type { FieldRow } from '../rows/fields'
import { partnerOf, type Partner } from '../rows/partners'
import { kindNames, measuredAsNames } from './studies.fields'

/** What belongs to the study as a whole; rows below the first may leave it empty. */
export const studyOwnFields = [
  'number',
  'revision',
  'characteristics',
  'gauge',
  'processStep',
  'site',
  'standard',
  'measuredAs',
  'unit',
  'collectedOn',
  'appraiser',
] as const
export type StudyField = (typeof studyOwnFields)[number]

export interface StudyRowRead {
  cells: RowCells
  code: string | null
  /** Null where the row names none and there are several. */
  partner: Partner | null
  own: Record<StudyField, string | null>
  readings: { text: string; value: number }[]
}

const text = line(80)
const several = line(200)

/** Reads one row of studies by itself. */
export function readStudyRow(source: FieldRow, writing: Writing, partners: readonly Partner[]): StudyRowRead {
  const cells = new RowCells(source, writing)
  const checked = (field: string, schema: ReturnType<typeof line> = text): string | null => {
    const entered = cells.text(field)
    return entered === null ? null : cells.check(schema, entered, { '': field })
  }
  const { shape } = registerStudy.body
  if (cells.text('code') === null)
    cells.refuse('code', 'Enter the code of the study; every row names its study.')
  cells.choice('kind', kindNames)
  return {
    cells,
    code: checked('code', shape.code),
    partner: cells.text('partner') === null ? null : partnerOf(cells, partners, 'supplier'),
    own: {
      number: checked('number'),
      revision: checked('revision'),
      characteristics: checked('characteristics', several),
      gauge: checked('gauge'),
      processStep: checked('processStep'),
      site: checked('site'),
      standard: checked('standard'),
      measuredAs: cells.choice('measuredAs', measuredAsNames),
      unit: cells.unit('unit'),
      collectedOn: cells.day('collectedOn'),
      appraiser: checked('appraiser', appraiserCode),
    },
    readings: cells.decimals('readings'),
  }
}
