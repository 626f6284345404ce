import { letterOf } from '../../../tables/letters'
import type { Source } from '../imports.source'
import type { StudySource } from './studies.plan'

/** How the readings of an imported file were read, as a study keeps it. */
export function readAsOf({ table, headerRow, mapping, mapped }: Source): StudySource['readAs'] {
  const [first = 0, ...more] = mapping.readings ?? []
  return {
    encoding: table.dialect?.encoding ?? 'utf-8',
    byteOrderMark: table.dialect?.byteOrderMark ?? false,
    separator: table.dialect?.separator ?? 'none',
    decimal: mapped.writing.decimal,
    direction: more.length > 0 ? 'across' : 'down',
    headerRows: headerRow,
    column: more.length > 0 ? null : letterOf(first),
    columnName: table.rows[headerRow - 1]?.cells[first] ?? null,
  }
}
