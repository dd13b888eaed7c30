import { can, type Permission } from './permissions'
import type { Access, Role } from './roles'

/** One word of the main navigation and where it leads; `within` are the screens it stands for, where it is several. */
export interface NavigationItem { label: string, to: string, within?: readonly NavigationItem[] }

interface Screen { label: string, to: string, permission: Permission, within?: readonly Screen[] }

/** What leaves for a reclaimer: the shipments themselves, and what is thought over before. */
const SHIPPING: readonly Screen[] = [
  { label: 'Shipments', to: '/shipments', permission: 'shipments:read' },
  { label: 'Worth shipping', to: '/reclaim', permission: 'terms:read' },
  { label: 'Plans', to: '/plans', permission: 'shipments:read' },
]

const SCREENS: readonly Screen[] = [
  { label: 'Now', to: '/now', permission: 'fleet:read' },
  { label: 'Scan', to: '/scan', permission: 'events:post' },
  { label: 'Fleet', to: '/fleet', permission: 'fleet:read' },
  { label: 'Jobs', to: '/jobs', permission: 'jobs:read' },
  { label: 'Shipments', to: '/shipments', permission: 'shipments:read', within: SHIPPING },
  { label: 'Retests', to: '/retests', permission: 'lots:read' },
  { label: 'Balance', to: '/balance', permission: 'reports:read' },
  { label: 'Refrigerants', to: '/refrigerants', permission: 'refrigerants:read' },
  { label: 'Labels', to: '/labels', permission: 'labels:mint' },
  { label: 'Places', to: '/places', permission: 'places:read' },
  { label: 'Log', to: '/log', permission: 'log:checkpoint' },
]

/** What is set once and looked at now and then: who and what there is, and by which rules. */
const SETTINGS: readonly Screen[] = [
  { label: 'Rules', to: '/rules', permission: 'settings:read' },
  { label: 'Scales', to: '/scales', permission: 'scales:read' },
  { label: 'People', to: '/people', permission: 'people:read' },
  { label: 'Firms', to: '/firms', permission: 'firms:read' },
  { label: 'Our firm', to: '/our-firm', permission: 'settings:read' },
  { label: 'Mail', to: '/mail', permission: 'mail:read' },
]

const DESK_ROLES: readonly Role[] = ['warehouse', 'manager', 'auditor', 'admin']

/** The screens that a person finds in the main navigation, in its order; the settings are one word at its end. */
export function navigationFor(access: Access | null): NavigationItem[] {
  const within = openTo(access, SETTINGS)
  return [...openTo(access, SCREENS), ...within.slice(0, 1).map(({ to }) => ({ label: 'Settings', to, within }))]
}

function openTo(access: Access | null, screens: readonly Screen[]): NavigationItem[] {
  return screens.filter(({ permission }) => can(access, permission))
    .map(({ label, to, within }) => within ? { label, to, within: openTo(access, within) } : { label, to })
}

/** Which of several items a path belongs to: the one whose own path is the longest beginning of it. */
export function itemAt(items: readonly NavigationItem[], path: string): NavigationItem | undefined {
  const reach = ({ to, within }: NavigationItem) => Math.max(...[to, ...within?.map(each => each.to) ?? []]
    .map(own => path === own || path.startsWith(`${own}/`) ? own.length : -1))
  return items.filter(item => reach(item) >= 0).sort((a, b) => reach(b) - reach(a))[0]
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
