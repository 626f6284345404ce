/** Text as a PDF string: only what stands in ASCII. */
const escaped = (text: string): string => text.replace(/[^\x20-\x7e]/g, '?').replace(/[\\()]/g, '\\$&')

/** A certificate of one page, so that the demonstration's files open in any reader. Plainly marked as invented. */
export const certificate = (
  number: string,
  laboratory: string,
  { calibratedOn, dueOn }: { calibratedOn: string; dueOn: string },
): Buffer =>
  page([
    'Calibration certificate (demonstration, invented)',
    number,
    laboratory,
    `Calibrated on ${calibratedOn}, due on ${dueOn}`,
    'Found within its limits.',
  ])

/** A document of one page with these lines. */
export function page(lines: readonly string[]): Buffer {
  const text = lines
    .map((line, at) => `BT /F1 12 Tf 72 ${760 - 22 * at} Td (${escaped(line)}) Tj ET`)
    .join('\n')
  const objects = [
    '<< /Type /Catalog /Pages 2 0 R >>',
    '<< /Type /Pages /Kids [3 0 R] /Count 1 >>',
    '<< /Type /Page /Parent 2 0 R /MediaBox [0 0 595 842] /Contents 4 0 R /Resources << /Font << /F1 5 0 R >> >> >>',
    `<< /Length ${text.length} >>\nstream\n${text}\nendstream`,
    '<< /Type /Font /Subtype /Type1 /BaseFont /Helvetica >>',
  ]
  let file = '%PDF-1.4\n'
  const places = objects.map((object, at) => {
    const place = file.length
    file += `${at + 1} 0 obj\n${object}\nendobj\n`
    return place
  })
  const table = places.map((place) => `${String(place).padStart(10, '0')} 00000 n \n`).join('')
  const start = file.length
  file += `xref\n0 ${objects.length + 1}\n0000000000 65535 f \n${table}`
  file += `trailer << /Size ${objects.length + 1} /Root 1 0 R >>\nstartxref\n${start}\n%%EOF\n`
  return Buffer.from(file, 'latin1')
}
