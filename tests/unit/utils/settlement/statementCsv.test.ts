import { describe, expect, it } from 'vitest'
import { csvFigure } from '../../../../utils/settlement/csvFigure'
import { NOTHING_SAID } from '../../../../utils/settlement/figures'
import { readHeader } from '../../../../utils/settlement/statementColumns'
import { statementPreview, withChanges, type KnownLine, type StatementReading } from '../../../../utils/settlement/statementCsv'

const HEADER = ['serial', 'gross', 'net', 'unit', 'grade', 'price', 'per', 'credit']
const POINT: StatementReading = { decimal: 'point', unit: null }
const known = (cylinderId: string, serial: string | null): KnownLine => ({ cylinderId, serial, figures: NOTHING_SAID })
const LINES = [known('a', 'K 4471-02'), known('b', 'K447103'), known('c', null)]

const table = (rows: string[][]) => rows.map((cells, index) => ({ row: index + 1, cells }))
const preview = (rows: string[][], reading = POINT, lines = LINES) => statementPreview(table([HEADER, ...rows]), lines, reading)
const problems = (row: string[], reading = POINT) => preview([row], reading).rows[0]!.problems.map(({ column, text }) => `${column}: ${text}`)

describe('a figure of a file', () => {
  it('has the decimal sign of the whole file, and is not guessed by the other', () => {
    expect(csvFigure('11.25', 'point')).toEqual({ value: 11.25, decimals: 2 })
    expect(csvFigure('11,25', 'comma')).toEqual({ value: 11.25, decimals: 2 })
    expect(csvFigure('1,022', 'point')).toEqual({ wrong: 'ambiguous' })
    expect(csvFigure('1.022', 'comma')).toEqual({ wrong: 'ambiguous' })
    expect(csvFigure('1,2,3', 'comma')).toEqual({ wrong: 'not-a-number' })
    expect(csvFigure('-1.5', 'point')).toEqual({ value: -1.5, decimals: 1 })
    for (const text of ['', 'abc', '1e3', '.', '--1', '1 2', '0x10', 'Infinity']) expect(csvFigure(text, 'point')).toHaveProperty('wrong')
  })
})

describe('the header of a file', () => {
  it('is found in any case and order', () => {
    expect(readHeader([' Net', 'SERIAL ', 'Remark'])).toMatchObject({ mapping: { serial: 1, net: 0, gross: null }, problems: [], notOurs: ['Remark'] })
  })

  it('must hold the serials and a figure, each column once', () => {
    expect(readHeader(['net', 'unit']).problems).toHaveLength(1)
    expect(readHeader(['serial', 'remark']).problems).toHaveLength(1)
    expect(readHeader(['serial', 'net', 'Net']).problems).toEqual(['Two columns are called “net”.'])
  })

  it('takes the columns that a person chose', () => {
    const chosen = { serial: 'Cyl no', net: 'Weight' }
    expect(readHeader(['cyl no', 'weight', 'x'], chosen)).toMatchObject({ mapping: { serial: 0, net: 1 }, problems: [], notOurs: ['x'] })
    expect(readHeader(['cyl no', 'kilos'], chosen).problems[0]).toBe('No column is called “Weight”.')
    expect(readHeader(['a', 'b'], { serial: 'a', net: 'a' }).problems).toContain('One column of the file was chosen for two of ours.')
  })
})

