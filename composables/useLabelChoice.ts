import { useLabelling, type ToLabel } from '~~/composables/useLabelling'
import { useLoaded } from '~~/composables/useLoaded'
import { queryList } from '~~/utils/address/queryText'
import { MOST_LABELS } from '~~/utils/contract/printing'
import { normaliseLabelCode } from '~~/utils/label/code'

/**
 * The codes that are to be printed: those of the address, those given here to its cylinders, and blank ones. None is
 * forgotten before it was set aside.
 */
export function useLabelChoice() {
  const route = useRoute()
  const { cylinders, mint, label, busy, problem } = useLabelling()

  const ids = computed(() => queryList(route.query, 'cylinders'))
  const chosen = useLoaded('labels-for', () => cylinders(ids.value), [ids])
  /** Cylinders that got a label here, as they then were. */
  const labelled = ref<ToLabel[]>([])
  const minted = ref<string[]>([])
  /** Codes that were printed and are done with. */
  const aside = ref<string[]>([])

  const waiting = computed(() => (chosen.data.value ?? []).filter(one => !labelled.value.some(done => done.id === one.id)))
  const bare = computed(() => waiting.value.filter(one => one.labelCode === null))
  const withLabel = computed(() => waiting.value.filter(one => one.labelCode !== null))
  const givenCodes = computed(() => queryList(route.query, 'codes').flatMap(code => normaliseLabelCode(code) ?? []))
  const codes = computed(() => [...new Set([...givenCodes.value, ...labelled.value.flatMap(one => one.labelCode ?? []), ...minted.value])].filter(code => !aside.value.includes(code)))

  async function mintBlank(count: number) {
    const made = await mint(count)
    if (made) minted.value = [...minted.value, ...made]
  }

  function setAside(printed: readonly string[]) {
    aside.value = [...aside.value, ...printed]
  }

  /** As many as may be made at once; those left over are still waiting. */
  async function giveCodes(all: ToLabel[], reason?: string) {
    const these = all.slice(0, MOST_LABELS)
    const before = new Map(these.map(one => [one.id, one.labelCode]))
    const after = await label(these, reason) ?? []
    labelled.value = [...labelled.value, ...after.filter(one => one.labelCode !== before.get(one.id))]
  }

  watch(ids, () => {
    labelled.value = []
  })

  return { ids, chosen, bare, withLabel, codes, busy, problem, mintBlank, giveCodes, setAside }
}
