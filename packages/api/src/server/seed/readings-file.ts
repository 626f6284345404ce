import type { ReadingsInput } from '../../contract/readings'
import type { UploadedFile } from '../http/route'

export interface SeededReadings {
  input: Pick<ReadingsInput, 'source' | 'text'>
  file?: UploadedFile
}

/**
 * The same readings as people bring them, in turn: files with decimal comma or point, with and without a header, in
 * different encodings, a paste from a spreadsheet, typed lines.
 */
export function asBrought(
  at: number,
  name: string,
  readings: readonly string[],
  unit: string,
): SeededReadings {
  const comma = readings.map((reading) => reading.replace('.', ','))
  const numbered = (separator: string, values: readonly string[]) =>
    values.map((value, index) => `${index + 1}${separator}${value}`)
  const upload = (bytes: Buffer): SeededReadings => ({
    input: { source: 'uploaded' },
    file: { name: `${name}.csv`, bytes },
  })
  switch (at % 6) {
    case 0:
      return upload(
        Buffer.from(`\uFEFFNo.;Reading [${unit}]\r\n${numbered(';', comma).join('\r\n')}\r\n`, 'utf8'),
      )
    case 1:
      return upload(Buffer.from(`no,reading\n${numbered(',', readings).join('\n')}\n`, 'utf8'))
    case 2:
      return { input: { source: 'pasted', text: `No.\tReading\n${numbered('\t', comma).join('\n')}\n` } }
    case 3:
      return upload(
        Buffer.from(`Nr;Anzeige in ${unit}\r\n${numbered(';', comma).join('\r\n')}\r\n`, 'latin1'),
      )
    case 4:
      return upload(Buffer.from(`${readings.join('\n')}\n`, 'utf8'))
    default:
      return { input: { source: 'typed', text: readings.join('\n') } }
  }
}
