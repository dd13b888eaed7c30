/**
 * Values from lines of JSON that come in pieces, each handed over as soon as its line is whole.
 *
 * Errors: SyntaxError where a line is no JSON.
 */
export function jsonLines(): (piece: string) => unknown[] {
  let rest = ''
  return (piece) => {
    const lines = (rest + piece).split('\n')
    rest = lines.pop() ?? ''
    return lines.filter(line => line !== '').map(line => JSON.parse(line) as unknown)
  }
}
