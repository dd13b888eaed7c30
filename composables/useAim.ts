const FREEZE_MS = 600
const FIRST_HINT_MS = 4_000
const SECOND_HINT_MS = 8_000
const AT_FIRST = 'Hold it a hand’s length away'

/** How a camera is held on a label: what it says to the hand while nothing is read, its torch, and its rest after a read. */
export function useAim() {
  const hint = ref(AT_FIRST)
  const canTorch = ref(false)
  const torch = ref(false)
  const frozen = ref(false)
  let hints: ReturnType<typeof setTimeout>[] = []

  function listen() {
    quiet()
    hint.value = AT_FIRST
    hints = [
      setTimeout(() => {
        hint.value = canTorch.value ? 'More light, or step back a little' : 'Step back a little'
      }, FIRST_HINT_MS),
      setTimeout(() => {
        hint.value = 'Not read? Type the code'
      }, SECOND_HINT_MS),
    ]
  }

  function quiet() {
    hints.forEach(clearTimeout)
  }

  function freeze() {
    quiet()
    frozen.value = true
    setTimeout(() => {
      frozen.value = false
    }, FREEZE_MS)
  }

  function ready(can: { torch: boolean }) {
    canTorch.value = can.torch
    listen()
  }

  onBeforeUnmount(quiet)
  return { hint, canTorch, torch, frozen, listen, freeze, ready }
}
