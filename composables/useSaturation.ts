import type { Ref } from 'vue'
import { problemOf, useApi } from '~~/composables/useApi'
import type { SaturationAnswer } from '~~/utils/contract/refrigerants'
import { celsiusFromThermometer, plainFigure, thermometerFromCelsius, type GaugeUnit } from '~~/utils/quantity/gauge'
import { parseSignedFigure } from '~~/utils/quantity/figure'

// A warm shop, and the temperature of 80 % by volume.
const FIRST_C = 25
const TYPING_PAUSE_MS = 150

/**
 * The saturation of a refrigerant at the temperature that somebody types, in the unit of the thermometer.
 *
 * `hottestC` is the last temperature of its table; until it is known nothing is asked.
 */
export function useSaturation(designation: Ref<string>, unit: Ref<GaugeUnit>, hottestC: Ref<number | null>) {
  const api = useApi()
  const temperature = ref('')
  const reading = shallowRef<{ tC: number, bubblePressureKPa: number, dewPressureKPa: number } | null>(null)
  const error = ref<string | null>(null)
  let timer: ReturnType<typeof setTimeout> | undefined
  let latest = 0

  const tC = computed(() => celsiusOf(temperature.value, unit.value))

  async function ask(at: number) {
    const mine = ++latest
    try {
      const { bubblePressureKPa, dewPressureKPa } = await api.get<SaturationAnswer>(
        `/api/refrigerants/${encodeURIComponent(designation.value)}/saturation`, { temperatureC: at })
      if (mine !== latest) return
      reading.value = { tC: at, bubblePressureKPa, dewPressureKPa }
      error.value = null
    }
    catch (failure) {
      if (mine !== latest) return
      const problem = problemOf(failure)
      refuse(problem.detail || problem.title)
    }
  }

  function refuse(why: string) {
    latest += 1
    reading.value = null
    error.value = why
  }

  function askSoon(at: number | null) {
    clearTimeout(timer)
    if (at === null) refuse('Type a temperature, such as 77.')
    else timer = setTimeout(() => void ask(at), TYPING_PAUSE_MS)
  }

  watch(hottestC, (hottest) => {
    if (hottest === null || temperature.value !== '') return
    const first = Math.floor(thermometerFromCelsius(Math.min(FIRST_C, hottest), unit.value))
    temperature.value = plainFigure(first)
  }, { immediate: true })
  // The same temperature in another unit: the thermometer changes, not what it measures.
  watch(unit, (next, before) => {
    const typed = celsiusOf(temperature.value, before)
    if (typed !== null) temperature.value = plainFigure(thermometerFromCelsius(typed, next))
  }, { flush: 'sync' })
  watch(tC, askSoon)
  onMounted(() => {
    if (tC.value !== null) void ask(tC.value)
  })
  onBeforeUnmount(() => clearTimeout(timer))

  return { temperature, reading, error }
}

function celsiusOf(typed: string, unit: GaugeUnit): number | null {
  const figure = parseSignedFigure(typed)
  return 'error' in figure ? null : celsiusFromThermometer(figure.value, unit)
}
