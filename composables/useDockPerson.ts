import type { MassUnit } from '~~/utils/quantity/mass'
import { MASS_UNITS } from '~~/utils/quantity/massUnits'

const KEY = 'collarbook-dock-person'

/**
 * Who is at the dock with this phone and how the scale there reads: asked once, and kept on the phone where it keeps anything.
 *
 * @param usual the unit to begin with; null while it is not known.
 */
export function useDockPerson(usual: () => MassUnit | null) {
  const name = ref('')
  const unit = ref<MassUnit>('lb')
  const isKnown = ref(false)

  onMounted(() => {
    const kept = read()
    name.value = kept.name ?? ''
    unit.value = MASS_UNITS.find(({ value }) => value === kept.unit)?.value ?? 'lb'
    isKnown.value = name.value !== ''
  })

  watch(usual, (found) => {
    if (found && !isKnown.value) unit.value = found
  }, { once: true })

  function keep() {
    isKnown.value = true
    try {
      localStorage.setItem(KEY, JSON.stringify({ name: name.value, unit: unit.value }))
    }
    catch {
      // It is asked again with the next page.
    }
  }

  function change() {
    isKnown.value = false
  }

  return { name, unit, isKnown, keep, change }
}

function read(): { name?: string, unit?: string } {
  try {
    return Object(JSON.parse(localStorage.getItem(KEY) ?? '{}')) as { name?: string, unit?: string }
  }
  catch {
    return {}
  }
}
