import { mountSuspended } from '@nuxt/test-utils/runtime'
import { afterEach, describe, expect, it } from 'vitest'
import VanRanking from '~~/components/van/VanRanking.vue'
import type { RankedLine, RankingAnswer } from '~~/utils/contract/ranking'
import { allByRole, byRole } from '../../helpers/roles'

function line(id: string, change: Partial<RankedLine>): RankedLine {
  return { id, labelCode: null, serial: id, place: null, holder: null, reach: 'van', fit: 'whole', roomGrams: 5_000, exactStopWeightGrams: 29_000, reasons: ['holds R-410A'], ...change }
}

let wrapper: Awaited<ReturnType<typeof mountSuspended>> | null = null
afterEach(() => wrapper?.unmount())

async function shown(items: RankedLine[], pair: RankingAnswer['pair'] = null) {
  const answer = { refrigerant: 'R-410A', amountGrams: 4_082, van: null, items, pair, leftOut: 0 }
  wrapper = await mountSuspended(VanRanking, { props: { answer, unit: 'lb' }, attachTo: document.body })
  return wrapper.element as HTMLElement
}

describe('the choice of a cylinder on the screen', () => {
  it('keeps those that do not go folded away, and says how many they are', async () => {
    const refused = (id: string) => line(id, { fit: 'refused', roomGrams: null, exactStopWeightGrams: null, reasons: ['holds R-22'] })
    const root = await shown([line('A', {}), refused('D'), refused('E')])
    const fold = byRole(root, 'region', 'Not these').querySelector('details')!
    expect(fold.open).toBe(false)
    expect(fold.querySelector('summary')!.textContent).toContain('Not these: 2 cylinders')
    wrapper?.unmount()
    expect((await shown([refused('D')])).querySelector('summary')!.textContent).toContain('Not these: 1 cylinder')
    wrapper?.unmount()
    expect((await shown([line('A', {})])).querySelector('details')).toBeNull()
  })

  it('parts those that take all of it from the others, each with its reasons', async () => {
    const root = await shown([
      line('A', {}), line('B', { fit: 'part', roomGrams: 1_000 }),
      line('C', { fit: 'not-weighed', roomGrams: null, reasons: ['not weighed: weigh it first', 'holds R-410A'] }),
      line('D', { fit: 'refused', roomGrams: null, exactStopWeightGrams: null, reasons: ['holds R-22'] }),
    ])
    expect(byRole(root, 'region', 'Takes all of it').textContent).toContain('SN A')
    expect(byRole(root, 'region', 'Room not known').textContent).toContain('weigh it first')
    expect(byRole(root, 'region', 'Not these').textContent).toContain('holds R-22')
    // 5,000 g are 11.02 lb and 29,000 g 63.93 lb; both go down to the division.
    expect(byRole(root, 'region', 'Takes all of it').textContent).toContain('11.0\u00A0lb')
    expect(byRole(root, 'region', 'Takes all of it').textContent).toContain('stop 63.9\u00A0lb')
  })

  it('gives neither room nor stop weight of one that is refused', async () => {
    const root = await shown([line('D', { fit: 'refused', roomGrams: null, exactStopWeightGrams: null, reasons: ['overfilled'] })])
    expect(byRole(root, 'region', 'Not these').textContent).not.toContain('lb')
  })

  it('names two where no single one suffices, with how much goes into each', async () => {
    const root = await shown([line('A', { fit: 'part', roomGrams: 3_000 }), line('B', { fit: 'part', roomGrams: 2_000 })], [{ id: 'A', grams: 3_000 }, { id: 'B', grams: 1_082 }])
    const [two] = allByRole(root, 'region', /^No single one takes 9\.0/)
    // 3,000 g are 6.6 lb and 1,082 g 2.39 lb, which read 2.4.
    expect(two!.textContent).toMatch(/First 6\.6\u00A0lb into\s+SN A.*Then 2\.4\u00A0lb into\s+SN B/s)
  })

  it('says so where nothing within reach takes it', async () => {
    expect((await shown([line('A', { fit: 'part', roomGrams: 10 })])).textContent).toContain('Nothing within reach takes 9.0\u00A0lb of R-410A.')
  })
})
