import { isoWithOffset } from '~~/utils/quantity/instant'

/** The present instant as this device's clock has it, with its offset. */
export function deviceNow(ms = Date.now()): string {
  return isoWithOffset(ms, -new Date(ms).getTimezoneOffset())
}
