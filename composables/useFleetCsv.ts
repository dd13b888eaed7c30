import { useAttempt } from '~~/composables/useAttempt'
import type { FleetQuery } from '~~/utils/contract/custody'
import type { FleetLayout } from '~~/utils/contract/fleetLayout'
import { fleetRequest } from '~~/utils/fleet/fleetAddress'
import type { MassUnit } from '~~/utils/quantity/mass'

/** Saves the whole list as the table shows it: its filters, order, columns and unit. */
export function useFleetCsv() {
  const { busy, problem, attempt } = useAttempt()

  function download(query: FleetQuery, { columns }: FleetLayout, unit: MassUnit, day: string) {
    return attempt(async () => {
      const { cursor: _page, limit: _length, ...list } = fleetRequest(query)
      const csv = await $fetch<Blob>('/api/cylinders', {
        query: { ...list, columns: columns.join(','), unit }, headers: { accept: 'text/csv' }, responseType: 'blob', retry: false,
      })
      const link = document.createElement('a')
      link.href = URL.createObjectURL(csv)
      link.download = `fleet-${day}.csv`
      link.click()
      // The browser has taken it by the next turn.
      setTimeout(() => URL.revokeObjectURL(link.href))
    })
  }

  return { busy, problem, download }
}
