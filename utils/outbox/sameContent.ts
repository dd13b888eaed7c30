import canonicalize from 'canonicalize'
import type { CustodyEvent } from '../custody/event'

/** Whether two events say the same, whatever their place in the device's count. */
export function sameContent(a: CustodyEvent, b: CustodyEvent): boolean {
  return canonicalize({ ...a, deviceSeq: 0 }) === canonicalize({ ...b, deviceSeq: 0 })
}
