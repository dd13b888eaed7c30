import type { CDPSession, Page } from 'playwright-core'

/** What a device with another layout writes where the scanner, which takes a US keyboard for granted, means something else. */
export type Layout = Record<string, string>

export const GERMAN: Layout = { 'Y': 'Z', 'Z': 'Y', ':': 'Ö', '/': '-', '-': 'ß' }
export const FRENCH: Layout = {
  'A': 'Q', 'Q': 'A', 'W': 'Z', 'Z': 'W', 'M': '?', ':': 'M', '/': '!', '.': ':',
  '0': 'à', '1': '&', '2': 'é', '3': '"', '4': '\'', '5': '(', '6': '-', '7': 'è', '8': '_', '9': 'ç',
}

const GAP_SECONDS = 0.008
const SHIFT = 8

const SEATS: Record<string, { code: string, shift: boolean }> = {
  ':': { code: 'Semicolon', shift: true }, '/': { code: 'Slash', shift: false }, '.': { code: 'Period', shift: false }, '-': { code: 'Minus', shift: false },
}

/** A hand scanner plugged into a page's browser: it types, key by key, 8 ms apart. */
export async function handScanner(page: Page) {
  const cdp = await page.context().newCDPSession(page)
  return {
    async scan(text: string, { enter, layout = {} }: { enter: boolean, layout?: Layout }): Promise<void> {
      const begin = Date.now() / 1_000
      const keys = [...text].map((character, at) => strike(cdp, { key: layout[character] ?? character, text: layout[character] ?? character, ...seatOf(character) }, begin + at * GAP_SECONDS))
      // All are on their way at once: on a busy machine a wait between two would look like a person's.
      if (enter) keys.push(strike(cdp, { key: 'Enter', text: '\r', code: 'Enter', shift: false }, begin + text.length * GAP_SECONDS))
      await Promise.all(keys)
    },
  }
}

function seatOf(character: string): { code: string, shift: boolean } {
  if (/[A-Z]/.test(character)) return { code: `Key${character}`, shift: true }
  return SEATS[character] ?? { code: `Digit${character}`, shift: false }
}

async function strike(cdp: CDPSession, { shift, ...key }: { key: string, text: string, code: string, shift: boolean }, timestamp: number): Promise<void> {
  const enter = key.key === 'Enter' ? { windowsVirtualKeyCode: 13 } : {}
  await Promise.all([
    cdp.send('Input.dispatchKeyEvent', { type: 'keyDown', modifiers: shift ? SHIFT : 0, timestamp, ...key, ...enter }),
    cdp.send('Input.dispatchKeyEvent', { type: 'keyUp', modifiers: shift ? SHIFT : 0, timestamp, key: key.key, code: key.code, ...enter }),
  ])
}
