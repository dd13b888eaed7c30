import { OUTBOX_WAITS_KEY } from '~~/utils/outbox/waitKey'

/** Notes for the next visit whether something waits on this device. */
export function noteWaiting(waits: boolean) {
  try {
    if (waits) localStorage.setItem(OUTBOX_WAITS_KEY, '1')
    else localStorage.removeItem(OUTBOX_WAITS_KEY)
  }
  catch {
    // Then it is looked for at every visit.
  }
}

/** Whether something may be waiting; where nothing can be noted, it may. */
export function mayWait(): boolean {
  try {
    return localStorage.getItem(OUTBOX_WAITS_KEY) !== null
  }
  catch {
    return true
  }
}
