import { describe, expect, it } from 'vitest'
import { failedResultOf } from '../../../../utils/document/failedResult'
import { ownerNotice, type NoticeFacts } from '../../../../utils/document/ownerNotice'
import type { PaperBlock } from '../../../../utils/document/paper'
import { did, filled, registered, REQUALIFIER, STAMP, viewAfter } from '../../../helpers/custody'

const retested = (result: 'passed' | 'rejected' | 'condemned', method: 'visual' | 'volumetric' = 'visual') => did('retested', { month: '2026-07', method, result, requalifierId: REQUALIFIER })
const facts = (changes: Partial<NoticeFacts> = {}): NoticeFacts => ({
  result: 'condemned', sender: { name: 'Quillfen Cooling', telephone: '555-0100' }, owner: { name: 'Dunmarrow Dairy', address: '1 Creamery Road' },
  test: { month: '2026-07', method: 'visual', requalifier: 'Ostwick Cylinder Tests', rin: 'A123' }, day: '30 Jul 2026', ...changes,
})
const saidIn = (block: PaperBlock): string[] => block.kind === 'facts' ? block.rows.map(({ term, value }) => `${term}: ${value}`) : block.kind === 'signatures' ? block.lines : 'text' in block ? [block.text] : []
const said = (...args: Parameters<typeof ownerNotice>) => ownerNotice(...args).blocks.flatMap(saidIn).join('\n').replaceAll('\u00A0', ' ')

describe('whether an owner is to be told', () => {
  it('is by what holds the cylinder: rejected or condemned, and nothing else', () => {
    const result = (...story: Parameters<typeof viewAfter>[0]) => failedResultOf(viewAfter([registered(), ...story]))
    expect(result()).toBeNull()
    expect(result(did('quarantined', { reason: 'no label' }))).toBeNull()
    expect(result(retested('rejected'))).toBe('rejected')
    expect(result(retested('rejected'), retested('passed', 'volumetric'))).toBeNull()
    expect(result(retested('condemned'))).toBe('condemned')
    expect(result(retested('rejected'), retested('condemned'))).toBe('condemned')
    expect(result(retested('condemned'), did('retired', { reason: 'scrapped' }))).toBe('condemned')
  })
})

describe('the notice to the owner', () => {
  const condemned = viewAfter([registered(), did('labelled', { code: '7K3M9Q2TX' }), filled('R-22', 20), retested('condemned')])

  it('names owner, cylinder and test', () => {
    const text = said(condemned, facts())
    for (const part of [
      'Dunmarrow Dairy\n1 Creamery Road', 'Label: 7K3 M9Q 2TX', 'Serial number: A1001', 'Specification: DOT-4BA, 400 psig', 'Tare weight (TW): 12.00 kg', 'Water capacity (WC): 20.00 kg',
      'Result: condemned', 'Month: July 2026', 'Requalifier: Ostwick Cylinder Tests, RIN A123', '49 CFR 180.205',
    ]) expect(text).toContain(part)
    expect(ownerNotice(condemned, facts()).sender).toEqual(['Quillfen Cooling', 'Telephone 555-0100', '30 Jul 2026'])
  })

  it('of a condemned one says that it is never filled again, and what may be done with it', () => {
    const text = said(condemned, facts())
    expect(text).toContain('Notice to the owner: cylinder condemned')
    expect(text).toContain('never filled again')
    expect(text).toContain('scrapped')
    expect(text).not.toContain('repaired or rebuilt')
  })

  it('of a rejected one says that it may be repaired below 900 psig; from there on the requalifier decides', () => {
    const rejected = (psig: number | null) => said(viewAfter([registered({ stamp: { ...STAMP, servicePressurePsig: psig } }), retested('rejected')]), facts({ result: 'rejected' }))
    expect(rejected(899)).toContain('Marked below 900 psig it may be repaired or rebuilt')
    for (const psig of [900, null]) {
      expect(rejected(psig)).toContain('The requalifier says whether it may be repaired.')
      expect(rejected(psig)).not.toContain('Marked below 900')
    }
    expect(rejected(400)).toContain('Only a passed test brings it back into use.')
    expect(rejected(400)).not.toContain('never filled again')
  })

  it('says what is in it and where it is, and warns of contents that nobody can name', () => {
    expect(said(condemned, facts())).toMatch(/It holds 17\.6 lb \(8\.00 kg\) of R-22\. By our log it is at place a1\./)
    expect(said(condemned, facts())).not.toContain('Do not open the valve')
    const unknown = viewAfter([registered(), filled(null, 20), retested('condemned')])
    expect(said(unknown, facts())).toContain('Do not open the valve')
    expect(said(viewAfter([registered(), retested('condemned')]), facts())).toContain('Nothing is in it.')
  })

  it('leaves out what is not known rather than to guess it', () => {
    const bare = viewAfter([registered({ stamp: { ...STAMP, serial: null, tareWeight: null, madeMonth: null, servicePressurePsig: null } }), retested('condemned')])
    const text = said(bare, facts({ owner: { name: 'Dunmarrow Dairy', address: null }, test: { ...facts().test, rin: null } }))
    expect(text).toContain('Serial number: cannot be read')
    for (const part of ['Tare weight', 'Made:', 'psig', 'RIN', 'null', 'undefined', 'Label:']) expect(text).not.toContain(part)
    expect(ownerNotice(bare, facts()).foot).toBe('Notice to the owner, cylinder without a label, 30 Jul 2026')
  })
})
