import { describe, expect, it } from 'vitest'
import { typedCodes, type TypedKey } from '../../../../utils/label/typedKeys'

const ADDRESS = 'HTTPS://CYLINDERS.EXAMPLE/C/7K3M9Q2TX'

/** Where a US scanner's keys sit, and whether it holds shift. */
function seatOf(character: string): { code: string, shift: boolean } {
  if (/[A-Z]/.test(character)) return { code: `Key${character}`, shift: true }
  if (/[0-9]/.test(character)) return { code: `Digit${character}`, shift: false }
  const seats: Record<string, { code: string, shift: boolean }> = {
    ':': { code: 'Semicolon', shift: true }, '/': { code: 'Slash', shift: false }, '.': { code: 'Period', shift: false }, '-': { code: 'Minus', shift: false },
  }
  return seats[character]!
}

/** What a device with this layout makes of a US scanner's burst: where `written` has no line the layouts agree. */
function burst(text: string, written: Record<string, string> = {}): TypedKey[] {
  return [...text].map(character => ({ key: written[character] ?? character, ...seatOf(character) }))
}

const QWERTZ = { 'Y': 'Z', 'Z': 'Y', ':': 'Ö', '/': '-', '-': 'ß' }
const AZERTY = {
  'A': 'Q', 'Q': 'A', 'W': 'Z', 'Z': 'W', 'M': '?', ':': 'M', '/': '!', '.': ':',
  '0': 'à', '1': '&', '2': 'é', '3': '"', '4': '\'', '5': '(', '6': '-', '7': 'è', '8': '_', '9': 'ç',
}

describe('a hand scanner that types', () => {
  it('is read as it writes where its keyboard is the device\'s', () => {
    expect(typedCodes(burst(ADDRESS))).toEqual(['7K3M9Q2TX'])
    expect(typedCodes(burst('7K3M9Q2TX'))).toEqual(['7K3M9Q2TX'])
  })

  it('is read on a German keyboard, on which Y and Z change seats', () => {
    expect(typedCodes(burst(ADDRESS, QWERTZ))).toEqual(['7K3M9Q2TX'])
    expect(typedCodes(burst('HTTPS://CYLINDERS.EXAMPLE/C/9JY7GJR40', QWERTZ))).toEqual(['9JY7GJR40'])
  })

  it('is read on a French keyboard, on which digits want shift and letters change seats', () => {
    expect(typedCodes(burst(ADDRESS, AZERTY))).toEqual(['7K3M9Q2TX'])
    expect(typedCodes(burst('7K3M9Q2TX', AZERTY))).toEqual(['7K3M9Q2TX'])
  })

  it('is read as it writes where it was set for the device\'s keyboard, whatever sits where', () => {
    // A scanner set for French types M at the semicolon and 7 with shift on the digit's key.
    const keys = burst(ADDRESS).map(key => key.key === 'M' ? { key: 'M', code: 'Semicolon', shift: true } : /\d/.test(key.key) ? { ...key, shift: true } : key)
    expect(typedCodes(keys)).toEqual(['7K3M9Q2TX'])
  })

  it('is read where the device does not say which key was pressed', () => {
    expect(typedCodes(burst(ADDRESS).map(key => ({ ...key, code: '' })))).toEqual(['7K3M9Q2TX'])
  })

  it('gives each of the codes that ran in without a pause, in their order', () => {
    expect(typedCodes(burst(ADDRESS + 'HTTPS://CYLINDERS.EXAMPLE/C/9JY7GJR40'))).toEqual(['7K3M9Q2TX', '9JY7GJR40'])
    expect(typedCodes(burst('7K3M9Q2TX9JY7GJR40'))).toEqual(['7K3M9Q2TX', '9JY7GJR40'])
  })

  it('is not read where its check does not fit, or where it is no code', () => {
    expect(typedCodes(burst('7K3M9Q2TW'))).toEqual([])
    expect(typedCodes(burst('HTTPS://ELSEWHERE.EXAMPLE/ABOUT'))).toEqual([])
    // Of two that ran together one is broken: neither is taken.
    expect(typedCodes(burst(ADDRESS + 'HTTPS://CYLINDERS.EXAMPLE/C/9JY7GJR41'))).toEqual([])
  })

  it('is not guessed where both readings have a right check and no address tells them apart', () => {
    const written = '7K3M9Q2TX'
    const seated = '9JY7GJR40'
    const keys = [...written].map((key, at) => ({ key, ...seatOf(seated.charAt(at)) }))
    expect(typedCodes(keys)).toEqual([])
  })

  it('takes the reading with the whole address where both have a right check', () => {
    const seated = 'HTTPS://CYLINDERS.EXAMPLE/C/9JY7GJR40'
    const written = 'HTTPSÖ--CYLINDERS.EXAMPLE-C-7K3M9Q2TX'
    const keys = [...written].map((key, at) => ({ key, ...seatOf(seated.charAt(at)) }))
    expect(typedCodes(keys)).toEqual(['9JY7GJR40'])
  })
})
