import { describe, expect, it } from 'vitest'
import { handoverText, MOST_HANDED_OVER, offerId, readHandover, type Handover } from '../../../../utils/handover/handoverText'
import { readScannedText } from '../../../../utils/label/code'
import { labelSymbol } from '../../../../utils/label/symbol'

const PERSON = '01900000-0000-7000-8000-00000000abcd'
const UNLABELLED = '01900000-0000-7000-8000-000000000001'
const OFFER: Handover = { is: 'offer', id: '7K3M9Q2T', personId: PERSON, atMs: 29_400_000 * 60_000, cylinders: ['7K3M9Q2TX', UNLABELLED] }
const TEXT = handoverText(OFFER)

describe('the text of a handover', () => {
  it('is read as it was written, an offer as an answer, in any case', () => {
    expect(readHandover(TEXT)).toEqual({ handover: OFFER })
    expect(readHandover(` ${TEXT.toLowerCase()} `)).toEqual({ handover: OFFER })
    const answer: Handover = { ...OFFER, is: 'answer', cylinders: [] }
    expect(readHandover(handoverText(answer))).toEqual({ handover: answer })
  })

  it('says what it is at its beginning, and names a cylinder without a label by its id', () => {
    // 29,400,000 minutes = 17 x 36^4 + 18 x 36^3 + 5 x 36^2 + 6 x 36 + 24.
    expect(TEXT).toMatch(/^CYLINDERS1\/O\/7K3M9Q2T\/0190000000007000800000000000ABCD\/HI56O\/7K3M9Q2TX\.01900000000070008000000000000001\/\d\d$/)
  })

  it('keeps the minute, not the second', () => {
    const read = readHandover(handoverText({ ...OFFER, atMs: OFFER.atMs + 59_999 }))
    expect(read).toEqual({ handover: OFFER })
  })

  it('is broken where a character is lost, changed or exchanged with its neighbour', () => {
    expect(readHandover(TEXT.replace('Q2TX', 'Q2T'))).toEqual({ reason: 'broken' })
    expect(readHandover(TEXT.replace('ABCD', 'ABCE'))).toEqual({ reason: 'broken' })
    expect(readHandover(TEXT.replace('ABCD', 'ABDC'))).toEqual({ reason: 'broken' })
    expect(readHandover(TEXT.slice(0, -1))).toEqual({ reason: 'broken' })
    expect(readHandover(TEXT.replace('/O/', '/A/'))).toEqual({ reason: 'broken' })
  })

  it('is told from one of a newer application, and from a label', () => {
    expect(readHandover(TEXT.replace('CYLINDERS1/', 'CYLINDERS2/'))).toEqual({ reason: 'newer' })
    expect(readHandover('HTTPS://CYLINDERS.EXAMPLE/C/7K3M9Q2TX')).toBeNull()
    expect(readHandover('7K3M9Q2TX')).toBeNull()
    expect(readScannedText(TEXT), 'nor does a label scanner take it for a label').toBeNull()
  })

  it('offers twenty cylinders and no more, and never none', () => {
    const of = (count: number) => readHandover(handoverText({ ...OFFER, cylinders: Array<string>(count).fill('7K3M9Q2TX') }))
    expect(MOST_HANDED_OVER).toBe(20)
    expect(of(20)).toHaveProperty('handover')
    expect(of(21)).toEqual({ reason: 'broken' })
    expect(of(0)).toEqual({ reason: 'broken' })
  })

  it('fits a symbol that a phone reads off a phone, even with twenty labels', () => {
    // Version 12 has 65 modules a side (ISO/IEC 18004).
    expect(labelSymbol(handoverText({ ...OFFER, cylinders: Array<string>(20).fill('7K3M9Q2TX') })).version).toBeLessThanOrEqual(12)
  })
})

it('the id of an offer has eight symbols that no eye confuses', () => {
  expect(offerId(new Uint8Array([0, 1, 31, 32, 255, 10, 18, 20, 99]))).toBe('01Z0ZAJM')
})
