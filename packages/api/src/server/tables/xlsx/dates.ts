import type { UploadedFile } from '../../http/route'
import { walkXml } from './xml'

/** Numbers of formats that every workbook knows as days or times without saying so. */
const known = (id: number): boolean =>
  (id >= 14 && id <= 22) || (id >= 27 && id <= 36) || (id >= 45 && id <= 47) || (id >= 50 && id <= 58)

/** Whether a format shows a day or a time: it names one outside of quotes, colours and escaped characters. */
export const showsTime = (format: string): boolean =>
  /[dmyhs]/i.test(
    format
      .replace(/"[^"]*"|\\.|_.|\*./g, '')
      .replace(/\[(?![hms]+\])[^\]]*\]/gi, '')
      .replace(/General/gi, ''),
  )

/** Which styles of cells show days or times, by the number cells name them with. */
export function readDateStyles(file: UploadedFile, path: string, bytes: Buffer | undefined): boolean[] {
  const formats = new Map<number, string>()
  const styles: boolean[] = []
  let inCells = false
  if (!bytes) return styles
  walkXml(file, path, bytes, {
    open(name, { numFmtId, formatCode }) {
      const id = Number(numFmtId ?? 0)
      if (name === 'numFmt') formats.set(id, formatCode ?? '')
      else if (name === 'cellXfs') inCells = true
      else if (name === 'xf' && inCells) {
        const format = formats.get(id)
        styles.push(format === undefined ? known(id) : showsTime(format))
      }
    },
    close(name) {
      if (name === 'cellXfs') inCells = false
    },
  })
  return styles
}

const dayLength = 86_400_000
/** Days of the calendar in which 1900 had a 29 February, as workbooks count, and the last that can be written. */
const first1900 = Date.UTC(1899, 11, 30)
const first1904 = Date.UTC(1904, 0, 1)
const lastDay = 2_958_465

/** A count of days as text: a day, a time, or both; undefined where it is none that a calendar knows. */
export function dayText(count: number, from1904: boolean): string | undefined {
  if (!(count >= 0 && count <= lastDay)) return undefined
  const seconds = Math.round(count * 86_400) * 1000
  const shifted = !from1904 && count < 60 ? dayLength : 0
  const at = new Date((from1904 ? first1904 : first1900) + shifted + seconds)
  const [day = '', time = ''] = at.toISOString().split('T')
  const clock = time.startsWith('00:00:00') ? '' : time.slice(0, time.startsWith(':00', 5) ? 5 : 8)
  if (count < 1) return clock || '00:00'
  return clock ? `${day} ${clock}` : day
}
