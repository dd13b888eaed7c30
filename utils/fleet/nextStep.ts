import type { CylinderRow } from '../custody/cylinderView'
import { isFull } from './rowVerdict'

/** What to do with a cylinder next, and which screen does it. */
export interface NextStep {
  word: string
  screen: 'cylinder' | 'shipment' | 'test-lot' | 'label'
}

/**
 * The next thing to do with a cylinder; null where nothing of ours is to be done.
 *
 * A cylinder with something in it is never sent to its test: it is emptied or shipped first. What belongs to two owners
 * only goes to reclaim.
 */
export function nextStep(row: CylinderRow): NextStep | null {
  const has = (code: CylinderRow['findingCodes'][number]) => row.findingCodes.includes(code)
  if (row.lifecycle === 'retired' && has('after-end')) return { word: 'See why', screen: 'cylinder' }
  if (row.lifecycle === 'retired') return null
  if (row.lifecycle === 'condemned') return { word: row.nothingInIt ? 'Take it out of use' : 'Empty it', screen: 'cylinder' }
  if (row.lifecycle === 'at-reclaim' || row.lifecycle === 'at-test') return { word: 'Await it', screen: 'cylinder' }
  if (row.lifecycle === 'missing') return { word: 'Look for it', screen: 'cylinder' }
  if (has('overfill')) return { word: 'Draw it down', screen: 'cylinder' }
  if (has('not-seen')) return { word: 'Look for it', screen: 'cylinder' }
  if (row.lifecycle === 'rejected') return { word: 'Open it', screen: 'cylinder' }
  if (!row.nothingInIt && row.refrigerant === null) return { word: 'Identify it', screen: 'cylinder' }
  if (has('retest-overdue') || has('early-test') || has('retest-unknown')) {
    return row.nothingInIt ? { word: 'Send to test', screen: 'test-lot' } : { word: 'Empty or ship it', screen: 'shipment' }
  }
  if (has('wet')) return { word: 'Evacuate it', screen: 'cylinder' }
  if (row.worstFinding?.severity === 'stop') return { word: 'See why', screen: 'cylinder' }
  if (row.labelCode === null) return { word: 'Label it', screen: 'label' }
  if (!row.nothingInIt && row.netGrams === null) return { word: 'Weigh it', screen: 'cylinder' }
  if (has('two-owners')) return { word: 'Ship it', screen: 'shipment' }
  if (has('nearly-full')) return isFull(row) ? { word: 'Ship it', screen: 'shipment' } : { word: 'Bring it back', screen: 'cylinder' }
  if (has('retest-soon') && row.nothingInIt) return { word: 'Plan its test', screen: 'test-lot' }
  if (row.fillLimitGrams !== null && row.stopWeightGrams === null) return { word: 'See why', screen: 'cylinder' }
  return { word: 'Fill it', screen: 'cylinder' }
}
