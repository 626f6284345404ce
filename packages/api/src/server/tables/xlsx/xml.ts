import { SaxesParser } from 'saxes'
import { ProblemError } from '../../errors'
import { damaged } from './zip'

export type Attributes = Readonly<Record<string, string>>

export interface XmlEvents {
  /** Names come without their prefix. */
  open(name: string, attributes: Attributes): void
  close?(name: string): void
  text?(text: string): void
}

const chunk = 65_536
const bare = (name: string): string => name.slice(name.indexOf(':') + 1)

/** Walks through a part of a workbook. Declarations of a document type, which could define entities, are refused. */
export function walkXml(file: { name: string }, path: string, bytes: Buffer, events: XmlEvents): void {
  const refuse = (what: string) => damaged(file, `the part ${path} ${what}`)
  const parser = new SaxesParser({ xmlns: false, position: false })
  parser.on('doctype', () => {
    throw refuse('declares a document type, as no workbook does')
  })
  parser.on('opentag', ({ name, attributes }) => events.open(bare(name), attributes))
  if (events.close) parser.on('closetag', ({ name }) => events.close?.(bare(name)))
  if (events.text) {
    parser.on('text', (text) => events.text?.(text))
    parser.on('cdata', (text) => events.text?.(text))
  }
  const wide = bytes[0] === 0xff && bytes[1] === 0xfe
  const decoder = new TextDecoder(wide ? 'utf-16le' : 'utf-8', { fatal: true })
  try {
    for (let at = 0; at < bytes.length; at += chunk)
      parser.write(decoder.decode(bytes.subarray(at, at + chunk), { stream: true }))
    parser.write(decoder.decode()).close()
  } catch (error) {
    throw error instanceof ProblemError ? error : refuse('cannot be read')
  }
}

/** An attribute by its name without prefix, such as the `id` of `r:id`. */
export const attribute = (attributes: Attributes, name: string): string | undefined =>
  attributes[name] ?? Object.entries(attributes).find(([key]) => bare(key) === name)?.[1]

/** Whether an attribute such as `hidden="1"` is set. */
export const isSet = (value: string | undefined): boolean => value === '1' || value === 'true'
