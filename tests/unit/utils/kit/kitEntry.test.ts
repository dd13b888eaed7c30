import { describe, expect, it } from 'vitest'
import { codesOnTwo, kitEntry, ownerOfCode, tailOf } from '~~/utils/kit/kitEntry'
import { packCylinder } from '~~/utils/kit/packCylinder'
import { did, folded, kg, OTHER_CYLINDER, registered, SHOP, TECHNICIAN, VAN } from '../../../helpers/custody'

const had = (id: string, code: string, firstAt: number, replacedAt?: number) => ({ id, labels: [{ code, firstAt, lastAt: firstAt, ...replacedAt === undefined ? {} : { replacedAt } }] })

describe('a code on two cylinders', () => {
  const [first, second] = [had('a', '7K3M9Q2TX', 100), had('b', '7K3M9Q2TX', 200)]

  it('belongs to the one that had it first, and stands against both', () => {
    expect(ownerOfCode('7K3M9Q2TX', [second, first])).toBe(first)
    expect([...codesOnTwo(first, [first, second])]).toEqual(['7K3M9Q2TX'])
    expect([...codesOnTwo(second, [first, second])]).toEqual(['7K3M9Q2TX'])
  })

  it('is on one again once another label has taken its place on the one that had it later', () => {
    const mended = had('b', '7K3M9Q2TX', 200, 300)
    expect(codesOnTwo(first, [first, mended]).size).toBe(0)
    expect(codesOnTwo(mended, [first, mended]).size).toBe(0)
  })

  it('stays on two where the one that had it first got another label', () => {
    const replaced = had('a', '7K3M9Q2TX', 100, 300)
    expect([...codesOnTwo(replaced, [replaced, second])]).toEqual(['7K3M9Q2TX'])
    expect([...codesOnTwo(second, [replaced, second])]).toEqual(['7K3M9Q2TX'])
  })

  it('is on no two where only one has it, and nobody\'s where none has', () => {
    expect(codesOnTwo(first, [first, had('c', '000000000', 1)]).size).toBe(0)
    expect(ownerOfCode('000000000', [first, second])).toBeNull()
  })
})

describe('a cylinder kept on a phone', () => {
  it('is found by every code that was ever on it, by where it is and who has it, by the end of its serial, and by whom it names', () => {
    const { state } = folded(
      registered(), did('labelled', { code: '7K3M9Q2TX' }), did('labelled', { code: '000000000', replaces: '7K3M9Q2TX' }),
      did('moved', { toPlaceId: VAN, toHolderId: TECHNICIAN }),
      did('transferred', { counterpartId: OTHER_CYLINDER, direction: 'out', refrigerant: 'R-22', condition: 'clean', grossAfter: kg(13), transferId: SHOP }),
    )
    expect(kitEntry(packCylinder(state))).toMatchObject({ codes: ['7K3M9Q2TX', '000000000'], placeId: VAN, holderId: TECHNICIAN, tail: '1001A', names: [OTHER_CYLINDER] })
  })

  it('leaves out what it does not have, for a store has no place for null', () => {
    const entry = kitEntry(packCylinder(folded(did('found', {})).state))
    for (const key of ['tail', 'placeId', 'holderId']) expect(entry).not.toHaveProperty(key)
  })

  it('has its serial from the end, without spaces, hyphens and small letters', () => {
    expect(tailOf('b-77 31')).toBe('1377B')
  })
})
