/** What an address holds under a name; '' where it holds nothing, or several. */
export function queryText(query: Readonly<Record<string, unknown>>, name: string): string {
  const value = query[name]
  return typeof value === 'string' ? value : ''
}

/**
 * What an address lists under a name, parted by commas.
 *
 * @example queryList({ with: 'a, b,' }, 'with') // ['a', 'b']
 */
export function queryList(query: Readonly<Record<string, unknown>>, name: string): string[] {
  return queryText(query, name).split(',').map(part => part.trim()).filter(part => part !== '')
}

/** An address without the names that hold nothing. */
export function withoutEmpty<T extends Readonly<Record<string, string>>>(query: T): Partial<T> {
  return Object.fromEntries(Object.entries(query).filter(([, value]) => value !== '')) as Partial<T>
}
