import { describe, expect, it } from 'vitest'
import { usualPrinter } from '../../../../utils/label/printer'
import { LABEL_STOCKS, type LabelStockId } from '../../../../utils/label/stock'
import { testPage } from '../../../../utils/label/testPage'

function drawn(id: LabelStockId) {
  return testPage(LABEL_STOCKS[id], usualPrinter(LABEL_STOCKS[id])).pages[0]![0]!.label
}

describe('the test page', () => {
  it.each([
    ['roll-4x2', 50, 40], ['roll-4x6', 50, 50], ['roll-3x2', 50, 40], ['roll-2x1', 40, 20],
    ['letter-30', 50, 20], ['letter-10', 50, 40], ['letter-6', 50, 50], ['a4-21', 50, 20], ['a4-14', 50, 20], ['a4-8', 50, 50],
  ] as const)('of %s has a ruler of %d mm across and %d mm down, and says so', (id, across, down) => {
    const { rules, texts } = drawn(id)
    const [horizontal] = rules.filter(({ width, thickness }) => width > 15 && thickness < 1)
    const [vertical] = rules.filter(({ width, thickness }) => thickness > 15 && width < 1)
    expect([horizontal!.width, vertical!.thickness]).toEqual([across, down])
    expect(texts[0]!.text).toBe(`${across} mm across, ${down} mm down.`)
    // From outer edge to outer edge, the marks included.
    const ticks = rules.filter(({ y, thickness }) => y === horizontal!.y && thickness > 1 && thickness < 5)
    expect(Math.min(...ticks.map(({ x }) => x))).toBeCloseTo(horizontal!.x, 9)
    expect(Math.max(...ticks.map(({ x, width }) => x + width))).toBeCloseTo(horizontal!.x + across, 9)
  })

  it('has a frame 2 mm inside every label, and its rulers inside the first', () => {
    const { strokes, rules, texts, width, height } = drawn('letter-30')
    expect([width, height]).toEqual([215.9, 279.4])
    expect(strokes).toHaveLength(30)
    const corners = strokes[0]!.path.match(/[\d.]+/g)!.map(Number)
    for (const [at, mm] of [6.763, 14.7, 69.438, 14.7, 69.438, 36.1, 6.763, 36.1].entries()) expect(corners[at]).toBeCloseTo(mm, 9)
    for (const { x, y, width, thickness } of rules) {
      expect(x).toBeGreaterThanOrEqual(6.763)
      expect(y).toBeGreaterThanOrEqual(14.7)
      expect(x + width).toBeLessThanOrEqual(69.438)
      expect(y + thickness).toBeLessThanOrEqual(36.1)
    }
    for (const { y, size } of texts) expect(y + size * 0.25).toBeLessThanOrEqual(36.1)
  })

  it('is moved by the printer\'s offset', () => {
    const { pages } = testPage(LABEL_STOCKS['roll-2x1'], { dotsPerInch: 300, offset: { x: -1, y: 0.5 } })
    expect(pages[0]![0]).toMatchObject({ x: -1, y: 0.5, symbol: null })
  })
})
