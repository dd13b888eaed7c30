import { defineStore } from 'pinia'
import { useSessionStore } from '~~/stores/session'
import type { MassUnit } from '~~/utils/quantity/mass'

const KEPT_FOR_SECONDS = 365 * 24 * 3600
const MOST_RECENT = 3

/** How this person reads the screens on this device. Kept in cookies, so that the first drawing is right already. */
export const usePreferencesStore = defineStore('preferences', () => {
  const session = useSessionStore()
  const cookie = { maxAge: KEPT_FOR_SECONDS, sameSite: 'strict' as const, path: '/' }
  const chosenUnit = useCookie<MassUnit | null>('unit', { ...cookie, default: () => null })
  const bigKeys = useCookie<boolean>('big-keys', { ...cookie, default: () => false })
  /** Whether a scan is answered by a tone. */
  const scanSounds = useCookie<boolean>('scan-sounds', { ...cookie, default: () => true })
  /** Whether a single key, such as the slash that goes to the search, does something. */
  const keyShortcuts = useCookie<boolean>('key-shortcuts', { ...cookie, default: () => true })
  /** The scale that a weight was last recorded with; '' for none that is named. */
  const lastScaleId = useCookie<string>('last-scale', { ...cookie, default: () => '' })
  const recentRefrigerants = useCookie<string[]>('recent-refrigerants', { ...cookie, default: () => [] })

  const unit = computed<MassUnit>({
    get: () => chosenUnit.value ?? session.user?.units ?? 'lb',
    set: (next) => {
      chosenUnit.value = next
    },
  })

  /** Puts a refrigerant at the head of the last three. */
  function remember(designation: string) {
    const others = recentRefrigerants.value.filter(name => name !== designation)
    recentRefrigerants.value = [designation, ...others].slice(0, MOST_RECENT)
  }

  return { unit, bigKeys, scanSounds, keyShortcuts, lastScaleId, recentRefrigerants, remember }
})
