import { describe, expect, it } from 'vitest'
import { contentsWord, verdictOf, verdictOfScan } from '../../../../utils/picture/verdict'
import { fold } from '../../../../utils/custody/fold'
import { view } from '../../../../utils/custody/view'
import { did, filled, FOLD_CONTEXT, LOT, recorded, registered, REQUALIFIER, STAMP, VIEW_CONTEXT, weighed, type Told } from '../../../helpers/custody'

// Tare 12 kg, water capacity 20 kg: room for 16 kg of R-22 in the empty cylinder.
function verdict(story: Told[], context: Partial<typeof VIEW_CONTEXT> = {}) {
  const { state } = fold(recorded(...story), FOLD_CONTEXT)
  return verdictOf(view(state, { ...VIEW_CONTEXT, ...context }), 'kg')
}

describe('the first line said of a cylinder', () => {
  it('is the room that is left, rounded down', () => {
    expect(verdict([registered(), filled('R-22', 20)])).toEqual({ kind: 'ok', text: 'Room for 8.00\u00A0kg of R-22', reason: null, source: null })
  })

  it('asks for the refrigerant while nothing is in it', () => {
    expect(verdict([registered()])).toMatchObject({ kind: 'ok', text: 'Nothing in it' })
    expect(verdict([registered()], { askedRefrigerant: 'R-22' }).text).toBe('Room for 16.00\u00A0kg of R-22')
  })

  it('is nearly full from nine tenths of the limit, and full within the accuracy of the scale', () => {
    // Nine tenths of 16 kg is 14.4 kg, a gross of 26.4 kg.
    expect(verdict([registered(), filled('R-22', 26.3)]).kind).toBe('ok')
    expect(verdict([registered(), filled('R-22', 26.4)])).toMatchObject({ kind: 'att', text: 'Room for 1.60\u00A0kg of R-22' })
    // Half a percent of 27.9 kg is 0.14 kg, more than the 0.10 kg that are left.
    expect(verdict([registered(), filled('R-22', 27.9)])).toMatchObject({ kind: 'att', text: 'Full' })
  })

  it('is a stop with the excess rounded up when it is overfilled, with no stop weight beside it', () => {
    const said = verdict([registered(), filled('R-22', 28.001)])
    expect(said).toMatchObject({ kind: 'stop', text: 'Overfilled by 0.01\u00A0kg' })
    expect(said.reason).not.toBeNull()
  })

  it('is a stop where nobody knows what is in it, never a room', () => {
    expect(verdict([registered({ contents: 'unknown', gross: { unit: 'kg', value: 15 } })])).toMatchObject({ kind: 'stop', text: 'Do not fill: contents not known' })
  })

  it('says of what is mixed that it is mixed, and of what is burnt that it is burnt', () => {
    const told = (refrigerant: string | null, condition: 'mixed' | 'burnt') =>
      [registered(), filled('R-22', 20), did('checked', { method: 'laboratory', composition: [], verdict: { refrigerant, condition } })]
    expect(verdict(told(null, 'mixed'))).toMatchObject({ kind: 'stop', text: 'Do not fill: contents mixed' })
    expect(contentsWord(view(fold(recorded(...told(null, 'mixed')), FOLD_CONTEXT).state, VIEW_CONTEXT))).toBe('mixed')
    // V = 20 kg / 0.99904 kg/L; 0.69 of it as R-22 of 1.0823 kg/L at 122 °F is 14.95 kg: less than 16 kg by water weight.
    expect(verdict(told('R-22', 'burnt'))).toMatchObject({ kind: 'att', text: 'Room for 6.95\u00A0kg of burnt R-22' })
  })

  it('says in the line itself why nothing may go in', () => {
    const said = verdict([registered(), filled('R-22', 20)], { nowMs: Date.UTC(2040, 0, 1) })
    expect(said).toMatchObject({ kind: 'stop', text: 'Do not fill: retest overdue' })
    expect(said.reason).not.toBeNull()
  })

  it('names the end of a condemned cylinder before all else that keeps it from being filled', () => {
    const condemned = did('retested', { month: '2026-07', method: 'visual', result: 'condemned', requalifierId: REQUALIFIER })
    expect(verdict([registered(), condemned, weighed(12)])).toMatchObject({ kind: 'stop', text: 'Condemned: never fill it again' })
  })

  it('says where it is not, and that it is set apart or retired', () => {
    const said = (...told: Told[]) => verdict([registered(), filled('R-22', 20), ...told]).text
    expect(said(did('missing', {}))).toBe('Do not fill: missing')
    expect(said(did('sent-for-test', { lotId: LOT }))).toBe('Do not fill: at the test station')
    expect(said(did('quarantined', { reason: 'no label' }))).toBe('Do not fill: set apart')
    expect(said(did('quarantined', { reason: 'no label' }), did('retired', { reason: 'scrapped' }))).toBe('Retired: never fill it again')
  })

  it('names what is missing from the stamp', () => {
    const said = verdict([registered({ stamp: { ...STAMP, tareWeight: null } })], { askedRefrigerant: 'R-22' })
    expect(said.kind).toBe('unk')
    expect(said.reason).toBe('Not known: its tare weight (TW).')
  })

  it('tells a scanned code that is on two cylinders from either of them', () => {
    const { state } = fold(recorded(registered(), did('labelled', { code: '7K3M9Q2TX' }), filled('R-22', 20)), FOLD_CONTEXT)
    const shown = view(state, { ...VIEW_CONTEXT, codesOnTwo: new Set(['7K3M9Q2TX']) })
    expect(verdictOfScan(shown, 'kg')).toMatchObject({ kind: 'stop', text: 'This code is on two cylinders' })
    expect(verdictOfScan(view(state, VIEW_CONTEXT), 'kg').kind).toBe('ok')
  })
})
