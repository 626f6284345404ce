import type { ReadAs } from '../../../../contract/readings'

/** How release 0.1.0 noted what was read: always a text, one column down or one row across. */
export interface ReadAsOfFirstRelease extends Pick<ReadAs, 'byteOrderMark' | 'decimal' | 'headerRows'> {
  encoding: NonNullable<ReadAs['encoding']>
  separator: NonNullable<ReadAs['separator']>
  direction: 'down' | 'across'
  column: string | null
  columnName: string | null
}

/** What a stored revision says of how it was read, in today's words. */
export function readAsStored(stored: ReadAs | ReadAsOfFirstRelease): ReadAs {
  if (!('direction' in stored)) return stored
  const { encoding, byteOrderMark, separator, decimal, direction, headerRows, column, columnName } = stored
  return {
    ...{ kind: 'csv', sheet: null, encoding, byteOrderMark, separator, decimal, headerRows },
    layout: direction === 'across' ? 'wide' : 'long',
    columns: column === null ? [] : [column],
    columnNames: column === null ? [] : [columnName],
  }
}
