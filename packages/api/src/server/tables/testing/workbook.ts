import { zipOf, type ZipPart } from './zip'

export interface SheetXml {
  name: string
  /** What stands inside of `sheetData`. */
  rows: string
  state?: 'hidden' | 'veryHidden'
  /** What stands before `sheetData`. */
  before?: string
}

const main = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main'
const office = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships'
const packaged = 'http://schemas.openxmlformats.org/package/2006/relationships'
const head = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>'

const related = (list: readonly (readonly [id: string, type: string, target: string])[]) =>
  `${head}<Relationships xmlns="${packaged}">${list
    .map(([id, type, target]) => `<Relationship Id="${id}" Type="${office}/${type}" Target="${target}"/>`)
    .join('')}</Relationships>`

export interface WorkbookXml {
  sheets: readonly SheetXml[]
  strings?: readonly string[]
  /** Format codes; cells name them by their place from 1 with `s`, the one after the last is the known one for days. */
  formats?: readonly string[]
  from1904?: boolean
}

/** The parts of a small workbook whose sheets are given as XML, for tests that ask for exactly these. */
export function workbookParts({ sheets, strings = [], formats = [], from1904 }: WorkbookXml): ZipPart[] {
  return [
    { name: '[Content_Types].xml', content: `${head}<Types/>` },
    { name: '_rels/.rels', content: related([['r1', 'officeDocument', 'xl/workbook.xml']]) },
    {
      name: 'xl/workbook.xml',
      content: `${head}<workbook xmlns="${main}" xmlns:r="${office}"><workbookPr${from1904 ? ' date1904="1"' : ''}/><sheets>${sheets
        .map(
          ({ name, state }, at) =>
            `<sheet name="${name}" sheetId="${at + 1}"${state ? ` state="${state}"` : ''} r:id="s${at + 1}"/>`,
        )
        .join('')}</sheets></workbook>`,
    },
    {
      name: 'xl/_rels/workbook.xml.rels',
      content: related([
        ...sheets.map((_sheet, at) => [`s${at + 1}`, 'worksheet', `worksheets/sheet${at + 1}.xml`] as const),
        ['t', 'sharedStrings', 'sharedStrings.xml'],
        ['f', 'styles', '/xl/styles.xml'],
      ]),
    },
    {
      name: 'xl/sharedStrings.xml',
      content: `${head}<sst xmlns="${main}">${strings.map((text) => `<si>${text}</si>`).join('')}</sst>`,
    },
    {
      name: 'xl/styles.xml',
      content: `${head}<styleSheet xmlns="${main}"><numFmts>${formats
        .map((code, at) => `<numFmt numFmtId="${164 + at}" formatCode="${code}"/>`)
        .join(
          '',
        )}</numFmts><cellXfs><xf numFmtId="0"/>${formats.map((_code, at) => `<xf numFmtId="${164 + at}"/>`).join('')}<xf numFmtId="14"/></cellXfs></styleSheet>`,
    },
    ...sheets.map(({ rows, before = '' }, at) => ({
      name: `xl/worksheets/sheet${at + 1}.xml`,
      content: `${head}<worksheet xmlns="${main}">${before}<sheetData>${rows}</sheetData></worksheet>`,
    })),
  ]
}

/** A workbook of one sheet with these rows. */
export const sheetOf = (rows: string, more: Partial<WorkbookXml> = {}): Buffer =>
  zipOf(workbookParts({ sheets: [{ name: 'Data', rows }], ...more }))

/** Rows of plain cells: numbers as numbers, everything else as text. */
export const rowsXml = (rows: readonly (readonly (string | number)[])[]): string =>
  rows
    .map(
      (cells, at) =>
        `<row r="${at + 1}">${cells
          .map((cell) =>
            typeof cell === 'number'
              ? `<c><v>${cell}</v></c>`
              : `<c t="inlineStr"><is><t>${cell.replace(/[&<]/g, (each) => `&#${each.charCodeAt(0)};`)}</t></is></c>`,
          )
          .join('')}</row>`,
    )
    .join('')
