import { DAY, HOUR } from './calendar'
import type { Stage } from './lives'

/** What was written on paper and came into the log days later: a fill of a cylinder that had left with papers by then. */
export function playLate({ script, shipments, cast, endAt }: Stage): void {
  const shipment = shipments.findLast(one => one.cylinders.length > 0)
  const line = shipment?.cylinders[0]
  if (!shipment || !line) return
  const at = shipment.at - 3 * HOUR
  script.add(cast.people.second, at, line.steel.id, 'filled', { refrigerant: line.refrigerant, condition: 'suspect', grossAfter: line.gross, looked: true }, {
    lateMs: Math.max(HOUR, endAt - 2 * DAY - at), note: 'from the paper tag; no signal in that cellar',
  })
}
