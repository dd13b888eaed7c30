/** What the bundler knows of a module once the whole table of imports is read. */
interface Linked {
  isEntry: boolean
  /** What fetches it when it is needed: it opens a file of its own. */
  dynamicImporters: readonly string[]
  importedIds: readonly string[]
}

type Known = (id: string) => Linked | null

/** What is opened in a plant room on one bar of signal. */
const SCREENS = ['pages/c/[ref]/index.vue', 'layouts/field.vue', 'layouts/desk.vue']

/**
 * Tells the bundler which modules go into one file: those that the cylinder page has in common with other pages. Each in a
 * file of its own, they weigh half as much again, for what is compressed alone finds little to repeat.
 *
 * What one screen alone has stays with it, what every page has stays in the entry, and so does what is fetched when it is needed.
 */
export function sharedParts() {
  let shared: Set<string> | null = null

  return (id: string, { getModuleIds, getModuleInfo }: { getModuleIds: () => Iterable<string>, getModuleInfo: Known }): 'shared' | undefined => {
    shared ??= sharedOf([...getModuleIds()], getModuleInfo)
    return shared.has(id) ? 'shared' : undefined
  }
}

function sharedOf(ids: readonly string[], known: Known): Set<string> {
  const isEntry = (id: string) => known(id)?.isEntry === true
  const isFetched = (id: string) => (known(id)?.dynamicImporters.length ?? 0) > 0
  const openings = ids.filter(id => isEntry(id) || isFetched(id))
  const screens = openings.filter(id => SCREENS.some(screen => id.endsWith(`/${screen}`)))
  if (screens.length !== SCREENS.length) throw new Error(`These are no screens any more: ${SCREENS.join(', ')}`)

  const loaded = new Map(openings.map(id => [id, loadedWith(id, known)]))
  const times = new Map<string, number>()
  for (const id of [...loaded.values()].flatMap(each => [...each])) times.set(id, (times.get(id) ?? 0) + 1)
  const always = new Set(openings.filter(isEntry).flatMap(id => [...loaded.get(id)!]))
  const ofScreens = screens.flatMap(id => [...loaded.get(id)!])
  return new Set(ofScreens.filter(id => times.get(id)! > 1 && !always.has(id) && !isFetched(id)))
}

/** A module with all that is loaded before it can run. */
function loadedWith(start: string, known: Known): Set<string> {
  const found = new Set([start])
  for (const id of found) {
    for (const next of known(id)?.importedIds ?? []) found.add(next)
  }
  return found
}
