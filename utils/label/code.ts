/** The 32 symbols that a label code is written in: Crockford's base 32, without the look-alikes I, L, O and U. */
export const LABEL_SYMBOLS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ'

/** How many characters a label code has, the check character among them. */
export const LABEL_CODE_LENGTH = 9

const DATA_LENGTH = LABEL_CODE_LENGTH - 1

/** ISO/IEC 7064 MOD 37-2 counts 0-9 as 0 to 9, A-Z as 10 to 35 and the asterisk as 36. */
const CHECK_ALPHABET = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ*'

/** A sound random source needs a redraw in about one draw of seven; this many in a row means that it is broken. */
const MOST_REDRAWS = 1000

/**
 * The check character that belongs behind these characters.
 *
 * Shape: upper-case letters and digits, eight of them for a label code; one character out, which may be
 * one that no label carries (I, L, O, U or an asterisk).
 * Errors: RangeError for any other character.
 * Source: ISO/IEC 7064, pure system MOD 37-2.
 *
 * @example checkCharacter('7K3M9Q2T') // 'X'
 */
export function checkCharacter(characters: string): string {
  let sum = 0
  for (const character of characters) {
    const value = CHECK_ALPHABET.indexOf(character)
    if (value < 0 || value === 36) {
      throw new RangeError(`Not a letter or digit of a code: ${character}`)
    }
    sum = ((sum + value) * 2) % 37
  }
  return CHECK_ALPHABET.charAt((38 - sum) % 37)
}

/** Whether this is a label code as it is stored: nine upper-case symbols, the ninth the right check character. */
export function isLabelCode(text: string): boolean {
  return text.length === LABEL_CODE_LENGTH
    && [...text].every(symbol => LABEL_SYMBOLS.includes(symbol))
    && checkCharacter(text.slice(0, DATA_LENGTH)) === text.charAt(DATA_LENGTH)
}

/**
 * What a person typed, letter by letter as a label would print it: upper case, i and l read as 1, o as 0,
 * hyphens and spaces left out. Characters that no label carries stay, so that they can be pointed at.
 */
export function readAsSymbols(text: string): string {
  return text.toUpperCase().replace(/[\s\u00AD\u2010-\u2015-]/g, '').replace(/[IL]/g, '1').replace(/O/g, '0')
}

/**
 * The label code that a person wrote, or null where this is none (a serial, say, or a slip of the finger).
 *
 * @example normaliseLabelCode('7k3-m9q 2tx') // '7K3M9Q2TX'
 */
export function normaliseLabelCode(text: string): string | null {
  const code = readAsSymbols(text)
  return isLabelCode(code) ? code : null
}

/**
 * A label code in three groups of three, as it is printed and shown.
 *
 * @example formatLabelCode('7K3M9Q2TX') // '7K3 M9Q 2TX'
 */
export function formatLabelCode(code: string): string {
  return labelCodeGroups(code).join(' ')
}

/** The groups of three in which a code, whole or still being typed, is read out. */
export function labelCodeGroups(code: string): string[] {
  return code.match(/.{1,3}/gu) ?? []
}

/**
 * A new label code from random bytes.
 *
 * Shape: `randomBytes` is asked for eight bytes a draw. Five bits of each make one symbol, so every symbol is
 * equally likely; a draw whose check character is none of the 32 symbols is thrown away whole.
 * Errors: RangeError where the source gives too few bytes, or only draws that have to be thrown away.
 */
export function drawLabelCode(randomBytes: (count: number) => Uint8Array): string {
  for (let draw = 0; draw < MOST_REDRAWS; draw++) {
    const bytes = randomBytes(DATA_LENGTH)
    if (bytes.length !== DATA_LENGTH) {
      throw new RangeError(`Asked the random source for ${DATA_LENGTH} bytes, got ${bytes.length}`)
    }
    const data = Array.from(bytes, byte => LABEL_SYMBOLS.charAt(byte & 31)).join('')
    const check = checkCharacter(data)
    if (LABEL_SYMBOLS.includes(check)) return data + check
  }
  throw new RangeError('The random source repeats itself: no draw made a label code')
}

/**
 * The address that a label's symbol holds, all upper case so that the symbol stays small.
 *
 * Shape: the public address of this server (scheme and host, a port if it has one, no path) and a code.
 * Errors: RangeError where the public address has a path: a path is case-sensitive and cannot be upper case.
 *
 * @example labelUrl('https://cylinders.example', '7K3M9Q2TX') // 'HTTPS://CYLINDERS.EXAMPLE/C/7K3M9Q2TX'
 */
export function labelUrl(publicUrl: string, code: string): string {
  const address = /^(https?:\/\/(?:[a-z0-9.-]+|\[[0-9a-f:.]+\])(?::\d+)?)\/?$/i.exec(publicUrl)?.[1]
  if (address === undefined) {
    throw new RangeError(`Not a scheme and a host alone: ${publicUrl}`)
  }
  return `${address.toUpperCase()}/C/${code}`
}

/**
 * The label code in what a camera or a hand scanner read, or null where there is none.
 *
 * Shape: an address of ours in any case, a bare code, or an address typed by a scanner with another keyboard's
 * layout, in which the slashes have become other marks. The last nine letters and digits count, where they stand
 * apart from what goes before and their check is right; a query or fragment behind them is passed over.
 *
 * @example readScannedText('HTTPSÑ--CYLINDERS.EXAMPLE-C-7K3M9Q2TX') // { code: '7K3M9Q2TX' }
 */
export function readScannedText(text: string): { code: string } | null {
  for (const candidate of [text.replace(/[?#].*$/su, ''), text]) {
    const code = lastCodeIn(candidate.toUpperCase())
    if (code !== null) return { code }
  }
  return null
}

function lastCodeIn(text: string): string | null {
  const tail = /(?:^|[^0-9A-Z])((?:[0-9A-Z][\s-]?){8}[0-9A-Z])[^0-9A-Z]*$/u.exec(text)?.[1]
  return tail === undefined ? null : normaliseLabelCode(tail)
}
