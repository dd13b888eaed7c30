import type { MassReading } from '../../quantity/mass'
import type { DraftKind } from './draft'

export const PURPOSES = ['same-system', 'same-owner', 'sampling', 'other'] as const
/** What it was drawn for, as people say it. */
export const PURPOSE_WORDS: Record<(typeof PURPOSES)[number], string> = {
  'same-system': 'Back into the system it came from',
  'same-owner': 'Into other equipment of its owner',
  'sampling': 'A sample',
  'other': 'Something else',
}
export const PHASES = ['liquid', 'vapour'] as const

export interface DrawnDraft {
  grossAfter: MassReading | null
  purpose: (typeof PURPOSES)[number] | ''
  phase: (typeof PHASES)[number] | ''
  /** '' = of no job. */
  jobId: string
  /** Whose equipment it goes into, a firm; '' = not said. */
  toOwnerId: string
}

/** The form of refrigerant taken out for use. */
export const DRAWN: DraftKind<'drawn', DrawnDraft> = {
  empty: () => ({ grossAfter: null, purpose: '', phase: '', jobId: '', toOwnerId: '' }),
  read: ({ grossAfter, purpose, phase, jobId, toOwnerId }) => {
    if (purpose === '') return { reason: 'Choose what it was drawn for.' }
    if (!grossAfter) return { reason: 'Type what the scale shows, hoses off.' }
    return { details: { grossAfter, purpose, ...(phase && { phase }), ...(jobId && { jobId }), ...(toOwnerId && { toOwnerId }) } }
  },
  of: ({ grossAfter, purpose, phase, jobId, toOwnerId }) => ({ grossAfter, purpose, phase: phase ?? '', jobId: jobId ?? '', toOwnerId: toOwnerId ?? '' }),
}
