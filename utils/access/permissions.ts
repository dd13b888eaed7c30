import type { Access, Role } from './roles'

/** Something a person may be allowed to do: 'topic:verb'. */
export type Permission
  = | 'fleet:read'
    | 'events:post' | 'events:correct-any'
    | 'labels:mint'
    | 'cylinders:register'
    | 'shipments:read' | 'shipments:prepare' | 'shipments:dispatch' | 'shipments:receive'
    | 'lots:read' | 'lots:prepare' | 'lots:dispatch' | 'lots:receive'
    | 'places:read' | 'places:manage'
    | 'firms:read' | 'firms:manage'
    /** What reclaimers take and pay. */
    | 'terms:read' | 'terms:set'
    | 'jobs:read' | 'jobs:record'
    | 'scales:read' | 'scales:manage'
    | 'people:read' | 'people:read-contact' | 'people:manage'
    /** A checkpoint is no event: who only reads may ask for one. */
    | 'log:verify' | 'log:export' | 'log:checkpoint'
    | 'reports:read'
    | 'settings:read' | 'settings:manage'
    /** Reminders and test choices; the fill rule asks for its own besides. */
    | 'rules:set' | 'fill-rule:set'
    | 'mail:read' | 'mail:send'
    | 'refrigerants:read'
    | 'account:own'

const EVERYONE = [
  'account:own', 'fleet:read', 'firms:read', 'jobs:read', 'people:read', 'places:read', 'refrigerants:read',
  'scales:read', 'settings:read',
] as const satisfies readonly Permission[]

const WAREHOUSE = [
  ...EVERYONE, 'events:post', 'cylinders:register', 'labels:mint',
  'jobs:record', 'shipments:read', 'shipments:prepare', 'lots:read', 'lots:prepare', 'reports:read', 'terms:read',
] as const satisfies readonly Permission[]

/** What each role may do. A person with several roles may do what any of them may. */
export const PERMISSIONS = {
  warehouse: WAREHOUSE,
  technician: [...EVERYONE, 'events:post', 'jobs:record'],
  manager: [
    ...WAREHOUSE, 'events:correct-any', 'shipments:dispatch', 'shipments:receive', 'lots:dispatch', 'lots:receive',
    'rules:set', 'fill-rule:set', 'log:verify', 'log:export', 'log:checkpoint', 'scales:manage', 'terms:set',
  ],
  auditor: [...EVERYONE, 'shipments:read', 'lots:read', 'reports:read', 'terms:read', 'people:read-contact', 'log:verify', 'log:export', 'log:checkpoint'],
  admin: [...EVERYONE, 'people:read-contact', 'people:manage', 'places:manage', 'firms:manage', 'scales:manage', 'settings:manage', 'rules:set', 'mail:read', 'mail:send', 'log:checkpoint'],
} as const satisfies Record<Role, readonly Permission[]>

/** What a permission is asked about, where it depends on that. */
export interface Subject {
  /** Whose account it is. */
  personId?: string
}

/**
 * Whether a person may do something; whatever no role of theirs allows is refused.
 *
 * Example: `can({ personId, roles: ['auditor'], trainee: false }, 'events:post')` is false.
 */
export function can(access: Access | null, permission: Permission, subject: Subject = {}): boolean {
  if (!access) return false
  if (!access.roles.some(role => allows(role, permission))) return false
  return permission !== 'account:own' || subject.personId === undefined || subject.personId === access.personId
}

function allows(role: Role, permission: Permission): boolean {
  if (!Object.hasOwn(PERMISSIONS, role)) return false
  return (PERMISSIONS[role] as readonly Permission[]).includes(permission)
}
