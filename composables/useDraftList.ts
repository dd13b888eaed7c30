import { useActedList, type CylinderList } from '~~/composables/useActedList'
import { useApi } from '~~/composables/useApi'
import { deviceNow } from '~~/stores/posting'

/** A test lot with its lines, and what may be done to it. */
export function useDraftList<L extends CylinderList>(kind: 'test-lots', id: string) {
  const api = useApi()
  const path = `/api/${kind}/${id}`
  const list = useActedList<L>(path)
  const { act, ids } = list

  /** Adds the cylinder with a code, or a serial, to the draft. */
  function add(typed: string): Promise<boolean> {
    return act(async () => {
      const added = await list.newOne(typed)
      return api.put<L>(`${path}/lines`, { cylinderIds: [...ids(), added] })
    })
  }

  function takeOff(cylinderIds: readonly string[]): Promise<boolean> {
    return act(() => api.put<L>(`${path}/lines`, { cylinderIds: ids().filter(one => !cylinderIds.includes(one)) }))
  }

  function putBack(cylinderIds: readonly string[]): Promise<boolean> {
    return act(() => api.put<L>(`${path}/lines`, { cylinderIds: [...new Set([...ids(), ...cylinderIds])] }))
  }

  function cancel(): Promise<boolean> {
    return act(() => api.post<L>(`${path}/cancel`, {}))
  }

  /** Records for all of its lines at once what happens now. */
  function record(what: 'dispatch' | 'return', body: object): Promise<boolean> {
    const now = deviceNow()
    return act(() => api.post<L>(`${path}/${what}`, { occurredAt: now, deviceNow: now, ...body }))
  }

  return { ...list, add, takeOff, putBack, cancel, record }
}
