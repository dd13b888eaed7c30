import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  checkCharacter, drawLabelCode, formatLabelCode, isLabelCode, labelUrl, LABEL_SYMBOLS, normaliseLabelCode, readScannedText,
} from '../../../../utils/label/code'

const codes = fc.uint8Array({ minLength: 8, maxLength: 8 })
  .filter(bytes => LABEL_SYMBOLS.includes(checkCharacter(symbolsOf(bytes))))
  .map(bytes => symbolsOf(bytes) + checkCharacter(symbolsOf(bytes)))

function symbolsOf(bytes: Uint8Array): string {
  return Array.from(bytes, byte => LABEL_SYMBOLS.charAt(byte % 32)).join('')
}

describe('the check character', () => {
  it('is H for the donation number G123 498 654 321 (worked example of the UK transfusion guidelines, Red Book, annex on ISO/IEC 7064 MOD 37-2)', () => {
    expect(checkCharacter('G123498654321')).toBe('H')
  })

  it('is X for 7K3M9Q2T: 1792 + 2560 + 192 + 704 + 144 + 208 + 8 + 58 = 5666, 37 into that leaves 5, 38 less 5 is 33', () => {
    expect(checkCharacter('7K3M9Q2T')).toBe('X')
  })

  it('may be an asterisk or a letter that no label carries', () => {
    // 00000001: sum 2, 38 - 2 = 36. 0000000A: sum 20, 38 - 20 = 18 = I.
    expect(checkCharacter('00000001')).toBe('*')
    expect(checkCharacter('0000000A')).toBe('I')
  })

  it('is refused for what is no letter or digit', () => {
    expect(() => checkCharacter('7K3-M9Q2')).toThrow(RangeError)
    expect(() => checkCharacter('7K3*M9Q2')).toThrow(RangeError)
  })

  it('tells every single wrong symbol', () => {
    fc.assert(fc.property(codes, (code) => {
      for (let place = 0; place < 9; place++) {
        for (const symbol of LABEL_SYMBOLS) {
          if (symbol === code[place]) continue
          expect(isLabelCode(code.slice(0, place) + symbol + code.slice(place + 1))).toBe(false)
        }
      }
    }), { numRuns: 50 })
  })

  it('tells every two neighbours swapped', () => {
    fc.assert(fc.property(codes, (code) => {
      for (let place = 0; place < 8; place++) {
        if (code[place] === code[place + 1]) continue
        expect(isLabelCode(code.slice(0, place) + code[place + 1] + code[place] + code.slice(place + 2))).toBe(false)
      }
    }))
  })
})

describe('a label code', () => {
  it('has nine symbols, the ninth the right check character', () => {
    expect(isLabelCode('7K3M9Q2TX')).toBe(true)
    expect(isLabelCode('7K3M9Q2TY')).toBe(false)
    expect(isLabelCode('7K3M9Q2T')).toBe(false)
    expect(isLabelCode('7K3M9Q2TX0')).toBe(false)
    expect(isLabelCode('7k3m9q2tx')).toBe(false)
    expect(isLabelCode('')).toBe(false)
  })

  it('holds no I even where that is the check character', () => {
    expect(isLabelCode('0000000AI')).toBe(false)
  })

  it.each([
    ['7k3 m9q 2tx'], ['7K3-M9Q-2TX'], [' 7k3m9q2tx '], ['7K3–M9Q–2TX'], ['7K3\u00A0M9Q\u00A02TX'],
  ])('is read from %j, in any case and grouping', (typed) => {
    expect(normaliseLabelCode(typed)).toBe('7K3M9Q2TX')
  })

  it('is read with i and l as 1 and o as 0 (the reading rule of Crockford\'s base 32)', () => {
    // 10100000: 256 + 64 = 320, 37 into that leaves 24, 38 less 24 is 14, an E.
    expect(normaliseLabelCode('10100000E')).toBe('10100000E')
    expect(normaliseLabelCode('ioLoOoooe')).toBe('10100000E')
  })

  it('is not read from what does not check, nor with a U in it', () => {
    expect(normaliseLabelCode('7K3 M9Q 2TY')).toBeNull()
    expect(normaliseLabelCode('7K3 M9U 2TX')).toBeNull()
    expect(normaliseLabelCode('K48213')).toBeNull()
  })

  it('is shown as three threes, whole or while it is typed', () => {
    expect(formatLabelCode('7K3M9Q2TX')).toBe('7K3 M9Q 2TX')
    expect(formatLabelCode('7K3M')).toBe('7K3 M')
  })
})

