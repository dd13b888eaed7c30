import { v7 as uuidv7 } from 'uuid'

/** Ids of the events that a form will write: one for each thing named, the same when it is sent again. */
export function useEventIds() {
  const ids = new Map<string, string>()

  return (about: string): string => {
    const known = ids.get(about)
    if (known !== undefined) return known
    const made = uuidv7()
    ids.set(about, made)
    return made
  }
}
