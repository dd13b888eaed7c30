import { describe, expect, it } from 'vitest'
import { EVENT_KINDS } from '~~/utils/custody/kinds'
import { mayPost } from '~~/utils/custody/posting'
import type { Role } from '~~/utils/access/roles'

const kindsOf = (...roles: Role[]) => EVENT_KINDS.filter(kind => mayPost({ personId: 'p', roles, trainee: false }, kind))

describe('who may record what', () => {
  it('lets a technician record what is done in the field', () => {
    expect(kindsOf('technician')).toEqual(['labelled', 'received', 'moved', 'handed-over', 'weighed', 'filled', 'drawn', 'transferred', 'checked', 'emptied', 'lost', 'inspected', 'quarantined', 'missing', 'found', 'returned', 'exchanged'])
  })

  it('lets the warehouse also register', () => {
    expect(kindsOf('warehouse')).toEqual(['registered', ...kindsOf('technician')])
  })

  it('lets a manager record every kind', () => {
    expect(kindsOf('manager')).toEqual([...EVENT_KINDS])
  })

  it('lets an auditor, an admin, and nobody record nothing', () => {
    expect(kindsOf('auditor', 'admin')).toEqual([])
    expect(kindsOf()).toEqual([])
    expect(mayPost(null, 'weighed')).toBe(false)
    expect(mayPost({ personId: 'p', roles: ['toString' as Role], trainee: false }, 'weighed')).toBe(false)
  })

  it('lets several roles do what any of them may, and a trainee what a technician may', () => {
    expect(kindsOf('auditor', 'technician')).toEqual(kindsOf('technician'))
    expect(mayPost({ personId: 'p', roles: ['technician'], trainee: true }, 'filled')).toBe(true)
  })
})
