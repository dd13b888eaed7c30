import { describe, expect, it } from 'vitest'
import type { Role } from '../../../../utils/access/roles'
import { firstScreenFor, itemAt, navigationFor, worksAtDesk } from '../../../../utils/access/navigation'

const access = (...roles: Role[]) => ({ personId: 'p', roles, trainee: false })
const words = (...roles: Role[]) => navigationFor(access(...roles)).map(item => item.label)

describe('where a person can go', () => {
  it.each<[Role, string[]]>([
    ['technician', ['Now', 'Scan', 'Fleet', 'Jobs', 'Refrigerants', 'Places', 'Settings']],
    ['warehouse', ['Now', 'Scan', 'Fleet', 'Jobs', 'Shipments', 'Retests', 'Balance', 'Refrigerants', 'Labels', 'Places', 'Settings']],
    ['manager', ['Now', 'Scan', 'Fleet', 'Jobs', 'Shipments', 'Retests', 'Balance', 'Refrigerants', 'Labels', 'Places', 'Log', 'Settings']],
    ['auditor', ['Now', 'Fleet', 'Jobs', 'Shipments', 'Retests', 'Balance', 'Refrigerants', 'Places', 'Log', 'Settings']],
    ['admin', ['Now', 'Fleet', 'Jobs', 'Refrigerants', 'Places', 'Log', 'Settings']],
  ])('as %s', (role, labels) => {
    expect(words(role)).toEqual(labels)
  })

  it('is nowhere without signing in', () => {
    expect(navigationFor(null)).toEqual([])
  })

  it.each<[Role, string[]]>([
    ['technician', ['Rules', 'Scales', 'People', 'Firms', 'Our firm']],
    ['manager', ['Rules', 'Scales', 'People', 'Firms', 'Our firm']],
    ['admin', ['Rules', 'Scales', 'People', 'Firms', 'Our firm', 'Mail']],
  ])('among the settings as %s', (role, labels) => {
    const settings = navigationFor(access(role)).at(-1)
    expect(settings).toMatchObject({ label: 'Settings', to: '/rules' })
    expect(settings?.within?.map(({ label }) => label)).toEqual(labels)
  })
})

describe('among the shipments', () => {
  it.each<Role>(['warehouse', 'manager', 'auditor'])('%s finds what is worth shipping as well', (role) => {
    const shipments = navigationFor(access(role)).find(({ label }) => label === 'Shipments')
    expect(shipments?.within?.map(({ label }) => label)).toContain('Worth shipping')
    expect(itemAt(navigationFor(access(role)), '/reclaim')).toMatchObject({ label: 'Shipments' })
  })
})

describe('where a person is', () => {
  const items = [{ label: 'Start', to: '/' }, { label: 'Fleet', to: '/fleet' }, { label: 'Settings', to: '/rules', within: [{ label: 'Rules', to: '/rules' }, { label: 'People', to: '/people' }] }]

  it.each([
    ['/', 'Start'], ['/fleet', 'Fleet'], ['/fleet/register', 'Fleet'], ['/fleets', undefined], ['/rules', 'Settings'], ['/people', 'Settings'], ['/mail', undefined],
  ])('at %s is %s', (path, label) => {
    expect(itemAt(items, path)?.label).toBe(label)
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
