import type { LabelQr } from './drawing'
import { moduleSize, type SymbolPlace } from './moduleSize'
import { labelSymbol, symbolPath } from './symbol'

/**
 * The symbol of an address in the middle of its place, as large as place, printer and curve allow.
 *
 * Units: millimetres. Errors: RangeError where it does not fit; ask `moduleSize` before.
 */
export function placedSymbol(
  payload: string, place: { x: number, y: number, sideMm: number }, on: Pick<SymbolPlace, 'dotsPerInch' | 'diameterMm'>,
): LabelQr {
  const symbol = labelSymbol(payload)
  const size = moduleSize({ modules: symbol.size, sideMm: place.sideMm, ...on })
  if (!('moduleMm' in size)) throw new RangeError(`The symbol of this address does not fit: ${size.is}`)
  return {
    payload,
    version: symbol.version,
    level: symbol.level,
    modules: symbol.size,
    moduleMm: size.moduleMm,
    x: place.x - size.sideMm / 2,
    y: place.y - size.sideMm / 2,
    path: symbolPath(symbol),
  }
}
