import { useCatalogue } from '~~/composables/useCatalogue'
import type { EvacuationLevelAnswer } from '~~/utils/contract/recovery'
import { reachedOf, type RecoveryCourse } from '~~/utils/recover/course'
import { requiredLevel } from '~~/utils/recovery/evacuationLevel'
import { judgeLevel } from '~~/utils/recovery/judgeLevel'
import { chargeGramsOf } from '~~/utils/recovery/levelDraft'
import { gaugeFor, readReached } from '~~/utils/recovery/reachedDraft'
import type { Refrigerant } from '~~/utils/refrigerant/types'

/**
 * The level that the system must come down to, and whether it did, worked out on this device once it is asked for.
 *
 * What a gauge showed goes into the recovery as it is typed.
 */
export function useSystemLevel(course: Ref<RecoveryCourse>) {
  const load = useCatalogue()
  const isAsked = ref(false)
  const known = shallowRef<ReadonlyMap<string, Refrigerant>>(new Map())

  const answer = computed<EvacuationLevelAnswer | null>(() => {
    if (!isAsked.value) return null
    const { level } = course.value
    const refrigerant = known.value.get(level.refrigerant) ?? null
    const required = requiredLevel({
      refrigerant,
      chargeGrams: chargeGramsOf(level),
      machineMade: level.machineMade || null,
      appliance: level.appliance,
      circumstances: level.circumstances || null,
      compressorRuns: level.compressorRuns === '' ? null : level.compressorRuns === 'true',
    })
    return { refrigerant: refrigerant?.designation ?? null, ...required, onGauges: null, judged: null }
  })
  const read = computed(() => answer.value && readReached(course.value.level.reached, gaugeFor(course.value.level.reached, answer.value.level), course.value.level.charge))
  const verdict = computed(() => answer.value && read.value && judgeLevel(answer.value, read.value.reached, read.value.heldMinutes))

  async function ask() {
    // Without the catalogue the refrigerant counts as not known, and the level as what asks for most.
    const loaded = await load().catch(() => null)
    if (loaded) known.value = loaded.catalogue.refrigerants
    isAsked.value = true
  }

  onMounted(() => {
    if (course.value.onTheWay.reached) void ask()
  })
  watch(() => JSON.stringify(read.value), () => {
    if (!read.value) return
    const { reached: _, ...others } = course.value.onTheWay
    const reached = reachedOf(read.value)
    course.value.onTheWay = reached ? { ...others, reached } : others
  })

  return { answer, read, verdict, ask }
}
