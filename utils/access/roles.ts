/** What a person may be to the firm; one may be several. */
export const ROLES = ['warehouse', 'technician', 'manager', 'auditor', 'admin'] as const

export type Role = (typeof ROLES)[number]

/** Who is asking: everything that a permission may depend on. */
export interface Access {
  personId: string
  roles: readonly Role[]
  /** A trainee's events name a supervisor and wait for that person's signature. */
  trainee: boolean
}
