import { describe, expect, it } from 'vitest'
import { codes, registered, viewAfter, did, kg, CYLINDER } from '~~/tests/helpers/custody'
import { pairFindings } from '~~/utils/custody/findings/pairs'
import type { Half, HalfTransfer } from '~~/utils/custody/half'

const A = '0198f000-0000-7000-8000-0000000000c8'
const B = '0198f000-0000-7000-8000-0000000000c9'

function half(direction: 'out' | 'in', transfer: Partial<HalfTransfer> | null = {}, more: Partial<Half> = {}): Half {
  const [cylinderId, otherId] = direction === 'out' ? [A, B] : [B, A]
  return {
    eventId: `${direction}-event`, kind: 'transferred', pairId: 'pair', cylinderId, otherId, direction, at: 0,
    transfer: transfer && { refrigerant: 'R-22', grams: 5000, accuracyGrams: 100, ...transfer }, ...more,
  }
}
const found = (mine: Half[], others: Half[]) => pairFindings(mine, others).map(({ code }) => code)

describe('two halves of a transfer', () => {
  it('balance within the accuracies of all four readings, whichever way they differ', () => {
    // 100 g of two readings on one side, 100 g of two on the other.
    for (const grams of [4800, 5000, 5200]) expect(found([half('out')], [half('in', { grams })])).toEqual([])
    for (const grams of [4799, 5201]) expect(found([half('out')], [half('in', { grams })])).toEqual(['transfer-unbalanced'])
  })

  it('say the same on both cylinders', () => {
    const short = half('in', { grams: 4799 })
    expect(pairFindings([short], [half('out')])).toEqual(pairFindings([half('out')], [short]))
  })

  it('say what went out, what came in, and what the readings explain', () => {
    const [finding] = pairFindings([half('out')], [half('in', { grams: 4000 })])
    expect(finding).toMatchObject({ severity: 'caution', since: '1970-01-01T00:00:00.000Z' })
    expect(finding!.text.replaceAll('\u00A0', ' ')).toContain('11.0 lb (5.00 kg) went out of one cylinder and 8.8 lb (4.00 kg) into the other')
    expect(finding!.text.replaceAll('\u00A0', ' ')).toContain('0.4 lb (0.20 kg)')
  })

  it('that name different refrigerants are unbalanced, however well the weights agree', () => {
    expect(found([half('out')], [half('in', { refrigerant: 'R-410A' })])).toEqual(['transfer-unbalanced'])
    expect(found([half('out')], [half('in', { refrigerant: null })])).toEqual(['transfer-unbalanced'])
    expect(found([half('out', { refrigerant: null })], [half('in', { refrigerant: null })])).toEqual([])
  })

  it('are not held against each other where a weight is not known', () => {
    expect(found([half('out', { grams: null })], [half('in')])).toEqual([])
    expect(found([half('out')], [half('in', { grams: null })])).toEqual([])
  })
})

describe('one half alone', () => {
  it('waits for the other', () => {
    expect(found([half('out')], [])).toEqual(['half-transfer'])
    expect(found([half('in')], [])).toEqual(['half-transfer'])
    expect(found([half('out', null, { kind: 'exchanged' })], [])).toEqual(['half-transfer'])
    expect(found([half('out', null, { kind: 'exchanged' })], [half('in', null, { kind: 'exchanged' })])).toEqual([])
  })

  it('is not made whole by a half of another pair, kind, side or cylinder', () => {
    const others = [{ pairId: 'another' }, { kind: 'exchanged' as const }, { direction: 'out' as const }, { cylinderId: 'x' }, { otherId: 'x' }]
    for (const more of others) expect(found([half('out')], [half('in', {}, more)])).toEqual(['half-transfer'])
  })

  it('recorded twice is whole once, the second time alone', () => {
    expect(found([half('out'), half('out')], [half('in')])).toEqual(['half-transfer'])
    expect(found([half('out'), half('out')], [half('in'), half('in')])).toEqual([])
  })
})

describe('a cylinder with one half in its log', () => {
  const story = [registered(), did('transferred', {
    direction: 'in', counterpartId: A, transferId: B, refrigerant: 'R-22', condition: 'clean', grossBefore: kg(12), grossAfter: kg(17),
  })]

  it('shows it until the other cylinder\'s log has the other half', () => {
    expect(codes(viewAfter(story))).toContain('half-transfer')
    const other: Half = { ...half('out'), cylinderId: A, otherId: CYLINDER, pairId: B }
    expect(codes(viewAfter(story, { otherHalves: [other] }))).not.toContain('half-transfer')
  })
})
