import { describe, expect, it } from 'vitest'
import {
  codes, corrected, DAY, did, filled, folded, HOUR, idOf, kg, lastFindings, lastMovements, registered, REQUALIFIER, SHOP, START, viewAfter, weighed,
} from '~~/tests/helpers/custody'

const full = [registered(), filled('R-22', 20)]
const retired = did('retired', { reason: 'scrapped', proof: { certificate: 'S-114' } })
const condemned = did('retested', { month: '2026-07', method: 'visual', result: 'condemned', requalifierId: REQUALIFIER })
const manager = { access: { personId: 'm', roles: ['manager' as const], trainee: false } }

describe('a retired cylinder', () => {
  it('has ended: no stop weight, no room, no date to remind of, and what is in it stays on the books', () => {
    const view = viewAfter([...full, retired], { nowMs: START + 4000 * DAY })
    expect(view).toMatchObject({ lifecycle: 'retired', findings: [], contents: { netGrams: 8000, refrigerant: 'R-22' }, capacity: { stopWeightGrams: null, roomGrams: null } })
    expect(view.capacity.refusals.map(({ code }) => code)).toContain('after-end')
    expect(lastMovements(...full, retired)).toEqual([])
  })

  it('is in no plan to fill or to take along; what is in it may still be drawn', () => {
    const view = viewAfter([...full, retired])
    for (const kind of ['filled', 'moved', 'handed-over'] as const) {
      expect(view.mayNot, kind).toContainEqual({ kind, because: 'It was retired. Nothing goes into it, and it leaves with nobody.' })
    }
    expect(view.may).toContain('drawn')
  })

  it('keeps what is recorded of it later, each with a stop, and that it was used stays standing', () => {
    expect(lastFindings(...full, retired, weighed(21))).toEqual(['after-end'])
    expect(lastFindings(...full, weighed(21))).toEqual([])
    const used = viewAfter([...full, retired, weighed(21)])
    expect(used).toMatchObject({ lifecycle: 'retired', contents: { netGrams: 9000 } })
    expect(codes(used)).toEqual(['after-end'])
    expect(used.findings[0]!.since).toBe(new Date(START + 3 * HOUR).toISOString())
  })

  it('is not said to be used by a label, a correction, or by being retired once more', () => {
    expect(lastFindings(...full, retired, did('labelled', { code: '7K3M9Q2TX' }))).toEqual([])
    expect(lastFindings(...full, retired, did('retired', { reason: 'again' }))).toEqual([])
    expect(folded(...full, retired, did('retired', { reason: 'again' })).state.retired).toEqual({ since: START + 2 * HOUR })
  })

  it('was never retired where that is taken out of the log, and what came after it is use like any other', () => {
    expect(viewAfter([...full, retired, weighed(21), corrected(idOf(2))])).toMatchObject({ lifecycle: 'in-service', findings: [] })
  })

  it('after it was condemned is what a condemned cylinder is for; it stays condemned as well', () => {
    expect(lastFindings(registered(), condemned, retired)).toEqual([])
    const both = viewAfter([registered(), condemned, retired])
    expect(both.lifecycle).toBe('retired')
    expect(codes(both)).toEqual(['condemned'])
    expect(lastFindings(registered(), retired, condemned)).toEqual(['after-end'])
    expect(lastFindings(registered(), condemned, weighed(12))).toEqual(['after-end'])
  })

  it('that was missing shows as retired, and a find of it later stands out', () => {
    const gone = [...full, did('missing', {}), retired]
    expect(viewAfter(gone).lifecycle).toBe('retired')
    expect(folded(...gone).state.missing).not.toBeNull()
    expect(lastFindings(...gone, did('found', { placeId: SHOP }))).toEqual(['after-end'])
  })

  it('keeps only the findings of what is in it', () => {
    const unlabelledAndApart = [registered({ stamp: { serial: null, spec: 'DOT-4BA', servicePressurePsig: 400, tareWeight: kg(12), waterCapacity: kg(20), madeMonth: null, flammableMarked: true } }), filled('R-22', 29), did('quarantined', { reason: 'no date' })]
    expect(codes(viewAfter(unlabelledAndApart))).toEqual(['overfill', 'quarantined', 'retest-unknown'])
    expect(codes(viewAfter([...unlabelledAndApart, retired]))).toEqual(['overfill'])
  })
})

describe('a plan to retire a cylinder', () => {
  const because = (...story: Parameters<typeof viewAfter>[0]) => viewAfter(story, manager).mayNot.find(({ kind }) => kind === 'retired')?.because ?? null

  it('names what is in it, and is free where nothing is, by the scale of 60 g', () => {
    expect(because(...full)).toMatch(/^It holds 17\.6\u00A0lb \(8\.00\u00A0kg\) of R-22\. Draw it or ship it first\.$/)
    expect(because(registered())).toBeNull()
    expect(because(...full, weighed(12.06))).toBeNull()
    expect(because(...full, weighed(12.07))).not.toBeNull()
    expect(because(...full, did('lost', { cause: 'hose' }))).toMatch(/^It holds R-22; how much is not known\./)
    expect(because(registered(), filled(null, 20))).toMatch(/of a refrigerant that nobody has named\./)
  })

  it('is none once it is retired, and a manager\'s alone', () => {
    expect(because(registered(), retired)).toBe('It is retired already.')
    expect(viewAfter([registered()]).mayNot).toContainEqual({ kind: 'retired', because: 'Another role records this.' })
  })
})
