import { describe, expect, it } from 'vitest'
import { FIRST_LAYOUT, FIXED_COLUMNS, FLEET_COLUMNS } from '../../../../utils/contract/fleetLayout'
import { fleetColumns } from '../../../../utils/contract/fleetViews'
import { FLEET_CHOICES } from '../../../../utils/contract/fleetQuestion'
import { columnHead, columnMoved, columnOfSort } from '../../../../utils/fleet/fleetColumns'

describe('the columns of the fleet', () => {
  it('name the unit over masses alone', () => {
    expect(columnHead('stop', 'kg')).toBe('Stop, kg')
    expect(columnHead('net', 'lb-oz')).toBe('Net / fill limit, lb oz')
    expect(columnHead('place', 'kg')).toBe('Place')
  })

  it('show every order of the list at one head', () => {
    const heads = FLEET_CHOICES.sort.map(columnOfSort)
    expect(heads).not.toContain(null)
    expect(new Set(heads).size).toBe(FLEET_CHOICES.sort.length)
  })

  it('move a step at a time, never among the two that stand first and never off the end', () => {
    const columns = ['code', 'verdict', 'room', 'stop'] as const
    expect(columnMoved(columns, 'stop', -1, 2)).toEqual(['code', 'verdict', 'stop', 'room'])
    expect(columnMoved(columns, 'room', 1, 2)).toEqual(['code', 'verdict', 'stop', 'room'])
    expect(columnMoved(columns, 'room', -1, 2)).toEqual(columns)
    expect(columnMoved(columns, 'stop', 1, 2)).toEqual(columns)
    expect(columnMoved(columns, 'verdict', 1, 2)).toEqual(columns)
  })

  it('are kept only where code and verdict stand first and none stands twice', () => {
    expect(fleetColumns.safeParse(FIRST_LAYOUT.columns).success).toBe(true)
    expect(fleetColumns.safeParse([...FIXED_COLUMNS]).success).toBe(true)
    expect(fleetColumns.safeParse([...FLEET_COLUMNS]).success).toBe(true)
    for (const columns of [['code'], ['verdict', 'code'], ['code', 'room', 'verdict'], ['code', 'verdict', 'room', 'room'], ['code', 'verdict', 'colour']]) {
      expect(fleetColumns.safeParse(columns).success, columns.join()).toBe(false)
    }
  })
})
