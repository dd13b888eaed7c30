import type { NowLine } from '../contract/now'

/** How many things wait, in a few words. @example '7 things, the most dangerous first' */
export function whatWaits(lines: readonly Pick<NowLine, 'kind'>[]): string {
  if (lines.length === 0) return 'Nothing needs you now.'
  if (lines.length === 1) return '1 thing'
  return `${lines.length} things, the most ${lines[0]?.kind === 'stop' ? 'dangerous' : 'urgent'} first`
}
