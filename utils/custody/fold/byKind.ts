import type { EventKind } from '../kinds'
import { checked } from './checked'
import { corrected } from './corrected'
import { countersigned } from './countersigned'
import { drawn } from './drawn'
import { emptied } from './emptied'
import { exchanged } from './exchanged'
import { filled } from './filled'
import { found } from './found'
import { handedOver } from './handedOver'
import { inspected } from './inspected'
import { labelled } from './labelled'
import { lost } from './lost'
import { missing } from './missing'
import { moved } from './moved'
import { quarantined } from './quarantined'
import { received } from './received'
import { reclaimed } from './reclaimed'
import { registered } from './registered'
import { released } from './released'
import { retested } from './retested'
import { retired } from './retired'
import { returned } from './returned'
import { sentForReclaim } from './sentForReclaim'
import { sentForTest } from './sentForTest'
import { transferred } from './transferred'
import type { Turn } from './turn'
import { weighed } from './weighed'

/** What each kind does to a cylinder. */
const FOLDS: { [K in EventKind]: (turn: Turn<K>) => void } = {
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
}

/** Does to the cylinder of a turn what the kind of its event does. */
export function foldByKind<K extends EventKind>(turn: Turn<K>): void {
  // The kind of the event names the fold that takes it, which the compiler cannot follow.
  const foldKind = FOLDS[turn.event.kind] as ((turn: Turn<K>) => void) | undefined
  foldKind?.(turn)
}
