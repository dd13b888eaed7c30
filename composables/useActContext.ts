import type { ActLists } from '~~/utils/contract/actLists'
import { useApi } from '~~/composables/useApi'
import { useClock } from '~~/composables/useClock'
import { useFirmRulesStore } from '~~/stores/firmRules'
import { usePreferencesStore } from '~~/stores/preferences'
import { useSessionStore } from '~~/stores/session'
import type { CustodyLogAnswer, CylinderView } from '~~/utils/contract/custody'
import type { PeopleAnswer } from '~~/utils/contract/people'
import type { FirmsAnswer, PlacesAnswer } from '~~/utils/contract/places'
import type { RefrigerantsAnswer } from '~~/utils/contract/refrigerants'
import type { DraftContext } from '~~/utils/custody/draft/draft'
import { lastGross, lastGrossByNet } from '~~/utils/custody/draft/lastGross'
import { monthOfInstant } from '~~/utils/quantity/month'

const LINES_LOOKED_AT = 20

/** What the forms of a cylinder's events begin from and choose from. */
export function useActContext(view: () => CylinderView | null | undefined, asked: () => string | null) {
  const api = useApi()
  const route = useRoute()
  const session = useSessionStore()
  const preferences = usePreferencesStore()
  const rules = useFirmRulesStore()
  const now = useClock()
  const reference = encodeURIComponent(String(Object(route.params).ref))

  const request = useAsyncData(`act-${reference}`, async () => {
    const [log, places, firms, people, refrigerants, policy] = await Promise.all([
      api.get<CustodyLogAnswer>(`/api/cylinders/${reference}/events`, { limit: LINES_LOOKED_AT }),
      api.get<PlacesAnswer>('/api/places', { active: true }),
      api.get<FirmsAnswer>('/api/firms', { active: true }),
      api.get<PeopleAnswer>('/api/people', { active: true }),
      api.get<RefrigerantsAnswer>('/api/refrigerants'),
      rules.load(),
    ])
    return {
      log: log.isWithServer ? null : log.items,
      lists: {
        places: places.items.map(({ id, name, kind, firmId, technicianId }) => ({ id, name, kind, firmId, technicianId })),
        firms: firms.items,
        people: people.items,
        scales: policy.scales,
        refrigerants: refrigerants.items.map(line => line.designation),
        recent: preferences.recentRefrigerants,
      } satisfies ActLists,
    }
  })

  const lists = computed(() => request.data.value?.lists ?? null)
  const context = computed<DraftContext | null>(() => {
    const cylinder = view()
    if (!cylinder || !request.data.value || !session.user) return null
    return {
      view: cylinder,
      unit: preferences.unit,
      personId: session.user.id,
      thisMonth: monthOfInstant(now.value, rules.timeZone),
      places: request.data.value.lists.places,
      asked: asked(),
      lastGross: request.data.value.log ? lastGross(cylinder, request.data.value.log) : lastGrossByNet(cylinder, preferences.unit),
      scaleId: request.data.value.lists.scales.find(scale => scale.active && scale.id === preferences.lastScaleId)?.id,
    }
  })

  return { ready: request as PromiseLike<unknown>, error: request.error, refresh: request.refresh, lists, context }
}
