import type { CylinderRow } from '../custody/cylinderView'
import { formatLabelCode } from '../label/code'

/** A cylinder that was expected and not scanned, with who or what had it last. */
export interface MissingCylinder { id: string, name: string, last: string }

/** What a list has to say of a cylinder that it expects. */
export type ExpectedCylinder = Pick<CylinderRow, 'id' | 'labelCode' | 'serial' | 'place' | 'holder'>

/**
 * The expected cylinders that are neither among the scanned nor at the place that they are to come to, in the order of
 * the list.
 */
export function missingOf(expected: readonly ExpectedCylinder[], scannedIds: ReadonlySet<string>, targetId: string | null): MissingCylinder[] {
  const isThere = ({ place }: ExpectedCylinder) => targetId !== null && place?.id === targetId
  return expected.filter(each => !scannedIds.has(each.id) && !isThere(each)).map(each => ({ id: each.id, name: nameOf(each), last: lastOf(each) }))
}

/** "Expected 12: 11 scanned, 1 missing". */
export function tallyText(expected: number, missing: number): string {
  return `Expected ${expected}: ${expected - missing} scanned${missing ? `, ${missing} missing` : ''}`
}

function nameOf({ labelCode, serial }: ExpectedCylinder): string {
  const parts = [labelCode && formatLabelCode(labelCode), serial && `SN ${serial}`].filter(Boolean)
  return parts.length ? parts.join(', ') : 'without label and serial'
}

function lastOf({ holder, place }: ExpectedCylinder): string {
  if (holder) return `last with ${holder.name}${place ? `, ${place.name}` : ''}`
  return place ? `last at ${place.name}` : 'nobody has recorded where'
}
