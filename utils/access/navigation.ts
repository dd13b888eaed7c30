import { can, type Permission } from './permissions'
import type { Access, Role } from './roles'

/** One word of the main navigation and where it leads. */
export interface NavigationItem { label: string, to: string }

const ITEMS: readonly (NavigationItem & { permission: Permission })[] = [
  { label: 'Now', to: '/now', permission: 'fleet:read' },
  { label: 'Scan', to: '/scan', permission: 'events:post' },
  { label: 'Fleet', to: '/fleet', permission: 'fleet:read' },
  { label: 'Shipments', to: '/shipments', permission: 'shipments:read' },
  { label: 'Retests', to: '/retests', permission: 'lots:read' },
  { label: 'Refrigerants', to: '/refrigerants', permission: 'refrigerants:read' },
  { label: 'Labels', to: '/labels', permission: 'labels:mint' },
  { label: 'Places', to: '/places', permission: 'places:read' },
  { label: 'Rules', to: '/rules', permission: 'settings:read' },
  { label: 'People', to: '/people', permission: 'people:read' },
  { label: 'Log', to: '/log', permission: 'log:verify' },
  { label: 'Mail', to: '/mail', permission: 'mail:read' },
]

const DESK_ROLES: readonly Role[] = ['warehouse', 'manager', 'auditor', 'admin']

/** The screens that a person finds in the main navigation, in its order. */
export function navigationFor(access: Access | null): NavigationItem[] {
  return ITEMS.filter(item => can(access, item.permission)).map(({ label, to }) => ({ label, to }))
}

/** Whether a person works at the desk: a technician who is nothing else works in the field. */
export function worksAtDesk(access: Access | null): boolean {
  if (!access) return false
  return !access.roles.includes('technician') || access.roles.some(role => DESK_ROLES.includes(role))
}

/** Where a person begins: a technician at the scan, whoever works at the desk at what needs them now, a signed-out person at sign-in. */
export function firstScreenFor(access: Access | null): string {
  if (!access) return '/sign-in'
  return worksAtDesk(access) ? '/now' : '/scan'
}
