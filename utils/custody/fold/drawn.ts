import { worse } from '../condition'
import { amountNotKnown } from '../findings/weight'
import type { MovementCause } from '../movement'
import { weighAfterOutflow } from './contents'
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
  if (contents.netGrams === null) turn.findings.push(amountNotKnown('drawn'))
  weighAfterOutflow(turn, grossAfter, CAUSES[purpose])
  if (phase === 'vapour' && !contents.nothingInIt && hasGlide(turn)) contents.condition = worse(contents.condition, 'suspect')
}

function hasGlide({ state, context }: Turn): boolean {
  const name = state.contents.refrigerant
  const refrigerant = name === null ? undefined : context.catalogue.refrigerants.get(name)
  return refrigerant !== undefined && refrigerant.glideK >= GLIDE_THAT_MATTERS_K
}
