import type { z } from 'zod'
import type { EventKind } from '../kinds'
import { details as checked } from './checked'
import { details as corrected } from './corrected'
import { details as countersigned } from './countersigned'
import { details as drawn } from './drawn'
import { details as emptied } from './emptied'
import { details as exchanged } from './exchanged'
import { details as filled } from './filled'
import { details as found } from './found'
import { details as handedOver } from './handedOver'
import { details as inspected } from './inspected'
import { details as labelled } from './labelled'
import { details as lost } from './lost'
import { details as missing } from './missing'
import { details as moved } from './moved'
import { details as quarantined } from './quarantined'
import { details as received } from './received'
import { details as reclaimed } from './reclaimed'
import { details as registered } from './registered'
import { details as released } from './released'
import { details as retired } from './retired'
import { details as retested } from './retested'
import { details as returned } from './returned'
import { details as sentForReclaim } from './sentForReclaim'
import { details as sentForTest } from './sentForTest'
import { details as transferred } from './transferred'
import { details as weighed } from './weighed'

/** The schema of each kind's details. */
export const DETAILS = {
  'registered': registered,
  'labelled': labelled,
  'received': received,
  'moved': moved,
  'handed-over': handedOver,
  'weighed': weighed,
  'filled': filled,
  'drawn': drawn,
  'transferred': transferred,
  'checked': checked,
  'emptied': emptied,
  'lost': lost,
  'inspected': inspected,
  'quarantined': quarantined,
  'released': released,
  'missing': missing,
  'found': found,
  'retired': retired,
  'sent-for-reclaim': sentForReclaim,
  'reclaimed': reclaimed,
  'returned': returned,
  'exchanged': exchanged,
  'sent-for-test': sentForTest,
  'retested': retested,
  'corrected': corrected,
  'countersigned': countersigned,
} satisfies Record<EventKind, z.ZodType>

/** What an event of a kind says. */
export type DetailsOf<K extends EventKind> = z.output<(typeof DETAILS)[K]>
