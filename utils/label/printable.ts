/**
 * The letters that labels and papers can be printed with: Latin with its extensions, Greek and Cyrillic, and the signs
 * that go with them.
 *
 * Source: what the fonts of the papers hold, in all four faces.
 */
const PRINTABLE = /^[\u0300\u0301\u0303\u0309\u0323\u0020-\u007E\u00A0-\u017F\u0192\u01A0\u01A1\u01AF\u01B0\u0218-\u021B\u0237\u0259\u02BC\u02C6\u02C7\u02C9\u02DA\u02DC\u02DD\u0384-\u038A\u038C\u038E-\u03A1\u03A3-\u03CE\u03D1\u03D2\u03D6\u0400-\u0486\u0488-\u0513\u1E80-\u1E85\u1EA0-\u1EF9\u2013\u2014\u2018-\u201A\u201C-\u201E\u2020\u2022\u2026\u2032\u2033\u2039\u203A\u2044\u20A3\u20AC\u2113\u2116\u2122\u2212\u2215]$/

const NEVER_SEEN = /\p{Default_Ignorable_Code_Point}/gu

/** A text as it goes to print: letters and their marks as one, spaces of one kind, without what nobody sees. */
export function forPrint(text: string): string {
  return text.normalize('NFC').replace(NEVER_SEEN, '').replace(/\p{Z}/gu, ' ')
}

/** The characters of a text that no label can be printed with, each once. */
export function unprintable(text: string): string[] {
  return [...new Set(forPrint(text))].filter(letter => !PRINTABLE.test(letter))
}

/** What stands for a character that cannot be printed: its number, by which it can be looked up. @example spelled('株') // '[U+682A]' */
export function spelled(letter: string): string {
  return `[U+${letter.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}]`
}
