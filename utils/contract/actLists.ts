import type { Firm } from './places'
import type { PersonLine } from './people'
import type { PolicyAnswer } from './policy'
import type { DraftPlace } from '../custody/draft/draft'

/** What the forms choose from. */
export interface ActLists {
  places: DraftPlace[]
  firms: Firm[]
  people: PersonLine[]
  scales: PolicyAnswer['scales']
  /** Designations of the catalogue. */
  refrigerants: string[]
  /** The person's last three. */
  recent: string[]
}
