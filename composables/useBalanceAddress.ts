import { OWN, UNKNOWN } from '~~/utils/contract/balanceLines'
import { balanceAddressQuery, readBalanceAddress, type BalanceAddress } from '~~/utils/records/balanceAddress'

/** What the address of the balance asks for, and the addresses that ask for something else. */
export function useBalanceAddress() {
  const route = useRoute()
  const address = computed(() => readBalanceAddress(route.query))

  function at(changes: Partial<BalanceAddress>, path = '/balance') {
    return { path, query: balanceAddressQuery({ ...address.value, ...changes }) }
  }

  return {
    address,
    at,
    /** The account of one refrigerant; null = unknown or mixed. */
    ofRefrigerant: (refrigerant: string | null) => refrigerant ?? UNKNOWN,
    /** What belongs to one firm; null = the contractor's own. */
    ofOwner: (ownerId: string | null) => ownerId ?? OWN,
  }
}
