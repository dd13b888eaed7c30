import { MS_PER_DAY } from '../quantity/instant'

/** No phone that sends us photos is older: common practice, no source. A clock that was never set says less. */
const EARLIEST = Date.parse('2000-01-01T00:00:00Z')

/**
 * When a photo was taken, by its phone's clock; null where that clock cannot have been right: before there were such
 * phones, or more than a day after the photo arrived.
 *
 * Units: UTC milliseconds.
 */
export function takenAtOf(claimed: string | undefined, arrivedAt: number): number | null {
  const at = claimed === undefined ? NaN : Date.parse(claimed)
  return at >= EARLIEST && at <= arrivedAt + MS_PER_DAY ? at : null
}
