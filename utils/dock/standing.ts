import { isOfKind, type LinkedDockEntry } from './entry'

/**
 * The entries that count, each once, in the order in which they were made: without those that were taken out over their
 * own link, and without the takings out themselves. The order in which they arrive does not matter.
 */
export function standingEntries(entries: readonly LinkedDockEntry[]): LinkedDockEntry[] {
  const takenOut = new Set(entries.filter(entry => isOfKind(entry, 'taken-out')).map(({ linkId, said }) => `${linkId} ${said.entryId}`))
  return inOrder(entries).filter(({ id, kind, linkId }) => kind !== 'taken-out' && !takenOut.has(`${linkId} ${id}`))
}

/** Each entry once, by when it was made; of the same instant by its id. */
export function inOrder(entries: readonly LinkedDockEntry[]): LinkedDockEntry[] {
  return [...new Map(entries.map(entry => [entry.id, entry])).values()]
    .sort((a, b) => Date.parse(a.at) - Date.parse(b.at) || (a.id < b.id ? -1 : 1))
}
