import { LARGEST_PHOTO } from '../../../utils/photo/limits'
import { LARGEST_FILE, LARGEST_STATEMENT } from '../../../utils/settlement/fileKinds'

/** For the fields beside a file. */
const ROOM = 64 * 1024

/** The routes that take a file, and so a form in place of JSON, each with the largest form that is read, in bytes. */
const FORMS: readonly { path: RegExp, largest: number }[] = [
  { path: /^\/api\/(uploads|dock\/[^/?]+\/photos)(\?|$)/, largest: LARGEST_PHOTO + ROOM },
  { path: /^\/api\/shipments\/[^/?]+\/files(\?|$)/, largest: LARGEST_FILE + ROOM },
  { path: /^\/api\/shipments\/[^/?]+\/settlement\/csv-(preview|take-over)(\?|$)/, largest: LARGEST_STATEMENT + ROOM },
]

/** The largest form that a path takes, in bytes; null where it takes none. */
export function largestForm(path: string): number | null {
  return FORMS.find(form => form.path.test(path))?.largest ?? null
}
