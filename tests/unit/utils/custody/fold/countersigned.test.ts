import { describe, expect, it } from 'vitest'
import {
  codes, corrected, did, filled, folded, HOUR, idOf, kg, registered, START, SUPERVISOR, TECHNICIAN, viewAfter, VIEW_CONTEXT, type Told,
} from '~~/tests/helpers/custody'

const trainee = { trainee: true, supervisorId: SUPERVISOR }
const filledByTrainee = filled('R-22', 20, {}, trainee)
const story = [registered(), filledByTrainee]
const signed = (index: number, more: Told['more'] = {}) => did('countersigned', { eventId: idOf(index) }, { actorId: SUPERVISOR, ...more })
const signatureOf = (index: number, ...told: Told[]) => folded(...told).steps.find(({ eventId }) => eventId === idOf(index))!.signature
const aparts = (...told: Told[]) => folded(...told).movements.map(({ apart }) => apart)

describe('a countersignature', () => {
  it('makes a trainee\'s entry count in the totals; what is in the steel was counted all along', () => {
    expect(aparts(...story)).toEqual([true])
    expect(aparts(...story, signed(1))).toEqual([false])
    expect(folded(...story).stockChanges.map(({ apart }) => apart)).toEqual([true])
    expect(folded(...story, signed(1)).stockChanges.map(({ apart }) => apart)).toEqual([false])
    for (const told of [story, [...story, signed(1)]]) expect(folded(...told).state.contents.netGrams).toBe(8000)
  })

  it('ends the caution, on the cylinder and on the line, and names the event that gave it', () => {
    expect(codes(viewAfter(story))).toEqual(['unsigned'])
    expect(viewAfter(story).waitsForSignatureOf).toEqual([SUPERVISOR])
    expect(signatureOf(1, ...story)).toEqual({ by: null })
    expect(codes(viewAfter([...story, signed(1)]))).toEqual([])
    expect(viewAfter([...story, signed(1)]).waitsForSignatureOf).toEqual([])
    expect(signatureOf(1, ...story, signed(1))).toEqual({ by: idOf(2) })
    expect(signatureOf(0, ...story)).toBeNull()
  })

  it('is only that of the supervisor named: not of another person, of the author, of a trainee', () => {
    const others: Told[] = [
      signed(1, { actorId: TECHNICIAN }), signed(1, { trainee: true }), signed(1, { actorId: '0198f000-0000-7000-8000-0000000000b9' }),
    ]
    for (const other of others) {
      expect(codes(viewAfter([...story, other]))).toEqual(['unsigned'])
      expect(aparts(...story, other)).toEqual([true])
    }
    const alone = filled('R-22', 20, {}, { trainee: true, supervisorId: TECHNICIAN, actorId: TECHNICIAN })
    expect(codes(viewAfter([registered(), alone, signed(1, { actorId: TECHNICIAN })]))).toEqual(['unsupervised', 'unsigned'])
    expect(viewAfter([registered(), alone]).waitsForSignatureOf).toEqual([])
  })

  it('cannot stand in for a supervisor who was never named', () => {
    const unsupervised = [registered(), filled('R-22', 20, {}, { trainee: true })]
    expect(codes(viewAfter([...unsupervised, signed(1)]))).toEqual(['unsupervised', 'unsigned'])
  })

  it('signs one entry, and the cylinder waits on for the others since the first of them', () => {
    const two = [...story, filled('R-22', 21, {}, trainee), signed(1)]
    expect(codes(viewAfter(two))).toEqual(['unsigned'])
    expect(viewAfter(two).findings[0]!.since).toBe(new Date(START + 2 * HOUR).toISOString())
    expect(codes(viewAfter([...two, signed(2)]))).toEqual([])
  })

  it('counts whichever of the two took effect or arrived first', () => {
    const early = signed(1, { occurredAt: START, recordedAt: START + 5 * HOUR })
    expect(codes(viewAfter([...story, early]))).toEqual([])
    expect(codes(viewAfter([registered(), signed(2), filledByTrainee]))).toEqual([])
  })

  it('of an entry that is not there does nothing, nor does one that was taken out', () => {
    expect(viewAfter([registered(), signed(9)])).toMatchObject({ findings: [], contents: { netGrams: 0 } })
    expect(codes(viewAfter([...story, signed(1), corrected(idOf(2))]))).toEqual(['unsigned'])
  })

  it('is given anew where the trainee has corrected since; a correction by another leaves it', () => {
    const other = { refrigerant: 'R-22', grossAfter: kg(21), looked: true }
    const mended = [...story, signed(1), corrected(idOf(1), other, { trainee: true })]
    expect(codes(viewAfter(mended))).toEqual(['unsigned'])
    expect(signatureOf(1, ...mended)).toEqual({ by: null })
    expect(signatureOf(1, ...mended, signed(1))).toEqual({ by: idOf(4) })
    expect(codes(viewAfter([...story, signed(1), corrected(idOf(1), other, { actorId: SUPERVISOR })]))).toEqual([])
    expect(codes(viewAfter([...story, corrected(idOf(1), other, { trainee: true }), signed(1)]))).toEqual([])
  })

  it('is given anew where the trainee has changed or taken out a correction that was signed', () => {
    const saying = (grossAfter: number) => ({ refrigerant: 'R-22', grossAfter: kg(grossAfter), looked: true })
    const signedAt21 = [...story, corrected(idOf(1), saying(21), { trainee: true }), signed(1)]
    const at25 = corrected(idOf(2), { eventId: idOf(1), reason: 'more', instead: saying(25) }, { trainee: true })
    const takenOut = corrected(idOf(2), undefined, { trainee: true })
    for (const change of [at25, takenOut]) {
      expect(codes(viewAfter([...signedAt21, change]))).toEqual(['unsigned'])
      expect(codes(viewAfter([...signedAt21, change, signed(1)]))).toEqual([])
      expect(codes(viewAfter([...signedAt21, change, corrected(idOf(1), saying(22), { actorId: SUPERVISOR })]))).toEqual([])
    }
    // What was changed and taken back by somebody else stands as it was signed.
    const changed = corrected(idOf(1), saying(25), { trainee: true })
    expect(codes(viewAfter([...story, signed(1), changed, corrected(idOf(3), undefined, { actorId: SUPERVISOR })]))).toEqual([])
  })

  it('does not cover a correction of the trainee that was still on its way, though it is older', () => {
    const onItsWay = (recordedAt: number) => corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(25), looked: true }, {
      trainee: true, occurredAt: START + 2 * HOUR, recordedAt,
    })
    const signedAt5 = signed(1, { occurredAt: START + 5 * HOUR, recordedAt: START + 5 * HOUR })
    expect(codes(viewAfter([...story, onItsWay(START + 5 * HOUR), signedAt5]))).toEqual([])
    expect(codes(viewAfter([...story, onItsWay(START + 5 * HOUR + 1), signedAt5]))).toEqual(['unsigned'])
  })

  it('is not moved to another entry by a correction', () => {
    const two = [...story, filled('R-22', 21, {}, trainee), signed(1)]
    const moved = corrected(idOf(3), { eventId: idOf(2) }, { actorId: TECHNICIAN })
    expect(signatureOf(2, ...two, moved)).toEqual({ by: null })
    expect(signatureOf(1, ...two, moved)).toEqual({ by: null })
    expect(signatureOf(2, ...two, moved, signed(2))).toEqual({ by: idOf(5) })
  })

  it('leaves practice apart', () => {
    const practice = filled('R-22', 20, {}, { ...trainee, practice: true })
    expect(aparts(registered(), practice, signed(1))).toEqual([true])
    expect(codes(viewAfter([registered(), practice, signed(1)]))).toEqual([])
  })

  it('is paper: a missing cylinder stays missing, nobody has seen it, and after its end it is no use', () => {
    const gone = [...story, did('missing', {}), signed(1)]
    expect(viewAfter(gone).lifecycle).toBe('missing')
    expect(folded(...gone).state.lastSeenAt).toBe(START + HOUR)
    expect(folded(...story, did('retired', { reason: 'scrapped' }), signed(1)).steps.at(-1)!.findings).toEqual([])
  })

  it('is planned by whom it waits for, and by nobody else', () => {
    const supervisor = { access: { personId: SUPERVISOR, roles: ['technician' as const], trainee: false } }
    expect(viewAfter(story, supervisor).may).toContain('countersigned')
    expect(viewAfter([...story, signed(1)], supervisor).mayNot).toContainEqual({ kind: 'countersigned', because: 'Nothing here waits for your signature.' })
    expect(viewAfter(story, VIEW_CONTEXT).may).not.toContain('countersigned')
    expect(viewAfter(story, { access: { ...supervisor.access, trainee: true } }).may).not.toContain('countersigned')
  })
})
