import { LABEL_CODE_LENGTH, labelUrl } from './code'
import { qrMatrix, type CorrectionLevel } from './qrMatrix'

/** Light modules that have to stay free on every side of a symbol (ISO/IEC 18004). */
export const QUIET_MODULES = 4

/** The longest host that still gives the usual symbol, version 3 at level Q: 47 characters less the rest of the address. */
export const HOST_CHARACTERS = 27

/** The longest host that gives it level H: 35 characters less the rest. */
export const STRONGEST_HOST_CHARACTERS = 15

/** The symbol of a label: `size` modules a side, asked for by column and row from the top left; outside it all is light. */
export interface LabelSymbol {
  version: number
  level: CorrectionLevel
  size: number
  isDark: (x: number, y: number) => boolean
}

/**
 * The symbol for a label's payload: as small as level Q allows, and level H where that costs nothing.
 *
 * Q stands a patch of dirt on a sixth of the symbol; where the version has room to spare, H stands more
 * in the same space.
 */
export function labelSymbol(payload: string): LabelSymbol {
  const quartile = qrMatrix(payload, 'Q')
  const high = qrMatrix(payload, 'H')
  const level = high.version <= quartile.version ? 'H' : 'Q'
  const { version, rows } = level === 'H' ? high : quartile
  return { version, level, size: rows.length, isDark: (x, y) => rows[y]?.[x] ?? false }
}

/**
 * The dark modules as one path for SVG and PDF, each run of neighbours in a row merged.
 *
 * Units: modules, from the symbol's top left corner, without the quiet zone; whole numbers only.
 *
 * @example a row of two dark modules after a light one // 'M1 0h2v1h-2z'
 */
export function symbolPath(symbol: LabelSymbol): string {
  const runs: string[] = []
  for (let y = 0; y < symbol.size; y++) {
    for (let x = 0; x < symbol.size; x++) {
      if (!symbol.isDark(x, y)) continue
      const start = x
      while (symbol.isDark(x + 1, y)) x++
      const length = x + 1 - start
      runs.push(`M${start} ${y}h${length}v1h-${length}z`)
    }
  }
  return runs.join('')
}

/** What a host means for the labels printed with it. */
export interface HostBudget {
  hostCharacters: number
  version: number
  level: CorrectionLevel
  modules: number
  /** The host is longer than the usual symbol has room for: its modules print smaller and read less far. */
  isLong: boolean
}

/**
 * The symbol that the labels of this host will carry.
 *
 * Shape: a host as in an address, its port with it; judged for https.
 *
 * @example hostBudget('cylinders.example') // { hostCharacters: 17, version: 3, level: 'Q', modules: 29, isLong: false }
 */
export function hostBudget(host: string): HostBudget {
  // Letters only: digits would be packed more tightly and could flatter the host.
  const { version, level, size } = labelSymbol(labelUrl(`https://${host}`, 'X'.repeat(LABEL_CODE_LENGTH)))
  return { hostCharacters: host.length, version, level, modules: size, isLong: host.length > HOST_CHARACTERS }
}
