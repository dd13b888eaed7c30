import { describe, expect, it } from 'vitest'
import type { Role } from '../../../../utils/access/roles'
import { supervisorsFor, usualSupervisorId } from '../../../../utils/access/supervisors'

function person(id: string, changes: object = {}) {
  return {
    id, name: id.toUpperCase(), roles: ['technician'] as Role[], trainee: false, active: true,
    certificationType: 'universal' as const, certification: null, supervisor: null, ...changes,
  }
}
const trainee = (supervisorId: string | null) => person('tess', {
  trainee: true, certificationType: null, supervisor: supervisorId === null ? null : { id: supervisorId },
})

describe('who may supervise a trainee', () => {
  it.each<[string, object, boolean]>([
    ['a certified technician', {}, true],
    ['a certified manager', { roles: ['manager'] }, true],
    ['one whose certification is only written in words', { certificationType: null, certification: 'Type II' }, true],
    ['one without certification', { certificationType: null }, false],
    ['another trainee', { trainee: true }, false],
    ['one who is turned off', { active: false }, false],
    ['the warehouse', { roles: ['warehouse'] }, false],
    ['an administrator', { roles: ['admin'] }, false],
  ])('%s: %o is %s', (_who, changes, may) => {
    expect(supervisorsFor([person('dan', changes), trainee(null)], 'tess').map(({ id }) => id)).toEqual(may ? ['dan'] : [])
  })

  it('is nobody for themselves', () => {
    expect(supervisorsFor([person('dan')], 'dan')).toEqual([])
  })
})

describe('the supervisor a trainee\'s form begins with', () => {
  it('is the usual one', () => {
    expect(usualSupervisorId([person('ada'), person('dan'), trainee('dan')], 'tess')).toBe('dan')
  })

  it('is nobody where none is named, or where that person may no longer', () => {
    expect(usualSupervisorId([person('dan'), trainee(null)], 'tess')).toBe('')
    expect(usualSupervisorId([person('dan', { active: false }), trainee('dan')], 'tess')).toBe('')
    expect(usualSupervisorId([person('dan', { certificationType: null }), trainee('dan')], 'tess')).toBe('')
    expect(usualSupervisorId([], 'tess')).toBe('')
  })
})
