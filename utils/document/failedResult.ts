import type { CylinderView } from '../custody/cylinderView'

/** What a test found that its owner is told in writing. */
export type FailedResult = 'rejected' | 'condemned'

/**
 * Which result a cylinder's owner is told of; null where it is neither rejected nor condemned.
 *
 * Shape: a cylinder that was condemned stays so, whatever it shows as after that.
 */
export function failedResultOf({ holds, findings }: Pick<CylinderView, 'holds' | 'findings'>): FailedResult | null {
  if (findings.some(({ code }) => code === 'condemned')) return 'condemned'
  return holds.includes('rejected') ? 'rejected' : null
}
