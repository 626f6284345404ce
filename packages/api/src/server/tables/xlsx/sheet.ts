import type { UploadedFile } from '../../http/route'
import { columnOf, letterOf } from '../letters'
import { refuseOversize } from '../refuse'
import type { BrokenCell, CellMark, Table, TableRow } from '../table'
import { unstorableAt, unstorableCell } from '../unstorable'
import { cellText, type CellSource, type ReadWith } from './cell'
import { stringCollector } from './strings'
import { attribute, isSet, walkXml, type Attributes } from './xml'
import { damaged } from './zip'

type SheetContent = Pick<Table, 'rows' | 'broken' | 'hiddenColumns'>

/** Cells computed by one formula that is written in the first of them only. */
interface Area {
  rows: [number, number]
  columns: [number, number]
}

const place = /^([A-Z]{1,3})([1-9]\d{0,6})$/

/** The rows of one sheet, with what is particular about their cells. */
export function readSheet(file: UploadedFile, path: string, bytes: Buffer, how: ReadWith): SheetContent {
  const sheet = new SheetReader(file, how)
  const string = stringCollector()
  let inValue = false
  walkXml(file, path, bytes, {
    open(name, attributes) {
      if (name === 'c') sheet.beginCell(attributes)
      else if (name === 'v') inValue = true
      else if (name === 'row') sheet.beginRow(attributes)
      else if (name === 'f') sheet.formula(attributes)
      else if (name === 'col') sheet.column(attributes)
      else string.open(name)
    },
    text(text) {
      if (inValue) sheet.value(text)
      else string.text(text)
    },
    close(name) {
      if (name === 'v') inValue = false
      else if (name === 'is') sheet.value(string.take())
      else if (name === 'c') sheet.endCell()
      else string.close(name)
    },
  })
  return sheet.content()
}

class SheetReader {
  readonly #file: UploadedFile
  readonly #how: ReadWith
  readonly #rows: TableRow[] = []
  readonly #hidden: [from: number, to: number][] = []
  readonly #areas: Area[] = []
  #broken: BrokenCell | null = null
  #row = 0
  #rowHidden = false
  #column = -1
  #cell: CellSource | undefined
  #count = { cells: 0, characters: 0 }

  constructor(file: UploadedFile, how: ReadWith) {
    this.#file = file
    this.#how = how
  }

  beginRow({ r, hidden }: Attributes): void {
    const row = r === undefined ? this.#row + 1 : Number(r)
    if (!Number.isInteger(row) || row <= this.#row || row > 1_048_576)
      throw damaged(this.#file, `row ${String(r).slice(0, 20)} of the sheet follows row ${this.#row}`)
    this.#row = row
    this.#rowHidden = isSet(hidden)
    this.#column = -1
  }

  beginCell({ r, t, s }: Attributes): void {
    const [, letter = '', number] = r === undefined ? [] : (place.exec(r) ?? [])
    const column = r === undefined ? this.#column + 1 : columnOf(letter)
    const elsewhere = r !== undefined && Number(number) !== this.#row
    if (column <= this.#column || elsewhere || column > 16_383)
      throw damaged(this.#file, `cell ${String(r).slice(0, 20)} of the sheet is not in its place`)
    this.#column = column
    this.#cell = { type: t ?? 'n', style: Number(s ?? 0), value: undefined, formula: false }
  }

  value(text: string): void {
    if (this.#cell) this.#cell.value = (this.#cell.value ?? '') + text
  }

  formula(attributes: Attributes): void {
    if (this.#cell) this.#cell.formula = true
    const { t, ref } = attributes
    if ((t === 'array' || t === 'dataTable') && ref && this.#areas.length < 1000) {
      const [from = '', to = from] = ref.split(':')
      const [, left = '', top] = place.exec(from) ?? []
      const [, right = '', bottom] = place.exec(to) ?? []
      this.#areas.push({
        rows: [Number(top), Number(bottom)],
        columns: [columnOf(left), columnOf(right)],
      })
    }
  }

  column(attributes: Attributes): void {
    if (!isSet(attribute(attributes, 'hidden'))) return
    this.#hidden.push([Number(attributes.min) - 1, Number(attributes.max) - 1])
  }

  endCell(): void {
    const source = this.#cell
    this.#cell = undefined
    if (!source) return
    const { text, mark } = cellText(source, this.#how)
    if (text.trim() === '' && !mark?.formula) return
    this.#count.cells++
    this.#count.characters += text.length
    refuseOversize({ rows: this.#row, columns: this.#column + 1, ...this.#count })
    const row = this.#rowAt(this.#row)
    while (row.cells.length < this.#column) row.cells.push('')
    row.cells.push(text)
    if (mark) row.marks = Object.assign(row.marks ?? {}, { [this.#column]: mark })
    const odd = this.#broken ? -1 : unstorableAt(text)
    if (odd >= 0)
      this.#broken = {
        code: 'unstorable-character',
        ...{ row: this.#row, column: letterOf(this.#column) },
        ...unstorableCell(text.charCodeAt(odd), text.slice(0, odd)),
      }
  }

  #rowAt(number: number): TableRow {
    while (this.#rows.length < number) this.#rows.push({ row: this.#rows.length + 1, cells: [] })
    const row = this.#rows[number - 1] as TableRow
    if (this.#rowHidden) row.hidden = true
    return row
  }

  content(): SheetContent {
    for (const area of this.#areas) markArea(this.#rows, area)
    const width = this.#rows.reduce((most, { cells }) => Math.max(most, cells.length), 0)
    const hiddenColumns = Array.from({ length: width }, (_each, at) => at)
      .filter((at) => this.#hidden.some(([from, to]) => at >= from && at <= to))
      .map(letterOf)
    return { rows: this.#rows, broken: this.#broken, hiddenColumns }
  }
}

/** Marks the other cells of an area as computed too. */
function markArea(rows: readonly TableRow[], { rows: [top, bottom], columns: [left, right] }: Area): void {
  for (const row of rows.slice(Math.max(top - 1, 0), bottom)) {
    const marks: Record<number, CellMark> = { ...row.marks }
    for (let at = left; at <= right && at < row.cells.length; at++)
      if (row.cells[at] !== '') marks[at] = { ...marks[at], formula: true }
    row.marks = marks
  }
}
