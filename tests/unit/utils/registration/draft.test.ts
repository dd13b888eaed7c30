import { describe, expect, it } from 'vitest'
import { emptyDraft, readDraft, type RegistrationDraft } from '../../../../utils/registration/draft'

function draft(change: Partial<RegistrationDraft> = {}): RegistrationDraft {
  return { ...emptyDraft(), serial: ' K48266 ', spec: 'dot-4ba400', contents: 'evacuated', placeId: 'shop', ...change }
}

function errors(change: Partial<RegistrationDraft>): string[] {
  const read = readDraft(draft(change), '2026-12')
  return 'errors' in read ? Object.keys(read.errors) : []
}

describe('what is typed of a collar stamp', () => {
  it('becomes a registration, with specification and service pressure apart', () => {
    const read = readDraft(draft({ made: '03-21', marks: [{ month: '04-26', rin: 'z000', suffix: '' }] }), '2026-12')
    expect(read).toEqual({
      details: {
        stamp: {
          serial: 'K48266', spec: 'DOT-4BA', servicePressurePsig: 400, tareWeight: null, waterCapacity: null,
          madeMonth: '2021-03', flammableMarked: false,
        },
        marks: [{ month: '2026-04', rin: 'Z000' }],
        ownership: 'own',
        contents: 'evacuated',
      },
    })
  })

  it('needs a serial, or the word that it cannot be read', () => {
    expect(errors({ serial: '' })).toEqual(['serial'])
    expect(errors({ serial: '', serialUnreadable: true })).toEqual([])
  })

  it('keeps no serial that cannot be read, whatever was typed of it', () => {
    const read = readDraft(draft({ serial: 'K48?', serialUnreadable: true }), '2026-12')
    expect(read).toMatchObject({ details: { stamp: { serial: null, serialUnreadable: true } } })
  })

  it('does not say for the person what is in it', () => {
    expect(errors({ contents: null })).toEqual(['contents'])
    expect(errors({ contents: 'refrigerant' })).toEqual(['refrigerant'])
    expect(errors({ contents: 'unknown' })).toEqual([])
  })

  it('takes a stamp without TW and WC', () => {
    expect(errors({ tareWeight: null, waterCapacity: null })).toEqual([])
  })

  it('names an owner where the cylinder is not our own', () => {
    expect(errors({ ownership: 'customer' })).toEqual(['ownerId'])
  })

  it('asks for a mark that can be read', () => {
    expect(errors({ made: '2021' })).toEqual(['made'])
    expect(errors({ marks: [{ month: '', rin: 'A123', suffix: '' }] })).toEqual(['marks'])
    expect(errors({ marks: [{ month: '04-26', rin: '123', suffix: '' }] })).toEqual(['marks'])
  })
})
