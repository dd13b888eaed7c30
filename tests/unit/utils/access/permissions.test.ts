import { describe, expect, it } from 'vitest'
import { can, PERMISSIONS, type Permission } from '../../../../utils/access/permissions'
import { ROLES, type Access, type Role } from '../../../../utils/access/roles'

// Read down: who may. W warehouse, T technician, M manager, A auditor, D admin.
const MATRIX: Record<Permission, string> = {
  'account:own': 'W T M A D',
  'cylinders:register': 'W M',
  'events:correct-any': 'M',
  'events:post': 'W T M',
  'fill-rule:set': 'M',
  'firms:manage': 'D',
  'firms:read': 'W T M A D',
  'fleet:read': 'W T M A D',
  'jobs:read': 'W T M A D',
  'jobs:record': 'W T M',
  'labels:mint': 'W M',
  'log:checkpoint': 'M A D',
  'log:export': 'M A',
  'log:verify': 'M A',
  'lots:dispatch': 'M',
  'lots:prepare': 'W M',
  'lots:read': 'W M A',
  'lots:receive': 'M',
  'mail:read': 'D',
  'mail:send': 'D',
  'people:manage': 'D',
  'people:read': 'W T M A D',
  'people:read-contact': 'A D',
  'places:manage': 'D',
  'places:read': 'W T M A D',
  'refrigerants:read': 'W T M A D',
  'reports:read': 'W M A',
  'rules:set': 'M D',
  'scales:manage': 'M D',
  'scales:read': 'W T M A D',
  'settings:manage': 'D',
  'settings:read': 'W T M A D',
  'shipments:dispatch': 'M',
  'shipments:prepare': 'W M',
  'shipments:read': 'W M A',
  'shipments:receive': 'M',
  'terms:read': 'W M A',
  'terms:set': 'M',
}
const LETTER: Record<Role, string> = { warehouse: 'W', technician: 'T', manager: 'M', auditor: 'A', admin: 'D' }
const ALL = Object.keys(MATRIX) as Permission[]

function person(...roles: Role[]): Access {
  return { personId: 'p1', roles, trainee: false }
}

describe('who may do what', () => {
  for (const permission of ALL) {
    for (const role of ROLES) {
      const may = MATRIX[permission].split(' ').includes(LETTER[role])
      it(`${role} ${may ? 'may' : 'may not'} ${permission}`, () => {
        expect(can(person(role), permission)).toBe(may)
      })
    }
    it(`nobody signed in may not ${permission}`, () => expect(can(null, permission)).toBe(false))
    it(`somebody without a role may not ${permission}`, () => expect(can(person(), permission)).toBe(false))
  }
})

describe('the table', () => {
  it('names no permission that the matrix here leaves out', () => {
    expect([...new Set(Object.values(PERMISSIONS).flat())].sort()).toEqual([...ALL].sort())
  })

  it('lets the auditor write nothing', () => {
    const writing = PERMISSIONS.auditor.filter(name => !/:(read|read-contact|verify|export|checkpoint|own)$/.test(name))
    expect(writing).toEqual([])
  })

  it('adds the rights of several roles: an admin who also keeps the store posts events', () => {
    expect(can(person('admin', 'warehouse'), 'events:post')).toBe(true)
    expect(can(person('admin', 'warehouse'), 'people:manage')).toBe(true)
    expect(can(person('admin', 'warehouse'), 'shipments:dispatch')).toBe(false)
  })

  it('gives a word that is no role no right, not even one that every object has', () => {
    for (const word of ['owner', '__proto__', 'constructor', 'toString']) {
      expect(can({ personId: 'p1', roles: [word as Role], trainee: false }, 'fleet:read')).toBe(false)
    }
  })
})

describe('one\'s own account', () => {
  it('is one\'s own only', () => {
    expect(can(person('admin'), 'account:own', { personId: 'p1' })).toBe(true)
    expect(can(person('admin'), 'account:own', { personId: 'p2' })).toBe(false)
  })
})
