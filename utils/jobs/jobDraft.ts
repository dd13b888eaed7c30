import type { Job, NewJob } from '../contract/jobs'
import type { MassReading } from '../quantity/mass'
import type { Appliance, Circumstances, MachineMade } from '../recovery/types'

/** The choice of a customer who is not on the list. */
export const BY_NAME = 'by-name'

/** A job as its form has it; '' = not said. */
export interface JobDraft {
  /** A firm, or {@link BY_NAME}. */
  customerId: string
  customerName: string
  site: string
  equipment: string
  refrigerant: string
  charge: MassReading | null
  keeps: Job['keeps'] | ''
  email: string
  appliance: Appliance | ''
  circumstances: Circumstances | ''
  machineMade: MachineMade | ''
}

/** A job of which nothing is said yet. */
export function emptyJob(refrigerant = ''): JobDraft {
  return {
    customerId: '', customerName: '', site: '', equipment: '', refrigerant, charge: null, keeps: '', email: '', appliance: '', circumstances: '', machineMade: '',
  }
}

/** What is sent of a job, or what is still missing, in words. */
export function readJob(draft: JobDraft): { body: NewJob } | { reason: string } {
  const [site, equipment, customerName, email] = [draft.site, draft.equipment, draft.customerName, draft.email].map(typed => typed.trim()) as [string, string, string, string]
  if (draft.customerId === '') return { reason: 'Choose the customer.' }
  if (draft.customerId === BY_NAME && customerName === '') return { reason: 'Write the customer’s name.' }
  if (site === '') return { reason: 'Write where the equipment stands.' }
  if (equipment === '') return { reason: 'Write which equipment it is.' }
  if (draft.keeps === '') return { reason: 'Choose whose the refrigerant stays.' }
  const opened = {
    ...(draft.appliance && { appliance: draft.appliance }),
    ...(draft.circumstances && { circumstances: draft.circumstances }),
    ...(draft.machineMade && { machineMade: draft.machineMade }),
  }
  return {
    body: {
      ...(draft.customerId === BY_NAME ? { customerName } : { customerId: draft.customerId }),
      site, equipment,
      keeps: draft.keeps,
      ...(draft.refrigerant && { refrigerant: draft.refrigerant }),
      ...(draft.charge && { charge: draft.charge }),
      ...(email && { email }),
      ...(Object.keys(opened).length > 0 && { opened }),
    },
  }
}

/** Whose the refrigerant of a fill is where a job was chosen: a firm's id, '' for the contractor. */
export function ownerOfJob({ keeps, customer }: Pick<Job, 'keeps' | 'customer'>): string {
  return keeps === 'customer' ? customer.id ?? '' : ''
}

/** The jobs to choose from: one's own first, then the newest. */
export function inOrderFor<J extends Pick<Job, 'createdBy' | 'number'>>(jobs: readonly J[], personId: string): J[] {
  return [...jobs].sort((a, b) => Number(b.createdBy.id === personId) - Number(a.createdBy.id === personId) || b.number - a.number)
}

/** A job in a line. */
export function jobWords({ number, customer, equipment }: Pick<Job, 'number' | 'customer' | 'equipment'>): string {
  return `${number}: ${customer.name}, ${equipment}`
}
