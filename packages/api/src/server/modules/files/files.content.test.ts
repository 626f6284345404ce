import { describe, expect, it } from 'vitest'
import { cleanFileName, contentTypeOf } from './files.content'

describe('the type of a file', () => {
  it.each([
    ['%PDF-1.7\n', 'application/pdf'],
    ['\n\n%PDF-1.7\n', 'application/pdf'],
    ['reading;24,001\r\n', 'text/csv'],
    ['Länge;24,0\n', 'text/csv'],
    ['', null],
    ['MZ\u0000\u0001', null],
    ['<!doctype html><script>1</script>', null],
    ['{"a":1}', null],
    [
      'PK\u0003\u0004 … xl/workbook.xml …',
      'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
    ],
    ['PK\u0003\u0004 … xl/workbook.xml … xl/vbaProject.bin', null],
    ['PK\u0003\u0004 … word/document.xml …', null],
  ])('%j is %s by its content', (text, type) => expect(contentTypeOf(Buffer.from(text))).toBe(type))

  it('knows PNG and JPEG by their first bytes', () => {
    expect(contentTypeOf(Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]))).toBe('image/png')
    expect(contentTypeOf(Buffer.from([0xff, 0xd8, 0xff, 0xe0]))).toBe('image/jpeg')
  })
  it('takes Latin-1 for text and a zip file for none', () => {
    expect(contentTypeOf(Buffer.from('L\xe4nge;24,0\n', 'latin1'))).toBe('text/csv')
    expect(contentTypeOf(Buffer.from('PK\u0003\u0004'))).toBeNull()
  })
})

describe('a file’s name', () => {
  it.each([
    ['../../etc/passwd', 'passwd'],
    ['C:\\certs\\ring 24.pdf', 'ring 24.pdf'],
    ['a\u0000b\r\n"c".pdf', 'abc.pdf'],
    ['harmless\u202efdp.exe', 'harmlessfdp.exe'],
    ['...', 'file'],
    ['', 'file'],
    ['Zertifikat № 7 – Ringlehre.pdf', 'Zertifikat № 7 – Ringlehre.pdf'],
  ])('%j is kept as %j', (name, kept) => expect(cleanFileName(name)).toBe(kept))

  it('is shortened to 120 characters with its ending', () => {
    const kept = cleanFileName(`${'x'.repeat(300)}.pdf`)
    expect(kept).toHaveLength(120)
    expect(kept.endsWith('x.pdf')).toBe(true)
  })
})
