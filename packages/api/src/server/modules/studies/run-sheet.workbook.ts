import type { Worksheet } from 'exceljs'
import type { RunSheetTable } from './run-sheet'

const hair = { style: 'hair', color: { argb: 'FF55626D' } } as const
const entryStyle = {
  border: { top: hair, left: hair, bottom: hair, right: hair },
  fill: { type: 'pattern', pattern: 'solid', fgColor: { argb: 'FFE2EFF1' } },
} as const
/** Rows above the readings: title, what is measured, headings. */
const above = 3

/**
 * A run sheet as an XLSX workbook: numbers are numbers, positions are text however they look, headings stay in view,
 * and the cells to fill in stand out and take numbers alone.
 */
export async function runSheetWorkbook(table: RunSheetTable, decimals: number | null): Promise<Uint8Array> {
  // Loaded on demand: it takes longer to load than everything else that the server needs.
  const { default: excel } = await import('exceljs')
  const workbook = new excel.Workbook()
  const sheet = workbook.addWorksheet('Run sheet', {
    views: [{ state: 'frozen', ySplit: above, activeCell: 'A1' }],
    pageSetup: { orientation: 'portrait', fitToPage: true, fitToWidth: 1, fitToHeight: 0, paperSize: 9 },
  })
  sheet.pageSetup.printTitlesRow = `${above}:${above}`
  addHead(sheet, table)
  const withSlots = table.headings.length > 3
  const at = withSlots ? 3 : 2
  for (const { number, slot, reading } of table.rows) {
    const row = sheet.addRow([
      number,
      ...(withSlots ? [slot ?? ''] : []),
      reading === null ? null : Number(reading),
      null,
    ])
    if (withSlots) row.getCell(2).numFmt = '@'
    const cell = row.getCell(at)
    Object.assign(cell, entryStyle)
    if (decimals !== null) cell.numFmt = decimals > 0 ? `0.${'0'.repeat(decimals)}` : '0'
    cell.dataValidation = {
      type: 'decimal',
      operator: 'between',
      formulae: [-1e15, 1e15],
      allowBlank: true,
      showErrorMessage: true,
      errorTitle: 'Reading',
      error: 'Enter the reading as a number, without its unit.',
    }
  }
  return new Uint8Array(await workbook.xlsx.writeBuffer())
}

function addHead(sheet: Worksheet, { title, about, headings }: RunSheetTable): void {
  sheet.addRow([title]).font = { bold: true, size: 14 }
  sheet.addRow([about])
  const row = sheet.addRow(headings)
  row.font = { bold: true }
  row.border = { bottom: { style: 'thin' } }
  const widths = headings.length > 3 ? [8, 22, 20, 36] : [8, 20, 36]
  for (const [index, width] of widths.entries()) sheet.getColumn(index + 1).width = width
}