describe('a statement beside the lines of a shipment', () => {
  it('says what would change, and changes nothing itself', () => {
    const { rows, notNamed } = preview([['k447102', '40.1', '11', 'lb', 'A', '2.4', '', '26.40']])
    expect(rows[0]).toMatchObject({ row: 2, cylinderId: 'a', problems: [] })
    expect(withChanges(NOTHING_SAID, rows[0]!.changes)).toEqual({
      theirGross: { unit: 'lb', value: 40.1 }, acceptedNet: { unit: 'lb', value: 11 }, grade: 'A', rate: { mills: 2_400, per: 'lb' }, statedCents: 2_640, outcome: 'taken-over',
    })
    expect(notNamed).toEqual(['b', 'c'])
  })

  it('keeps what a row leaves empty, and tells no change where it says the same', () => {
    const figures = { ...NOTHING_SAID, grade: 'A', acceptedNet: { value: 11, unit: 'lb' as const }, outcome: 'sent-back' as const }
    const { rows } = preview([['K447103', '', '11', 'lb', '', '', '', '']], POINT, [{ cylinderId: 'b', serial: 'K447103', figures }])
    expect(rows[0]!.changes).toEqual([])
  })

  it('tells a serial that is unknown, that two lines share, that stands twice, or that is missing', () => {
    expect(problems(['X9', '', '1', 'lb', '', '', '', ''])).toEqual(['serial: No line of this shipment has this serial'])
    const twins = preview([['K1', '', '1', 'lb', '', '', '', '']], POINT, [known('a', 'K1'), known('b', 'k-1')])
    expect(twins.rows[0]).toMatchObject({ cylinderId: null, problems: [{ column: 'serial', text: expect.stringContaining('Several lines') }] })
    const twice = preview([['K447103', '', '1', 'lb', '', '', '', ''], ['K4471-03', '', '2', 'lb', '', '', '', '']])
    expect(twice.rows.map(row => row.problems[0]!.text)).toEqual(['Stands 2 times in the file: rows 2, 3', 'Stands 2 times in the file: rows 2, 3'])
    expect(twice.rows.map(row => row.changes)).toEqual([[], []])
    expect(problems(['', '', '1', 'lb', '', '', '', ''])).toEqual(['serial: No serial stands in this row'])
  })

  it('meets its line by a serial that a table keeps from being a formula', () => {
    expect(preview([['\'-K447103', '', '11', 'lb', '', '', '', '']], POINT, [known('b', '-K447103')]).rows[0]).toMatchObject({ cylinderId: 'b', problems: [] })
  })

  it('tells a weight that is no number, is below zero, has no unit or one that is not ours, or is beyond any scale', () => {
    expect(problems(['K447103', 'heavy', '', 'lb', '', '', '', ''])).toEqual(['gross: “heavy” is no number'])
    expect(problems(['K447103', '', '-1', 'lb', '', '', '', ''])).toEqual(['net: “-1” is below zero: a weight is not'])
    expect(problems(['K447103', '', '1', '', '', '', '', ''])).toEqual(['unit: The unit is missing: lb or kg'])
    expect(problems(['K447103', '', '1', 'stone', '', '', '', ''])).toEqual(['unit: “stone” is no unit of ours: lb or kg'])
    expect(problems(['K447103', '', '100001', 'lb', '', '', '', ''])).toHaveLength(1)
    expect(problems(['K447103', '', '100000', 'lb', '', '', '', ''])).toEqual([])
  })

  it('takes the unit that a person chose where the file has none, and nothing for a missing weight', () => {
    const { rows } = preview([['K447103', '', '0', '', '', '-1.5', '', '']], { decimal: 'point', unit: 'kg' })
    expect(rows[0]!.changes).toContainEqual({ field: 'acceptedNet', from: null, to: { unit: 'kg', value: 0 } })
    expect(rows[0]!.changes).toContainEqual({ field: 'rate', from: null, to: { mills: -1_500, per: 'kg' } })
  })

  it('takes a credit to the cent and a price to the thousandth, and no finer', () => {
    expect(problems(['K447103', '', '', '', '', '', '', '1.005'])).toEqual(['credit: “1.005” has more than 2 decimals'])
    expect(problems(['K447103', '', '', '', '', '1.005', 'lb', '-4.10'])).toEqual([])
    expect(problems(['K447103', '', '', '', '', '1.0005', 'lb', ''])).toEqual(['price: “1.0005” has more than 3 decimals'])
    expect(problems(['K447103', '', '', '', '', '1', '', ''])).toEqual(['per: The unit is missing: lb or kg'])
  })

  it('reads no row under a header that it cannot read', () => {
    expect(statementPreview(table([['number', 'weight'], ['K447103', '3']]), LINES, POINT)).toMatchObject({ rows: [], header: { notOurs: ['number', 'weight'] } })
    expect(statementPreview([], LINES, POINT).header.problems).not.toEqual([])
  })
})
