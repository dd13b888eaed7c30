import { createHash } from 'node:crypto'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { chainForm, hashEvent, HASHED_COLUMNS, verifyStep, type HashedColumns } from '~~/utils/custody/chain'

const sha256 = (text: string) => createHash('sha256').update(text).digest('hex')

const first: HashedColumns = {
  prev_hash: '', seq: 7, id: 'e1', cylinder_id: 'c1', version: 1, device_id: 'phone-1', device_seq: 3, kind: 'weighed', occurred_at: 1000,
  occurred_offset_minutes: -300, clock_skew_seconds: 0, effective_at: 1000, recorded_at: 2000, actor_id: 'p1', posted_by: 'p1', supervisor_id: null,
  trainee: 0, place_id: null, body: '{}', content_hash: sha256('{}'),
}
const closed = { ...first, hash: hashEvent(first, sha256) }
const BEGINNING = { version: 0, hash: '' }

describe('the chain of a cylinder', () => {
  it('is taken over every column in one fixed form', () => {
    expect(chainForm(first)).toBe(`["",7,"e1","c1",1,"phone-1",3,"weighed",1000,-300,0,1000,2000,"p1","p1",null,0,null,"{}","${sha256('{}')}"]`)
    // Any order of the same columns has the same form.
    expect(chainForm(Object.fromEntries(Object.entries(first).reverse()) as HashedColumns)).toBe(chainForm(first))
  })

  it('holds from the first line on', () => {
    expect(verifyStep(closed, BEGINNING, sha256)).toBeNull()
    const second = { ...first, prev_hash: closed.hash, version: 2, id: 'e2' }
    expect(verifyStep({ ...second, hash: hashEvent(second, sha256) }, { version: 1, hash: closed.hash }, sha256)).toBeNull()
  })

  it('finds a change in any column', () => {
    fc.assert(fc.property(fc.constantFrom(...HASHED_COLUMNS), fc.oneof(fc.integer(), fc.string(), fc.constant(null)), (column, value) => {
      fc.pre(value !== first[column])
      expect(verifyStep({ ...closed, [column]: value }, BEGINNING, sha256)).not.toBeNull()
    }))
  })

  it('finds a line that is missing and a line that was put in', () => {
    expect(verifyStep(closed, { version: 1, hash: '' }, sha256)).toBe('missing-before')
    expect(verifyStep({ ...closed, version: 2 }, { version: 1, hash: 'another' }, sha256)).toBe('unlinked')
  })

  it('finds a value that no line can have', () => {
    expect(verifyStep({ ...closed, seq: 1.5 }, BEGINNING, sha256)).toBe('changed')
  })

  it('tells a text from the number it looks like, and takes nothing else', () => {
    expect(chainForm({ ...first, seq: '7' })).not.toBe(chainForm(first))
    expect(() => chainForm({ ...first, trainee: undefined as never })).toThrow(TypeError)
    expect(() => chainForm({ ...first, seq: 1.5 })).toThrow(TypeError)
  })
})
