import { posix } from 'node:path'
import type { Sheet } from '../../../contract/tables'
import type { UploadedFile } from '../../http/route'
import { attribute, isSet, walkXml } from './xml'
import { damaged, type Parts } from './zip'

interface SheetPart extends Sheet {
  path: string
}

export interface Workbook {
  sheets: SheetPart[]
  /** Days are counted from 1904 instead of 1900. */
  from1904: boolean
  stylesPath: string | undefined
  stringsPath: string | undefined
}

interface Related {
  id: string
  type: string
  path: string
}

/** What the workbook says of itself: its sheets with cells in their order, and where its parts lie. */
export function readWorkbook(file: UploadedFile, parts: Parts): Workbook {
  const path =
    relatedOf(file, parts, '').find(({ type }) => type === 'officeDocument')?.path ?? 'xl/workbook.xml'
  const bytes = parts.read(path)
  if (!bytes) throw damaged(file, 'it has no list of its sheets')
  const related = relatedOf(file, parts, path)
  const sheets: SheetPart[] = []
  let from1904 = false
  walkXml(file, path, bytes, {
    open(name, attributes) {
      if (name === 'workbookPr') from1904 = isSet(attributes.date1904)
      if (name !== 'sheet') return
      const id = attribute(attributes, 'id')
      const part = related.find((each) => each.id === id)
      // Sheets that hold a chart or a dialogue have no cells.
      if (part?.type !== 'worksheet') return
      sheets.push({
        name: attributes.name ?? '',
        hidden: (attributes.state ?? 'visible') !== 'visible',
        path: part.path,
      })
    },
  })
  const ofType = (wanted: string) => related.find(({ type }) => type === wanted)?.path
  return { sheets, from1904, stylesPath: ofType('styles'), stringsPath: ofType('sharedStrings') }
}

/** What a part points to; the whole container's own list for the empty path. */
function relatedOf(file: UploadedFile, parts: Parts, path: string): Related[] {
  const folder = posix.dirname(path)
  const list = posix.join(folder, '_rels', `${posix.basename(path)}.rels`)
  const bytes = parts.read(list)
  if (!bytes) return []
  const related: Related[] = []
  walkXml(file, list, bytes, {
    open(name, { Id = '', Type = '', Target = '', TargetMode }) {
      if (name !== 'Relationship' || TargetMode === 'External') return
      related.push({
        id: Id,
        type: Type.slice(Type.lastIndexOf('/') + 1),
        path: posix.join('/', Target.startsWith('/') ? '' : folder, Target).slice(1),
      })
    },
  })
  return related
}
