import { describe, expect, it } from 'vitest'
import { fleetCsvHeads, fleetCsvRow } from '../../../../utils/fleet/fleetCsv'
import { cylinderRow } from '../../../helpers/cylinderRow'

describe('the fleet as a table of values', () => {
  it('names the unit in the head of each mass', () => {
    expect(fleetCsvHeads(['code', 'verdict', 'net', 'room', 'last'], 'kg'))
      .toEqual(['Code', 'Verdict', 'Net, kg', 'Fill limit, kg', 'Room, kg', 'Last event', 'Last event at'])
    expect(fleetCsvHeads(['code', 'verdict', 'stop'], 'lb-oz').at(-1)).toBe('Stop, lb')
  })

  // 10251 g are 22.60 lb; 17272 g are 38.08, 7021 g are 15.48 and 29746.6 g are 65.58 lb: limit, room and stop go down.
  it('writes each figure as the screen rounds it, each month and instant in the form that sorts', () => {
    expect(fleetCsvRow(cylinderRow(), ['code', 'verdict', 'net', 'room', 'stop', 'retest', 'last'], 'lb'))
      .toEqual(['7K3 M9Q 2TX', 'Usable', 22.6, 38, 15.4, 65.5, '2029-03', 'Filled', '2026-11-30T16:00:00Z'])
  })

  // 328 g are 0.723 lb: the excess is written as 0.8.
  it('keeps an overfill a negative number', () => {
    expect(fleetCsvRow(cylinderRow({ roomGrams: -328 }), ['room'], 'lb')).toEqual([-0.8])
  })

  it('leaves a cell without a figure empty, and keeps a nought', () => {
    const empty = cylinderRow({ nothingInIt: true, refrigerant: null, netGrams: 0, fillLimitGrams: null, governingRule: null, roomGrams: null, exactStopWeightGrams: null })
    expect(fleetCsvRow(empty, ['refrigerant', 'net', 'rule', 'room', 'stop'], 'lb')).toEqual(['none', 0, null, 'by refrigerant', null, null])
  })

  it('names the owner where it is another, and leaves the cell empty where none is named', () => {
    expect(fleetCsvHeads(['holder', 'owner'], 'lb')).toEqual(['Holder', 'Owner'])
    const dairy = { id: 'd', name: 'Dunmarrow Dairy' }
    expect(fleetCsvRow(cylinderRow({ owner: dairy }), ['holder', 'owner'], 'lb')).toEqual([null, 'Dunmarrow Dairy'])
    expect(fleetCsvRow(cylinderRow(), ['owner'], 'lb')).toEqual([null])
  })

  it('keeps a text from being reckoned by a spreadsheet', () => {
    for (const serial of ['=1+1', '+44', '-5', '@A1', '\tx', '\uFF1D1']) {
      expect(fleetCsvRow(cylinderRow({ serial }), ['serial'], 'lb')).toEqual([`'${serial}`])
    }
    expect(fleetCsvRow(cylinderRow({ serial: 'K-5=1' }), ['serial'], 'lb')).toEqual(['K-5=1'])
  })
})
