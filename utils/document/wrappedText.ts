/** Width of a character of Barlow over its size: an upper estimate for words. */
const WORD_WIDTH = 0.56

/** From one baseline to the next, over the size. */
export const LINE_SPACING = 1.15

/** Lines of text that fit a box, and the size that they are set in. */
export interface FittedLines { lines: string[], size: number }

/**
 * Text broken between words into a box, in the largest of some sizes that fits; the least size takes whatever is left.
 *
 * Units: those of the box; `sizes` from the largest down.
 */
export function fittedLines(text: string, box: { width: number, height: number }, sizes: readonly [number, ...number[]]): FittedLines {
  for (const size of sizes) {
    const most = Math.floor(box.width / (size * WORD_WIDTH))
    const lines = brokenAt(text, most)
    if (lines.length * size * LINE_SPACING <= box.height && lines.every(line => line.length <= most)) return { lines, size }
  }
  const least = sizes.at(-1) ?? sizes[0]
  return { lines: brokenAt(text, Math.floor(box.width / (least * WORD_WIDTH))), size: least }
}

/** A word longer than a line stands alone on its own. */
function brokenAt(text: string, most: number): string[] {
  return text.split(' ').reduce<string[]>((lines, word) => {
    const last = lines.at(-1)
    return last !== undefined && last.length + 1 + word.length <= most ? [...lines.slice(0, -1), `${last} ${word}`] : [...lines, word]
  }, [])
}
