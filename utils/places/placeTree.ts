/** A place in the order of the tree, and how deep it stands in it. */
export interface TreePlace<P> { place: P, depth: number }

/**
 * The places as a tree read from the top, each followed by what stands in it; the order within one place stays.
 *
 * A place whose parent is not given stands at the top, and so does one that stands in itself by way of others.
 */
export function placeTree<P extends { id: string, parentId: string | null }>(places: readonly P[]): TreePlace<P>[] {
  const known = new Set(places.map(place => place.id))
  const shown = new Set<string>()
  const tree: TreePlace<P>[] = []

  function add(place: P, depth: number) {
    if (shown.has(place.id)) return
    shown.add(place.id)
    tree.push({ place, depth })
    places.filter(child => child.parentId === place.id).forEach(child => add(child, depth + 1))
  }

  places.filter(place => place.parentId === null || !known.has(place.parentId)).forEach(place => add(place, 0))
  places.forEach(place => add(place, 0))
  return tree
}
