import { describe, expect, it } from 'vitest'
import { cleanFileName, fileKind } from '../../../../utils/settlement/fileKinds'

const bytes = (text: string) => new TextEncoder().encode(text)

describe('the kind of a file', () => {
  it('is told by its content', () => {
    expect(fileKind(bytes('%PDF-1.7\n…'))).toBe('pdf')
    expect(fileKind(new Uint8Array([0xFF, 0xD8, 0xFF, 0xE0]))).toBe('jpeg')
    expect(fileKind(new Uint8Array([0x89, 0x50, 0x4E, 0x47, 0x0D, 0x0A, 0x1A, 0x0A]))).toBe('png')
    expect(fileKind(bytes('\uFEFFserial;net\r\nK1;3,5\r\n'))).toBe('csv')
  })

  it('is none for a page, a program, an archive, a text without columns, or a picture of another kind', () => {
    expect(fileKind(bytes('a,b\n<script>1</script>'))).toBeNull()
    expect(fileKind(bytes('MZ\u0000,'))).toBeNull()
    expect(fileKind(bytes('PK\u0003\u0004,'))).toBeNull()
    expect(fileKind(bytes('serial\nK1,K2'))).toBeNull()
    expect(fileKind(bytes('RIFF    WEBP,'))).toBeNull()
    expect(fileKind(bytes(' %PDF-1.7'))).toBeNull()
    expect(fileKind(new Uint8Array())).toBeNull()
  })
})

describe('the name of a file', () => {
  it('keeps letters and figures, without its path, its signs or its own ending', () => {
    expect(cleanFileName('C:\\fakepath\\Statement 4711.PDF', 'pdf')).toBe('Statement 4711.pdf')
    expect(cleanFileName('../../etc/passwd', 'csv')).toBe('passwd.csv')
    expect(cleanFileName('a"\r\nSet-Cookie: x.exe', 'pdf')).toBe('aSet-Cookie x.pdf')
    expect(cleanFileName('Gutschrift Würz.png', 'png')).toBe('Gutschrift Würz.jpg')
    expect(cleanFileName('..', 'pdf')).toBe('file.pdf')
    expect(cleanFileName('', 'pdf')).toBe('file.pdf')
    expect(cleanFileName('x'.repeat(300), 'pdf')).toHaveLength(104)
  })
})
