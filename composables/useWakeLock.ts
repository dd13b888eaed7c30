/** Whether the screen is kept from going dark: it is, this device cannot, or it did not let us just now. */
export type WakeLockState = 'off' | 'held' | 'unsupported' | 'refused'

/** Keeps the screen awake while `isWanted`, and again whenever the page comes back into sight. */
export function useWakeLock(isWanted: () => boolean) {
  const state = ref<WakeLockState>('off')
  let lock: WakeLockSentinel | null = null

  async function take() {
    if (!isWanted() || document.visibilityState !== 'visible') return
    if (!('wakeLock' in navigator)) {
      state.value = 'unsupported'
      return
    }
    if (lock && !lock.released) return
    try {
      lock = await navigator.wakeLock.request('screen')
      state.value = 'held'
      // The system takes it back where the page goes out of sight, or the battery is low.
      lock.addEventListener('release', () => {
        if (isWanted()) state.value = 'refused'
      })
      if (!isWanted()) await give()
    }
    catch {
      state.value = 'refused'
    }
  }

  async function give() {
    state.value = 'off'
    await lock?.release().catch(() => undefined)
    lock = null
  }

  onMounted(() => {
    watch(isWanted, wanted => void (wanted ? take() : give()), { immediate: true })
    document.addEventListener('visibilitychange', take)
  })
  onBeforeUnmount(() => {
    document.removeEventListener('visibilitychange', take)
    void give()
  })

  return state
}
