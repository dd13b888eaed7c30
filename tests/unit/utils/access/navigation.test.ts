import { describe, expect, it } from 'vitest'
import type { Role } from '../../../../utils/access/roles'
import { firstScreenFor, navigationFor, worksAtDesk } from '../../../../utils/access/navigation'

const access = (...roles: Role[]) => ({ personId: 'p', roles, trainee: false })
const words = (...roles: Role[]) => navigationFor(access(...roles)).map(item => item.label)

describe('where a person can go', () => {
  it.each<[Role, string[]]>([
    ['technician', ['Now', 'Scan', 'Fleet', 'Refrigerants', 'Places', 'Rules', 'People']],
    ['warehouse', ['Now', 'Scan', 'Fleet', 'Shipments', 'Retests', 'Refrigerants', 'Labels', 'Places', 'Rules', 'People']],
    ['manager', ['Now', 'Scan', 'Fleet', 'Shipments', 'Retests', 'Refrigerants', 'Labels', 'Places', 'Rules', 'People', 'Log']],
    ['auditor', ['Now', 'Fleet', 'Shipments', 'Retests', 'Refrigerants', 'Places', 'Rules', 'People', 'Log']],
    ['admin', ['Now', 'Fleet', 'Refrigerants', 'Places', 'Rules', 'People', 'Mail']],
  ])('as %s', (role, labels) => {
    expect(words(role)).toEqual(labels)
  })

  it('is nowhere without signing in', () => {
    expect(navigationFor(null)).toEqual([])
  })
})

describe('where a person begins', () => {
  it('is the scan for a technician, what needs them now for the desk, sign-in for anybody else', () => {
    expect(firstScreenFor(access('technician'))).toBe('/scan')
    expect(firstScreenFor(access('auditor'))).toBe('/now')
    expect(firstScreenFor(access('technician', 'manager'))).toBe('/now')
    expect(firstScreenFor(null)).toBe('/sign-in')
  })
})

describe('who works at the desk', () => {
  it('is everybody but a technician who is nothing else', () => {
    expect(worksAtDesk(access('technician'))).toBe(false)
    expect(worksAtDesk(access('technician', 'manager'))).toBe(true)
    expect(worksAtDesk(access('auditor'))).toBe(true)
    expect(worksAtDesk(null)).toBe(false)
  })
})
