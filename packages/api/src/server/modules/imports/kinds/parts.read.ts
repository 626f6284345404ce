import { line } from '../../../../contract/common'
import { partNumber, revisionLabel } from '../../../../contract/parts'
import type { CharacteristicClass } from '../../../../contract/characteristics'
import type { Tenant } from '../../../db/tenant'
import { RowCells } from '../rows/cells'
import type { Writing } from '../rows/context'
import type { FieldRow } from '../rows/fields'
import { partnerOf, type Partner } from '../rows/partners'
import { classNames } from './parts.fields'

/** What a row says of its characteristic; null where a cell says nothing. */
export interface ReadCharacteristic {
  number: number
  name: string | null
  nominal: string | null
  lowerLimit: string | null
  upperLimit: string | null
  tolerance: string | null
  unit: string | null
  class: CharacteristicClass | null
  processStandardDeviation: string | null
}

export interface PartRowRead {
  cells: RowCells
  partner: Partner | null
  number: string | null
  name: string | null
  supplierNumber: string | null
  revision: string | null
  characteristic: ReadCharacteristic | null
}

const described = [
  'characteristicName',
  'nominal',
  'lowerLimit',
  'upperLimit',
  'tolerance',
  'unit',
  'class',
] as const

/** Reads one row of parts by itself: what is wrong with its own cells is among its problems. */
export function readPartRow(
  source: FieldRow,
  writing: Writing,
  partners: readonly Partner[],
  side: Tenant['side'],
): PartRowRead {
  const cells = new RowCells(source, writing)
  const checked = (field: string, schema: ReturnType<typeof line>): string | null => {
    const text = cells.text(field)
    return text === null ? null : cells.check(schema, text, { '': field })
  }
  const number = checked('number', partNumber)
  if (cells.text('number') === null)
    cells.refuse('number', 'Enter the part number; every row names its part.')
  return {
    cells,
    partner: partnerOf(cells, partners, side),
    number,
    name: checked('name', line()),
    supplierNumber: checked('supplierNumber', partNumber),
    revision: checked('revision', revisionLabel),
    characteristic: readCharacteristic(cells),
  }
}

function readCharacteristic(cells: RowCells): ReadCharacteristic | null {
  const number = cells.whole('characteristic')
  if (number === null) {
    if (cells.text('characteristic') === null && described.some((field) => cells.text(field) !== null))
      cells.refuse('characteristic', 'Enter the number the characteristic has on the drawing.')
    return null
  }
  const tolerance = cells.decimal('tolerance')
  const limits = [cells.decimal('lowerLimit'), cells.decimal('upperLimit')] as const
  if (tolerance !== null && limits.some((limit) => limit !== null))
    cells.refuse('tolerance', 'Give limits or a tolerance, not both; leave one of them empty.')
  else if (tolerance !== null && Number(tolerance) <= 0)
    cells.refuse('tolerance', 'Enter a tolerance above zero, such as 0.025 for ± 0.025.')
  return {
    number,
    name: cells.text('characteristicName'),
    nominal: cells.decimal('nominal'),
    lowerLimit: limits[0],
    upperLimit: limits[1],
    tolerance,
    unit: cells.unit('unit'),
    class: cells.choice<CharacteristicClass>('class', classNames),
    processStandardDeviation: cells.decimal('processStandardDeviation'),
  }
}
