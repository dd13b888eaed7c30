import { describe, expect, it } from 'vitest'
import type { JobAnswer, JobFill } from '../../../../utils/contract/jobs'
import type { PaperBlock } from '../../../../utils/document/paper'
import { paperPages } from '../../../../utils/document/paper'
import { recoveryNote } from '../../../../utils/document/recoveryNote'

const fill: JobFill = {
  eventId: 'e1', cylinder: { id: 'c1', labelCode: '7K3M9Q2TX', serial: 'A1001' }, at: '2026-07-01T18:00:00.000Z', refrigerant: 'R-22', condition: null,
  grossBefore: { unit: 'lb', value: 27.5 }, grossAfter: { unit: 'lb', value: 40 }, netGrams: 5_670, uncertaintyGrams: 150, method: 'push-pull',
  reached: { verdict: 'reached', because: 'It comes to 10.5 inHg below 29.9 inHg (492.8 mmHg absolute), 10 inHg vacuum is asked for.', shortBy: null, absoluteMmHg: 492.7, heldMinutes: 5 },
  by: { id: 'p1', name: 'Dayo Okafor', certification: 'Universal, no. 555-20417' }, supervisor: null, ownerId: 'f1', apart: null, corrected: false,
}

const job: JobAnswer = {
  id: 'j1', number: 12, customer: { id: 'f1', name: 'Ossory Foods' }, email: null, site: '4 Quay Street', equipment: 'Chiller 2', refrigerant: 'R-22',
  charge: { unit: 'lb', value: 30 }, keeps: 'customer', opened: { circumstances: 'major', machineMade: 'since-1993-11-15' }, note: null,
  createdAt: '2026-07-01T15:00:00.000Z', createdBy: { id: 'p1', name: 'Dayo Okafor' }, cylinders: 1, recoveredGrams: 5_670, notKnown: 0, fills: [fill], draws: [],
  required: { level: { unit: 'inHg-vacuum', value: 10 }, alternative: null, assumed: [], source: '40 CFR 82.156(a), Table 1' },
  cautions: [], issue: 1, corrections: [], notes: [],
}

function noteOf(changes: Partial<JobAnswer> = {}) {
  return recoveryNote({ ...job, ...changes }, {
    sender: { name: 'Quillfen Cooling', telephone: '555-0100', address: '9 Tern Lane' },
    ownerName: id => id === null ? 'Quillfen Cooling' : 'Ossory Foods', timeZone: 'America/Chicago', printedMs: Date.UTC(2026, 6, 2, 15, 5),
  })
}

function saidIn(block: PaperBlock): string[] {
  switch (block.kind) {
    case 'facts': return block.rows.map(({ term, value }) => `${term}: ${value}`)
    case 'signatures': return block.lines
    case 'table': return [...block.rows, ...(block.totals ? [block.totals] : [])].map(cells => cells.join(' | '))
    default: return [block.text]
  }
}
const said = (changes: Partial<JobAnswer> = {}) => noteOf(changes).blocks.flatMap(saidIn).join('\n').replaceAll('\u00A0', ' ')

