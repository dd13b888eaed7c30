import type { Access } from '../access/roles'
import { contentsInWords } from './contentsInWords'
import type { CylinderView } from './cylinderView'
import { DISPATCH_KINDS, EVENT_KINDS, type EventKind } from './kinds'
import { isEmptyByScale, mayCheck, mayDraw, mayFill, mayTake, type PlanAnswer, type Planned } from './plan'
import { mayPost } from './posting'
import { MISSING_WORDS } from './words'

/** What this person may do with a cylinder, and what not and why. It advises on plans; a fact is recorded all the same. */
export function mayOf(view: Planned, access: Access | null): Pick<CylinderView, 'may' | 'mayNot'> {
  const may: EventKind[] = []
  const mayNot: CylinderView['mayNot'] = []
  if (access === null || !EVENT_KINDS.some(kind => mayPost(access, kind))) return { may, mayNot }
  for (const kind of EVENT_KINDS) {
    const because = whyNot(view, access, kind)
    if (because === null) may.push(kind)
    else mayNot.push({ kind, because })
  }
  return { may, mayNot }
}

function whyNot(view: Planned, access: Access, kind: EventKind): string | null {
  if (kind === 'countersigned') return view.waitsForSignatureOf.includes(access.personId) && !access.trainee ? null : 'Nothing here waits for your signature.'
  if (!mayPost(access, kind)) return 'Another role records this.'
  if ((DISPATCH_KINDS as readonly EventKind[]).includes(kind)) {
    return kind === 'sent-for-reclaim' ? 'It leaves with a shipment and its papers.' : 'It leaves with a test lot and its list.'
  }
  switch (kind) {
    case 'registered': return view.stamp === null ? null : 'It is registered already; correct that entry instead.'
    case 'reclaimed': return view.lifecycle === 'at-reclaim' ? null : 'It is not at a reclaimer.'
    case 'released': return view.holds.includes('quarantined') ? null : 'It is not set apart.'
    case 'missing': return view.lifecycle === 'missing' ? 'It is missing already.' : null
    case 'found': return view.lifecycle === 'missing' ? null : 'It is not missing.'
    case 'retired': return whyNotRetired(view)
    case 'filled': return reason(mayFill(view))
    // Most that is drawn goes back into equipment of its owner. What is overfilled is drawn down, whosever it is.
    case 'drawn': return reason(mayDraw(view, isOverfilled(view) ? undefined : { purpose: 'same-owner' }))
    case 'transferred': return reason(mayDraw(view))
    case 'checked': return view.contents.nothingInIt ? 'By the log nothing is in it.' : reason(mayCheck(view))
    case 'moved':
    case 'exchanged':
    case 'handed-over': return reason(mayTake(view))
    default: return null
  }
}

function isOverfilled({ findings }: Planned): boolean {
  return findings.some(({ code }) => code === 'overfill')
}

function whyNotRetired(view: Planned): string | null {
  if (view.lifecycle === 'retired') return 'It is retired already.'
  return isEmptyByScale(view) ? null : `${contentsInWords(view)} Draw it or ship it first.`
}

function reason({ allowed, because, missing }: PlanAnswer): string | null {
  if (allowed) return null
  if (because.length === 0 && missing.length === 0) return 'No rule has a figure for this refrigerant in this cylinder.'
  return because[0]?.text ?? `Not known: ${missing.map(input => MISSING_WORDS[input]).join(', ')}.`
}
