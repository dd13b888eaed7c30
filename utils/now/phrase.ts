/** A number with its noun. @example counted(1, 'letter', 'letters') // '1 letter' */
export function counted(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`
}

/** Names in a row, at most three by name. @example listed(['Ada', 'Bo', 'Cy', 'Di']) // 'Ada, Bo, Cy and 1 more' */
export function listed(names: readonly string[]): string {
  const most = 3
  if (names.length > most) return `${names.slice(0, most).join(', ')} and ${names.length - most} more`
  return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`
}
