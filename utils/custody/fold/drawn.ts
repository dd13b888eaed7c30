import { worse } from '../condition'
import { newOwnerBecause, ownerChange } from '../findings/owner'
import { amountNotKnown } from '../findings/weight'
import type { MovementCause } from '../movement'
import { weighAfterOutflow } from './contents'
import type { CylinderState } from '../state'
import type { Turn } from './turn'
import { backByUse } from './whereabouts'

const CAUSES: Record<Turn<'drawn'>['event']['details']['purpose'], MovementCause> = {
  'same-system': 'drawn-same-system',
  'same-owner': 'drawn-same-owner',
  'sampling': 'sampled',
  'other': 'drawn-other',
}

// Our threshold: below it the vapour has nearly the composition of the liquid.
const GLIDE_THAT_MATTERS_K = 1.5

/** Refrigerant is taken out. */
export function drawn(turn: Turn<'drawn'>): void {
  const { contents } = turn.state
  const { grossAfter, purpose, phase } = turn.event.details
  if (turn.state.away) backByUse(turn)
  raiseNewOwner(turn)
  if (contents.netGrams === null) turn.findings.push(amountNotKnown('drawn'))
  weighAfterOutflow(turn, grossAfter, CAUSES[purpose])
  if (phase === 'vapour' && !contents.nothingInIt && hasGlide(turn)) contents.condition = worse(contents.condition, 'suspect')
}

function raiseNewOwner({ state, event, findings }: Turn<'drawn'>): void {
  const because = newOwnerBecause(ownersOf(state.contents), event.details)
  if (because && !state.contents.nothingInIt) findings.push(ownerChange(because))
}

function ownersOf({ shares }: CylinderState['contents']): (string | null)[] {
  const held = shares.filter(({ grams }) => grams > 0)
  return (held.length > 0 ? held : shares).map(({ ownerId }) => ownerId)
}

function hasGlide({ state, context }: Turn): boolean {
  const name = state.contents.refrigerant
  const refrigerant = name === null ? undefined : context.catalogue.refrigerants.get(name)
  return refrigerant !== undefined && refrigerant.glideK >= GLIDE_THAT_MATTERS_K
}
