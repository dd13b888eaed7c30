import { inflateSync } from 'node:zlib'

/** Corners of one closed outline, in points from the top left corner of the page. */
export type Outline = { x: number, y: number }[]

/** One page as it would be printed: its size in points and what is filled black on it, letters excepted. */
export interface DrawnPage {
  width: number
  height: number
  fills: Outline[][]
}

type Matrix = readonly [number, number, number, number, number, number]

/** The filled shapes of every page of a PDF, read from the file's own drawing operators. */
export function drawnPages(pdf: Buffer): DrawnPage[] {
  const source = pdf.toString('latin1')
  return pageIds(source).map((id) => {
    const page = objectText(source, id)
    const [, , width, height] = /\/MediaBox \[([^\]]*)\]/.exec(page)![1]!.trim().split(/\s+/).map(Number)
    const contents = /\/Contents (\d+) 0 R/.exec(page)![1]!
    return { width: width!, height: height!, fills: filledOutlines(streamText(source, contents), height!) }
  })
}

/** The numbers of the objects that are a file's pages, in their order. */
export function pageIds(source: string): string[] {
  const kids = /\/Kids \[([^\]]*)\]/.exec(source)?.[1] ?? ''
  return [...kids.matchAll(/(\d+) 0 R/g)].map(([, id]) => id!)
}

/** What stands in an object of a file. */
export function objectText(source: string, id: string): string {
  const start = source.indexOf(`\n${id} 0 obj\n`)
  return source.slice(start, source.indexOf('endobj', start))
}

/** The content of a stream, inflated where it is packed. */
export function streamText(source: string, id: string): string {
  const object = objectText(source, id)
  const begin = object.indexOf('stream\n') + 'stream\n'.length
  const length = Number(/\/Length (\d+)/.exec(object)![1])
  const bytes = Buffer.from(object.slice(begin, begin + length), 'latin1')
  return (object.includes('/FlateDecode') ? inflateSync(bytes) : bytes).toString('latin1')
}

/** Follows the operators that straight-edged fills are made of; curves are taken by their ends, strokes and letters passed over. */
function filledOutlines(content: string, pageHeight: number): Outline[][] {
  const fills: Outline[][] = []
  const saved: Matrix[] = []
  let matrix: Matrix = [1, 0, 0, 1, 0, 0]
  let outlines: Outline[] = []
  let operands: number[] = []
  const corner = (x: number, y: number) => ({
    x: matrix[0] * x + matrix[2] * y + matrix[4],
    y: pageHeight - (matrix[1] * x + matrix[3] * y + matrix[5]),
  })

  for (const token of content.replace(/BT\b[\s\S]*?\bET\b/g, '').split(/\s+/)) {
    if (/^[-+.\d]+$/.test(token)) {
      operands.push(Number(token))
      continue
    }
    const [a, b, c, d, e, f] = operands as [number, number, number, number, number, number]
    operands = []
    if (token === 'q') saved.push(matrix)
    else if (token === 'Q') matrix = saved.pop()!
    else if (token === 'cm') matrix = times([a, b, c, d, e, f], matrix)
    else if (token === 'm') outlines.push([corner(a, b)])
    else if (token === 'l') outlines.at(-1)!.push(corner(a, b))
    else if (token === 'c') outlines.at(-1)!.push(corner(e, f))
    else if (token === 'v' || token === 'y') outlines.at(-1)!.push(corner(c, d))
    else if (token === 're') outlines.push([corner(a, b), corner(a + c, b), corner(a + c, b + d), corner(a, b + d)])
    else if (token === 'f' || token === 'f*') {
      fills.push(outlines)
      outlines = []
    }
    else if (token === 'S' || token === 's' || token === 'n') outlines = []
  }
  return fills
}

function times(first: Matrix, then: Matrix): Matrix {
  return [
    first[0] * then[0] + first[1] * then[2], first[0] * then[1] + first[1] * then[3],
    first[2] * then[0] + first[3] * then[2], first[2] * then[1] + first[3] * then[3],
    first[4] * then[0] + first[5] * then[2] + then[4], first[4] * then[1] + first[5] * then[3] + then[5],
  ]
}

/** The symbols of a page: the fills made of so many outlines that they can be nothing else. */
export function symbolsOf(page: DrawnPage): Outline[][] {
  return page.fills.filter(outlines => outlines.length > 50)
}

/** The smallest upright box around some outlines, in points. */
export function boundsOf(outlines: Outline[]): { left: number, top: number, right: number, bottom: number } {
  const corners = outlines.flat()
  const [xs, ys] = [corners.map(({ x }) => x), corners.map(({ y }) => y)]
  return { left: Math.min(...xs), top: Math.min(...ys), right: Math.max(...xs), bottom: Math.max(...ys) }
}

/** Whether a point of the page is inside one of the outlines. */
export function isInside(outlines: Outline[], x: number, y: number): boolean {
  return outlines.some((outline) => {
    let inside = false
    outline.forEach((to, index) => {
      const from = outline.at(index - 1)!
      const crosses = (from.y > y) !== (to.y > y)
      if (crosses && x < from.x + (y - from.y) / (to.y - from.y) * (to.x - from.x)) inside = !inside
    })
    return inside
  })
}
