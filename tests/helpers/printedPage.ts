import { boundsOf, isInside, symbolsOf, type DrawnPage } from './pdfShapes'
import { readSymbols } from './readSymbols'

const PIXELS_PER_POINT = 1.5

/** What the symbols of a printed page say, sorted. */
export function symbolTexts(page: DrawnPage): Promise<string[]> {
  const symbols = symbolsOf(page).map(outlines => ({ outlines, bounds: boundsOf(outlines) }))
  return readSymbols(Math.round(page.width * PIXELS_PER_POINT), Math.round(page.height * PIXELS_PER_POINT), (column, row) => {
    const [x, y] = [(column + 0.5) / PIXELS_PER_POINT, (row + 0.5) / PIXELS_PER_POINT]
    const here = symbols.find(({ bounds }) => x > bounds.left && x < bounds.right && y > bounds.top && y < bounds.bottom)
    return here && isInside(here.outlines, x, y) ? 0 : 255
  })
}
