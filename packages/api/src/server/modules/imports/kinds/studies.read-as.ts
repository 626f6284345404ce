import { letterOf } from '../../../tables/letters'
import type { Source } from '../imports.source'
import type { StudySource } from './studies.plan'

/** How the readings of an imported file were read, as a study keeps it. */
export function readAsOf({ table, headerRow, mapping, mapped }: Source): StudySource['readAs'] {
  const places = mapping.readings ?? []
  return {
    kind: table.kind,
    sheet: table.sheet,
    encoding: table.dialect?.encoding ?? null,
    byteOrderMark: table.dialect?.byteOrderMark ?? false,
    separator: table.dialect?.separator ?? null,
    decimal: mapped.writing.decimal,
    layout: places.length > 1 ? 'wide' : 'long',
    headerRows: headerRow,
    columns: places.map(letterOf),
    columnNames: places.map((place) => table.rows[headerRow - 1]?.cells[place] ?? null),
  }
}
