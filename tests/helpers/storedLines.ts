import type { Database } from '../../server/utils/database/database'

/** A line of the custody log, as far as its place in it goes. */
export interface StoredLine { id: string, cylinderId: string, seq: number, version: number }

/** The lines of the whole log in the order of recording. */
export async function storedLines({ readClient }: Pick<Database, 'readClient'>): Promise<StoredLine[]> {
  const { rows } = await readClient.execute('SELECT id, cylinder_id, seq, version FROM custody_events ORDER BY seq')
  return rows.map(row => ({ id: row[0] as string, cylinderId: row[1] as string, seq: row[2] as number, version: row[3] as number }))
}

/** What of the acknowledged events is not as it was promised, and where numbers are missing; empty where all is well. */
export function brokenPromises(acknowledged: readonly string[], lines: readonly StoredLine[]): string[] {
  const times = new Map<string, number>()
  for (const { id } of lines) times.set(id, (times.get(id) ?? 0) + 1)
  const versions = new Map<string, number>()
  const gaps = lines.flatMap(({ cylinderId, seq, version }, index) => {
    const before = versions.get(cylinderId) ?? 0
    versions.set(cylinderId, version)
    return [
      ...(seq === index + 1 ? [] : [`line ${seq} stands where ${index + 1} should`]),
      ...(version === before + 1 ? [] : [`version ${version} of ${cylinderId} follows ${before}`]),
    ]
  })
  return [
    ...acknowledged.filter(id => !times.has(id)).map(id => `${id} was acknowledged and is lost`),
    ...[...times].filter(([, count]) => count > 1).map(([id, count]) => `${id} is stored ${count} times`),
    ...gaps,
  ]
}
