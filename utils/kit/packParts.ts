/**
 * How an object of fixed keys is packed: each key's short name, and the value it usually has, which is left out.
 *
 * The usual value may be reckoned from the keys before it in the table, never from those after it: they are not there yet
 * when it is unpacked.
 */
export type PackParts<T extends object> = { readonly [K in keyof T]-?: { as: string, usual: (before: T) => T[K] } }

/** What differs from the usual, by short names. */
export type Packed = Record<string, unknown>

/** Packs by a table of parts. */
export function packBy<T extends object>(parts: PackParts<T>, value: T): Packed {
  const packed: Packed = {}
  for (const name of Object.keys(parts) as (keyof T & string)[]) {
    const { as, usual } = parts[name]
    // By text: the order of keys within a value is kept as well.
    if (JSON.stringify(value[name]) !== JSON.stringify(usual(value))) packed[as] = value[name]
  }
  return packed
}

/**
 * The value that was packed.
 *
 * @param empty has every key, in the order in which the value has them.
 */
export function unpackBy<T extends object>(parts: PackParts<T>, packed: Packed, empty: T): T {
  const value = { ...empty }
  for (const name of Object.keys(parts) as (keyof T & string)[]) {
    const { as, usual } = parts[name]
    value[name] = as in packed ? packed[as] as T[typeof name] : usual(value)
  }
  return value
}
