import { describe, expect, it } from 'vitest'
import { hostBudget, labelSymbol, symbolPath, type LabelSymbol } from '../../../../utils/label/symbol'

const REST = 'HTTPS:///C/7K3M9Q2TX'.length

function address(length: number): string {
  return `HTTPS://${'A'.repeat(length - REST)}/C/7K3M9Q2TX`
}

describe('the symbol of a label', () => {
  // Capacity of version 3 in alphanumeric mode: 47 characters at Q, 35 at H; of version 2: 29 at Q, 20 at H (ISO/IEC 18004).
  it('is of version 3 at level Q up to 47 characters', () => {
    expect(labelSymbol(address(47))).toMatchObject({ version: 3, level: 'Q', size: 29 })
    expect(labelSymbol(address(48))).toMatchObject({ version: 4, size: 33 })
  })

  it('gains level H for nothing where the host is short', () => {
    expect(labelSymbol(address(35))).toMatchObject({ version: 3, level: 'H' })
    expect(labelSymbol(address(36))).toMatchObject({ version: 3, level: 'Q' })
  })

  it('never grows for the sake of level H', () => {
    expect(labelSymbol(address(29))).toMatchObject({ version: 2, level: 'Q', size: 25 })
    expect(labelSymbol(address(30))).toMatchObject({ version: 3, level: 'H' })
  })

  it('is light all round, and has its three finder patterns and no fourth', () => {
    const symbol = labelSymbol(address(47))
    const corner = (left: number, top: number) => Array.from({ length: 7 }, (_, x) => symbol.isDark(left + x, top)).every(Boolean)
    expect([corner(0, 0), corner(22, 0), corner(0, 22), corner(22, 22)]).toEqual([true, true, true, false])
    expect([symbol.isDark(-1, 0), symbol.isDark(0, -1), symbol.isDark(29, 0), symbol.isDark(0, 29)]).toEqual([false, false, false, false])
  })

  it('is asked by column, then row: the one lone dark module beside the lower left finder is at column 8', () => {
    // ISO/IEC 18004: the module at row 4 x version + 9, column 8 is always dark; version 3: row 21.
    const symbol = labelSymbol(address(47))
    expect(symbol.isDark(8, 21)).toBe(true)
  })
})

describe('the path of a symbol', () => {
  const drawing = ['##.#', '....', '.###', '#...']
  const symbol: LabelSymbol = { version: 1, level: 'Q', size: 4, isDark: (x, y) => drawing[y]?.[x] === '#' }

  it('merges the neighbours of a row into one run', () => {
    expect(symbolPath(symbol)).toBe('M0 0h2v1h-2zM3 0h1v1h-1zM1 2h3v1h-3zM0 3h1v1h-1z')
  })
})

describe('the room for a host', () => {
  // 48 characters in version 4: 50 are its capacity at H (ISO/IEC 18004).
  it('warns beyond 27 characters', () => {
    expect(hostBudget('a'.repeat(27))).toEqual({ hostCharacters: 27, version: 3, level: 'Q', modules: 29, isLong: false })
    expect(hostBudget('a'.repeat(28))).toEqual({ hostCharacters: 28, version: 4, level: 'H', modules: 33, isLong: true })
  })

  it('gives the strongest level up to 15 characters', () => {
    expect(hostBudget('a'.repeat(15))).toMatchObject({ version: 3, level: 'H' })
    expect(hostBudget('a'.repeat(16))).toMatchObject({ version: 3, level: 'Q' })
  })

  it('does not let digits flatter a host', () => {
    expect(hostBudget('1'.repeat(28)).isLong).toBe(true)
  })
})