describe('drawing a label code', () => {
  it('takes five bits of each of eight bytes', () => {
    // The places of 7, K, 3, M, 9, Q, 2, T among the symbols; the upper bits are passed over.
    const bytes = Uint8Array.of(7, 19 + 32, 3, 20 + 224, 9, 23, 2, 26)
    expect(drawLabelCode(() => bytes)).toBe('7K3M9Q2TX')
  })

  it('throws a draw away whose check character no label carries', () => {
    const draws = [Uint8Array.of(0, 0, 0, 0, 0, 0, 0, 1), Uint8Array.of(7, 19, 3, 20, 9, 23, 2, 26)]
    expect(drawLabelCode(() => draws.shift()!)).toBe('7K3M9Q2TX')
    expect(draws).toEqual([])
  })

  it('gives a label code whatever the bytes', () => {
    fc.assert(fc.property(fc.infiniteStream(fc.integer({ min: 0, max: 255 })), (bytes) => {
      const source = (count: number) => Uint8Array.from({ length: count }, () => bytes.next().value)
      expect(isLabelCode(drawLabelCode(source))).toBe(true)
    }))
  })

  it('gives up on a source that is stuck or short', () => {
    expect(() => drawLabelCode(() => Uint8Array.of(0, 0, 0, 0, 0, 0, 0, 1))).toThrow(/repeats itself/)
    expect(() => drawLabelCode(() => Uint8Array.of(1, 2, 3))).toThrow(/8 bytes, got 3/)
  })
})

describe('the address on a label', () => {
  it('is upper case throughout', () => {
    expect(labelUrl('https://cylinders.example', '7K3M9Q2TX')).toBe('HTTPS://CYLINDERS.EXAMPLE/C/7K3M9Q2TX')
    expect(labelUrl('http://localhost:3000/', '7K3M9Q2TX')).toBe('HTTP://LOCALHOST:3000/C/7K3M9Q2TX')
    expect(labelUrl('http://[::1]:3000', '7K3M9Q2TX')).toBe('HTTP://[::1]:3000/C/7K3M9Q2TX')
  })

  it.each([['https://cylinders.example/app'], ['https://name@cylinders.example'], ['cylinders.example'], ['ftp://cylinders.example'], ['https://zylinder.böttcher.example']])(
    'is not made from %s', (address) => {
      expect(() => labelUrl(address, '7K3M9Q2TX')).toThrow(RangeError)
    })
})

describe('what a scanner reads', () => {
  it.each([
    ['HTTPS://CYLINDERS.EXAMPLE/C/7K3M9Q2TX'],
    ['https://cylinders.example/c/7k3m9q2tx'],
    ['https://cylinders.example/c/7k3-m9q-2tx/'],
    ['https://cylinders.example/c/7k3m9q2tx?from=phone'],
    ['HTTPSÑ--CYLINDERS.EXAMPLE-C-7K3M9Q2TX'],
    ['HTTPS>&&CYLINDERS.EXAMPLE&C&7K3M9Q2TX\r\n'],
    ['HTTPS?--CYLINDERS.EXAMPLE-C-7K3M9Q2TX'],
    ['7K3 M9Q 2TX'],
    ['7k3m9q2tx\t'],
  ])('names the label in %j', (text) => {
    expect(readScannedText(text)).toEqual({ code: '7K3M9Q2TX' })
  })

  it.each([
    ['HTTPS://CYLINDERS.EXAMPLE/C/7K3M9Q2TY', 'a wrong check character'],
    ['HTTPS://CYLINDERS.EXAMPLE/C/', 'no code'],
    ['00007K3M9Q2TX', 'a longer number that ends like a code'],
    ['K48213', 'a serial'],
    ['', 'nothing'],
  ])('names no label in %j: %s', (text) => {
    expect(readScannedText(text)).toBeNull()
  })
})
