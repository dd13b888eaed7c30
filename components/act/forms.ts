import type { Component } from 'vue'
import type { DraftKind } from '~~/utils/custody/draft/draft'
import { CHECKED } from '~~/utils/custody/draft/checked'
import { DRAWN } from '~~/utils/custody/draft/drawn'
import { EMPTIED } from '~~/utils/custody/draft/emptied'
import { FILLED } from '~~/utils/custody/draft/filled'
import { isFormKind, type FormKind } from '~~/utils/custody/draft/formKinds'
import { INSPECTED } from '~~/utils/custody/draft/inspected'
import { HANDED_OVER } from '~~/utils/custody/draft/handedOver'
import { LABELLED } from '~~/utils/custody/draft/labelled'
import { LOST } from '~~/utils/custody/draft/lost'
import { FOUND, MISSING } from '~~/utils/custody/draft/missing'
import { MOVED } from '~~/utils/custody/draft/moved'
import { EXCHANGE_HALF, TRANSFER_HALF } from '~~/utils/custody/draft/pairHalf'
import { REGISTERED } from '~~/utils/custody/draft/registered'
import { RECEIVED, RETURNED } from '~~/utils/custody/draft/received'
import { RETIRED } from '~~/utils/custody/draft/retired'
import { QUARANTINED, RELEASED } from '~~/utils/custody/draft/setApart'
import { WEIGHED } from '~~/utils/custody/draft/weighed'
import type { EventKind } from '~~/utils/custody/kinds'
import type { CautionTopic } from '~~/utils/document/cautions'
import CheckedForm from './CheckedForm.vue'
import DrawnForm from './DrawnForm.vue'
import EmptiedForm from './EmptiedForm.vue'
import ExchangeHalfForm from './ExchangeHalfForm.vue'
import FilledForm from './FilledForm.vue'
import FoundForm from './FoundForm.vue'
import HandedOverForm from './HandedOverForm.vue'
import InspectedForm from './InspectedForm.vue'
import LabelledForm from './LabelledForm.vue'
import LostForm from './LostForm.vue'
import MissingForm from './MissingForm.vue'
import MovedForm from './MovedForm.vue'
import QuarantinedForm from './QuarantinedForm.vue'
import ReceivedForm from './ReceivedForm.vue'
import RegisteredForm from './RegisteredForm.vue'
import ReleasedForm from './ReleasedForm.vue'
import RetiredForm from './RetiredForm.vue'
import ReturnedForm from './ReturnedForm.vue'
import TransferHalfForm from './TransferHalfForm.vue'
import WeighedForm from './WeighedForm.vue'

export interface ActForm {
  component: Component
  // A form and its draft belong together by their line here; the page only carries the draft between them.
  // eslint-disable-next-line @typescript-eslint/no-explicit-any
  draft: DraftKind<any, any>
  /** The heading, as a thing that happened. */
  title: string
  /** What the button records. */
  verb: string
  cautions: CautionTopic[]
}

/** The form of each kind of event. */
const ACT_FORMS = {
  'filled': { component: FilledForm, draft: FILLED, title: 'A recovery', verb: 'Record the recovery', cautions: ['filling'] },
  'weighed': { component: WeighedForm, draft: WEIGHED, title: 'A weighing', verb: 'Record the weight', cautions: [] },
  'moved': { component: MovedForm, draft: MOVED, title: 'A move', verb: 'Record the move', cautions: ['moving'] },
  'handed-over': { component: HandedOverForm, draft: HANDED_OVER, title: 'Handed over', verb: 'Record the handover', cautions: [] },
  'received': { component: ReceivedForm, draft: RECEIVED, title: 'Received', verb: 'Record that it came in', cautions: ['storing'] },
  'returned': { component: ReturnedForm, draft: RETURNED, title: 'Returned', verb: 'Record that it came back', cautions: ['storing'] },
  'drawn': { component: DrawnForm, draft: DRAWN, title: 'Drawn', verb: 'Record what was drawn', cautions: ['handling'] },
  'checked': { component: CheckedForm, draft: CHECKED, title: 'A check of the contents', verb: 'Record the check', cautions: ['checking'] },
  'emptied': { component: EmptiedForm, draft: EMPTIED, title: 'Emptied', verb: 'Record that it is empty', cautions: ['handling'] },
  'lost': { component: LostForm, draft: LOST, title: 'A loss', verb: 'Record the loss', cautions: ['handling'] },
  'labelled': { component: LabelledForm, draft: LABELLED, title: 'A label', verb: 'Record the label', cautions: [] },
  'inspected': { component: InspectedForm, draft: INSPECTED, title: 'An outside look', verb: 'Record the look', cautions: [] },
  'quarantined': { component: QuarantinedForm, draft: QUARANTINED, title: 'Set apart', verb: 'Set it apart', cautions: ['storing'] },
  'released': { component: ReleasedForm, draft: RELEASED, title: 'Released', verb: 'Release it', cautions: [] },
  'missing': { component: MissingForm, draft: MISSING, title: 'Missing', verb: 'Report it missing', cautions: [] },
  'found': { component: FoundForm, draft: FOUND, title: 'Found', verb: 'Record that it was found', cautions: [] },
  'retired': { component: RetiredForm, draft: RETIRED, title: 'Retired', verb: 'Retire it', cautions: ['handling'] },
} satisfies Record<FormKind, ActForm>

/** Forms that only mend: what they write is recorded elsewhere. */
const MENDING_FORMS: Partial<Record<EventKind, Pick<ActForm, 'component' | 'draft'>>> = {
  registered: { component: RegisteredForm, draft: REGISTERED },
  transferred: { component: TransferHalfForm, draft: TRANSFER_HALF },
  exchanged: { component: ExchangeHalfForm, draft: EXCHANGE_HALF },
}

/** The form that mends a recorded event of a kind, or null where it can only be taken out and recorded anew. */
export function correctionFormOf(kind: EventKind): Pick<ActForm, 'component' | 'draft'> | null {
  return MENDING_FORMS[kind] ?? formOf(kind)
}

/** The form of a kind, or null where it has none of this sort. */
export function formOf(kind: string): ActForm | null {
  return isFormKind(kind) ? ACT_FORMS[kind] : null
}