describe('a recovery note', () => {
  it('says who recovered what from whose equipment, where and when', () => {
    const text = said()
    for (const part of [
      'Recovery note 12', 'Customer: Ossory Foods', 'Site: 4 Quay Street', 'Equipment: Chiller 2', 'Day of the recovery: 1 Jul 2026', 'Refrigerant: R-22', 'Full charge: 30.0 lb (13.61 kg)',
      // 12.5 lb are 5669.9 g.
      '7K3 M9Q 2TX, serial A1001 | R-22 | 27.5 lb | 40.0 lb | 12.5 lb (5.67 kg) | Ossory Foods', 'Total |  |  |  | 12.5 lb (5.67 kg) | ',
      'Method: machine, push-pull', 'Vacuum required: 10 inHg vacuum (40 CFR 82.156(a), Table 1)', 'Vacuum reached: Reached. It comes to 10.5 inHg', 'It held for 5 minutes.',
      'Dayo Okafor: certification Universal, no. 555-20417',
      'It stays the property of Ossory Foods.', '40 CFR 82.154(d)',
    ]) expect(text).toContain(part)
    expect(noteOf().sender).toEqual(['Quillfen Cooling', '9 Tern Lane', 'Telephone 555-0100'])
    expect(noteOf().foot).toBe('Recovery note 12, issue 1, as recorded by 2 Jul 2026 10:05')
    expect(noteOf().blocks.at(-1)).toEqual({ kind: 'signatures', lines: ['Technician', 'For Quillfen Cooling', 'For the customer', 'Day'] })
  })

  it('writes what nobody knows as not known, and never as nothing', () => {
    const unknown = { ...fill, refrigerant: null, grossBefore: null, netGrams: null, uncertaintyGrams: null, method: null, reached: null, by: { ...fill.by, certification: null } }
    const text = said({ refrigerant: null, charge: null, opened: null, recoveredGrams: null, notKnown: 1, fills: [unknown] })
    for (const part of [
      'Refrigerant: not known', 'Full charge: not known', '| not known | not weighed | 40.0 lb | not known |', 'Total |  |  |  | not known | ', 'Method: not known', 'Why it was opened: not known',
      'Recovery machine: date not known', 'Vacuum reached: not known', 'Dayo Okafor: certification not known',
    ]) expect(text).toContain(part)
    expect(text).not.toMatch(/\b0\.0 lb/)
  })

  it('adds up what is known and says how many are not', () => {
    expect(said({ fills: [fill, { ...fill, netGrams: null }], notKnown: 1 })).toContain('12.5 lb (5.67 kg), and 1 not known')
  })

  it('keeps practice and what is not countersigned apart from the total', () => {
    const note = noteOf({ fills: [fill, { ...fill, apart: 'practice', netGrams: 1_000 }] })
    const tables = note.blocks.filter(block => block.kind === 'table')
    expect(tables.map(({ rows, totals }) => [rows.length, totals !== undefined])).toEqual([[1, true], [1, false]])
    expect(said({ fills: [{ ...fill, apart: 'unsigned' }], recoveredGrams: null })).toContain('Nothing that counts was recorded of this job.')
  })

  it('says of what was left to the contractor that it was, whatever the job had said', () => {
    const text = said({ fills: [{ ...fill, ownerId: null }] })
    expect(text).toContain('It was left to Quillfen Cooling.')
    expect(text).not.toContain('stays the property')
    expect(said({ keeps: 'firm', fills: [] })).toContain('It was left to Quillfen Cooling.')
    expect(said({ fills: [] })).toContain('It stays the property of Ossory Foods.')
  })

  it('says what went back, and what was taken for granted of the level', () => {
    const text = said({
      draws: [{ eventId: 'e2', cylinder: fill.cylinder, at: '2026-07-01T20:00:00.000Z', purpose: 'same-system', netGrams: 2_268, apart: null, by: fill.by }],
      required: { ...job.required, assumed: ['The charge is not known: taken as 200 lb or more, which asks for more.'] },
    })
    expect(text).toContain('Out of 7K3 M9Q 2TX, serial A1001, 5.0 lb (2.27 kg) went back into the system it came from on 1 Jul 2026.')
    expect(text).toContain('Taken for granted: The charge is not known')
  })

  it('carries the cautions of the job with their source', () => {
    expect(said({ cautions: [{ code: 'vacuum-level', text: 'No vacuum was recorded.', source: '40 CFR 82.156(a), Table 1' }] })).toContain('No vacuum was recorded. (40 CFR 82.156(a), Table 1)')
  })

  it('that was corrected is a new issue, marked on each page, that replaces those before', () => {
    const corrected = { issue: 2, corrections: [{ eventId: 'e3', at: '2026-07-02T14:00:00.000Z', reason: 'wrong scale' }] }
    expect(noteOf().mark).toBeUndefined()
    expect(noteOf(corrected).mark).toBe('Issue 2')
    expect(said(corrected)).toContain('Issue 2. It replaces every issue before it')
    expect(said(corrected)).toContain('Corrected on 2 Jul 2026: wrong scale')
    expect(paperPages(noteOf(corrected)).every(({ texts }) => texts.some(({ text }) => text === 'Issue 2'))).toBe(true)
  })

  it('of many cylinders goes on over as many pages as it takes, each with its number', () => {
    const pages = paperPages(noteOf({ fills: Array.from({ length: 60 }, (_, index) => ({ ...fill, eventId: `e${index}` })) }))
    expect(pages.length).toBeGreaterThan(1)
    pages.forEach(({ texts }, index) => expect(texts.map(({ text }) => text)).toContain(`Page ${index + 1} of ${pages.length}`))
  })
})
