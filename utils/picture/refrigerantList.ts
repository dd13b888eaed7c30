/** Which refrigerants a list shows. */
export type BurnFilter = 'all' | 'burns' | 'does-not-burn'

// R 410a, r410A and 410 a are one search.
function plain(text: string): string {
  return text.toUpperCase().replace(/[^A-Z0-9()]/g, '')
}

/** The lines whose designation holds what was typed, however it was spelled. */
export function withName<T extends { designation: string }>(lines: readonly T[], typed: string): T[] {
  const wanted = plain(typed)
  return lines.filter(line => plain(line.designation).includes(wanted))
}

/** The lines that burn, that do not, or all. */
export function withBurning<T extends { flammable: boolean }>(lines: readonly T[], filter: BurnFilter): T[] {
  return filter === 'all' ? [...lines] : lines.filter(line => line.flammable === (filter === 'burns'))
}
