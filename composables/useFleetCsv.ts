import { useCsvFile } from '~~/composables/useCsvFile'
import type { FleetQuery } from '~~/utils/contract/custody'
import type { FleetLayout } from '~~/utils/contract/fleetLayout'
import { fleetRequest } from '~~/utils/fleet/fleetAddress'
import type { MassUnit } from '~~/utils/quantity/mass'

/** Saves the whole list as the table shows it: its filters, order, columns and unit. */
export function useFleetCsv() {
  const { busy, problem, save } = useCsvFile()

  function download(query: FleetQuery, { columns }: FleetLayout, unit: MassUnit, day: string) {
    const { cursor: _page, limit: _length, ...list } = fleetRequest(query)
    return save('/api/cylinders', { ...list, columns: columns.join(','), unit }, `fleet-${day}.csv`)
  }

  return { busy, problem, download }
}
