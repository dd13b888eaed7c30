import { describe, expect, it } from 'vitest'
import { isMarkTyped, readMarkEntry } from '~~/utils/requalification/markEntry'

const NOW = '2026-12'

function read(month: string, rin = '', suffix = '') {
  return readMarkEntry({ month, rin, suffix }, NOW)
}

describe('the fields of a mark', () => {
  it('may each hold their part, or the first the whole mark', () => {
    const mark = { month: '2006-09', rin: 'A123', suffix: 'S' }
    expect(read('9-06', 'a123', 's')).toEqual({ mark })
    expect(read('9 A123 06 S')).toEqual({ mark })
    expect(read('9 A1/32 06', '', 'S')).toEqual({ mark })
    expect(read('9-06', 'A1/32', 'S')).toEqual({ mark })
    expect(read('9 A123 06 S', 'A123', 'S')).toEqual({ mark })
  })

  it('need no RIN and no suffix', () => {
    expect(read('9-06')).toEqual({ mark: { month: '2006-09', rin: null, suffix: null } })
  })

  it('say what is to be mended', () => {
    expect(read('', 'A123')).toMatchObject({ error: expect.stringContaining('the month and the year') })
    expect(read('9-06', 'A12')).toMatchObject({ error: expect.stringContaining('four letters or figures') })
    expect(read('9 A123 06', 'B456')).toEqual({ error: 'The RIN is typed twice, as A123 and as B456. Take one out.' })
    expect(read('9 A123 06 S', '', 'E')).toEqual({ error: 'The suffix is typed twice, as S and as E. Take one out.' })
  })

  it('are empty only where nothing at all is typed', () => {
    expect(isMarkTyped({ month: ' ', rin: '', suffix: '' })).toBe(false)
    expect(isMarkTyped({ month: '', rin: '', suffix: 'S' })).toBe(true)
  })
})
