import { describe, expect, it } from 'vitest'
import type { Place, Standing } from '../../../../utils/contract/places'
import { placeBranches, placesToStandIn, whyNotClose, type PlaceBranch } from '../../../../utils/places/placeBranches'

const place = (id: string, parentId: string | null = null, change: Partial<Place> = {}): Place => ({
  id, parentId, name: id, kind: 'rack', firmId: null, technicianId: null, technicianName: null, active: true, cylinders: 0, ...change,
})
const standing = (placeId: string, grossGrams: number, refrigerants: [string | null, number][], withoutWeight = 0): Standing => ({
  placeId, grossGrams, withoutWeight,
  cylinders: refrigerants.reduce((sum, [, count]) => sum + count, 0),
  refrigerants: refrigerants.map(([refrigerant, cylinders]) => ({ refrigerant, cylinders })),
})
const shape = (branches: PlaceBranch[]): unknown[] => branches.map(branch => branch.inside.length ? [branch.place.id, shape(branch.inside)] : branch.place.id)

describe('the tree of places', () => {
  it('has racks in the shop that they stand in', () => {
    expect(shape(placeBranches([place('bay 1', 'shop'), place('shop'), place('van'), place('shelf', 'bay 1')], [])))
      .toEqual([['shop', [['bay 1', ['shelf']]]], 'van'])
  })

  it('loses no place whose shop is not shown, nor one that stands in itself', () => {
    expect(shape(placeBranches([place('bay', 'gone'), place('a', 'b'), place('b', 'a'), place('c', 'c')], [])))
      .toEqual(['bay', ['a', ['b']], 'c'])
  })

  it('adds up what stands in a branch and tells it from what stands in the place itself', () => {
    const [shop] = placeBranches(
      [place('shop'), place('bay', 'shop'), place('shelf', 'bay')],
      [standing('shop', 20_000, [['R-22', 1]]), standing('bay', 30_000, [['R-410A', 2], [null, 1]], 1), standing('shelf', 5_000, [['R-410A', 1]])],
    )
    expect(shop!.here).toMatchObject({ cylinders: 1, grossGrams: 20_000, withoutWeight: 0 })
    expect(shop!.within).toEqual({
      cylinders: 5, grossGrams: 55_000, withoutWeight: 1,
      refrigerants: [{ refrigerant: 'R-410A', cylinders: 3 }, { refrigerant: 'R-22', cylinders: 1 }, { refrigerant: null, cylinders: 1 }],
    })
  })
})

describe('a branch that is moved', () => {
  const places = [place('shop'), place('bay', 'shop'), place('shelf', 'bay'), place('yard'), place('van', null, { kind: 'van' }),
    place('dock', null, { kind: 'firm' }), place('old shed', null, { active: false })]

  it('may stand anywhere but within itself, in a van, with a firm or in a closed place', () => {
    expect(placesToStandIn(places, 'bay').map(({ id }) => id)).toEqual(['shop', 'yard'])
    expect(placesToStandIn(places, 'shop').map(({ id }) => id)).toEqual(['yard'])
    expect(placesToStandIn(places, null).map(({ id }) => id)).toEqual(['shop', 'bay', 'shelf', 'yard'])
  })

  it('is still to be moved out of a circle that it stands in', () => {
    expect(placesToStandIn([place('a', 'b'), place('b', 'a'), place('shop')], 'a').map(({ id }) => id)).toEqual(['shop'])
  })
})

describe('a place that is closed', () => {
  const closing = (standingThere: Standing[], child: Partial<Place>) =>
    whyNotClose(placeBranches([place('shop'), place('bay', 'shop', child)], standingThere)[0]!)

  it('has no cylinder in it and no place in use inside it', () => {
    expect(closing([], { active: false })).toBeNull()
    expect(closing([], { active: true })).toBe('bay is inside it and in use.')
    expect(closing([standing('shop', 1, [['R-22', 1]])], { active: false })).toBe('1 cylinder stands there.')
  })
})
