import type { Role } from './roles'

/** The roles as people read them. */
export const ROLE_WORDS: Record<Role, string> = {
  warehouse: 'warehouse',
  technician: 'technician',
  manager: 'manager',
  auditor: 'auditor, reads only',
  admin: 'administrator',
}
