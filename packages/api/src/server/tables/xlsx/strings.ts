import type { UploadedFile } from '../../http/route'
import { walkXml } from './xml'

/** Characters that XML cannot hold are written as `_x000D_`; an underscore before such a text as `_x005F_`. */
export const unescaped = (text: string): string =>
  text.includes('_x')
    ? text.replace(/_x([0-9a-f]{4})_/gi, (_all, code: string) => String.fromCharCode(parseInt(code, 16)))
    : text

/**
 * Collects the text of a string item, whose runs may differ in font and carry a reading aid, which is no part of it.
 * Tells it what opens, closes and is written; `take` gives the text and begins anew.
 */
export function stringCollector() {
  let text = ''
  let inText = false
  let aids = 0
  return {
    open(name: string): void {
      if (name === 't') inText = true
      else if (name === 'rPh') aids++
    },
    close(name: string): void {
      if (name === 't') inText = false
      else if (name === 'rPh') aids--
    },
    text(piece: string): void {
      if (inText && aids === 0) text += piece
    },
    take(): string {
      const taken = unescaped(text)
      text = ''
      return taken
    },
  }
}

/** The texts that cells name by their number. */
export function readStrings(file: UploadedFile, path: string, bytes: Buffer | undefined): string[] {
  const strings: string[] = []
  if (!bytes) return strings
  const item = stringCollector()
  walkXml(file, path, bytes, {
    open: item.open,
    text: item.text,
    close(name) {
      item.close(name)
      if (name === 'si') strings.push(item.take())
    },
  })
  return strings
}
