import { defineStore } from 'pinia'
import { useApi } from '~~/composables/useApi'
import { useSessionStore } from '~~/stores/session'
import type { SessionAnswer } from '~~/utils/contract/session'
import type { MassUnit } from '~~/utils/quantity/mass'

const KEPT_FOR_SECONDS = 365 * 24 * 3600
const MOST_RECENT = 3

/**
 * How this person reads the screens: the unit of weights goes with the person, the rest with the device, kept in cookies so
 * that the first drawing is right already.
 */
export const usePreferencesStore = defineStore('preferences', () => {
  const api = useApi()
  const session = useSessionStore()
  const cookie = { maxAge: KEPT_FOR_SECONDS, sameSite: 'strict' as const, path: '/' }
  const bigKeys = useCookie<boolean>('big-keys', { ...cookie, default: () => false })
  /** Whether a scan is answered by a tone. */
  const scanSounds = useCookie<boolean>('scan-sounds', { ...cookie, default: () => true })
  /** Whether a single key, such as the slash that goes to the search, does something. */
  const keyShortcuts = useCookie<boolean>('key-shortcuts', { ...cookie, default: () => true })
  /** The scale that a weight was last recorded with; '' for none that is named. */
  const lastScaleId = useCookie<string>('last-scale', { ...cookie, default: () => '' })
  const recentRefrigerants = useCookie<string[]>('recent-refrigerants', { ...cookie, default: () => [] })

  /** Whoever is not signed in has no account to keep it in. */
  const visitorsUnit = ref<MassUnit>('lb')
  let keeping: Promise<unknown> = Promise.resolve()
  const unit = computed<MassUnit>({
    get: () => session.user?.units ?? visitorsUnit.value,
    // Where it cannot be kept, out of reach of the server, it holds until the page is loaded anew.
    set: next => void keepUnit(next).catch(() => undefined),
  })

  /** Shows weights in a unit at once, and keeps that with the person. Errors: as of the API. */
  function keepUnit(units: MassUnit): Promise<unknown> {
    if (!session.user) visitorsUnit.value = units
    if (!session.user || units === session.user.units) return keeping
    session.set({ ...session.user, units })
    // One after the other, so that the last choice is the one that is kept.
    keeping = keeping.catch(() => undefined).then(() => api.patch<SessionAnswer>('/api/session/units', { units }))
    return keeping
  }

  /** Puts a refrigerant at the head of the last three. */
  function remember(designation: string) {
    const others = recentRefrigerants.value.filter(name => name !== designation)
    recentRefrigerants.value = [designation, ...others].slice(0, MOST_RECENT)
  }

  return { unit, keepUnit, bigKeys, scanSounds, keyShortcuts, lastScaleId, recentRefrigerants, remember }
})
