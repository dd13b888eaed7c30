import { describe, expect, it } from 'vitest'
import { codes, did, filled, kg, lastFindings, LOT, registered, REQUALIFIER, TEST_PLACE, viewAfter } from '~~/tests/helpers/custody'
import { DAMAGE_REASONS } from '~~/utils/custody/damage'

const full = [registered(), filled('R-22', 20)]
const sound = did('inspected', { result: 'sound' })
const damaged = (...reasons: (typeof DAMAGE_REASONS)[number][]) => did('inspected', { result: 'damaged', reasons })
const tested = (method: 'volumetric' | 'visual') => did('retested', { month: '2026-07', method, result: 'passed', requalifierId: REQUALIFIER })

describe('an outside look', () => {
  it('that finds nothing changes nothing', () => {
    expect(viewAfter([...full, sound])).toMatchObject({ holds: [], findings: [], capacity: { stopWeightGrams: 28_000 } })
  })

  it('that finds a damage asks for a test before the next fill, however long the date still runs', () => {
    const view = viewAfter([...full, damaged('dent', 'corrosion')])
    expect(view).toMatchObject({ lifecycle: 'in-service', holds: ['damaged'], requalification: { state: 'in-date' }, capacity: { stopWeightGrams: null } })
    expect(view.capacity.refusals.map(({ code }) => code)).toEqual(['early-test'])
    expect(view.findings).toHaveLength(1)
    expect(view.findings[0]).toMatchObject({ code: 'early-test', severity: 'stop', source: '49 CFR 180.205(d)' })
    expect(view.findings[0]!.text).toMatch(/^Damaged: dent, corrosion\. Put nothing in;/)
  })

  it.each([...DAMAGE_REASONS])('holds it back for %s alone as well', (reason) => {
    expect(viewAfter([...full, damaged(reason)]).holds).toEqual(['damaged'])
  })

  it('adds what it finds to what was found before, a leak that was recorded as a loss among it', () => {
    const view = viewAfter([...full, did('lost', { cause: 'leak', grossAfter: kg(19) }), damaged('valve', 'leak'), did('inspected', { result: 'damaged' })])
    expect(view.findings.map(({ code }) => code)).toEqual(['early-test'])
    expect(view.findings[0]!.text).toMatch(/^Damaged: leak, valve or guard damaged\. /)
  })

  it('that finds nothing later does not make up for the test; a passed test under pressure does, an outside look by a requalifier does not', () => {
    expect(viewAfter([registered(), damaged('heat'), sound]).holds).toEqual(['damaged'])
    expect(viewAfter([registered(), damaged('heat'), tested('visual')]).holds).toEqual(['damaged'])
    expect(viewAfter([registered(), damaged('heat'), tested('volumetric')]).holds).toEqual(['wet'])
  })

  it('of a cylinder that should be at its test says so, and leaves it there', () => {
    const atTest = [registered(), did('sent-for-test', { lotId: LOT }, { placeId: TEST_PLACE })]
    expect(lastFindings(...atTest, sound)).toEqual(['away'])
    expect(viewAfter([...atTest, sound]).lifecycle).toBe('at-test')
  })

  it('stands against a fill that was made all the same', () => {
    expect(lastFindings(...full, damaged('gouge'), filled('R-22', 21))).toContain('early-test')
    expect(codes(viewAfter([...full, damaged('gouge'), filled('R-22', 21)]))).toEqual(['early-test'])
  })
})
