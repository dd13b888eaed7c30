import { queryText } from '~~/utils/address/queryText'
import { readInstant } from '~~/utils/address/queryInstant'
import type { AskedPast } from '~~/utils/picture/pastWords'

/** The past instant that this page's address asks for; null for the present. */
export function usePast() {
  const route = useRoute()
  const past = computed<AskedPast | null>(() => {
    const [asOf, knownAt] = [readInstant(queryText(route.query, 'asOf')), readInstant(queryText(route.query, 'knownAt'))]
    return asOf === null && knownAt === null ? null : { asOf, knownAt }
  })
  /** As the server's routes take it. */
  const asked = computed(() => Object.fromEntries(Object.entries(past.value ?? {}).filter((part): part is [string, string] => part[1] !== null)))
  return { past, asked }
}
