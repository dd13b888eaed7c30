import { flushPromises } from '@vue/test-utils'
import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { useWhichOne } from '~~/composables/useWhichOne'
import type { CylinderRow, CylinderView } from '~~/utils/contract/custody'
import { did, registered, STAMP, viewAfter } from '../../helpers/custody'
import { cylinderRow } from '../../helpers/cylinderRow'

const CODE = '7K3M9Q2TX'
const OTHER_CODE = '000000000'

function onTwo(id: string, serial: string | null, code = CODE): CylinderView {
  return { ...viewAfter([registered({ stamp: { ...STAMP, serial } }), did('labelled', { code })], { codesOnTwo: new Set([code]) }), id }
}

let fleet: CylinderView[] = []
registerEndpoint('/api/cylinders', () => ({
  items: fleet.map((view): CylinderRow => cylinderRow({ id: view.id, serial: view.stamp?.serial ?? null, findingCodes: ['code-on-two'] })), nextCursor: null, total: fleet.length,
}))
for (const id of ['first', 'second', 'stranger']) registerEndpoint(`/api/cylinders/${id}`, () => fleet.find(view => view.id === id)!)

async function asked(lastFour: string) {
  let which!: ReturnType<typeof useWhichOne>
  await mountSuspended({
    setup() {
      which = useWhichOne(ref(CODE), ref(fleet[0]!))
      return () => null
    },
  }, { route: `/c/${CODE.toLowerCase()}` })
  await which.answer(lastFour)
  await flushPromises()
  return { asks: which.asks.value, isWrong: which.isWrong.value, at: useRouter().currentRoute.value.path }
}

describe('which of two cylinders with one code', () => {
  beforeEach(() => {
    fleet = [onTwo('first', 'K48213'), onTwo('second', 'K48777')]
  })
  afterEach(() => useRouter().push('/'))

  it('is the one that is shown, where its serial ends so', async () => {
    expect(await asked('8213')).toMatchObject({ asks: false, isWrong: false, at: '/c/7k3m9q2tx' })
  })

  it('is the other, where only that one ends so', async () => {
    expect(await asked('8777')).toMatchObject({ isWrong: false, at: '/c/second' })
  })

  it('is neither, where both end so or none does', async () => {
    fleet = [onTwo('first', 'K48213'), onTwo('second', 'T18213')]
    expect(await asked('8213')).toMatchObject({ asks: true, isWrong: true })
    expect(await asked('13')).toMatchObject({ asks: true, isWrong: true })
    expect(await asked('9999')).toMatchObject({ asks: true, isWrong: true })
  })

  it('is never a third, whose own code is on two', async () => {
    fleet = [onTwo('first', 'K48213'), onTwo('second', null), onTwo('stranger', 'K49999', OTHER_CODE)]
    expect(await asked('9999')).toMatchObject({ asks: true, isWrong: true, at: '/c/7k3m9q2tx' })
  })
})
