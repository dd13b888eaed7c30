import type { CylinderState } from './state'

/** How and when a cylinder's life ended. */
export interface End { how: 'condemned' | 'retired', since: number }

/** What ended a cylinder first in effect; null while it is in use. */
export function endOf({ condemnedAt, retired }: Pick<CylinderState, 'condemnedAt' | 'retired'>): End | null {
  const ends: End[] = [
    ...(condemnedAt === null ? [] : [{ how: 'condemned' as const, since: condemnedAt }]),
    ...(retired ? [{ how: 'retired' as const, since: retired.since }] : []),
  ]
  return ends.sort((a, b) => a.since - b.since)[0] ?? null
}
