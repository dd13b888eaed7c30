import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import CustodyLogTable from '~~/components/custody/CustodyLogTable.vue'
import type { LogLine } from '~~/utils/custody/cylinderView'
import { byRole } from '../../helpers/roles'

const DAYO = { id: 'd', name: 'D. Author' }

function line(version: number, at: string, more: Partial<LogLine>): LogLine {
  return {
    id: `line-${version}`, seq: version, version, kind: 'weighed', occurredAt: at, effectiveAt: at, recordedAt: at, clockSkewSeconds: 0,
    author: DAYO, postedBy: DAYO, supervisor: null, place: null, note: null, practice: false, confirmed: [], details: {}, names: {}, otherCylinder: null,
    netBeforeGrams: null, netAfterGrams: null, findings: [], correction: null, signature: null, ...more,
  }
}

// One pound is 453.59 g: 20.0 lb is 9,072 g, 17.0 lb is 7,711 g.
const LINES = [
  line(4, '2026-07-15T16:02:00Z', {
    kind: 'corrected', details: { eventId: 'line-3', reason: 'typed 47.9, the photo shows 44.9', instead: {} }, netBeforeGrams: 7711, netAfterGrams: 7711,
  }),
  line(3, '2026-07-14T15:20:00Z', {
    kind: 'filled', details: { refrigerant: 'R-410A', grossAfter: { unit: 'lb', value: 47.9 } }, netBeforeGrams: 0, netAfterGrams: 7711,
    recordedAt: '2026-07-16T08:20:00Z', correction: { eventId: 'line-4', reason: 'typed 47.9, the photo shows 44.9', takenOut: false },
  }),
  line(2, '2026-03-18T15:00:00Z', { kind: 'moved', details: { toPlaceId: 'van' }, names: { van: 'Van 12' }, netBeforeGrams: 0, netAfterGrams: 0 }),
  line(1, '2026-03-17T15:00:00Z', {
    kind: 'registered', details: { stamp: { serial: 'K48213', spec: 'DOT-4BA' }, ownership: 'own', contents: 'evacuated' }, netAfterGrams: 0,
  }),
]

const mount = (more: object = {}) => mountSuspended(CustodyLogTable, {
  props: {
    lines: LINES, unit: 'lb', timeZone: 'America/Phoenix', nowMs: Date.parse('2026-07-20T12:00:00Z'), correctable: new Set(['line-3']),
    correctTo: '/c/7k3m9q2tx/act/corrected', readerId: 'r', signTo: '/countersign?cylinder=c', whole: true, ...more,
  },
})

describe('a trainee\'s entry in the custody log', () => {
  const entry = (by: string | null) => line(2, '2026-07-14T15:20:00Z', { supervisor: { id: 's', name: 'S. Supervisor' }, signature: { by } })
  const signature = line(3, '2026-07-15T15:20:00Z', { kind: 'countersigned', details: { eventId: 'line-2' } })
  const linksOf = async (lines: LogLine[], readerId: string) => [...((await mount({ lines, readerId })).element as HTMLElement).querySelectorAll('a')]
    .map(link => `${link.textContent?.trim()} > ${link.getAttribute('href')}`)

  it('waits for the signature of the supervisor it names, and of nobody else', async () => {
    expect(await linksOf([entry(null)], 's')).toContain('Waits for your signature > /countersign?cylinder=c')
    expect(await linksOf([entry(null)], 'd')).toEqual([])
  })

  it('leads to the line that signed it, and that line back to it', async () => {
    const links = await linksOf([signature, entry('line-3')], 's')
    expect(links).toContain('countersigned by line 3 > #line-3')
    expect(links).toContain('signs line 2 > #line-2')
    expect(links.join()).not.toContain('Waits for your signature')
  })
})

describe('the custody log as a table', () => {
  it('sums the signed column to the net', async () => {
    const table = byRole((await mount()).element, 'table', 'Custody log, newest first')
    expect(table.querySelector('tfoot')?.textContent).toMatch(/\+17\.0\s*17\.0/)
  })

  it('draws a gap of 118 days without an event, and none between neighbouring days', async () => {
    const table = byRole((await mount()).element, 'table', 'Custody log, newest first')
    const gaps = [...table.querySelectorAll('strong')].map(each => each.textContent).filter(text => text?.includes('no event'))
    expect(gaps).toEqual(['118 days, no event'])
  })

  it('draws no gap and no sum where lines are left out', async () => {
    const table = byRole((await mount({ whole: false })).element, 'table', 'Custody log, newest first')
    expect(table.textContent).not.toContain('no event')
    expect(table.querySelector('tfoot')).toBeNull()
  })

  it('shows both times where an event was recorded late', async () => {
    const table = byRole((await mount()).element, 'table', 'Custody log, newest first')
    const row = [...table.querySelectorAll('tbody tr')].find(each => each.textContent?.includes('R-410A recovered'))!
    expect(row.textContent).toContain('14 Jul 08:20')
    expect(row.textContent).toContain('16 Jul 01:20')
    expect(row.textContent).toContain('1 d 17 h late')
  })

  it('lets a correction and the line it mends point to one another', async () => {
    const wrapper = await mount()
    const table = byRole(wrapper.element, 'table', 'Custody log, newest first')
    expect(byRole(table, 'link', 'corrects line 3').getAttribute('href')).toBe('#line-3')
    expect(byRole(table, 'link', 'corrected by line 4').getAttribute('href')).toBe('#line-4')
    expect(byRole(table, 'link', /Correct line 3/).getAttribute('href')).toBe('/c/7k3m9q2tx/act/corrected?event=line-3')
  })

  it('shows a net that is not known as a dash, never as nothing', async () => {
    const table = byRole((await mount({ lines: [line(1, '2026-07-14T15:20:00Z', { kind: 'lost', details: { cause: 'leak' }, netBeforeGrams: 7711 })] })).element, 'table', 'Custody log, newest first')
    const cells = [...table.querySelectorAll('tbody tr td')].map(cell => cell.textContent?.trim())
    expect(cells.slice(-2)).toEqual(['–', '–'])
  })
})

describe('a corrected line', () => {
  const instead = { refrigerant: 'R-410A', grossAfter: { unit: 'lb', value: 44.9 } }
  const [mend, fill, ...others] = LINES

  it('reads as recorded with its old weight struck through, or as it now stands with the new one and why', async () => {
    const lines = [{ ...fill!, instead }, ...others]
    const recorded = await mount({ lines: [mend, ...lines] })
    expect(recorded.find('s, .line-through').text()).toBe('47.9')
    expect(recorded.text()).toContain('corrected by line 4')
    const now = await mount({ lines, applied: true })
    expect(now.find('tbody').text()).toContain('44.9')
    expect(now.find('tbody').text()).not.toContain('47.9 ')
    expect(now.text()).toContain('corrected: typed 47.9, the photo shows 44.9')
    expect(now.find('.line-through').exists()).toBe(false)
  })

  it('tells which other lines say something else since', async () => {
    const said = { netGrams: 6_000, refrigerant: 'R-22', condition: 'clean', findings: [] }
    const table = await mount({ unit: 'kg', lines: [{ ...fill!, changes: [{ eventId: 'line-4', version: 4, kind: 'weighed', before: said, now: { ...said, netGrams: 5_500 } }] }] })
    expect(table.get('details summary').text()).toBe('1 line says something else since')
    expect(table.get('details li').text()).toContain('line 4, weighed: net 6.00\u00A0kg, now 5.50\u00A0kg')
  })
})
