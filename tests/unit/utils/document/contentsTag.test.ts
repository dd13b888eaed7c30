import { describe, expect, it } from 'vitest'
import { contentsTag, noTagBecause, numberHeightMm, tagLines, type TagEntry } from '~~/utils/document/contentsTag'
import type { CylinderView, LogLine } from '~~/utils/custody/cylinderView'

const ENTRY: TagEntry = { un: 'UN1018', properShippingName: 'Chlorodifluoromethane or Refrigerant gas R 22', judgement: null, source: '49 CFR 172.101' }
const SPACE = '\u00A0'

function viewOf(contents: Partial<CylinderView['contents']> = {}, more: Partial<CylinderView> = {}): CylinderView {
  return {
    labelCode: '7K3M9Q2TX',
    stamp: { waterCapacity: { unit: 'lb', value: 47.6 } },
    contents: { refrigerant: 'R-22', condition: 'clean', burnt: false, netGrams: 6492, nothingInIt: false, evacuated: false, ...contents },
    ...more,
  } as CylinderView
}

function line(kind: string, day: string, author: string, before: number | null, after: number | null, takenOut = false): LogLine {
  return {
    kind, effectiveAt: `${day}T12:00:00.000Z`, author: { id: author, name: author }, netBeforeGrams: before, netAfterGrams: after,
    correction: takenOut ? { eventId: 'x', reason: 'a slip', takenOut } : null,
  } as LogLine
}

const LOG = [line('weighed', '2026-11-03', 'Wes', 6492, 6490), line('filled', '2026-11-02', 'Tina', 0, 6492), line('registered', '2026-11-01', 'Wes', null, 0)]

describe('the height of the identification number', () => {
  // 60 L of water at 60 F weigh 59.942 kg, 132.15 lb (0.99904 kg/L).
  it('is 6 mm up to 60 L of water capacity', () => {
    expect(numberHeightMm({ unit: 'lb', value: 132.1 }, 50_000)).toBe(6)
    expect(numberHeightMm({ unit: 'lb', value: 132.2 }, 50_000)).toBe(12)
  })

  it('is 6 mm up to 30 kg net, whatever the capacity', () => {
    expect(numberHeightMm({ unit: 'lb', value: 1000 }, 30_000)).toBe(6)
    expect(numberHeightMm({ unit: 'lb', value: 1000 }, 30_001)).toBe(12)
  })

  it('is 12 mm where neither is known, and 0 g is known', () => {
    expect(numberHeightMm(null, null)).toBe(12)
    expect(numberHeightMm(null, 0)).toBe(6)
  })
})

describe('a cylinder without a contents tag', () => {
  it('has nothing in it, or nobody knows what, or no code to repeat', () => {
    expect(noTagBecause(viewOf())).toBeNull()
    expect(noTagBecause(viewOf({ nothingInIt: true, refrigerant: null }))).toContain('Nothing is in it')
    expect(noTagBecause(viewOf({ refrigerant: null, condition: 'unknown' }))).toContain('is not known')
    expect(noTagBecause(viewOf({ refrigerant: null, condition: 'mixed' }))).toContain('mixed')
    expect(noTagBecause(viewOf({}, { labelCode: null }))).toContain('Label it first')
    expect(() => contentsTag(viewOf({ refrigerant: null }), LOG, ENTRY)).toThrow(RangeError)
  })
})

describe('a contents tag of mixed refrigerants', () => {
  // 49 CFR 172.301(b): the technical names on the package too.
  it('says how its shipper has it travel, once the shipper has said so, and not before', () => {
    const mixed = viewOf({ refrigerant: null, condition: 'mixed' })
    const entry = { ...ENTRY, un: 'UN1078', properShippingName: 'Refrigerant gases, n.o.s. (chlorodifluoromethane, propane)' }
    expect(noTagBecause(mixed, true)).toBeNull()
    expect(contentsTag(mixed, LOG, entry, true)).toMatchObject({ refrigerant: 'Mixed', kind: 'Recovered', entry })
    expect(() => contentsTag(mixed, LOG, entry)).toThrow(RangeError)
    expect(noTagBecause(viewOf({ nothingInIt: true, refrigerant: null }), true)).toContain('Nothing is in it')
  })
})

describe('a contents tag', () => {
  it('names what is in it, how much, and who recovered it on which day', () => {
    const tag = contentsTag(viewOf(), LOG, ENTRY)
    // 6,492 g are 14.31 lb and 6.49 kg; pounds are written to a tenth.
    expect(tag).toEqual({
      code: '7K3M9Q2TX', refrigerant: 'R-22', kind: 'Recovered', net: `14.3${SPACE}lb (6.49${SPACE}kg)`, on: '2026-11-02T12:00:00.000Z', technician: 'Tina', entry: ENTRY, numberHeightMm: 6,
    })
    expect(tagLines(tag, '2 Nov 2026')).toEqual([
      'R-22', 'Recovered', 'UN1018', 'Chlorodifluoromethane or Refrigerant gas R 22', `Net 14.3${SPACE}lb (6.49${SPACE}kg)`, '2 Nov 2026, Tina', '7K3 M9Q 2TX',
    ])
  })

  it('passes over a fill that was taken out of the log', () => {
    const log = [line('filled', '2026-11-05', 'Otto', 6492, 8000, true), ...LOG]
    expect(contentsTag(viewOf(), log, ENTRY)).toMatchObject({ technician: 'Tina' })
  })

  it('says "recovered" only of what a recovery brought, and its condition where that is not clean', () => {
    const received = [line('received', '2026-11-02', 'Wes', null, 6492)]
    expect(contentsTag(viewOf(), received, ENTRY).kind).toBe('')
    expect(contentsTag(viewOf({ condition: 'suspect' }), LOG, ENTRY).kind).toBe('Recovered, suspect')
    expect(contentsTag(viewOf({ condition: 'suspect', burnt: true }), LOG, ENTRY).kind).toBe('Recovered, burnt')
  })

  it('never gives a weight that is not known', () => {
    const tag = contentsTag(viewOf({ netGrams: null }), LOG, ENTRY)
    expect(tag.net).toBeNull()
    expect(tagLines(tag, '2 Nov 2026')).toContain('Net not weighed')
  })
})
