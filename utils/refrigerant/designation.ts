/**
 * A designation as a list spells it, in whatever case it was written; one that the list does not have stays as it is.
 *
 * @example asListed('r-134A', ['R-22', 'R-134a']) // 'R-134a'
 */
export function asListed(designation: string, listed: Iterable<string>): string {
  const names = [...listed]
  if (names.includes(designation)) return designation
  const wanted = designation.toUpperCase()
  return names.find(name => name.toUpperCase() === wanted) ?? designation
}
