import { problemOf, useApi } from '~~/composables/useApi'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { FillLimitAnswer } from '~~/utils/contract/refrigerants'
import { COMPARE_KEYS, compareFaults, type CompareQuery } from '~~/utils/picture/compareDraft'
import { asListed } from '~~/utils/refrigerant/designation'

/** What a stamp may take: of the refrigerant asked about, or why not, and of some others. */
export interface Comparison {
  answer: FillLimitAnswer | null
  problem: ProblemDetails | null
  others: { refrigerant: string, answer: FillLimitAnswer | null }[]
}

const INCOMPLETE: ProblemDetails = { type: 'about:blank', title: 'Something is missing', status: 422, detail: 'Fill in what is named below.' }

/** The fill rules side by side for what this page's address asks, and the limits of other refrigerants in the same stamp. */
export function useComparison(others: () => readonly string[]) {
  const api = useApi()
  const route = useRoute()

  const query = computed(() => Object.fromEntries(COMPARE_KEYS.flatMap((key) => {
    const value = route.query[key]
    return typeof value === 'string' && value !== '' ? [[key, value]] : []
  })) as CompareQuery)
  const isAsked = computed(() => Object.keys(query.value).length > 0)

  async function compare(): Promise<Comparison | null> {
    if (!isAsked.value) return null
    const faults = compareFaults(query.value)
    if (faults.length) return { answer: null, problem: { ...INCOMPLETE, errors: faults }, others: [] }
    const { refrigerant, composition: _, ...stamp } = query.value
    const asked = asListed(refrigerant ?? '', others())
    try {
      const [answer, ...rest] = await Promise.all([
        api.get<FillLimitAnswer>('/api/fill-limit', query.value),
        ...others().filter(name => name !== asked).map(async other => ({
          refrigerant: other,
          // Why the stamp is refused stands with the first; here only the figures are wanted.
          answer: await api.get<FillLimitAnswer>('/api/fill-limit', { ...stamp, refrigerant: other }).catch(() => null),
        })),
      ])
      return { answer, problem: null, others: rest }
    }
    catch (failure) {
      return { answer: null, problem: problemOf(failure), others: [] }
    }
  }

  const { data, status, refresh } = useAsyncData(() => `comparison-${JSON.stringify(query.value)}`, compare, { deep: false })
  return { query, isAsked, comparison: data, waiting: computed(() => status.value === 'pending'), refresh: () => refresh() }
}
