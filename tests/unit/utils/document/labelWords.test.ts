import { describe, expect, it } from 'vitest'
import { hostWords, symbolWords } from '~~/utils/document/labelWords'
import { hostBudget } from '~~/utils/label/symbol'

const GOOD = { is: 'good', moduleMm: 0.625, sideMm: 18.125 } as const

describe('what the print dialog says of a symbol', () => {
  it('gives its size, and below 150 mm of diameter which way the label goes', () => {
    expect(symbolWords(GOOD, null)).toEqual({ kind: 'ok', text: 'A symbol of 18.1 mm, its modules 0.63 mm.' })
    expect(symbolWords(GOOD, 150).text).not.toContain('long edge')
    expect(symbolWords(GOOD, 149.9).text).toContain('long edge along the cylinder')
  })

  it('sends a label that would bend too much to the flat of the guard', () => {
    expect(symbolWords({ is: 'too-curved' }, 80)).toMatchObject({ kind: 'stop', text: expect.stringContaining('flat of the guard') })
    expect(symbolWords({ ...GOOD, is: 'at-the-limit' }, 90)).toMatchObject({ kind: 'att', text: expect.stringContaining('flat of the guard') })
  })

  it('sends a long address to larger labels', () => {
    expect(symbolWords({ is: 'no-room' }, null)).toMatchObject({ kind: 'stop', text: expect.stringContaining('larger labels') })
  })
})

describe('what the length of the host makes of the labels', () => {
  it('is the strongest level up to 15 characters, the usual size up to 27, a warning beyond', () => {
    const said = (length: number) => hostWords(hostBudget('a'.repeat(length)))
    expect(said(15)).toMatchObject({ kind: 'ok', text: expect.stringContaining('level H. It stands the most') })
    expect(said(16)).toMatchObject({ kind: 'ok', text: expect.stringContaining('level Q. 27 is the most') })
    expect(said(27)).toMatchObject({ kind: 'ok' })
    expect(said(28)).toMatchObject({ kind: 'att', text: expect.stringContaining('read from less far') })
  })
})
