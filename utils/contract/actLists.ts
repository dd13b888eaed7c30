import type { Firm } from '~~/utils/contract/places'
import type { PersonLine } from '~~/utils/contract/people'
import type { PolicyAnswer } from '~~/utils/contract/custody'
import type { DraftPlace } from '~~/utils/custody/draft/draft'

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
