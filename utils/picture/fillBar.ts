/** The small bar of a table's row, as lengths in percent of its width. */
export type FillBar = {
  limit: number
  filled: number
  /** How far it reaches past the limit; 0 while it does not. */
  over: number
}

/**
 * Lays out net contents against the fill limit and the water-full cylinder; null where one of them is not known.
 */
export function layOutFillBar(netGrams: number | null, limitGrams: number | null, waterGrams: number | null): FillBar | null {
  if (netGrams === null || limitGrams === null || waterGrams === null) return null
  const endGrams = Math.max(waterGrams, netGrams, limitGrams)
  if (endGrams <= 0) return null
  const limit = limitGrams / endGrams * 100
  const net = Math.max(0, netGrams) / endGrams * 100
  return { limit, filled: Math.min(net, limit), over: Math.max(0, net - limit) }
}
