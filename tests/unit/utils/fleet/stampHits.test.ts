import { describe, expect, it } from 'vitest'
import { endsStamp, moreInWords, stampFound } from '../../../../utils/fleet/stampHits'

const rows = [{ serial: 'K1044A' }, { serial: 'QX-7 1044' }, { serial: null }, { serial: 'qx81044' }, { serial: 'K48213' }]
const alike = (count: number) => Array.from({ length: count }, (_, at) => ({ serial: `K${1000 + at}` }))

describe('the cylinders whose stamp has some typed characters', () => {
  it('are those first whose serial ends with them, then those that have them elsewhere', () => {
    expect(stampFound(rows, '1044', 5).rows.map(({ serial }) => serial)).toEqual(['QX-7 1044', 'qx81044', 'K1044A'])
  })

  it('are found whatever the case, the spaces and the hyphens, and never by what is not their serial', () => {
    expect(stampFound(rows, 'qx7-1044', 5)).toEqual({ rows: [{ serial: 'QX-7 1044' }], more: 0, isMoreUnread: false })
    expect(stampFound(rows, 'R-22', 5).rows).toEqual([])
  })

  it('are shown up to twenty, and the others counted', () => {
    expect(stampFound(alike(20), 'K1', 20)).toMatchObject({ rows: alike(20), more: 0, isMoreUnread: false })
    expect(stampFound(alike(21), 'K1', 21)).toMatchObject({ rows: alike(20), more: 1, isMoreUnread: false })
    expect(stampFound(alike(200), 'K1', 201)).toMatchObject({ more: 180, isMoreUnread: true })
  })
})

it('says how many others there are, and that there may be more where not all were read', () => {
  expect(moreInWords({ more: 0, isMoreUnread: false })).toBeNull()
  expect(moreInWords({ more: 1, isMoreUnread: false })).toBe('1 other has these characters too.')
  expect(moreInWords({ more: 14, isMoreUnread: false })).toBe('14 others have these characters too.')
  expect(moreInWords({ more: 180, isMoreUnread: true })).toBe('180 or more others have these characters too.')
  expect(moreInWords({ more: 0, isMoreUnread: true })).toBe('There may be more with these characters.')
})

it('tells the end of a serial from its middle, and knows no end of a serial that is not known', () => {
  expect(endsStamp('QX-7 1044', '71044')).toBe(true)
  expect(endsStamp('QX-7 1044', '7-10')).toBe(false)
  expect(endsStamp(null, '')).toBe(false)
})
