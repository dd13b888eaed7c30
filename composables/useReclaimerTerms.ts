import { v7 as uuidv7 } from 'uuid'
import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { useKept } from '~~/composables/useKept'
import { useLoaded } from '~~/composables/useLoaded'
import type { PriceRow, PricesAnswer, TermsAnswer, TermsRow } from '~~/utils/contract/reclaim'
import type { RefrigerantsAnswer } from '~~/utils/contract/refrigerants'
import type { PriceDraft, PriceTyped } from '~~/utils/reclaim/priceTyped'
import { rowStandings } from '~~/utils/reclaim/recordedWords'
import type { ReclaimerTerms } from '~~/utils/reclaim/terms'
import { typedTerms, type TermsTyped } from '~~/utils/reclaim/termsTyped'

/**
 * What a reclaimer takes and pays: what was recorded, the form that is open with what is typed in it, and the recording.
 *
 * What is typed is kept in the tab until it is recorded or left. Nothing is asked for while it is not `wanted`. `done`
 * hears what was done, in words.
 */
export function useReclaimerTerms(firmId: string, wanted: Ref<boolean>, done: (said: string) => unknown) {
  const api = useApi()
  const path = `/api/firms/${firmId}`
  const { busy, problem, attempt } = useAttempt()
  const asked = <T>(key: string, where: string) => useLoaded<T | null>(key, () => wanted.value ? api.get<T>(where) : Promise.resolve(null), [wanted])
  const terms = asked<TermsAnswer>(`terms ${firmId}`, `${path}/terms`)
  const prices = asked<PricesAnswer>(`prices ${firmId}`, `${path}/prices`)
  const catalogue = asked<RefrigerantsAnswer>(`terms names ${firmId}`, '/api/refrigerants')
  const termsTyped = ref<TermsTyped | null>(null)
  const priceTyped = ref<PriceTyped | null>(null)
  const { restored, keep, forget } = useKept<{ terms: TermsTyped | null, price: PriceTyped | null }>(`terms ${firmId}`)
  // One id to one content: sent again it records nothing twice, and what was changed since is another row.
  let sent = { content: '', id: '' }

  const refrigerants = computed(() => catalogue.data.value?.items.map(({ designation }) => designation) ?? [])
  const inForce = computed(() => {
    const answer = terms.data.value
    const standing = answer ? rowStandings(answer.items, answer.today) : null
    return answer?.items.find(row => standing?.get(row.id)?.is === 'in-force') ?? null
  })

  watch(restored, (kept) => {
    if (kept) [termsTyped.value, priceTyped.value] = [kept.terms, kept.price]
  })
  watch([termsTyped, priceTyped], () => {
    if (termsTyped.value || priceTyped.value) keep({ terms: termsTyped.value, price: priceTyped.value })
    else forget()
  }, { deep: true })

  function openTerms() {
    close()
    termsTyped.value = typedTerms(inForce.value?.terms ?? null, terms.data.value?.today ?? '')
  }

  function openPrice() {
    close()
    priceTyped.value = { refrigerant: '', condition: '', pays: 'they', amount: '', per: 'lb', fromDay: prices.data.value?.today ?? '', untilDay: '' }
  }

  function close() {
    [termsTyped.value, priceTyped.value] = [null, null]
    problem.value = null
  }

  async function saveTerms(draft: { fromDay: string, terms: ReclaimerTerms }) {
    if (!await attempt(() => api.post(`${path}/terms`, { id: idFor(draft), ...draft }))) return
    close()
    await terms.refresh()
    done('What it takes is recorded.')
  }

  /** The form stays open for the next price, with the days of this one. */
  async function savePrice(draft: PriceDraft) {
    if (!await attempt(() => api.post(`${path}/prices`, { id: idFor(draft), ...draft }))) return
    if (priceTyped.value) priceTyped.value = { ...priceTyped.value, refrigerant: '', condition: '', amount: '' }
    await prices.refresh()
    done('The price is recorded. The form is ready for the next one.')
  }

  async function withdrawTerms({ id }: TermsRow) {
    if (await attempt(() => api.post(`${path}/terms/${id}/withdraw`, {}))) done('Taken back. The history keeps it.')
    await terms.refresh()
  }

  async function withdrawPrice({ price }: PriceRow) {
    if (await attempt(() => api.post(`${path}/prices/${price.id}/withdraw`, {}))) done('Taken back. The history keeps it.')
    await prices.refresh()
  }

  function idFor(draft: object): string {
    const content = JSON.stringify(draft)
    if (content !== sent.content) sent = { content, id: uuidv7() }
    return sent.id
  }

  return { busy, problem, terms, prices, refrigerants, inForce, termsTyped, priceTyped, openTerms, openPrice, close, saveTerms, savePrice, withdrawTerms, withdrawPrice }
}
